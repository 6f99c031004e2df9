import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { encryptedWorkbook } from './encrypted-workbook';
import { launchBrowser } from './browser';
import { fillForm, nextStep, sample, send, upload } from './intake-acts';
import { people, signIn } from './people';
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

const files = [
  {
    what: 'a picture under the name of a workbook',
    file: {
      name: 'fluxes.xlsx',
      mimeType: '',
      buffer: Buffer.from('89504e470d0a1a0a0000000d49484452', 'hex'),
    },
    status: 415,
    says: /is a PNG image/,
  },
  {
    what: 'a workbook behind a password',
    file: { name: 'locked.xlsx', mimeType: '', buffer: encryptedWorkbook() },
    status: 422,
    says: /is protected by a password/,
  },
];

test.each(files)('$what is refused in words, and the file stays chosen', async ({ file, status, says }) => {
  const { page, expectRefusal, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist');
  expectRefusal(status, /\/submissions$/);
  await send(page, product, file);
  const dialog = page.getByRole('dialog', { name: 'Upload a spreadsheet' });
  const alert = dialog.getByRole('alert');
  await alert.waitFor();
  expect(await alert.innerText()).toMatch(says);
  expect(await alert.innerText()).toMatch(/nothing was stored/);
  await dialog.getByText(file.name, { exact: true }).waitFor();
  await leave();
});

test('whoever is scientist and steward does not decide on a submission of their own', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'steward2');
  await upload(page, product, sample('B_Staubfluesse_Export.csv'));
  await fillForm(page, {
    creator: people.steward2.name,
    licence: 'CC-BY-4.0',
    citation: 'Quade, J. (2024): Table of the walk. Invented Letters 1, 1-2.',
    choices: {
      Archive: 'Ice core',
      'Size cut-off': 'Bulk: all sizes',
      'What counts as dust': 'Insoluble particles',
      'Ages count from': 'Before 1950 CE (BP)',
      'Uncertainties are': 'One standard error',
    },
  });
  await nextStep(page).getByRole('button', { name: 'Submit' }).click();
  await nextStep(page).getByText('It waits for a steward.').waitFor();
  expect(
    await nextStep(page)
      .getByRole('button', { name: /Take|Approve/ })
      .count(),
  ).toBe(0);
  await page.goto(`${product.url}/intake?view=queue`);
  await page.getByRole('row', { name: /B Staubfluesse Export/ }).waitFor();
  await leave();
});

test('who changes what another tab has changed meanwhile is told so, and nothing is overwritten', async () => {
  const { page, context, expectRefusal, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist');
  const path = await upload(page, product, sample('B_Staubfluesse_Export.csv'));
  const other = await context.newPage();
  await other.goto(product.url + path);
  await other.getByRole('grid').waitFor();
  await leaveOutRow(page, 6, 'Changed first.');
  await page.getByText('left out: Changed first.').waitFor();
  expectRefusal(412, /\/leave-out$/);
  await leaveOutRow(other, 7, 'Changed second.');
  const alert = other.getByRole('alert').filter({ hasText: /changed|meanwhile|newer/i });
  await alert.first().waitFor();
  await leave();

  async function leaveOutRow(on: typeof page, row: number, reason: string) {
    await on
      .getByRole('button', { name: `Row ${row}: choices` })
      .first()
      .click();
    await on.getByRole('menuitem', { name: /Leave the row out/ }).click();
    await on.getByRole('dialog').getByLabel('Reason').fill(reason);
    await on.getByRole('dialog').getByRole('button', { name: 'Leave the row out' }).click();
  }
});
