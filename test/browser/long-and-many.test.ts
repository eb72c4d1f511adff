// Long texts and long sheets: nothing is cut without a control that opens it, and no edit is lost by scrolling.

import type { Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
import { test } from '../support/page-test.ts';

const cellOf = (page: Page, key: string, column: string): Locator =>
  page.locator(`[data-key="${key}"] [data-column="${column}"]`);

/** A sheet pasted into an empty one. */
async function pasteSheet(page: Page, address: string, lines: readonly string[]): Promise<void> {
  await page.goto(address);
  await page.getByRole('button', { name: 'Start an empty sheet' }).click();
  await cellOf(page, 'ghost:0', 'name').click();
  await page.evaluate((text) => {
    const data = new DataTransfer();
    data.setData('text/plain', text);
    document.activeElement!.dispatchEvent(
      new ClipboardEvent('paste', { clipboardData: data, bubbles: true, cancelable: true }),
    );
  }, lines.join('\n'));
}

test('a long entry and a long note are cut with a control that opens them, by pointer and by key', async ({
  page,
  address,
}) => {
  const sum = Array.from({ length: 40 }, (_, k) => `R_1 * ${k + 100}`).join(' + ');
  const note = Array.from({ length: 30 }, (_, k) => `remark ${k}`).join(', ');
  await pasteSheet(page, address, ['R_1 = 1 kohm [assumed] ; short', `R_long = ${sum} ; ${note}`]);
  const entry = cellOf(page, 'cell:R_long', 'entry');
  const more = entry.getByRole('button', { name: /^\d+ more lines of entry of / });
  await more.waitFor();
  expect(await page.getByRole('button', { name: /more lines of/ }).count()).toBe(2);
  const height = async (): Promise<number> => (await entry.boundingBox())!.height;
  const before = await height();
  await more.click();
  const fewer = entry.getByRole('button', { name: /^fewer lines of entry/ });
  expect(await fewer.getAttribute('aria-expanded')).toBe('true');
  expect(await height()).toBeGreaterThan(before + 24);
  expect(await page.evaluate(() => document.activeElement?.getAttribute('data-column'))).toBe('entry');
  await page.keyboard.press('Space');
  await more.waitFor();
  expect(await height()).toBe(before);
  await cellOf(page, 'cell:R_long', 'source').focus();
  await page.keyboard.press('Space');
  await page.getByRole('button', { name: /^fewer lines of source/ }).waitFor();
});

test('a value is plotted against an input from the menu, as an ordinary line', async ({ page, address }) => {
  await page.goto(address);
  await cellOf(page, 'cell:G_chain', 'entry').click();
  await page.keyboard.press('Alt+i');
  await page.getByRole('menuitem', { name: /plot this against/ }).click();
  const inputs = page.getByRole('menu', { name: 'Plot G_chain against' });
  await inputs.waitFor();
  await page.keyboard.press('Escape');
  await page.getByRole('menu', { name: 'Insert' }).waitFor();
  await page.keyboard.press('End');
  await page.keyboard.press('Enter');
  await inputs
    .getByRole('menuitem', { name: /6\.8 kΩ/ })
    .first()
    .click();
  const line = page.locator('[data-column="entry"]:focus');
  await expect
    .poll(() => line.locator('.entry-text').textContent())
    .toMatch(/^plot G_chain against R_\w+ over 1\.7 kohm \.\. 27\.2 kohm log$/);
  const name = await line.locator('xpath=..').getAttribute('data-key');
  expect(name).toMatch(/^cell:F\d+$/);
  // Its figure is drawn beside the others.
  await page.getByRole('button', { name: `${name!.slice('cell:'.length)} in the sheet` }).waitFor();
  // An input rests on nothing that could be turned.
  await cellOf(page, 'cell:R_D', 'entry').click();
  await page.keyboard.press('Alt+i');
  await page.getByRole('menu', { name: 'Insert' }).waitFor();
  expect(await page.getByRole('menuitem', { name: /plot this against/ }).count()).toBe(0);
});

test('an edit in a sheet of 2 000 cells stays while the sheet scrolls away and back', async ({ page, address }) => {
  await pasteSheet(
    page,
    address,
    Array.from({ length: 2100 }, (_, k) => `x_${k} = ${k}`),
  );
  await expect.poll(() => page.getByRole('grid').getAttribute('aria-rowcount')).toBe('2102');
  const pane = page.locator('.sheet-pane');
  await pane.evaluate((at) => at.scrollTo(0, 0));
  const entry = cellOf(page, 'cell:x_3', 'entry');
  await entry.click();
  await page.keyboard.press('F2');
  await page.keyboard.type(' + 40');
  const height = await pane.evaluate((at) => at.scrollHeight);
  for (const share of [0.1, 0.4, 1, 0.5, 0.02, 0]) {
    await pane.evaluate((at, top) => at.scrollTo(0, top), share * height);
    await page.evaluate(() => new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done))));
    const field = await page.evaluate(() => {
      const at = document.activeElement;
      return at instanceof HTMLInputElement ? `${at.value} ${at.selectionStart}` : null;
    });
    expect(`${share}: ${field}`).toBe(`${share}: 3 + 40 6`);
  }
  await page.keyboard.press('ArrowLeft');
  await page.keyboard.type('2');
  await page.keyboard.press('Enter');
  await expect.poll(() => entry.locator('.entry-text').textContent()).toBe('3 + 420');
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry.locator('.entry-text').textContent()).toBe('3');
});

test('a new line that is being typed stays while the sheet scrolls', async ({ page, address }) => {
  await pasteSheet(
    page,
    address,
    Array.from({ length: 2100 }, (_, k) => `x_${k} = ${k}`),
  );
  await expect.poll(() => page.getByRole('grid').getAttribute('aria-rowcount')).toBe('2102');
  const pane = page.locator('.sheet-pane');
  await pane.evaluate((at) => at.scrollTo(0, 0));
  await cellOf(page, 'cell:x_3', 'entry').click();
  await page.keyboard.press('Control+Enter');
  await page.keyboard.type('y_1 = 7');
  for (const top of [20_000, 54_000, 0]) {
    await pane.evaluate((at, to) => at.scrollTo(0, to), top);
    await page.evaluate(() => new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done))));
    expect(await page.evaluate(() => (document.activeElement as HTMLInputElement).value)).toBe('y_1 = 7');
  }
  await page.keyboard.type('5');
  await page.keyboard.press('Enter');
  await expect.poll(() => cellOf(page, 'cell:y_1', 'nominal').textContent()).toBe('75');
});
