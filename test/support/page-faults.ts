// What must not happen behind a page that seems to work: anything on the console, an exception nobody caught, an
// answer that is not a success, a request that leaves the page's own address.

import type { BrowserContext } from 'playwright-core';

/** Watches every page and worker of `context`; the list it returns grows as faults happen. */
export function watchFaults(context: BrowserContext, ownAddress: string): string[] {
  const faults: string[] = [];
  const { origin } = new URL(ownAddress);
  context.on('console', (message) => faults.push(`console ${message.type()}: ${message.text()}`));
  context.on('weberror', (event) => faults.push(`uncaught: ${event.error().message}`));
  context.on('request', (request) => {
    const url = new URL(request.url());
    const isLocal = url.protocol === 'blob:' || url.protocol === 'data:' || url.protocol === 'about:';
    if (url.origin !== origin && !isLocal) faults.push(`request outside: ${request.url()}`);
  });
  context.on('requestfailed', (request) => {
    const why = request.failure()?.errorText ?? '';
    // A page that goes takes the worker along that it was still fetching.
    if (why === 'net::ERR_ABORTED' && /\/worker-[\w-]+\.js$/.test(request.url())) return;
    faults.push(`request failed: ${request.url()} ${why}`);
  });
  context.on('response', (response) => {
    if (response.status() >= 400) faults.push(`answer ${response.status()}: ${response.url()}`);
  });
  return faults;
}
