import { expect, inject, test } from 'vitest';
import { launchBrowser } from './browser';
import { startProduct } from './product';
import { takeScreens } from './screens';

/** Not a test: pictures of every page for each role, taken when somebody wants to look (see screens.config.ts). */
test.each(['scientist', 'steward', 'modeller', 'administrator'] as const)(
  'pictures for the %s',
  async (who) => {
    const [product, browser] = await Promise.all([startProduct(inject('seededDir')), launchBrowser()]);
    try {
      expect(await takeScreens(browser, product, who)).toBeGreaterThan(0);
    } finally {
      await browser.close();
      await product.stop();
    }
  },
);
