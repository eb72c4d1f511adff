// The built page opens from a sub-path of a host, under its own policy, on the worked sheet; what it shows is what
// the terminal prints of the same text.

import { readFileSync } from 'node:fs';
import { expect } from 'vitest';
import { run } from '../../src/cli/run.ts';
import { test } from '../support/page-test.ts';

const DEMO = 'public/examples/crevasse-listener.txt';
const text = readFileSync(DEMO, 'utf8');

/** What the terminal says in JSON. */
function report(): { cells: Record<string, { kind: string; text: string | null }> } {
  const lines: string[] = [];
  const status = run([DEMO, '--json'], {
    read: () => new TextEncoder().encode(text),
    print: (line: string) => lines.push(line),
    complain: (line: string) => lines.push(line),
    width: 100,
  });
  // One check of the worked sheet fails at an extreme: that is what the tool is for.
  expect(status).toBe(1);
  return JSON.parse(lines.join('\n'));
}

test('the first visit opens the worked sheet and says that it is one', async ({ page, address }) => {
  await page.goto(address);
  await page.getByRole('heading', { level: 1, name: 'Crevasse listener, probe electronics' }).waitFor();
  await page.getByText('This is a worked example, yours to change.').waitFor();
  await page
    .getByRole('button', {
      name: /^8 of 9 checks hold at every extreme\. current holds nominally but is 0\.042 mA short/,
    })
    .waitFor();
});

test('every quantity stands on the page as the terminal prints it', async ({ page, address }) => {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  const quantities = Object.entries(report().cells).filter(([, { kind }]) => kind === 'quantity');
  expect(quantities.length).toBeGreaterThan(15);
  for (const [name, { text: printed }] of quantities) {
    const row = page.locator(`[data-key="cell:${name}"]`);
    // Rows out of view are not laid out, so the text is read from the tree, where number and unit stand apart.
    const shown = (await row.locator('[data-column="nominal"]').textContent()) ?? '';
    expect(`${name} ${shown.replace(/\s+/g, '')}`).toBe(`${name} ${printed!.replace(/\s+/g, '')}`);
  }
});
