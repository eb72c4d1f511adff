// A part of one's own: kept from one sheet, put into another, renamed, removed and put back, by keys alone.

import { expect } from 'vitest';
import type { Locator, Page } from 'playwright-core';
import { findings } from '../support/axe-findings.ts';
import { test } from '../support/page-test.ts';

async function openParts(page: Page): Promise<Locator> {
  await page.getByRole('button', { name: 'Insert' }).focus();
  await page.keyboard.press('Enter');
  await page.getByRole('menuitem', { name: 'part of your own' }).focus();
  await page.keyboard.press('Enter');
  return page.getByRole('dialog', { name: 'Parts' });
}

async function press(button: Locator, page: Page): Promise<void> {
  await button.focus();
  await page.keyboard.press('Enter');
}

test('a part is kept from one sheet and put into another', async ({ page, address }) => {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  let dialog = await openParts(page);
  await dialog.getByText('No part yet.').waitFor();
  await press(dialog.getByRole('button', { name: 'Keep Q1' }), page);
  await press(dialog.getByRole('button', { name: 'Keep Q3' }), page);
  await dialog.getByRole('button', { name: 'Put in Q3' }).waitFor();
  // A part of the sheet it came from bears another name there.
  await press(dialog.getByRole('button', { name: 'Put in Q1' }), page);
  await expect.poll(() => page.locator('[data-key="cell:Q4"] [data-column="entry"]').textContent()).toBe('n-JFET');
  await page.keyboard.press('Control+z');

  await page.keyboard.press('Control+o');
  await page.getByRole('button', { name: 'Empty sheet', exact: true }).click();
  await page.locator('[data-key="cell:Q1"]').waitFor({ state: 'detached' });
  dialog = await openParts(page);
  const list = dialog.getByRole('list', { name: 'Parts' });
  await dialog.getByLabel('Search').focus();
  await page.keyboard.type('p-mosfet');
  await expect.poll(() => list.getByRole('listitem').count()).toBe(1);
  await page.keyboard.press('Control+a');
  await page.keyboard.press('Delete');
  await press(list.getByRole('button', { name: 'Q1', exact: true }), page);
  await list.getByText('V_GSoff: -3.2 V .. -1.1 V at I_D = 100 nA [same]').waitFor();
  expect(await findings(page)).toEqual([]);
  await list.getByLabel('Name').focus();
  await page.keyboard.press('Control+a');
  await page.keyboard.type('J_in');
  await page.keyboard.press('Enter');
  await list.getByRole('button', { name: 'Remove J_in' }).waitFor();
  await press(list.getByRole('button', { name: 'Remove J_in' }), page);
  await expect.poll(() => list.getByRole('listitem').count()).toBe(1);
  await press(dialog.getByRole('button', { name: 'Put J_in back' }), page);
  await press(list.getByRole('button', { name: 'Put in J_in' }), page);
  await expect.poll(() => page.locator('[data-key="cell:J_in"] [data-column="entry"]').textContent()).toBe('n-JFET');
});
