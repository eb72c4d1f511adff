// Starts the browser that the page is tested in.

import { mkdirSync, readFileSync, statSync } from 'node:fs';
import path from 'node:path';
import { chromium } from 'playwright-core';
import type { BrowserServer } from 'playwright-core';
import { chooseBrowser } from './browser-choice.ts';

const FLAGS = [
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
];

/** Starts a headless browser that tests connect to. Throws with one sentence where there is none. */
export async function launchBrowser(): Promise<BrowserServer> {
  const choice = chooseBrowser({ env: process.env, platform: process.platform, arch: process.arch, isFile });
  if (choice.kind === 'none') throw new Error(choice.reason);
  const executablePath = choice.kind === 'installed' ? choice.file : await unpackBundledBrowser();
  // The page's number formats follow the locale, and the bundled browser cannot read the one called C.UTF-8.
  const env = { ...process.env, LANG: 'en_US.UTF-8' } as Record<string, string>;
  return chromium.launchServer({ executablePath, headless: true, args: FLAGS, env });
}

/** Unpacks the browser among the packages, with the shared libraries it needs, and returns its file. */
async function unpackBundledBrowser(): Promise<string> {
  const modules = path.resolve('node_modules');
  const { version } = JSON.parse(readFileSync(path.join(modules, '@sparticuz/chromium/package.json'), 'utf8'));
  // It reuses whatever it finds unpacked, of whichever version: so each version has its own folder.
  const folder = path.join(modules, '.cache', `chromium-${version}`);
  mkdirSync(folder, { recursive: true });
  const before = process.env.TMPDIR;
  process.env.TMPDIR = folder;
  // Read on import: makes it bring its own libraries, which a machine without any browser lacks.
  process.env.AWS_LAMBDA_JS_RUNTIME = 'nodejs22.x';
  try {
    const { default: bundled } = await import('@sparticuz/chromium');
    return await bundled.executablePath();
  } finally {
    delete process.env.AWS_LAMBDA_JS_RUNTIME;
    if (before === undefined) delete process.env.TMPDIR;
    else process.env.TMPDIR = before;
  }
}

function isFile(file: string): boolean {
  return statSync(file, { throwIfNoEntry: false })?.isFile() ?? false;
}
