// The sheet grid: driven by keys and pointer as its user would.

import type { Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
import { test } from '../support/page-test.ts';

const cellOf = (page: Page, key: string, column: string): Locator =>
  page.locator(`[data-key="${key}"] [data-column="${column}"]`);

async function openSheet(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await cellOf(page, 'cell:V_DD', 'entry').waitFor();
}

/** An empty sheet, typed line by line into the place for a new line at its end. */
async function typeSheet(page: Page, address: string, lines: readonly string[]): Promise<void> {
  await page.goto(address);
  await page.getByRole('button', { name: 'Start an empty sheet' }).click();
  await cellOf(page, 'ghost:0', 'name').click();
  for (const line of lines) {
    await page.keyboard.type(line);
    await page.keyboard.press('Enter');
  }
}

/** Key, column and text of what has the focus. */
const focused = (page: Page): Promise<string> =>
  page.evaluate(() => {
    const at = document.activeElement;
    const key = at?.closest<HTMLElement>('[data-key]')?.dataset['key'];
    const column = at?.closest<HTMLElement>('[data-column]')?.dataset['column'];
    const text = at instanceof HTMLInputElement ? ` ${at.value}` : '';
    return `${key} ${column}${text}`;
  });

test('a stage is written by keys alone and computes', async ({ page, address }) => {
  await typeSheet(page, address, [
    'V_DD = 15 V ± 5 % [power note, table 2]',
    'R_D = 3.3 kohm ± 1 % [assumed]',
    'R_S = 1.2 kohm ± 1 % [same]',
    'R_G = 1M0 ± 5 %',
    'Q1 = n-JFET',
    'I_DSS: 6 mA in 2 mA .. 9 mA at V_DS = 15 V [data sheet, p. 2]',
    'V_P: -2.5 V in -4 V .. -1 V [same]',
    'A1 = stage of Q1',
    'gate: R_G to 0 V, 100 nF to signal',
    'drain: R_D to V_DD, 1 uF to load',
    'source: R_S to 0 V, 47 uF to 0 V',
    'load: 100 kohm to 0 V',
    'output: load',
    'headroom = check A1.margin >= 1 V',
  ]);
  expect(await focused(page)).toBe('ghost:0 name');
  await expect.poll(() => cellOf(page, 'value:A1.region', 'nominal').textContent()).toBe('saturation');
  expect(await cellOf(page, 'cell:headroom', 'source').textContent()).toMatch(/to spare$/);
  // The lines of a block stand in it, whether or not the blanks before them were typed.
  expect(await cellOf(page, 'field:Q1.I_DSS', 'low').textContent()).toBe('2');
  expect(await cellOf(page, 'field:Q1.V_P', 'low').textContent()).toBe('−1');
});

test('an entry is edited in place: seen while typed, kept by Enter, restored by Escape, undone by Ctrl+Z', async ({
  page,
  address,
}) => {
  await openSheet(page, address);
  await cellOf(page, 'cell:R_D', 'entry').click();
  const before = await cellOf(page, 'value:A1.V_DS', 'nominal').textContent();
  await page.keyboard.type('10 kohm ± 1 %');
  expect(await cellOf(page, 'cell:R_D', 'source').textContent()).toBe('was 6.8 kohm ± 1 %');
  expect(await cellOf(page, 'value:A1.V_DS', 'nominal').textContent()).not.toBe(before);
  await page.keyboard.press('Escape');
  expect(await cellOf(page, 'cell:R_D', 'entry').textContent()).toBe('6.8 kohm ± 1 %');
  expect(await cellOf(page, 'value:A1.V_DS', 'nominal').textContent()).toBe(before);
  await page.keyboard.press('F2');
  await page.keyboard.press('Home');
  await page.keyboard.press('Delete');
  await page.keyboard.type('5');
  await page.keyboard.press('Enter');
  expect(await focused(page)).toBe('cell:R_S1 entry');
  expect(await cellOf(page, 'cell:R_D', 'nominal').textContent()).toBe('5.8kΩ');
  await page.keyboard.press('Control+z');
  expect(await cellOf(page, 'cell:R_D', 'entry').textContent()).toBe('6.8 kohm ± 1 %');
});

test('Tab goes on to the next cell that can be edited and a second Tab leaves the sheet', async ({ page, address }) => {
  await openSheet(page, address);
  await cellOf(page, 'field:Q1.I_DSS', 'low').click();
  await page.keyboard.type('3');
  await page.keyboard.press('Tab');
  expect(await focused(page)).toBe('field:Q1.I_DSS nominal');
  await page.keyboard.type('5 mA');
  await page.keyboard.press('Tab');
  expect(await focused(page)).toBe('field:Q1.I_DSS high');
  expect(await cellOf(page, 'field:Q1.I_DSS', 'nominal').textContent()).toBe('5mA');
  await page.keyboard.press('Tab');
  expect(await focused(page)).not.toContain('field:Q1');
});

test('what cannot be read is kept, says why at its place, and leads there', async ({ page, address }) => {
  await openSheet(page, address);
  await cellOf(page, 'cell:V_DD', 'entry').click();
  await page.keyboard.type('18 V + 2 mA');
  await page.keyboard.press('Enter');
  const entry = cellOf(page, 'cell:V_DD', 'entry');
  expect(await entry.getAttribute('aria-invalid')).toBe('true');
  const about = await entry.getAttribute('aria-describedby');
  expect(await page.locator(`[id="${about}"]`).textContent()).toContain('cannot be added');
  expect(await cellOf(page, 'cell:A1', 'nominal').textContent()).toContain('waits for V_DD');
  await page.keyboard.press('F8');
  expect(await focused(page)).toBe('cell:V_DD entry');
  await page.getByRole('button', { name: /^column \d+$/ }).click();
  expect(await focused(page)).toBe('cell:V_DD entry 18 V + 2 mA');
});

test('a cell is renamed with all its uses', async ({ page, address }) => {
  await openSheet(page, address);
  await cellOf(page, 'cell:R_probe', 'name').click();
  await page.keyboard.press('Enter');
  expect(await focused(page)).toBe('cell:R_probe name R_probe');
  await page.keyboard.press('Control+a');
  await page.keyboard.type('R_whole');
  await page.keyboard.press('Enter');
  expect(await cellOf(page, 'cell:R_whole', 'nominal').textContent()).toBe('2.2kΩ');
  expect(await cellOf(page, 'cell:loss', 'entry').textContent()).toContain('R_whole');
});

test('the list offers what fits, and never replaces a finished name', async ({ page, address }) => {
  await openSheet(page, address);
  await cellOf(page, 'ghost:9', 'name').click();
  await page.keyboard.type('V_left = V_DD - A1.V_dr');
  const field = page.getByRole('combobox');
  expect(await field.getAttribute('aria-expanded')).toBe('true');
  const marked = await field.getAttribute('aria-activedescendant');
  expect(await page.locator(`#${marked}`).textContent()).toContain('A1.V_drain');
  expect(await page.locator('.suggestions-foot').textContent()).toContain('A voltage is expected here');
  await page.keyboard.press('Tab');
  expect(await field.inputValue()).toBe('V_left = V_DD - A1.V_drain');
  await page.keyboard.press('Enter');
  expect(await cellOf(page, 'cell:V_left', 'nominal').textContent()).toMatch(/V$/);
  await page.keyboard.type('x_1 = R_S1');
  await page.keyboard.press('Enter');
  expect(await cellOf(page, 'cell:x_1', 'entry').textContent()).toBe('R_S1');
});

test('a number is stepped along its series and dragged by its tick, each run one step of the history', async ({
  page,
  address,
}) => {
  await openSheet(page, address);
  const entry = cellOf(page, 'cell:R_D', 'entry');
  await entry.click();
  for (let k = 0; k < 3; k++) await page.keyboard.press('Alt+PageUp');
  await expect.poll(() => entry.textContent()).toBe('9.1 kohm ± 1 %');
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry.textContent()).toBe('6.8 kohm ± 1 %');
  const bar = (await page.locator('[data-key="cell:R_D"] .bar').boundingBox())!;
  const y = bar.y + bar.height / 2;
  await page.mouse.move(bar.x + bar.width / 2, y);
  await page.mouse.down();
  // A quarter of the scale is a factor of two.
  await page.mouse.move(bar.x + (bar.width * 3) / 4, y, { steps: 5 });
  await page.mouse.up();
  await expect.poll(() => entry.textContent()).toBe('13 kohm ± 1 %');
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry.textContent()).toBe('6.8 kohm ± 1 %');
});

test('lines are put in, moved and removed; what was removed can be had back', async ({ page, address }) => {
  await openSheet(page, address);
  await cellOf(page, 'cell:R_S1', 'entry').click();
  await page.keyboard.press('Control+Enter');
  await page.keyboard.type('R_new = 4k7 [assumed]');
  await page.keyboard.press('Enter');
  const keys = (): Promise<string[]> =>
    page.locator('[data-key^="cell:R_"]').evaluateAll((rows) => rows.map((row) => row.dataset['key']!));
  expect((await keys()).slice(0, 5)).toEqual(['cell:R_G', 'cell:R_D', 'cell:R_S1', 'cell:R_new', 'cell:R_S2']);
  await cellOf(page, 'cell:R_new', 'entry').click();
  await page.keyboard.press('Alt+ArrowUp');
  expect((await keys()).slice(1, 4)).toEqual(['cell:R_D', 'cell:R_new', 'cell:R_S1']);
  expect(await focused(page)).toBe('cell:R_new entry');
  await page.keyboard.press('Control+Delete');
  expect(await keys()).not.toContain('cell:R_new');
  await page.keyboard.press('Control+z');
  expect(await keys()).toContain('cell:R_new');
});

test('Insert writes a stage that works', async ({ page, address }) => {
  await openSheet(page, address);
  await cellOf(page, 'cell:G_chain', 'entry').click();
  await page.keyboard.press('Alt+i');
  await page.getByRole('menuitem', { name: 'follower' }).click();
  expect(await focused(page)).toBe('cell:A4 entry');
  expect(await cellOf(page, 'value:A4.region', 'nominal').textContent()).toBe('saturation');
});

test('copied rows are sheet text, and come back as lines', async ({ page, address }) => {
  await openSheet(page, address);
  await cellOf(page, 'cell:R_S1', 'entry').click();
  await page.keyboard.press('Shift+ArrowDown');
  const copied = await page.evaluate(() => {
    const data = new DataTransfer();
    document.activeElement!.dispatchEvent(
      new ClipboardEvent('copy', { clipboardData: data, bubbles: true, cancelable: true }),
    );
    return [data.getData('text/plain'), data.getData('text/html')];
  });
  expect(copied[0]!.split('\n').map((line) => line.split(' ')[0])).toEqual(['R_S1', 'R_S2', '']);
  expect(copied[1]).toContain('<td>R_S2</td>');
  await page.evaluate(() => {
    const data = new DataTransfer();
    data.setData('text/plain', 'R_8 = 1 kohm\nR_9 = 2 kohm\n');
    document.activeElement!.dispatchEvent(
      new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }),
    );
  });
  expect(await cellOf(page, 'cell:R_9', 'nominal').textContent()).toBe('2kΩ');
});

test('a section folds by its key and says what it hides', async ({ page, address }) => {
  await openSheet(page, address);
  const section = cellOf(page, 'section:2', 'name');
  await section.click();
  expect(await section.getAttribute('aria-expanded')).toBe('true');
  await page.keyboard.press('Space');
  expect(await section.getAttribute('aria-expanded')).toBe('false');
  expect(await cellOf(page, 'cell:R_D', 'entry').count()).toBe(0);
  await page.keyboard.press('Space');
  expect(await cellOf(page, 'cell:R_D', 'entry').count()).toBe(1);
});

test('of a very long sheet the rows near what is seen stand in the page, and the focused one always', async ({
  page,
  address,
}) => {
  await page.goto(address);
  await page.getByRole('button', { name: 'Start an empty sheet' }).click();
  await cellOf(page, 'ghost:0', 'name').click();
  await page.evaluate(() => {
    const data = new DataTransfer();
    const lines = Array.from({ length: 2500 }, (_, k) => `x_${k} = ${k}`);
    data.setData('text/plain', lines.join('\n'));
    document.activeElement!.dispatchEvent(
      new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }),
    );
  });
  await expect.poll(() => page.getByRole('grid').getAttribute('aria-rowcount')).toBe('2502');
  expect(await page.locator('[data-key]').count()).toBeLessThan(400);
  await page.keyboard.press('Control+End');
  await expect.poll(() => focused(page)).toBe('ghost:0 name');
  await page.keyboard.press('ArrowUp');
  await expect.poll(() => focused(page)).toContain('cell:x_2499');
  await page.locator('.sheet-pane').evaluate((pane) => pane.scrollTo(0, 0));
  await cellOf(page, 'cell:x_3', 'entry').waitFor();
  expect(await focused(page)).toContain('cell:x_2499');
});
