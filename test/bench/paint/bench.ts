// From a key to the painted page: the built page in a headless browser, one input of a sheet turned by key, the
// time taken from the event to the frame after it. Nothing is asserted; the machine's own speed is in the numbers.

import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { chromium } from 'playwright-core';
import type { Page } from 'playwright-core';
import { preview } from 'vite';
import { writeLink } from '../../../src/storage/index.ts';
import { launchBrowser } from '../../support/browser.ts';

const EDITS = 60;
const WARM_UP = 5;

/** A sheet of about `cells` cells around one stage, all fed from one supply. */
function wideSheet(cells: number): string {
  const lines = [
    '# Wide sheet',
    'V_DD = 15 V ± 5 %',
    'R_S = 1.2 kohm ± 1 %',
    'Q1 = n-JFET',
    '  I_DSS: 6 mA',
    '  V_P: -3 V',
    'A1 = stage of Q1',
  ];
  lines.push('  gate: 1 Mohm to 0 V', '  drain: 3.3 kohm to V_DD', '  source: R_S to 0 V', '  output: drain');
  for (let k = 0; k < cells; k++) lines.push(`x_${k} = ${k % 2 === 0 ? 'A1.I_D' : `x_${k - 1}`} * ${k + 1}`);
  return `${lines.join('\n')}\n`;
}

/** Milliseconds from key to paint of repeated steps of the input `name`. */
async function stepTimes(page: Page, name: string): Promise<number[]> {
  await page.locator(`[data-key="cell:${name}"] [data-column="entry"]`).click();
  await page.evaluate(() => {
    const times: number[] = [];
    Object.assign(globalThis, { paintTimes: times });
    document.addEventListener(
      'keydown',
      (event) => {
        const began = event.timeStamp;
        requestAnimationFrame(() => {
          const after = new MessageChannel();
          after.port1.addEventListener('message', () => times.push(performance.now() - began), { once: true });
          after.port1.start();
          after.port2.postMessage(null);
        });
      },
      { capture: true },
    );
  });
  for (let i = 0; i < EDITS + WARM_UP; i++) {
    await page.keyboard.press(i % 2 === 0 ? 'Alt+PageUp' : 'Alt+PageDown');
    await page.evaluate(() => new Promise((done) => requestAnimationFrame(() => setTimeout(done, 5))));
  }
  const times = await page.evaluate(() => (globalThis as unknown as { paintTimes: number[] }).paintTimes);
  return times.slice(WARM_UP);
}

/** A table of median and 99th percentile for the demo sheet and a sheet of 2 000 cells. */
export async function benchPaint(): Promise<string[]> {
  const server = await preview({ preview: { port: 0, open: false }, logLevel: 'silent' });
  const address = server.resolvedUrls!.local[0]!;
  const browserServer = await launchBrowser();
  const browser = await chromium.connect(browserServer.wsEndpoint());
  const rows: string[] = ['key to paint, ms                      median      p99'];
  try {
    const demo = readFileSync('public/examples/crevasse-listener.txt', 'utf8');
    for (const [label, text, input] of [
      ['demo sheet', demo, 'R_S2'],
      ['sheet of 2 000 cells', wideSheet(2000), 'R_S'],
    ] as const) {
      const written = await writeLink(text, (bytes) => createHash('sha256').update(bytes).digest('hex'));
      if ('fault' in written) throw new Error(written.fault.text);
      const context = await browser.newContext({ locale: 'en-US', viewport: { width: 1440, height: 900 } });
      const page = await context.newPage();
      await page.goto(`${address}#${written.fragment}`);
      await page.getByRole('grid', { name: 'Sheet' }).waitFor();
      const times = (await stepTimes(page, input)).toSorted((a, b) => a - b);
      const at = (share: number): string =>
        times[Math.min(times.length - 1, Math.floor(share * times.length))]!.toFixed(1);
      rows.push(`${label.padEnd(34)}${at(0.5).padStart(10)}${at(0.99).padStart(9)}`);
      await context.close();
    }
  } finally {
    await browser.close();
    await browserServer.close();
    await server.close();
  }
  return [rows.join('\n')];
}
