// A band of the drain current on the page: designed, compared and put in by keys alone.

import type { Locator, Page } from 'playwright-core';
import { expect } from 'vitest';
import { findings } from '../support/axe-findings.ts';
import { test } from '../support/page-test.ts';

const entryOf = (page: Page, name: string): Locator => page.locator(`[data-key="cell:${name}"] [data-column="entry"]`);

/** Presses Tab until the field has the focus. */
async function tabTo(page: Page, field: Locator): Promise<void> {
  for (let n = 0; n < 40; n++) {
    if (await field.evaluate((element) => element === document.activeElement)) return;
    await page.keyboard.press('Tab');
  }
  throw new Error('the field is not reached by Tab');
}

async function typeInto(page: Page, field: Locator, text: string): Promise<void> {
  await tabTo(page, field);
  await page.keyboard.press('Control+a');
  await page.keyboard.type(text);
}

async function openDialog(page: Page): Promise<Locator> {
  await page.getByRole('button', { name: 'Insert' }).focus();
  await page.keyboard.press('Enter');
  const item = page.getByRole('menuitem', { name: /^stage band/ });
  for (let n = 0; n < 40 && !(await item.evaluate((element) => element === document.activeElement)); n++)
    await page.keyboard.press('ArrowDown');
  await page.keyboard.press('Enter');
  const dialog = page.getByRole('dialog', { name: 'Band of the drain current' });
  await dialog.waitFor();
  return dialog;
}

test('three ways to bias stand side by side; one of them is put in as lines that compute, in one step', async ({
  page,
  address,
}) => {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  const dialog = await openDialog(page);
  const putIn = dialog.getByRole('button', { name: 'Put in' });
  await typeInto(page, dialog.getByLabel('ID at least'), '0.5 mA');
  await typeInto(page, dialog.getByLabel('ID at most'), '0.8 mA');
  await typeInto(page, dialog.getByLabel('Drain resistor'), 'R_D');
  const row = (name: string): Locator => dialog.getByRole('row', { name: new RegExp(`^${name}`) });
  await expect
    .poll(() => row('fixed plus self').textContent())
    .toBe('fixed plus selfholds1.58 : 1502 µA to 790 µA7.5 kΩ3.51 V');
  expect(await row('self-bias').textContent()).toMatch(/^self-biasmisses3\.\d\d : 1/);
  expect(await row('current source').textContent()).toMatch(/^current sourceholds1\.11 : 1/);
  await dialog.getByText(/The line through both limit devices: RS 5\.52 kΩ from VGG 2\.27 V/).waitFor();
  await dialog.getByRole('img', { name: /The band wanted is from 500 µA to 800 µA\.$/ }).waitFor();
  expect(await findings(page)).toEqual([]);
  await tabTo(page, dialog.getByRole('radio', { name: 'fixed plus self' }));
  await page.keyboard.press('ArrowDown');
  await dialog.getByText('source: I_B to 0 V').waitFor();
  await page.keyboard.press('ArrowUp');
  await dialog.getByText('source: R_S to 0 V').waitFor();
  await tabTo(page, putIn);
  await page.keyboard.press('Enter');
  expect(await dialog.count()).toBe(0);
  await expect.poll(() => entryOf(page, 'R_S').textContent()).toBe('7.5 kohm ± 1 %');
  expect(await entryOf(page, 'band').textContent()).toMatch(/within/);
  await page.keyboard.press('Control+z');
  await expect.poll(() => entryOf(page, 'R_S').count()).toBe(0);
  expect(await entryOf(page, 'band').count()).toBe(0);
});

test('what cannot be read, and what no bias holds, is said; Escape leaves the sheet as it was', async ({
  page,
  address,
}) => {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  const dialog = await openDialog(page);
  await typeInto(page, dialog.getByLabel('ID at most'), '0.5 mA');
  await dialog.getByText('The largest current is larger than the least one.').waitFor();
  expect(await dialog.getByRole('button', { name: 'Put in' }).getAttribute('aria-disabled')).toBe('true');
  await typeInto(page, dialog.getByLabel('ID at least'), '0.49 mA');
  await dialog
    .getByText(/The low end misses by \d+ µA: a unit may carry \d+ µA\./)
    .first()
    .waitFor();
  await page.keyboard.press('Escape');
  await expect.poll(() => dialog.count()).toBe(0);
  expect(await page.getByRole('button', { name: 'Undo' }).getAttribute('aria-disabled')).toBe('true');
});

test('an empty sheet says that a part is wanted first', async ({ page, address }) => {
  await page.goto(address);
  await page.getByRole('button', { name: 'Start an empty sheet' }).click();
  const dialog = await openDialog(page);
  await dialog.getByText('The sheet has no part yet. Insert one from its data sheet first.').waitFor();
  expect(await findings(page)).toEqual([]);
});

for (const [width, height] of [
  [1024, 768],
  [390, 844],
] as const) {
  test(`axe finds nothing in the dialog, dark, ${width} px`, async ({ page, address }) => {
    await page.emulateMedia({ colorScheme: 'dark' });
    await page.setViewportSize({ width, height });
    await page.goto(address);
    await page.getByRole('grid', { name: 'Sheet' }).waitFor();
    const dialog = await openDialog(page);
    await dialog.getByRole('img', { name: /The band wanted/ }).waitFor();
    expect(await findings(page)).toEqual([]);
  });
}
