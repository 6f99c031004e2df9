import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { axeFaults } from './axe';
import { launchBrowser } from './browser';
import { signIn } from './people';
import { startProduct, type Product } from './product';
import { narrow, visit } from './visit';

let product: Product;
let browser: Browser;

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(inject('seededDir')), launchBrowser()]);
});

afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

/** Extinction at 0.55 µm as the table behind its curve has it. */
async function extinctionAt550(page: Page): Promise<number> {
  const figure = page.getByRole('figure', { name: 'Mass extinction efficiency' });
  const row = figure.getByRole('row').filter({ hasText: /^0\.55/ });
  await row.waitFor();
  return Number(await row.getByRole('cell').nth(2).innerText());
}

const refined = (page: Page) => page.getByText(/^Refined/).waitFor({ timeout: 120_000 });

test('a ready-made set is changed, its curves follow, it is published, and an estimate can choose it', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist');
  await page.keyboard.press('g');
  await page.keyboard.press('o');
  await page.waitForURL(/\/optics$/);
  await page.getByRole('link', { name: 'Transported mineral dust' }).click();
  await page.getByRole('heading', { level: 1, name: 'Transported mineral dust' }).waitFor();
  await refined(page);
  await page.getByRole('button', { name: 'Mass extinction efficiency as table' }).click();
  const before = await extinctionAt550(page);
  expect(before).toBeGreaterThan(0.2);

  const radius = page.getByLabel(/median radius by number/);
  await radius.fill('wide');
  await page.getByText('wide is not a number. Write it as 0.42 or 0,42.').waitFor();
  await radius.fill('0.2');
  await page.getByText(/^Preview/).waitFor();
  await refined(page);
  const after = await extinctionAt550(page);
  expect(after).toBeGreaterThan(1.3 * before);

  await page.getByLabel('Name of the set').fill('Fine dust of a walk');
  await page.getByRole('button', { name: 'Save as draft of your own' }).click();
  await page.waitForURL(/\/optics\/fine-dust-of-a-walk$/);
  await page.getByRole('heading', { level: 1, name: 'Fine dust of a walk' }).waitFor();
  await page.getByRole('button', { name: 'Publish' }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Publish' }).click();
  await page.locator('.state-tag', { hasText: 'Published' }).waitFor();

  await page.goto(`${product.url}/estimates/new`);
  const choice = page.getByLabel('Optical set');
  await choice.selectOption({ label: 'Fine dust of a walk, version 1' });
  const values = page.getByRole('table', { name: 'Values of Fine dust of a walk' });
  await values.waitFor();
  expect(await values.innerText()).toContain(after.toFixed(2));
  await leave();
});

test('sets are compared, equations and sources stand by, and nothing of it asks the outside', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'modeller', '/optics/dust-pm20-desert?with=dust-fine,dust-broadband');
  await page.getByRole('heading', { level: 1, name: 'Desert dust below 20 µm' }).waitFor();
  const figure = page.getByRole('figure', { name: 'Single-scattering albedo' });
  await figure.getByText('Fine dust below 2.5 µm', { exact: true }).waitFor();
  await figure.getByText('Mineral dust, broadband for one-layer formulas', { exact: true }).waitFor();
  expect(await page.getByRole('button', { name: 'Publish' }).count()).toBe(0);
  await page.getByRole('tab', { name: 'By number' }).click();
  await page.getByText('share of number per unit of ln radius; axis: radius in µm').waitFor();
  await page.getByRole('button', { name: 'Equations and their sources' }).click();
  await page.getByRole('math', { name: 'One sphere' }).waitFor();
  await leave();
});

const looks = ['light', 'dark'] as const;
test.each(looks.flatMap((look) => ['/optics', '/optics/new', '/optics/sulfate'].map((path) => [path, look])))(
  '%s can be read and used by everybody in %s, and does not scroll sideways on a telephone',
  async (path, look) => {
    const { page, leave } = await visit(browser, product, { colorScheme: look as 'light' | 'dark' });
    await signIn(page, product, 'scientist', path);
    if (path !== '/optics') await page.getByRole('table', { name: 'Band means' }).waitFor();
    expect(await axeFaults(page)).toEqual([]);
    await page.setViewportSize(narrow);
    const wider = await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth);
    expect(wider, 'the page scrolls sideways').toBe(false);
    await leave();
  },
);
