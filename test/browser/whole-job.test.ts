// The whole job by keys alone, from an empty sheet to the printed record, on the worked sheet.

import { readFileSync } from 'node:fs';
import { expect } from 'vitest';
import type { Page } from 'playwright-core';
import { run } from '../../src/cli/run.ts';
import { test } from '../support/page-test.ts';
import { readPdf } from '../support/pdf-text.ts';

const DEMO = 'public/examples/crevasse-listener.txt';
const text = readFileSync(DEMO, 'utf8');
const LINES = text.split('\n').filter((line) => line.trim() !== '');

/** Presses Tab until what has the focus is called so. */
async function tabTo(page: Page, name: RegExp): Promise<void> {
  for (let n = 0; n < 60; n++) {
    await page.keyboard.press('Tab');
    const found = await page.evaluate(() => {
      const at = document.activeElement;
      return at?.getAttribute('aria-label') ?? at?.textContent ?? '';
    });
    if (name.test(found)) return;
  }
  throw new Error(`Tab leads to nothing called ${name}`);
}

/** Goes from pane to pane, on and then back, until one has the focus. */
async function paneTo(page: Page, pane: string): Promise<void> {
  for (const key of [...Array<string>(6).fill('F6'), ...Array<string>(6).fill('Shift+F6')]) {
    if (await page.evaluate((name) => document.activeElement?.closest(`[data-pane=${name}]`) !== null, pane)) return;
    await page.keyboard.press(key);
  }
  throw new Error(`F6 does not lead to ${pane}`);
}

/** Runs a command of the toolbar. */
async function command(page: Page, name: string): Promise<void> {
  await paneTo(page, 'commands');
  for (let n = 0; n < 20; n++) {
    if ((await page.evaluate(() => document.activeElement?.textContent)) === name) return page.keyboard.press('Enter');
    await page.keyboard.press('ArrowRight');
  }
  throw new Error(`the arrows lead to no command ${name}`);
}

/** Lines of the sheet as its text has them, without blanks around. */
async function sheetLines(page: Page): Promise<string[]> {
  await command(page, 'Text');
  const written = await page.getByRole('textbox', { name: 'Text of the sheet' }).inputValue();
  await command(page, 'Sheet');
  return written.split('\n').flatMap((line) => (line.trim() === '' ? [] : [line.trim()]));
}

/** What the terminal says of each value, by row of the page. */
function printed(): Map<string, string> {
  let out = '';
  run([DEMO, '--json', '--samples', '300'], {
    read: () => new TextEncoder().encode(text),
    print: (line: string) => (out += line),
    complain: (line: string) => expect.unreachable(line),
    width: 100,
  });
  const { cells } = JSON.parse(out) as {
    cells: Record<string, { kind: string; text: string | null; values?: Record<string, { text: string | null }> }>;
  };
  const found = new Map<string, string>();
  for (const [name, cell] of Object.entries(cells)) {
    if (cell.kind === 'quantity' && cell.text) found.set(`cell:${name}`, cell.text);
    if (cell.kind !== 'stage' && cell.kind !== 'point') continue;
    for (const [value, { text: shown }] of Object.entries(cell.values ?? {})) {
      if (shown) found.set(`value:${name}.${value}`, shown);
    }
  }
  return found;
}

/** Number and unit as a row shows them, without blanks. */
async function shownIn(page: Page, key: string): Promise<string> {
  const text = await page.locator(`[data-key="${key}"] [data-column="nominal"]`).textContent();
  return (text ?? '').replace(/\s+/g, '');
}

const said = (page: Page): Promise<string | null> => page.locator('.verdict').textContent();

/** From an empty sheet to the worked one, line by line. */
async function write(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  await tabTo(page, /^Start an empty sheet$/);
  await page.keyboard.press('Enter');
  await page.locator('[data-key="ghost:0"]').waitFor();
  await paneTo(page, 'sheet');
  for (const line of LINES) {
    // The first letter begins the edit; the rest of a line comes at once, as from a fast hand.
    await page.keyboard.type(line.trim().charAt(0));
    await page.keyboard.insertText(line.trim().slice(1));
    await page.keyboard.press('Enter');
  }
  expect(await sheetLines(page)).toEqual(LINES.map((line) => line.trim()));
}

test('the worked sheet is written from empty by keys alone, and shows what the terminal prints', async ({
  page,
  address,
}) => {
  await write(page, address);
  for (const [key, expected] of printed()) {
    if ((await page.locator(`[data-key="${key}"]`).count()) === 0) continue;
    expect(`${key} ${await shownIn(page, key)}`).toBe(`${key} ${expected.replace(/\s+/g, '')}`);
  }
  await expect.poll(() => said(page), { timeout: 20_000 }).toMatch(/^8 of 9 checks hold at every extreme/);
}, 200_000);

test('a line is broken and mended, and all is undone to the start and done again, by keys alone', async ({
  page,
  address,
}) => {
  await write(page, address);
  await paneTo(page, 'sheet');
  await page.keyboard.press('Control+Home');
  for (let n = 0; n < 40; n++) {
    if (await page.evaluate(() => document.activeElement?.closest('[data-key="cell:R_D"]') !== null)) break;
    await page.keyboard.press('ArrowDown');
  }
  for (let n = 0; n < 8; n++) {
    if (await page.evaluate(() => document.activeElement?.closest('[data-column="entry"]') !== null)) break;
    await page.keyboard.press('ArrowRight');
  }
  await page.keyboard.press('F2');
  await page.keyboard.press('End');
  await page.keyboard.type(' + 2 V');
  await page.keyboard.press('Enter');
  await expect.poll(() => said(page)).toMatch(/^1 cell is broken: R.?D\./);
  await page.keyboard.press('F8');
  const row = page.locator('[data-key="cell:R_D"]');
  expect(await row.textContent()).toContain('6.8 kohm ± 1 % + 2 V');
  await page.keyboard.press('F2');
  await page.keyboard.press('End');
  for (let n = 0; n < ' + 2 V'.length; n++) await page.keyboard.press('Backspace');
  await page.keyboard.press('Enter');
  await expect.poll(() => said(page), { timeout: 20_000 }).toMatch(/^8 of 9 checks hold/);
  const lines = LINES.map((line) => line.trim());
  for (let n = 0; n < LINES.length + 5; n++) await page.keyboard.press('Control+z');
  expect(await sheetLines(page)).toEqual([]);
  await paneTo(page, 'sheet');
  for (let n = 0; n < LINES.length + 5; n++) await page.keyboard.press('Control+y');
  expect(await sheetLines(page)).toEqual(lines);
}, 200_000);

test('the sheet lives through a link, a reload and a print', async ({ page, address, context }) => {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  await command(page, 'Share');
  const link = await page.getByRole('dialog', { name: 'Share' }).getByRole('textbox').first().inputValue();
  const other = await context.newPage();
  await other.goto(link);
  await other.getByRole('grid', { name: 'Sheet' }).waitFor();
  expect(await sheetLines(other)).toEqual(LINES.map((line) => line.trim()));
  await other.close();
  await page.keyboard.press('Escape');
  await paneTo(page, 'sheet');
  await page.keyboard.press('Control+End');
  await page.keyboard.type('R_more = 12 kohm ± 5 % [assumed]');
  await page.keyboard.press('Enter');
  await expect.poll(() => page.locator('.status-line').textContent()).toMatch(/kept/);
  await page.waitForTimeout(1200);
  await page.reload();
  await page.locator('[data-key="cell:R_more"]').waitFor();
  await page.waitForLoadState('networkidle');
  const pages = await readPdf(await page.pdf({ preferCSSPageSize: true }));
  const whole = pages.map(({ text: each }) => each).join('');
  expect(whole).toContain('Crevasselistener,probeelectronics');
  expect(whole).toMatch(/Squarelaw,text[0-9a-f]{16}/);
  expect(whole).toContain('R_more=12kohm±5%[assumed]');
  expect(whole).toMatch(/696µA|0\.696mA/);
}, 120_000);

test('what is folded stays folded with its sheet, and the verdict leads to a line without a name', async ({
  page,
  address,
}) => {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  await paneTo(page, 'sheet');
  await page.keyboard.press('Control+End');
  await page.keyboard.type('?? what');
  await page.keyboard.press('Enter');
  await page.getByRole('button', { name: /Go to line \d+\.$/ }).focus();
  await page.keyboard.press('Enter');
  await expect
    .poll(() => page.evaluate(() => document.activeElement?.closest('[data-key]')?.textContent))
    .toContain('?? what');
  await page.keyboard.press('Control+Home');
  const section = page.getByRole('rowheader', { name: /^Resistors/ });
  await section.focus();
  await page.keyboard.press('Space');
  await expect.poll(() => page.locator('[data-key="cell:R_cable"]').count()).toBe(0);
  await page.waitForTimeout(1200);
  await page.reload();
  await section.waitFor();
  expect(await page.locator('[data-key="cell:R_cable"]').count()).toBe(0);
  // Another sheet has folds of its own.
  await command(page, 'Shelf');
  await page
    .getByRole('button', { name: /empty sheet/i })
    .first()
    .focus();
  await page.keyboard.press('Enter');
  await page.locator('[data-key="ghost:0"]').waitFor();
});
