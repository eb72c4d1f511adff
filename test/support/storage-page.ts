// A page under the policy and at the origin of the real one, with nothing in it but the code of src/storage.

import { readFileSync } from 'node:fs';
import type { BrowserContext, Page } from 'playwright-core';
import { build } from 'vite';
import type * as entry from './storage-entry.ts';

declare global {
  var underTest: typeof entry;
  var desk: entry.Desk;
}

let script: Promise<string> | null = null;

/** The code as one script that sets `underTest`. */
async function bundle(): Promise<string> {
  const built = await build({
    configFile: false,
    logLevel: 'error',
    publicDir: false,
    build: {
      write: false,
      target: 'es2022',
      lib: { entry: 'test/support/storage-entry.ts', formats: ['iife'], name: 'entry' },
    },
  });
  const [{ output }] = built as { output: { code: string }[] }[];
  return `${output[0].code};globalThis.underTest = entry;`;
}

/** Opens such a page in `context`. `headers` come with it. */
export async function openStoragePage(
  context: BrowserContext,
  address: string,
  headers: Record<string, string> = {},
): Promise<Page> {
  const policy = /<meta[^>]*Content-Security-Policy[^>]*>/.exec(readFileSync('index.html', 'utf8'))![0];
  const page = await context.newPage();
  await page.addInitScript({ content: await (script ??= bundle()) });
  await page.route(`${address}storage-test.html`, (route) =>
    route.fulfill({
      contentType: 'text/html',
      headers,
      body: `<!doctype html><head>${policy}</head><title>Test</title>`,
    }),
  );
  await page.goto(`${address}storage-test.html`);
  return page;
}
