// Before the browser tests: serves the built page from a sub-path, as a plain static host would, and starts
// the browser. After them: stops both.

import { existsSync } from 'node:fs';
import { preview } from 'vite';
import type { TestProject } from 'vitest/node';
import { launchBrowser } from './browser.ts';

declare module 'vitest' {
  interface ProvidedContext {
    /** Address of the built page, with the slash at its end. */
    pageAddress: string;
    /** Where the tests reach the browser. */
    browserEndpoint: string;
  }
}

const SUB_PATH = '/desk/squarelaw/';

export default async function setup(project: TestProject): Promise<() => Promise<void>> {
  if (!existsSync('dist/index.html')) throw new Error('There is no built page in dist: run `npm run build` first.');
  const server = await preview({
    configFile: false,
    base: SUB_PATH,
    // No page stands in for a missing file: what is not there is answered by 404.
    appType: 'mpa',
    logLevel: 'error',
    preview: { host: '127.0.0.1', port: 0 },
  });
  const browser = await launchBrowser().catch(async (fault: unknown) => {
    await server.close();
    throw fault;
  });
  const address = server.httpServer.address();
  if (address === null || typeof address === 'string') throw new Error('The server has no port.');
  project.provide('pageAddress', `http://127.0.0.1:${address.port}${SUB_PATH}`);
  project.provide('browserEndpoint', browser.wsEndpoint());
  return async () => {
    await browser.close();
    await server.close();
  };
}
