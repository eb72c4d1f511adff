// The built page opens from a sub-path of a host, under its own policy.

import { expect } from 'vitest';
import { test } from '../support/page-test.ts';

test('the page opens and shows the lines of its sheet', async ({ page, address }) => {
  await page.goto(address);
  const lines = page.getByRole('list', { name: 'Lines of the sheet' }).getByRole('listitem');
  await lines.first().waitFor();
  expect(await lines.allTextContents()).toContain('# Input stage');
});
