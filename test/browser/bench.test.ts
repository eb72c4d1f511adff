// Measured points on the page: pasted from a spreadsheet, looked at, put in as a bench.

import type { Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
import { findings } from '../support/axe-findings.ts';
import { test } from '../support/page-test.ts';

const cellOf = (page: Page, key: string, column: string): Locator =>
  page.locator(`[data-key="${key}"] [data-column="${column}"]`);

async function openDialog(page: Page, address: string): Promise<Locator> {
  await page.goto(address);
  await page.getByRole('button', { name: 'Start an empty sheet' }).click();
  await page.getByRole('button', { name: 'Insert' }).click();
  await page.getByRole('menuitem', { name: 'bench' }).click();
  return page.getByRole('dialog', { name: 'Rows from a spreadsheet' });
}

test('a pasted table is shown as it will stand, what was decided is said, and it becomes a bench', async ({
  page,
  address,
}) => {
  const dialog = await openDialog(page, address);
  const putIn = dialog.getByRole('button', { name: 'Put in' });
  expect(await putIn.getAttribute('aria-disabled')).toBe('true');
  await dialog.getByLabel('Table').fill('unit;VGS (V);ID (µA)\ns1;-0,5;2100\ns1;-1;1200\ns1;-1,5;520\ns1;-2;\n');
  await expect
    .poll(() => dialog.getByRole('listitem').allTextContents())
    .toEqual([
      'The comma is read as a decimal mark.',
      'Line 5, column 3: The place of ID is empty. Write what was measured there, or take the line out.',
    ]);
  await dialog.getByLabel('Table').fill('unit;VGS (V);ID (µA)\ns1;-0,5;2100\ns1;-1;1200\ns1;-1,5;520\ns1;-2;150\n');
  await expect.poll(() => dialog.getByText('4 rows, 1 specimen.').count()).toBe(1);
  expect(await dialog.getByRole('row').allTextContents()).toEqual([
    'unitVGS [V]ID [µA]',
    's1-0.52100',
    's1-11200',
    's1-1.5520',
    's1-2150',
  ]);
  expect(await dialog.getByText('No column is VDS: write at which one all rows were measured.').count()).toBe(1);
  await dialog.getByLabel('VDS of all rows').fill('10 V');
  await putIn.click();
  expect(await dialog.count()).toBe(0);
  expect(await cellOf(page, 'cell:M1', 'entry').textContent()).toBe('bench');
  expect(await cellOf(page, 'row:M1.2', 'entry').textContent()).toBe('s1, -1, 1200');
  await page.keyboard.press('Control+z');
  await expect.poll(() => cellOf(page, 'cell:M1', 'entry').count()).toBe(0);
});

const BATCH = [
  ['s1', -2, 4],
  ['s2', -1.9, 3.9],
  ['s3', -2.1, 4.6],
] as const;
const GATES = [0, -0.5, -1, -1.5];

/** A table as a spreadsheet of a country with decimal commas copies it. */
const pastedBatch = [
  'unit\tVGS (V)\tVDS (V)\tID (mA)',
  ...BATCH.flatMap(([name, cutoff, current]) =>
    GATES.map((vgs) => [name, vgs, 10, (current * (1 - vgs / cutoff) ** 2).toFixed(4)].join('\t').replace(/\./g, ',')),
  ),
].join('\n');

/** Types lines at the end of the sheet, as its text. */
async function append(page: Page, lines: string): Promise<void> {
  await page.getByRole('button', { name: 'Text', exact: true }).click();
  await page.getByRole('textbox', { name: 'Text of the sheet' }).focus();
  await page.keyboard.press('Control+End');
  await page.keyboard.insertText(lines);
  await page.getByRole('button', { name: 'Sheet', exact: true }).click();
}

test('a pasted batch shows its fits, matches and resistors, and a stage computes with what it spreads over', async ({
  page,
  address,
}) => {
  const dialog = await openDialog(page, address);
  await dialog.getByLabel('Table').fill(pastedBatch);
  await expect.poll(() => dialog.getByText('12 rows, 3 specimens.').count()).toBe(1);
  await dialog.getByRole('button', { name: 'Put in' }).click();
  await append(
    page,
    '\n  lambda: 0 /V\n  match: pairs at I_D = 1 mA\n  fitting: I_D = 1 mA\nQ1 = n-JFET fitted to M1\nA1 = stage of Q1\n  gate: 1 Mohm to 0 V\n  drain: 1 kohm to 15 V\n  source: 1 kohm to 0 V\n',
  );

  await cellOf(page, 'cell:M1', 'name').click();
  const workings = page.getByRole('region', { name: 'Workings' });
  const rowsOf = (table: RegExp): Promise<string[]> =>
    workings.getByRole('table', { name: table }).getByRole('row').allTextContents();
  // s1: 4 mA at a cutoff of -2 V, so 1 mA at -1 V and 1 kohm.
  await expect
    .poll(() => rowsOf(/^R_S that sets each specimen to 1\.00 mA/))
    .toContainEqual(expect.stringMatching(/^s1−1\.000 V1\.00 kΩ1 kΩ1\.00 mA$/));
  expect((await rowsOf(/^The fitted square law/)).filter((row) => row.startsWith('s'))).toHaveLength(4);
  expect(await rowsOf(/^Pairs by the difference/)).toHaveLength(2);
  expect(await rowsOf(/^For the bench/)).toContainEqual(expect.stringMatching(/1 kΩ$/));
  const figures = page.getByRole('region', { name: 'Figures' });
  await figures.getByRole('img', { name: /^Bench M1: 12 readings and the fitted square law of 3 specimens/ }).waitFor();
  await figures.getByRole('img', { name: /^What the readings of M1 differ from the law by/ }).waitFor();
  await figures.getByRole('button', { name: 'keep in the sheet' }).first().click();
  await expect.poll(() => cellOf(page, 'cell:F1', 'entry').textContent()).toBe('plot bench of M1');

  // The median of the three cutoffs is -2 V, their least and largest are the ends.
  const texts = (columns: readonly string[], key: string): Promise<(string | null)[]> =>
    Promise.all(columns.map((column) => cellOf(page, key, column).textContent()));
  await expect
    .poll(() => texts(['low', 'nominal', 'high'], 'value:Q1.V_P'))
    .toEqual([expect.stringMatching(/^−2\.1/), expect.stringMatching(/^−2/), expect.stringMatching(/^−1\.(9|89)/)]);
  await expect.poll(() => cellOf(page, 'value:A1.I_D', 'nominal').textContent()).toMatch(/^1/);

  await cellOf(page, 'cell:M1', 'name').click();
  await workings.getByText('all 12 readings').click();
  expect(await findings(page)).toEqual([]);
});
