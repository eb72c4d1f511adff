// The `test` of the browser tests: gives each test a fresh context of the browser, and fails it for whatever goes
// wrong behind the page while it runs.

import { chromium } from 'playwright-core';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, beforeAll, test as plainTest, expect, inject } from 'vitest';
import { watchFaults } from './page-faults.ts';

interface PageFixtures {
  /** A context without storage; its pages are watched. */
  context: BrowserContext;
  /** A blank page of that context. */
  page: Page;
  /** Address of the built page. */
  address: string;
}

let browser: Browser;
beforeAll(async () => {
  browser = await chromium.connect(inject('browserEndpoint'));
});
afterAll(() => browser.close());

/** Opens a context outside the watch, for a test that provokes faults; the caller closes it. */
export async function openUnwatchedContext(): Promise<BrowserContext> {
  const context = await browser.newContext({ locale: 'en-US' });
  context.setDefaultTimeout(PATIENCE);
  return context;
}

/** How long a step of a test waits for the page, in ms. */
const PATIENCE = 90_000;

export const test = plainTest.extend<PageFixtures>({
  // oxlint-disable-next-line no-empty-pattern -- the fixture's dependencies are read from this pattern
  address: async ({}, use) => {
    await use(inject('pageAddress'));
  },
  context: async ({ address }, use) => {
    const context = await openUnwatchedContext();
    const faults = watchFaults(context, address);
    await use(context);
    // One more turn of each page, so that a message on its way arrives before the count.
    for (const page of context.pages()) await page.evaluate(() => new Promise((done) => setTimeout(done)));
    await context.close();
    expect(faults, 'faults behind the page').toEqual([]);
  },
  page: async ({ context }, use) => {
    await use(await context.newPage());
  },
});
