// Divider pairs on the page: asked for, ranked, one of them put in by keys alone.

import { expect } from 'vitest';
import { findings } from '../support/axe-findings.ts';
import { test } from '../support/page-test.ts';

test('the best pair for a voltage is put in as two resistors in one step', async ({ page, address }) => {
  await page.goto(address);
  await page.getByRole('button', { name: 'Start an empty sheet' }).click();
  await page.getByRole('button', { name: 'Insert' }).focus();
  await page.keyboard.press('Enter');
  await page.getByRole('menuitem', { name: 'divider pair' }).focus();
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog', { name: 'Divider pair' });
  await dialog.getByText('Write the voltage that is divided, such as 15 V.').waitFor();
  await dialog.getByLabel('Voltage that is divided').focus();
  await page.keyboard.type('15 V');
  await page.keyboard.press('Tab');
  await page.keyboard.type('5 mA');
  await dialog.getByText('5 mA is of another kind. Write the voltage at the tap, such as 3 V.').waitFor();
  await page.keyboard.press('Control+a');
  await page.keyboard.type('5 V');
  await page.keyboard.press('Tab');
  await page.keyboard.type('66.7 kohm');
  await dialog.getByRole('row', { name: /200 kΩ 100 kΩ 5\.000 V \+0 % 66\.7 kΩ −0\.05 %/ }).waitFor();
  expect(await findings(page)).toEqual([]);
  await dialog.getByRole('button', { name: 'Put in' }).focus();
  await page.keyboard.press('Enter');
  const entry = (name: string) => page.locator(`[data-key="cell:${name}"] [data-column="entry"]`);
  await expect.poll(() => entry('R_1').textContent()).toBe('200 kohm ± 5 %');
  await expect.poll(() => entry('R_2').textContent()).toBe('100 kohm ± 5 %');
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry('R_1').count()).toBe(0);
});
