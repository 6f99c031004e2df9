import type { Page } from 'playwright-core';
import type { PersonKey } from './people';

export type NamedPage = { name: string; path: string };

type Listed<Item> = { items: Item[] };

/** Asks the service as the person on the page does. */
const ask = <Item>(page: Page, path: string) =>
  page.evaluate(async (address) => {
    const answer = await fetch(`/api/v1${address}`);
    return (await answer.json()) as unknown;
  }, path) as Promise<Listed<Item>>;

/** Every address of the client with something of the demo scenario to show on it. */
export async function everyPage(page: Page, who: PersonKey): Promise<NamedPage[]> {
  const fields = await ask<{ versionId: string }>(page, '/fields?slice=lgm');
  const estimates = await ask<{ id: string }>(page, '/estimates?slice=lgm');
  const datasets = await ask<{ slug: string }>(page, '/datasets');
  const found = {
    field: fields.items[0]!.versionId,
    estimate: estimates.items[0]!.id,
    dataset: datasets.items[0]!.slug,
  };
  const everybody: NamedPage[] = [
    { name: 'desk', path: '/desk' },
    { name: 'holdings', path: '/holdings' },
    { name: 'dataset', path: `/holdings/${found.dataset}/versions/1` },
    { name: 'slices', path: '/slices' },
    { name: 'slice', path: '/slices/lgm' },
    { name: 'field', path: `/fields/${found.field}` },
    { name: 'optics', path: '/optics' },
    { name: 'estimates', path: '/estimates' },
    { name: 'estimate', path: `/estimates/${found.estimate}?region=EAN` },
    { name: 'exports', path: '/exports' },
    { name: 'mailbox', path: '/mailbox' },
    { name: 'profile', path: '/profile' },
    { name: 'not-found', path: '/nowhere' },
  ];
  return [...everybody, ...(await ownPages(page, who, found.field))];
}

async function ownPages(page: Page, who: PersonKey, field: string): Promise<NamedPage[]> {
  if (who === 'administrator') {
    return [
      { name: 'ledger', path: '/ledger' },
      { name: 'administration', path: '/administration' },
    ];
  }
  if (who === 'modeller') return [];
  const { items } = await ask<{ id: string }>(page, '/submissions');
  const first = items[0]!.id;
  const intake: NamedPage[] = [
    { name: 'intake', path: who === 'steward' ? '/intake?view=queue' : '/intake' },
    { name: 'intake-rules', path: '/intake/rules' },
    { name: 'bench', path: `/intake/${first}` },
    { name: 'bench-mapping', path: `/intake/${first}?panel=mapping` },
    { name: 'bench-metadata', path: `/intake/${first}?panel=metadata` },
    { name: 'bench-history', path: `/intake/${first}?panel=history` },
  ];
  if (who === 'steward') return [...intake, { name: 'ledger', path: '/ledger' }];
  return [
    ...intake,
    { name: 'intake-new', path: '/intake/new' },
    { name: 'new-field', path: '/slices/lgm/new-field' },
    { name: 'new-estimate', path: `/estimates/new?field=${field}` },
  ];
}

/** Waits until nothing on the page loads any more. */
export async function settled(page: Page): Promise<void> {
  await page.getByRole('heading', { level: 1 }).first().waitFor();
  await page.waitForLoadState('networkidle');
  await page.evaluate(() => document.fonts.ready);
}
