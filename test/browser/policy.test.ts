// The page's content policy is in force, and the watch behind the browser tests sees what it is there to see.

import { expect } from 'vitest';
import { watchFaults } from '../support/page-faults.ts';
import { openUnwatchedContext, test } from '../support/page-test.ts';
import type { Page } from 'playwright-core';

async function faultsOf(address: string, provoke: (page: Page) => Promise<unknown>): Promise<string[]> {
  const context = await openUnwatchedContext();
  try {
    const faults = watchFaults(context, address);
    const page = await context.newPage();
    await page.goto(address);
    await provoke(page);
    await expect.poll(() => faults.length, { timeout: 5000 }).toBeGreaterThan(0);
    return faults;
  } finally {
    await context.close();
  }
}

test('a script written into the page does not run', async ({ address }) => {
  let ran: unknown;
  const faults = await faultsOf(address, async (page) => {
    ran = await page.evaluate(() => {
      const script = document.createElement('script');
      script.textContent = 'document.title = "ran"';
      document.body.append(script);
      return document.title;
    });
  });
  expect(ran).not.toBe('ran');
  expect(faults.join('\n')).toContain('Content Security Policy');
});

test('a style element is refused', async ({ address }) => {
  const faults = await faultsOf(address, (page) =>
    page
      .evaluate(() => document.head.append(document.createElement('style')))
      .then(() =>
        page.evaluate(() => {
          document.head.querySelector('style')!.textContent = 'body { color: red }';
        }),
      ),
  );
  expect(faults.join('\n')).toContain('Content Security Policy');
});

test('a request to another host is refused and seen', async ({ address }) => {
  const faults = await faultsOf(address, (page) =>
    page.evaluate(() => fetch('https://example.org/').catch(() => undefined)),
  );
  expect(faults.join('\n')).toContain('Content Security Policy');
});

test('WebAssembly may be compiled', async ({ page, address }) => {
  await page.goto(address);
  const compiled = await page.evaluate(async () => {
    const module = await WebAssembly.compile(new Uint8Array([0, 0x61, 0x73, 0x6d, 1, 0, 0, 0]));
    return module instanceof WebAssembly.Module;
  });
  expect(compiled).toBe(true);
});

test('a word on the console is seen', async ({ address }) => {
  const faults = await faultsOf(address, (page) => page.evaluate(() => console.info('a word')));
  expect(faults).toEqual(['console info: a word']);
});

test('an exception that nobody catches is seen', async ({ address }) => {
  const faults = await faultsOf(address, (page) =>
    page.evaluate(() => {
      setTimeout(() => {
        throw new Error('planted');
      });
    }),
  );
  expect(faults).toEqual(['uncaught: planted']);
});

test('a missing file is seen', async ({ address }) => {
  const faults = await faultsOf(address, (page) => page.evaluate(() => fetch('missing.txt').then(() => undefined)));
  expect(faults).toContain(`answer 404: ${address}missing.txt`);
});
