import path from 'node:path';
import type { Page } from 'playwright-core';
import { expect } from 'vitest';
import { root, type Product } from './product';

export const sample = (name: string) => path.join(root, 'reference/samples', name);

type FileGiven = string | { name: string; mimeType: string; buffer: Buffer };

/** Chooses a file on the Intake page and sends it; what follows is the caller's. */
export async function send(page: Page, product: Product, file: FileGiven): Promise<void> {
  await page.goto(`${product.url}/intake`);
  await page.getByRole('button', { name: 'Upload a spreadsheet' }).first().click();
  const dialog = page.getByRole('dialog', { name: 'Upload a spreadsheet' });
  const [chooser] = await Promise.all([
    page.waitForEvent('filechooser'),
    dialog.getByRole('button', { name: 'Choose a file' }).click(),
  ]);
  await chooser.setFiles(file);
  await dialog.getByRole('button', { name: 'Upload', exact: true }).click();
}

/** Sends a file that is taken, and waits for its bench. */
export async function upload(page: Page, product: Product, file: FileGiven): Promise<string> {
  await send(page, product, file);
  await page.waitForURL(/\/intake\/[0-9a-f-]{36}/);
  await page.getByRole('grid').waitFor();
  return new URL(page.url()).pathname;
}

export const nextStep = (page: Page) => page.getByRole('region', { name: 'Next step' });
export const findings = (page: Page) => page.getByRole('complementary', { name: /^Findings/ });

export type Answers = {
  title?: string;
  creator: string;
  licence: string;
  choices: Record<string, string>;
} & ({ doi: string } | { citation: string });

/** Answers what the sheet does not say, and closes the form. */
export async function fillForm(page: Page, answers: Answers): Promise<void> {
  await page.getByRole('button', { name: 'Metadata', exact: true }).click();
  const form = page.getByRole('complementary', { name: 'Metadata' });
  if (answers.title) await form.getByLabel('Title').fill(answers.title);
  await form.getByLabel('Name 1').fill(answers.creator);
  await form.getByLabel('Licence').fill(answers.licence);
  if ('doi' in answers) await form.getByLabel('DOI of the publication').fill(answers.doi);
  else await form.getByLabel('Citation of the publication').fill(answers.citation);
  for (const [label, option] of Object.entries(answers.choices)) {
    await form.getByLabel(label).selectOption({ label: option });
  }
  await form.getByLabel('Method').focus(); // leaving the last field saves
  await form.getByText('All that is wanted is answered.').waitFor();
  await form.getByText('saved', { exact: true }).waitFor();
  await form.getByRole('button', { name: /^Close/ }).click();
}

/** Waives warnings rule by rule, with one reason, until the submission may be approved. */
async function waiveAll(page: Page, reason: string): Promise<void> {
  const collapsed = findings(page).getByRole('button', { expanded: false });
  const waivers = findings(page).getByRole('button', { name: /^Waive/ });
  await findings(page).getByRole('list').first().waitFor();
  while (await nextStep(page).getByRole('button', { name: 'Approve' }).isDisabled()) {
    const waivable = await waivers.count();
    if (waivable === 0) {
      await collapsed.first().click();
      continue;
    }
    await waivers.first().click();
    const dialog = page.getByRole('dialog');
    await dialog.getByLabel('Reason').fill(reason);
    await dialog.getByRole('button', { name: 'Waive', exact: true }).click();
    await dialog.waitFor({ state: 'detached' });
    await expect.poll(() => waivers.count()).toBeLessThan(waivable);
  }
}

/** Takes a submission, settles its warnings and approves it as a new dataset; ends on the page of the version. */
export async function approve(page: Page, reason: string): Promise<void> {
  await nextStep(page).getByRole('button', { name: 'Take' }).click();
  await nextStep(page).getByRole('button', { name: 'Release' }).waitFor();
  await waiveAll(page, reason);
  await nextStep(page).getByRole('button', { name: 'Approve' }).click();
  await page.getByRole('dialog').getByRole('button', { name: 'Approve', exact: true }).click();
  await nextStep(page)
    .getByRole('link', { name: /^version 1 of/ })
    .click();
  await page.waitForURL(/\/holdings\//);
}
