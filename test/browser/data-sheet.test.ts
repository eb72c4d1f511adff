// The rows of a data sheet typed as printed, by keys alone.

import { expect } from 'vitest';
import { findings } from '../support/axe-findings.ts';
import { test } from '../support/page-test.ts';

test('rows typed as printed become a part; contradictory ones are said before', async ({ page, address }) => {
  await page.goto(address);
  await page.getByRole('button', { name: 'Start an empty sheet' }).click();
  await page.getByRole('button', { name: 'Insert' }).focus();
  await page.keyboard.press('Enter');
  await page.getByRole('menuitem', { name: /rows typed as printed/ }).focus();
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog', { name: 'Data sheet' });
  await dialog.getByText('Type the numbers of at least one row.').waitFor();
  const type = async (label: string, text: string): Promise<void> => {
    await dialog.getByLabel(label, { exact: true }).focus();
    await page.keyboard.press('Control+a');
    await page.keyboard.type(text);
  };
  await type('Source', 'data sheet, p. 2');
  await type('min of I_DSS', '2');
  await type('max of I_DSS', '6');
  await type('min of V_GSoff', '-3');
  await type('max of V_GSoff', '-1');
  await dialog.getByText('V_GSoff: -3 V .. -1 V at V_DS = 15 V, I_D = 10 nA [same]').waitFor();
  // No specimen of these has so steep a slope.
  await type('min of g_fs', '20');
  await type('max of g_fs', '30');
  await dialog.getByText(/contradict each other: no specimen meets all of them/).waitFor();
  await type('min of g_fs', '2.5');
  await type('max of g_fs', '6');
  await dialog.getByText(/cuts the declared set: [\d.]+ % of the specimens/).waitFor();
  await type('max of g_fs', 'six');
  await dialog.getByText('six is no number. Write one such as 2.5 or -0.5e-3.').waitFor();
  await type('max of g_fs', '6');
  expect(await findings(page)).toEqual([]);
  await dialog.getByRole('button', { name: 'Put in' }).focus();
  await page.keyboard.press('Enter');
  const entry = page.locator('[data-key="cell:Q1"] [data-column="entry"]');
  await expect.poll(() => entry.textContent()).toBe('n-JFET');
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry.count()).toBe(0);
});
