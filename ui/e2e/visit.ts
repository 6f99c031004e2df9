import path from 'node:path';
import { expect, onTestFailed } from 'vitest';
import type { Browser, BrowserContext, BrowserContextOptions, Page } from 'playwright-core';
import type { Product } from './product';

/** An answer that a walk means to get; the browser reports each as an error in its console. */
type Refusal = { status: number; path: RegExp };

/** Everybody's first page asks whether somebody is signed in. */
const sessionProbe: Refusal = { status: 401, path: /^\/api\/v1\/auth\/session$/ };

export type Visit = {
  context: BrowserContext;
  page: Page;
  /** The next steps provoke this refusal. */
  expectRefusal: (status: number, path: RegExp) => void;
  /** Fails on console errors, faults of the page, violated policy and requests to the outside; closes the context. */
  leave: () => Promise<void>;
};

/** Pictures for people to look at; never part of the project's history. */
export const outputDir = path.join(import.meta.dirname, 'output');
export const wide = { width: 1440, height: 900 };
export const narrow = { width: 390, height: 844 };

/** A person's own browser profile, with an eye on everything that must not happen. */
export async function visit(
  browser: Browser,
  product: Product,
  options: BrowserContextOptions = {},
): Promise<Visit> {
  const context = await browser.newContext({ viewport: wide, acceptDownloads: true, ...options });
  context.setDefaultTimeout(15_000);
  const wrong: string[] = [];
  const refusals = [sessionProbe];
  const meant = (status: number, path: string) =>
    refusals.some((refusal) => refusal.status === status && refusal.path.test(path));
  await context.route(
    (url) => url.protocol.startsWith('http') && url.origin !== product.url,
    (route) => {
      wrong.push(`asked the outside for ${route.request().url()}`);
      return route.abort();
    },
  );
  context.on('weberror', (fault) => wrong.push(`fault of the page: ${fault.error().message}`));
  context.on('console', (message) => {
    if (message.type() !== 'error') return;
    const status = /status of (\d{3})/.exec(message.text())?.[1];
    const { url } = message.location();
    if (status && url && meant(Number(status), new URL(url).pathname)) return;
    wrong.push(`console: ${message.text()} (${url})`);
  });
  const page = await context.newPage();
  onTestFailed(async ({ task }) => {
    if (!page.isClosed()) await page.screenshot({ path: path.join(outputDir, `failed-${task.id}.png`) });
  });
  return {
    context,
    page,
    expectRefusal: (status, path) => void refusals.push({ status, path }),
    leave: async () => {
      await context.close();
      expect(wrong, 'what went wrong behind the page').toEqual([]);
    },
  };
}
