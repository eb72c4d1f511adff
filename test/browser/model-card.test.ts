// A model card on the page: pasted, looked at as the part it becomes, put in by keys alone.

import { expect } from 'vitest';
import { findings } from '../support/axe-findings.ts';
import { test } from '../support/page-test.ts';

test('a pasted card is shown as a part, what is not taken is listed, and it is put in as one step', async ({
  page,
  address,
}) => {
  await page.goto(address);
  await page.getByRole('button', { name: 'Start an empty sheet' }).click();
  await page.getByRole('button', { name: 'Insert' }).focus();
  await page.keyboard.press('Enter');
  await page.getByRole('menuitem', { name: 'model card' }).focus();
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog', { name: 'Model card' });
  const putIn = dialog.getByRole('button', { name: 'Put in' });
  expect(await putIn.getAttribute('aria-disabled')).toBe('true');
  await dialog.getByLabel('Card').focus();
  await page.keyboard.type('.model J1 NJF (BETA=1.1m VTO=2.2 KF=1e-17)');
  await dialog.getByText(/^Line 1, column 26: VTO of a JFET is negative/).waitFor();
  await page.keyboard.press('Control+a');
  await page.keyboard.type('.model J1 NJF (BETA=1.1m VTO=-2.2 KF=1e-17)');
  await dialog.getByText('beta: 1.1 mA/V^2 [model card J1]').waitFor();
  await dialog.getByRole('row', { name: /^KF 1e-17 coefficient of flicker noise/ }).waitFor();
  await dialog.getByRole('row', { name: /^IDSS 5\.32 mA/ }).waitFor();
  expect(await dialog.getByLabel('Name').inputValue()).toBe('J1');
  expect(await findings(page)).toEqual([]);
  await putIn.focus();
  await page.keyboard.press('Enter');
  expect(await dialog.count()).toBe(0);
  const entry = page.locator('[data-key="cell:J1"] [data-column="entry"]');
  await expect.poll(() => entry.textContent()).toBe('n-JFET');
  await page.keyboard.press('Control+z');
  await expect.poll(() => entry.count()).toBe(0);
});
