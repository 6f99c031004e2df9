import { mkdirSync } from 'node:fs';
import path from 'node:path';
import type { Browser } from 'playwright-core';
import { everyPage, settled } from './pages';
import { signIn, type PersonKey } from './people';
import type { Product } from './product';
import { narrow, outputDir, wide } from './visit';

const sizes = { wide, narrow };
const schemes = ['light', 'dark'] as const;

/** Pictures of every page of a person in both sizes and themes, for people to look at. */
export async function takeScreens(browser: Browser, product: Product, who: PersonKey): Promise<number> {
  mkdirSync(outputDir, { recursive: true });
  let taken = 0;
  for (const [size, viewport] of Object.entries(sizes)) {
    for (const colorScheme of schemes) {
      const context = await browser.newContext({ viewport, colorScheme });
      const page = await context.newPage();
      await signIn(page, product, who);
      for (const { name, path: address } of await everyPage(page, who)) {
        await page.goto(product.url + address);
        await settled(page);
        await page.screenshot({ path: path.join(outputDir, `${who}-${name}-${size}-${colorScheme}.png`) });
        taken += 1;
      }
      await context.close();
    }
  }
  return taken;
}
