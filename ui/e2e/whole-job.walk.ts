import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, inject, test } from 'vitest';
import { launchBrowser } from './browser';
import { approve, fillForm, findings, nextStep, sample, upload } from './intake-acts';
import { people, signIn } from './people';
import { startProduct, type Product } from './product';
import { visit } from './visit';

let product: Product;
let browser: Browser;
const paths = { workbook: '', table: '', estimate: '' };
const workbookTitle = 'Dust flux at Dome C and NorthGRIP';
const tableTitle = 'Dust fluxes of two ice cores, exported table';

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(inject('seededDir')), launchBrowser()]);
});

afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

const cell = (page: Page, text: string) => page.getByRole('gridcell').filter({ hasText: text }).first();

test('a scientist sends the workbook, corrects the proposal, answers the form and submits', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist');
  paths.workbook = await upload(page, product, sample('A_EDC_NGRIP_dust_v3_final.xlsx'));
  expect(await nextStep(page).innerText()).toMatch(/errors stand/);

  await page.getByRole('button', { name: 'Mapping', exact: true }).click();
  const mapping = page.getByRole('complementary', { name: 'Mapping' });
  const tables = mapping.getByRole('region', { name: 'Tables' });
  await tables.getByRole('listitem').nth(3).waitFor();
  expect(await tables.getByRole('listitem').allInnerTexts()).toEqual([
    expect.stringMatching(/left alone\s+READ ME[\s\S]*no table of numbers/),
    expect.stringMatching(/in use\s+EDC[\s\S]*header rows 4, 5, 6, units in row 6/),
    expect.stringMatching(/in use\s+NGRIP/),
    expect.stringMatching(/left alone\s+old calc[\s\S]*superseded/),
  ]);
  const unit = mapping.getByLabel('Unit of column F');
  expect(await unit.inputValue()).toBe('mg m-2 yr-1');
  const flux = cell(page, '0.4963');
  expect(await flux.innerText()).toMatch(/0\.0004963/);
  await unit.fill('g m-2 yr-1');
  await mapping.getByRole('button', { name: 'Apply' }).click();
  await expect.poll(() => flux.innerText()).toMatch(/0\.4963\s+0\.4963/);
  await unit.fill('mg m-2 yr-1');
  await mapping.getByRole('button', { name: 'Apply' }).click();
  await expect.poll(() => flux.innerText()).toMatch(/0\.0004963/);
  await mapping.getByRole('button', { name: /^Close/ }).click();

  await fillForm(page, {
    title: workbookTitle,
    creator: people.scientist.name,
    licence: 'CC-BY-4.0',
    doi: '10.1038/nature06763',
    choices: {
      Archive: 'Ice core',
      'Size cut-off': 'Bulk: all sizes',
      'What counts as dust': 'Insoluble particles',
      'Ages count from': 'Before 1950 CE (BP)',
      'Uncertainties are': 'One standard error',
    },
  });
  expect(await nextStep(page).innerText()).not.toMatch(/errors? stand/);
  await nextStep(page).getByRole('button', { name: 'Submit' }).click();
  await nextStep(page).getByText('It waits for a steward.').waitFor();
  await leave();
});

test('the exported table comes out of Latin-1, semicolons and decimal commas; a bad row is left out', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist');
  paths.table = await upload(page, product, sample('B_Staubfluesse_Export.csv'));
  await cell(page, '0,0008264').waitFor();
  expect(await cell(page, '0,0008264').innerText()).toMatch(/0\.0003018/); // 0.0008264 × 0.36525, as expected there
  await page.getByRole('button', { name: 'Row 5: choices' }).first().click();
  await page.getByRole('menuitem', { name: /Leave the row out/ }).click();
  await page.getByRole('dialog').getByLabel('Reason').fill('Too few samples, as the remark says.');
  await page.getByRole('dialog').getByRole('button', { name: 'Leave the row out' }).click();
  await page.getByText('left out: Too few samples, as the remark says.').waitFor();
  await fillForm(page, {
    title: tableTitle,
    creator: people.scientist.name,
    licence: 'CC-BY-4.0',
    citation: 'Lambert, F. (2008): Dust-climate couplings over the past 800,000 years. Nature 452, 616-619.',
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
  await leave();
});

test('a steward takes both from the queue, reads findings in the grid, waives with a reason and approves', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'steward', '/intake?view=queue');
  await page.getByRole('link', { name: workbookTitle }).click();
  await findings(page)
    .getByRole('button', { name: /Codes taken as missing/ })
    .click();
  await findings(page)
    .getByRole('button', { name: /column F/ })
    .click();
  await page.getByRole('grid').focus();
  await page.keyboard.press(']');
  await approve(page, 'The codes mark gaps, as the notes sheet says.');
  await page
    .getByText(/^[0-9a-f]{64}$/)
    .first()
    .waitFor();
  expect(await page.getByRole('main').innerText()).toMatch(
    new RegExp(`Ilka Vossberg \\(\\d{4}\\): ${workbookTitle}, version 1\\..*CC-BY-4\\.0`),
  );
  const samples = page.getByRole('table', { name: 'Samples' });
  await samples.getByRole('row', { name: /^EDC/ }).first().waitFor();
  await page.goto(product.url + paths.table);
  await approve(page, 'Looked at, row by row.');
  await leave();
});

test('the scientist is told by mail', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist', '/mailbox');
  await page.getByText(`approved: ${workbookTitle}`).first().click();
  await page.getByText(/checksum [0-9a-f]{64}/).waitFor();
  await leave();
});

test('a field of all datasets lists what has no reference flux, and an estimate on it runs as a job', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist', '/slices/lgm');
  await page
    .getByRole('button', { name: 'Build a field' })
    .or(page.getByRole('link', { name: 'Build a field' }))
    .click();
  const preview = page.getByRole('region', { name: 'Preview' });
  await preview.getByRole('heading', { name: /Sites not used/ }).waitFor();
  const unused = preview.getByRole('table', { name: /Sites not used/ });
  expect(await unused.getByRole('row', { name: /^NGRIP/ }).innerText()).toMatch(/no reference flux/i);
  expect(
    await preview
      .getByRole('table', { name: /Sites used/ })
      .getByRole('row', { name: /^NGRIP/ })
      .count(),
  ).toBe(0);
  await page.getByRole('button', { name: 'Build field' }).click();
  await page.waitForURL(/\/fields\//);
  await page.getByRole('button', { name: 'New estimate' }).click();

  await page
    .getByText(/Thin layer, daily form/)
    .first()
    .waitFor();
  expect(await page.getByRole('main').innerText()).toMatch(/longwave on/);
  await page
    .getByRole('complementary', { name: /preview/i })
    .getByText(/5–95 %/)
    .first()
    .waitFor();
  await page.getByRole('button', { name: 'Run 1024 members' }).click();
  await page.waitForURL(/\/estimates\/[0-9a-f-]{36}/);
  paths.estimate = new URL(page.url()).pathname;
  await page.getByRole('button', { name: 'Sign off' }).waitFor({ timeout: 60_000 });
  expect(await page.getByRole('main').innerText()).toMatch(/Yours: a second person signs it off/);

  const regions = page.getByRole('table', { name: '58 regions' });
  const row = regions.getByRole('row', { name: /^E\. Antarctica/ });
  await row.click();
  await page.waitForURL(/region=EAN/);
  expect(await row.getAttribute('aria-selected')).toBe('true');
  await page.getByRole('heading', { name: /E\. Antarctica/ }).waitFor();
  await page.goBack();
  await leave();
});

test('a second person signs it off, and the stratum takes its colour', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'scientist2', paths.estimate);
  await page.getByRole('button', { name: 'Sign off', exact: true }).click();
  await page.getByRole('alertdialog').getByRole('button', { name: 'Sign off and publish' }).click();
  await page.getByText('Signed off and published').first().waitFor();
  const net = /−?\+?[\d.]+/.exec(await page.getByRole('row', { name: /^Global mean/ }).innerText());
  expect(net).not.toBeNull();
  const bed = page
    .getByRole('navigation', { name: /^Time slices/ })
    .getByRole('link', { name: /^Last Glacial Maximum/ });
  await expect
    .poll(() => bed.getAttribute('aria-label'))
    .toMatch(/net forcing [−+][\d.]+ watts per square metre/);
  await leave();
});

test.each([
  {
    format: 'Regional table, CSV',
    file: /regions\.csv$/,
    begins: /^slice,reference,region_code,.*forcing_net_central_W_m2/,
  },
  // Classic and 64-bit NetCDF begin with CDF and a version byte; CF names itself in the header.
  { format: 'Slice fields, NetCDF', file: /\.nc$/, begins: /^CDF[^a-z][\s\S]*CF-1\./ },
])('a modeller takes the estimate home as $format, and its bytes match the checksum', async (wanted) => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'modeller', paths.estimate);
  await page.getByRole('button', { name: 'Export' }).click();
  await page.getByRole('menuitem', { name: new RegExp(wanted.format) }).click();
  await page.waitForURL(/\/exports/);
  const row = page.getByRole('row', { name: new RegExp(wanted.format) });
  await row.getByText('Done').waitFor({ timeout: 60_000 });
  const [download] = await Promise.all([
    page.waitForEvent('download'),
    row.getByRole('link', { name: wanted.file }).click(),
  ]);
  const bytes = await readFile(await download.path());
  expect(download.suggestedFilename()).toMatch(wanted.file);
  expect(bytes.subarray(0, 20_000).toString('latin1')).toMatch(wanted.begins);
  expect(await page.getByText(createHash('sha256').update(bytes).digest('hex')).count()).toBeGreaterThan(0);
  await leave();
});

test('three clicks lead from the number of a region to the cell of the spreadsheet behind it', async () => {
  const { page, leave } = await visit(browser, product);
  await signIn(page, product, 'modeller', paths.estimate);
  await page.getByRole('row', { name: /^E\. Antarctica/ }).click();
  await page.getByRole('list', { name: 'Sites of E. Antarctica' }).getByRole('link', { name: 'EDC' }).click();
  await page.getByRole('link', { name: /EDC!F28/ }).click();
  await page.getByRole('status').filter({ hasText: 'Cell F28 of sheet “EDC” reads 10.8179' }).waitFor();
  expect(await page.getByRole('cell', { name: '10.8179', exact: true }).getAttribute('aria-current')).toBe(
    'true',
  );
  await leave();
});
