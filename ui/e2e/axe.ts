import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';

/** Fluent's tab sentinels: empty elements that only catch the focus and pass it on. */
const sentinel = 'i[data-tabster-dummy][aria-hidden="true"]';

const tags = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

/** Serious and critical faults of access, each as one readable line; empty when there is none. */
export const axeFaults = (page: Page): Promise<string[]> =>
  faultsOf(page, new AxeBuilder({ page }).withTags(tags));

/** The same page under the other theme differs in its colours alone. */
export async function axeFaultsInDark(page: Page): Promise<string[]> {
  await page.emulateMedia({ colorScheme: 'dark' });
  await page.evaluate(coloursSettled);
  const faults = await faultsOf(
    page,
    new AxeBuilder({ page }).withRules(['color-contrast', 'link-in-text-block']),
  );
  await page.emulateMedia({ colorScheme: 'light' });
  await page.evaluate(coloursSettled);
  return faults;
}

/** In the page: colours fade from one theme to the other, and half-way they are no one's. */
async function coloursSettled(): Promise<void> {
  for (let frame = 0; frame < 3; frame += 1) await new Promise(requestAnimationFrame);
  const fading = document.getAnimations().filter((animation) => animation instanceof CSSTransition);
  await Promise.allSettled(fading.map((animation) => animation.finished));
}

async function faultsOf(page: Page, axe: AxeBuilder): Promise<string[]> {
  // The pages hold no frames: then the legacy way finds the same without opening a page of its own each time.
  const { violations } = await axe.setLegacyMode().analyze();
  const faults: string[] = [];
  for (const { id, impact, nodes } of violations) {
    if (impact !== 'serious' && impact !== 'critical') continue;
    for (const { target, html, failureSummary } of nodes) {
      const selector = String(target.at(-1));
      if (id === 'aria-hidden-focus' && (await isSentinel(page, selector))) continue;
      faults.push(
        `${id} at ${selector}: ${html.slice(0, 160)} ${(failureSummary ?? '').replace(/\s+/g, ' ')}`,
      );
    }
  }
  return faults;
}

const isSentinel = (page: Page, selector: string): Promise<boolean> =>
  page.evaluate(
    ([at, wanted]) => {
      const element = document.querySelector(at!);
      return element !== null && element.matches(wanted!) && element.textContent === '';
    },
    [selector, sentinel],
  );
