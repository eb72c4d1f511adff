// The figures in the built page: what is drawn follows the selection and the text, in whatever light, and prints.

import { expect } from 'vitest';
import type { Locator, Page } from 'playwright-core';
import { test } from '../support/page-test.ts';

async function openFigures(page: Page, address: string): Promise<Locator> {
  await page.goto(address);
  const pane = page.getByRole('region', { name: 'Figures' });
  await pane.locator('canvas').first().waitFor();
  // The face of quantities comes late; until then the charts are painted in another.
  await page.evaluate(() => document.fonts.load('italic 12px KaTeX_Math').then(() => undefined));
  return pane;
}

function row(page: Page, name: string): Locator {
  return page.locator(`[data-key="cell:${name}"] [data-column="name"]`);
}

/** A canvas as a hash of its pixels. */
function pixels(canvas: Locator): Promise<string> {
  return canvas.evaluate((element) => (element as HTMLCanvasElement).toDataURL());
}

test('figures follow the selected row to its stage, and say when it belongs to none', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  await pane.getByRole('heading', { level: 2, name: 'A1' }).waitFor();
  await row(page, 'R_E').click();
  await pane.getByRole('heading', { level: 2, name: 'A2' }).waitFor();
  await row(page, 'A_chain').click();
  await pane.getByText('Still showing A2: the selected line belongs to no stage.').waitFor();
  await row(page, 'R_D').click();
  await pane.getByRole('heading', { level: 2, name: 'A1' }).waitFor();
});

test('figures that do not follow stay with their stage', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  await pane.getByRole('checkbox', { name: 'follows the selection' }).uncheck();
  await row(page, 'R_E').click();
  await expect(pane.getByRole('heading', { level: 2 }).textContent()).resolves.toBe('A1');
});

test('a symbol leads to its cell by click and by keys', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  const symbols = pane.getByRole('group', { name: 'Schematic of A1' }).getByRole('button');
  await expect(symbols.count()).resolves.toBe(5);
  await pane.getByRole('button', { name: /RD 6\.8 kΩ: R_D, resistor of 6\.8 kΩ/ }).click();
  await expectFocus(page, 'cell:R_D');
  // One stop for Tab; arrows walk through the others.
  const stops = await symbols.evaluateAll((all) => all.filter((each) => each.getAttribute('tabindex') === '0').length);
  expect(stops).toBe(1);
  await symbols.first().focus();
  await page.keyboard.press('End');
  const last = await page.evaluate(() => document.activeElement?.getAttribute('aria-label'));
  expect(last).toBe(await symbols.last().getAttribute('aria-label'));
  await page.keyboard.press('Enter');
  await expectFocus(page, 'cell:R_S2', 'cell:Q1', 'cell:R_S1', 'cell:R_G');
});

test('every figure says its values and unfolds as a table', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  const plane = pane.getByRole('region', { name: 'Transfer plane of A1' });
  await plane.getByRole('img', { name: /operating points: nominal V_GS −1\.07 V, I_D 696 µA/ }).waitFor();
  await plane.getByText('as table').click();
  const table = plane.getByRole('table', { name: 'Transfer plane of A1' });
  const heads = await table.getByRole('columnheader').allTextContents();
  expect(heads).toEqual(['VGS (V)', 'bias line (mA)', 'nominal (mA)']);
  await table.getByRole('row', { name: /^−1\.07/ }).waitFor();
});

test('the pointer over a plane reads its curves in words', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  const plane = pane.getByRole('region', { name: 'Output plane of A1' });
  await plane.locator('.u-over').hover();
  await plane.getByText(/^VDS \d.*: load line [\d.]+ mA, VGS −1\.07 V [\d.]+ mA$/).waitFor();
  await page.mouse.move(2, 2);
  await expect.poll(() => plane.locator('.read-out').textContent()).toBe('');
});

test('an edit moves the curves; dark and light are drawn anew', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  const canvas = pane.getByRole('region', { name: 'Output plane of A1' }).locator('canvas');
  const before = await pixels(canvas);
  await page.evaluate(() => document.documentElement.setAttribute('data-theme', 'dark'));
  await expect.poll(() => pixels(canvas)).not.toBe(before);
  await page.evaluate(() => document.documentElement.setAttribute('data-theme', 'light'));
  await expect.poll(() => pixels(canvas)).toBe(before);
  // Enter goes on to the next row, which belongs to another stage.
  await pane.getByRole('checkbox', { name: 'follows the selection' }).uncheck();
  await page.locator('[data-key="cell:R_S2"] [data-column="entry"]').click();
  await page.keyboard.press('F2');
  await page.keyboard.press('Control+a');
  await page.keyboard.type('2.2 kohm');
  await page.keyboard.press('Enter');
  await expect.poll(() => pixels(canvas)).not.toBe(before);
  await pane.getByRole('button', { name: /R_S2, resistor of 2\.2 kΩ/ }).waitFor();
});

test('plots of the sheet stand below in its order and fold', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  const plots = pane.locator('details.plot-figure');
  await expect
    .poll(() => plots.locator('> summary').allTextContents())
    .toEqual(['F1 transfer of A1', 'F2 output of A1', 'F3 ID, A1 against RS2', 'F4 spread of ID, A1']);
  // Planes of the stage that is followed stand above; below they are folded.
  await expect
    .poll(() => plots.evaluateAll((all) => all.map((each) => (each as HTMLDetailsElement).open)))
    .toEqual([false, false, true, true]);
  await plots.nth(2).locator('> summary').click();
  await expect.poll(() => plots.nth(2).locator('canvas').count()).toBe(0);
  await plots.nth(2).locator('> summary').click();
  await plots.nth(2).locator('canvas').waitFor();
  await pane.getByRole('button', { name: 'F3 in the sheet' }).click();
  await expectFocus(page, 'cell:F3');
  await row(page, 'A2').click();
  await plots.nth(0).locator('canvas').waitFor();
});

test('in print charts are lines, not pixels', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  await pane.locator('summary', { hasText: 'F1 transfer of A1' }).click();
  const charts = 5;
  // One of them is the histogram, which is drawn once builds are counted.
  await expect.poll(() => pane.locator('canvas').count(), { timeout: 10_000 }).toBe(charts);
  await page.evaluate(() => window.dispatchEvent(new Event('beforeprint')));
  await expect(pane.locator('.chart-place svg').count()).resolves.toBe(charts);
  await expect(pane.locator('canvas').count()).resolves.toBe(0);
  await page.evaluate(() => window.dispatchEvent(new Event('afterprint')));
  await expect.poll(() => pane.locator('canvas').count()).toBe(charts);
});

test('nothing is wider than a narrow page', async ({ context, address }) => {
  const page = await context.newPage();
  await page.setViewportSize({ width: 390, height: 844 });
  await page.goto(address);
  await page.getByRole('navigation', { name: 'Panes' }).getByRole('button', { name: 'Figures' }).click();
  const pane = page.getByRole('region', { name: 'Figures' });
  await pane.locator('canvas').first().waitFor();
  const wider = await pane.evaluate((element) => element.scrollWidth - element.clientWidth);
  expect(wider).toBeLessThanOrEqual(0);
});

/** Waits until the focus is in one of these rows of the sheet. */
async function expectFocus(page: Page, ...keys: string[]): Promise<void> {
  const focused = (): Promise<string> =>
    page.evaluate(() => document.activeElement?.closest('[data-key]')?.getAttribute('data-key') ?? '');
  await expect.poll(async () => keys.includes(await focused())).toBe(true);
}

test('Q dragged along its curve turns the source resistor to a preferred value, as one step', async ({
  page,
  address,
}) => {
  const pane = await openFigures(page, address);
  const q = pane.getByRole('slider', { name: 'Q of A1' });
  await expect(q.getAttribute('aria-valuetext')).resolves.toBe('R_S2 1.2 kΩ, I_D 696 µA');
  const entry = page.locator('[data-key="cell:R_S2"] [data-column="entry"]');
  await q.scrollIntoViewIfNeeded();
  const box = (await q.boundingBox())!;
  await page.mouse.move(box.x + 12, box.y + 12);
  await page.mouse.down();
  for (const pixels of [4, 10, 18]) await page.mouse.move(box.x + 12 + pixels, box.y + 12);
  await page.mouse.up();
  await expect.poll(() => q.getAttribute('aria-valuetext')).not.toMatch(/^R_S2 1\.2 kΩ/);
  const value = /^R_S2 (\S+) (k?)Ω/.exec((await q.getAttribute('aria-valuetext'))!)!;
  const ohms = Number(value[1]) * (value[2] === 'k' ? 1000 : 1);
  expect(ohms).toBeLessThan(1200);
  expect([560, 620, 680, 750, 820, 910, 1000, 1100]).toContain(ohms);
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry.textContent()).toBe('1.2 kohm ± 1 %');
});

test('Q is stepped by arrow keys, and a drag is given up by Escape', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  const q = pane.getByRole('slider', { name: 'Q of A1' });
  const entry = page.locator('[data-key="cell:R_S2"] [data-column="entry"]');
  await q.focus();
  await page.keyboard.press('ArrowRight');
  await page.keyboard.press('ArrowRight');
  await expect.poll(() => entry.textContent()).toBe('1 kohm ± 1 %');
  await page.keyboard.press('ArrowDown');
  await expect.poll(() => entry.textContent()).toBe('1.1 kohm ± 1 %');
  // The steps of one stay are taken back together.
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry.textContent()).toBe('1.2 kohm ± 1 %');
  const box = (await q.boundingBox())!;
  await page.mouse.move(box.x + 12, box.y + 12);
  await page.mouse.down();
  await page.mouse.move(box.x + 30, box.y + 12);
  await expect.poll(() => q.getAttribute('aria-valuetext')).not.toMatch(/^R_S2 1\.2 kΩ/);
  await page.keyboard.press('Escape');
  await expect.poll(() => q.getAttribute('aria-valuetext')).toBe('R_S2 1.2 kΩ, I_D 696 µA');
  await page.mouse.up();
});

test('a Q that cannot be dragged says why', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  await row(page, 'A3').click();
  const q = pane.getByRole('slider', { name: 'Q of A3' });
  await expect(q.getAttribute('aria-disabled')).resolves.toBe('true');
  await q.focus();
  await page.keyboard.press('ArrowUp');
  await page.getByText('Q of A3 cannot be dragged: its source does not lead through resistors').waitFor();
});

test('a followed plane is kept as a plot cell, once', async ({ page, address }) => {
  const pane = await openFigures(page, address);
  await row(page, 'A2').click();
  const plane = pane.getByRole('region', { name: 'Transfer plane of A2' });
  const keep = plane.getByRole('button', { name: 'keep in the sheet' });
  await keep.click();
  await expect
    .poll(() => page.locator('[data-key="cell:F5"] [data-column="entry"]').textContent())
    .toBe('plot transfer of A2');
  await pane.locator('summary', { hasText: 'F5 transfer of A2' }).waitFor();
  await expect(keep.count()).resolves.toBe(0);
  await page.keyboard.press('Control+z');
  await keep.waitFor();
  await expect.poll(() => page.locator('[data-key="cell:F5"]').count()).toBe(0);
});
