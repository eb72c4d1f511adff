// Measured points on the page: pasted from a spreadsheet, looked at, put in as a bench.

import type { Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
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
