// The workings and the verdict in the built page.

import { expect } from 'vitest';
import type { Locator, Page } from 'playwright-core';
import { sha256Hex } from '../../src/numeric/index.ts';
import { writeLink } from '../../src/storage/index.ts';
import { test } from '../support/page-test.ts';

async function openSheet(page: Page, address: string): Promise<Locator> {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  return page.getByRole('region', { name: 'Workings' });
}

function cell(page: Page, key: string, column: string): Locator {
  return page.locator(`[data-key="${key}"] [data-column="${column}"]`);
}

function focusedRow(page: Page): Promise<string> {
  return page.evaluate(() => {
    const element = document.activeElement;
    const column = element?.closest('[data-column]')?.getAttribute('data-column') ?? '';
    return `${element?.closest('[data-key]')?.getAttribute('data-key') ?? ''} ${column}`;
  });
}

async function retype(page: Page, name: string, entry: string): Promise<void> {
  await cell(page, `cell:${name}`, 'entry').click();
  await page.keyboard.press('F2');
  await page.keyboard.press('Control+a');
  await page.keyboard.type(entry);
  await page.keyboard.press('Enter');
}

test('the selected cell shows formula, numbers in place and result, set', async ({ page, address }) => {
  const pane = await openSheet(page, address);
  await cell(page, 'cell:G_chain', 'name').click();
  await pane.locator('.katex').first().waitFor();
  const texts = await pane.locator('.equation-side').evaluateAll((all) => all.map((each) => each.ariaLabel));
  expect(texts).toEqual(['dB(A_chain)', 'dB(−7.86)', '17.9 dB']);
  // Set for the eye, and said for readers.
  await expect(pane.locator('.equation-side math').count()).resolves.toBe(3);
});

test('an input says its spread, its source and its note', async ({ page, address }) => {
  const pane = await openSheet(page, address);
  await cell(page, 'cell:R_S2', 'name').click();
  await pane.getByText('From 1.188 kΩ to 1.212 kΩ. Units lie evenly between the limits.').waitFor();
  await pane.getByText(/^stock list, resistors, as in line \d+$/).waitFor();
  await pane.getByText('bypassed', { exact: true }).waitFor();
});

test('a part has its numbers and its other forms in tables', async ({ page, address }) => {
  const pane = await openSheet(page, address);
  await cell(page, 'cell:Q1', 'name').click();
  await pane.getByRole('row', { name: /^IDSS 2\.5 mA 4\.33 mA 7\.5 mA data sheet Q1, ed\. 4, p\. 2$/ }).waitFor();
  await pane.getByRole('row', { name: /^β 1\.11 mA\/V² / }).waitFor();
});

test('what a cell uses and what uses it are ways to go there', async ({ page, address }) => {
  const pane = await openSheet(page, address);
  await cell(page, 'cell:G_chain', 'name').click();
  await pane.getByRole('button', { name: 'gain holds, 3.09 dB to spare' }).click();
  await expect.poll(() => focusedRow(page)).toBe('cell:gain name');
  await pane.getByRole('heading', { level: 2, name: 'gain' }).waitFor();
});

test('F9 leads into the workings and Escape back to the same cell of the sheet', async ({ page, address }) => {
  await openSheet(page, address);
  await cell(page, 'cell:R_S2', 'entry').click();
  await expect.poll(() => focusedRow(page)).toBe('cell:R_S2 entry');
  await page.keyboard.press('F9');
  await expect.poll(() => page.evaluate(() => document.activeElement?.id)).toBe('workings');
  await page.keyboard.press('Escape');
  await expect.poll(() => focusedRow(page)).toBe('cell:R_S2 entry');
});

test('a broken cell says its fault with line and column, and who waits for it says that', async ({ page, address }) => {
  const pane = await openSheet(page, address);
  await retype(page, 'V_DD', '18 V + 2 mA');
  await cell(page, 'cell:V_DD', 'name').click();
  await pane.getByRole('button', { name: /^line 13, column \d+$/ }).waitFor();
  await pane.getByText(/18 V is a voltage and 2 mA is a current/).waitFor();
  await cell(page, 'cell:A1', 'name').click();
  await pane
    .getByText(/^waits for/)
    .getByRole('button')
    .click();
  await expect.poll(() => focusedRow(page)).toBe('cell:V_DD name');
});

test('at a narrow page formulas break or scroll within their own line', async ({ context, address }) => {
  const page = await context.newPage();
  await page.setViewportSize({ width: 390, height: 844 });
  const pane = await openSheet(page, address);
  await cell(page, 'cell:Q1', 'name').click();
  await page.getByRole('navigation', { name: 'Panes' }).getByRole('button', { name: 'Workings' }).click();
  await pane.locator('.katex').first().waitFor();
  await expect.poll(() => pane.evaluate((element) => element.scrollWidth - element.clientWidth)).toBeLessThanOrEqual(0);
  // What is longer than its line can be reached by keys.
  await expect
    .poll(() =>
      pane
        .locator('.equation-side')
        .evaluateAll((all) =>
          all.filter((each) => each.scrollWidth > each.clientWidth + 4).map((each) => each.getAttribute('tabindex')),
        ),
    )
    .toEqual(expect.arrayContaining(['0']));
});

test('the verdict leads to the first failing check and is said once it has changed', async ({ page, address }) => {
  await openSheet(page, address);
  const status = page.getByRole('group', { name: 'Verdict' }).getByRole('status');
  // What is known first, or already what holds at the extremes.
  await expect
    .poll(() => status.textContent())
    .toMatch(/^(All 9 checks hold at the nominal values\.|8 of 9 checks hold at every extreme\.)/);
  await retype(page, 'R_S2', '9.9 kohm ± 1 %');
  const verdict = page.getByRole('button', { name: /^[78] of 9 checks hold [^.]+\. current fails, / });
  await verdict.waitFor();
  await expect.poll(() => status.textContent()).toMatch(/^[78] of 9 checks hold/);
  await verdict.click();
  await expect.poll(() => focusedRow(page)).toBe('cell:current name');
});

const CHOOSING = `V_DD = 15 V
R_S = 1.2 kohm ± 1 %
Q1 = n-JFET
  I_DSS: 2 mA .. 6 mA
  V_P: -3 V .. -1 V
A1 = stage of Q1
  gate: 1 Mohm to 0 V
  drain: to V_DD
  source: R_S to 0 V
R_want = R_S such that A1.I_D = 1 mA over 100 ohm .. 10 kohm
`;

test('the answer of an inverse cell goes into its input by one edit that can be undone', async ({ page, address }) => {
  const written = await writeLink(CHOOSING, sha256Hex);
  if ('fault' in written) throw new Error(written.fault.text);
  const pane = await openSheet(page, `${address}#${written.fragment}`);
  const entry = cell(page, 'cell:R_S', 'entry');
  await cell(page, 'cell:R_want', 'name').click();
  const asShown = pane.getByRole('button', { name: /^put [\d.]+ k?Ω into R_?S$/ });
  const offered = (await asShown.textContent())!;
  // Of the geometric means, I_DSS 3.46 mA and V_P -1.73 V, 1 mA leaves V_GS = -0.801 V.
  expect(offered).toMatch(/^put 801\s?Ω into/);
  await pane.getByText(/R_?want has just one answer in (all|[\d.]+ %) of [\d ]+ builds/).waitFor({ timeout: 60_000 });
  await asShown.click();
  await expect.poll(() => entry.textContent()).toBe('801 ohm ± 1 %');
  // It answers as before: what its input is now has no say in it.
  expect(await asShown.textContent()).toBe(offered);
  await pane.getByRole('button', { name: /^put the nearest E24 value, 820\s?Ω into R_?S$/ }).click();
  await expect.poll(() => entry.textContent()).toBe('820 ohm ± 1 %');
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry.textContent()).toBe('801 ohm ± 1 %');
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry.textContent()).toBe('1.2 kohm ± 1 %');
});
