import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { launchBrowser } from './browser';
import { fillSignIn, people, signIn } from './people';
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

test('a wrong password is refused in words, and the right one leads on to the page that was wanted', async () => {
  const { page, expectRefusal, leave } = await visit(browser, product);
  await page.goto(`${product.url}/slices/lgm`);
  await page.waitForURL(/\/sign-in\?next=/);
  expectRefusal(401, /\/auth\/sign-in$/);
  await fillSignIn(page, people.scientist.email, 'not the right password');
  const alert = page.getByRole('alert');
  await alert.waitFor();
  expect(await alert.innerText()).toMatch(/password/i);
  expect(await page.getByLabel('E-mail').inputValue()).toBe(people.scientist.email);
  await fillSignIn(page, people.scientist.email, product.password);
  await page.getByRole('heading', { level: 1, name: 'Last Glacial Maximum' }).waitFor();
  expect(new URL(page.url()).pathname).toBe('/slices/lgm');

  await page.getByRole('button', { name: `${people.scientist.name}: menu` }).click();
  await page.getByRole('menuitem', { name: 'Sign out' }).click();
  await page.getByRole('heading', { level: 1, name: 'Sign in' }).waitFor();
  await page.goBack();
  await page.getByRole('heading', { level: 1, name: 'Sign in' }).waitFor();
  await leave();
});

test('a demo person picked by name fills in the e-mail', async () => {
  const { page, leave } = await visit(browser, product);
  await page.goto(product.url);
  await page.getByRole('button', { name: new RegExp(people.modeller.name) }).click();
  expect(await page.getByLabel('E-mail').inputValue()).toBe(people.modeller.email);
  await leave();
});

const desks = [
  { who: 'scientist', headline: /came back with questions|wait/, sections: 7, sees: 'Latest published' },
  { who: 'steward', headline: /submissions? waits?/, sections: 7, sees: 'To vet' },
  { who: 'modeller', headline: /Nothing waits for you/, sections: 6, sees: 'Latest published' },
  { who: 'administrator', headline: /Nothing waits for you/, sections: 6, sees: 'Latest published' },
] as const;

test.each(desks)('the desk of the $who says what waits and shows only open sections', async (desk) => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, desk.who);
  expect(await page.getByRole('heading', { level: 1 }).innerText()).toMatch(desk.headline);
  const tabs = page.getByRole('navigation', { name: 'Sections' }).getByRole('link');
  expect(await tabs.count()).toBe(desk.sections);
  await page.getByText(desk.sees, { exact: true }).first().waitFor();
  await leave();
});

test('letters after g open sections, a stroke goes to the search, and Enter opens what was found', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist');
  for (const [letter, path] of [
    ['s', '/slices'],
    ['p', '/profile'],
    ['d', '/desk'],
  ]) {
    await page.keyboard.press('g');
    await page.keyboard.press(letter!);
    await page.waitForURL(product.url + path);
    await expect.poll(() => page.evaluate(() => document.activeElement?.tagName)).toBe('H1');
  }
  await page.keyboard.press('/');
  await page.keyboard.type('Glacial Max');
  await page
    .getByRole('option', { name: /Last Glacial Maximum/ })
    .first()
    .waitFor();
  await page.keyboard.press('Enter');
  await page.waitForURL(/\/slices\/lgm$/);
  await leave();
});

test('arrow keys walk down the column, and Enter puts the slice in the address', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist', '/slices');
  const column = page.getByRole('navigation', { name: 'Time slices, youngest first' });
  const beds = column.getByRole('link');
  await beds.first().waitFor();
  await beds.first().focus();
  for (let step = 0; step < 3; step += 1) await page.keyboard.press('ArrowDown');
  const third = await beds.nth(3).getAttribute('href');
  await page.keyboard.press('Enter');
  await page.waitForURL(product.url + third!);
  await expect.poll(() => beds.nth(3).getAttribute('aria-current')).toBe('true');
  await page.getByRole('button', { name: 'Open the column' }).click();
  await page.reload();
  await page.getByRole('button', { name: 'Close the column' }).waitFor();
  await leave();
});

test('on a narrow screen the column is a strip and the sections stand behind a button', async () => {
  const { page, leave } = await visit(browser, product, { viewport: narrow });
  await signIn(page, product, 'scientist');
  const strip = page.getByRole('navigation', { name: 'Time slices, youngest first' });
  await strip.getByRole('link', { name: /Last Glacial Maximum/ }).click();
  await page.waitForURL(/\/slices\/lgm$/);
  await page.getByRole('button', { name: 'Sections' }).click();
  await page.getByRole('menuitem', { name: 'Holdings' }).click();
  await page.waitForURL(/\/holdings$/);
  const wider = await page.evaluate(() => document.documentElement.scrollWidth > window.innerWidth);
  expect(wider, 'the page scrolls sideways').toBe(false);
  await leave();
});
