// What a reader, a keyboard or a low contrast would stumble over, by the rules of axe-core, in the states of the page.

import { expect } from 'vitest';
import { findings } from '../support/axe-findings.ts';
import { openUnwatchedContext, test } from '../support/page-test.ts';

const SIZES = [
  { width: 1440, height: 900 },
  { width: 1024, height: 768 },
  { width: 720, height: 450 },
  { width: 390, height: 844 },
];

for (const colorScheme of ['light', 'dark'] as const) {
  for (const viewport of SIZES) {
    test(`axe finds nothing on the demo sheet, ${colorScheme}, ${viewport.width} px`, async ({ address }) => {
      const context = await openUnwatchedContext();
      const page = await context.newPage();
      await page.emulateMedia({ colorScheme });
      await page.setViewportSize(viewport);
      await page.goto(address);
      await page.getByRole('grid', { name: 'Sheet' }).waitFor();
      await page.locator('[data-key="cell:A1"] [data-column="name"]').click();
      await page.waitForTimeout(500);
      expect(await findings(page)).toEqual([]);
      await context.close();
    });
  }
}

test('axe finds nothing in the dialogs, in an edited cell, beside a broken line, in the text', async ({
  page,
  address,
}) => {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  const toolbar = page.getByRole('toolbar', { name: 'Commands' });
  for (const name of ['Shelf', 'Share', 'Help', 'Record']) {
    await toolbar.getByRole('button', { name, exact: true }).click();
    await page.getByRole('dialog').waitFor();
    await page.waitForTimeout(name === 'Record' ? 800 : 200);
    expect(await findings(page), name).toEqual([]);
    await page.keyboard.press('Escape');
    await page.getByRole('dialog').waitFor({ state: 'hidden' });
  }
  await page.locator('[data-key="cell:R_D"] [data-column="entry"]').click();
  await page.keyboard.press('Enter');
  await page.keyboard.type(' + R_');
  await page.waitForTimeout(300);
  expect(await findings(page), 'an edited cell').toEqual([]);
  await page.keyboard.type('nothing');
  await page.keyboard.press('Escape');
  await page.keyboard.press('Enter');
  await page.waitForTimeout(800);
  expect(await findings(page), 'after the edit').toEqual([]);
  await toolbar.getByRole('button', { name: 'Text', exact: true }).click();
  await page.waitForTimeout(200);
  expect(await findings(page), 'the text').toEqual([]);
});
