import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { axeFaults, axeFaultsInDark } from './axe';
import { launchBrowser } from './browser';
import { everyPage, settled } from './pages';
import { signIn, type PersonKey } from './people';
import { startProduct, type Product } from './product';
import { visit } from './visit';

let product: Product;
let browser: Browser;

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(inject('seededDir')), launchBrowser()]);
});

afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

/** Every page for one person; of the others' pages those that look different for them. */
const rounds: { who: PersonKey; part: string; takes: (name: string) => boolean }[] = [
  { who: 'scientist', part: 'Intake', takes: (name) => /^(intake|bench)/.test(name) },
  { who: 'scientist', part: 'all other', takes: (name) => !/^(intake|bench)/.test(name) },
  { who: 'steward', part: 'their own', takes: (name) => /^(desk|intake|bench|ledger)$/.test(name) },
  { who: 'administrator', part: 'their own', takes: (name) => /^(desk|administration)$/.test(name) },
];

async function faultsInBothThemes(page: Page): Promise<string[]> {
  await settled(page);
  return [...(await axeFaults(page)), ...(await axeFaultsInDark(page)).map((fault) => `dark: ${fault}`)];
}

test.each(rounds)('axe finds nothing serious for the $who on $part pages, light and dark', async (round) => {
  const { who, takes } = round;
  const { page, leave } = await visit(browser, product, { colorScheme: 'light' });
  const faults: Record<string, string[]> = {};
  await signIn(page, product, who);
  for (const { name, path } of await everyPage(page, who)) {
    if (!takes(name)) continue;
    await page.goto(product.url + path);
    const found = await faultsInBothThemes(page);
    if (found.length > 0) faults[name] = found;
  }
  expect(faults).toEqual({});
  await leave();
});

test('axe finds nothing serious before sign-in, on a missing page and on an empty list', async () => {
  const { page, expectRefusal, leave } = await visit(browser, product, { colorScheme: 'light' });
  await page.goto(`${product.url}/sign-in`);
  expect(await faultsInBothThemes(page)).toEqual([]);
  await page.goto(`${product.url}/reset-password#token=used-up`);
  expect(await faultsInBothThemes(page)).toEqual([]);
  await signIn(page, product, 'modeller');
  expectRefusal(404, /\/slices\/no-such-slice$/);
  for (const path of ['/slices/no-such-slice', '/estimates?slice=penultimate-glacial', '/exports']) {
    await page.goto(product.url + path);
    expect(await faultsInBothThemes(page), path).toEqual([]);
  }
  await leave();
});
