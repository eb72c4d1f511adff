// Spread in the built page: ends as the terminal prints them, a corner to stand at, and what mends a failing check.

import { readFileSync } from 'node:fs';
import { expect } from 'vitest';
import type { Page } from 'playwright-core';
import { run } from '../../src/cli/run.ts';
import { findings } from '../support/axe-findings.ts';
import { test } from '../support/page-test.ts';

const DEMO = 'public/examples/crevasse-listener.txt';

interface Spread {
  readonly low: number | null;
  readonly high: number | null;
}

/** The ends of every value that spreads, by row of the page, from the terminal. */
function printedEnds(): Map<string, Spread> {
  let out = '';
  run([DEMO, '--json', '--samples', '300'], {
    read: () => readFileSync(DEMO),
    print: (line: string) => (out += line),
    complain: (line: string) => expect.unreachable(line),
    width: 100,
  });
  const { cells } = JSON.parse(out) as {
    cells: Record<string, { kind: string; values?: Record<string, { spread?: Spread }> }>;
  };
  return new Map(
    Object.entries(cells).flatMap(([name, { kind, values }]) =>
      kind !== 'stage'
        ? []
        : Object.entries(values ?? {}).flatMap(([value, { spread }]) =>
            spread ? [[`value:${name}.${value}`, spread] as const] : [],
          ),
    ),
  );
}

const cellText = async (page: Page, key: string, column: string): Promise<string> =>
  (await page.locator(`[data-key="${key}"] [data-column="${column}"]`).textContent()) ?? '';

async function openCounted(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await page.getByRole('button', { name: /10 000 builds/ }).waitFor({ timeout: 40_000 });
}

const PREFIX: Readonly<Record<string, number>> = { p: 1e-12, n: 1e-9, µ: 1e-6, m: 1e-3, k: 1e3, M: 1e6 };

/** The number of a shown text in SI, where its unit is one of volts, amperes, ohms, siemens or watts. */
function number(text: string): number | null {
  const found = /^([−\d.\u2009]+)([pnµmkM]?)([VAΩSW])$/.exec(text.replace(/\s+/g, ''));
  if (!found) return null;
  return Number(found[1]!.replace('−', '-').replace(/\u2009/g, '')) * (found[2] ? PREFIX[found[2]]! : 1);
}

test('the ends beside each value are those of the terminal, rounded outward', async ({ page, address }) => {
  await openCounted(page, address);
  let compared = 0;
  for (const [key, { low, high }] of printedEnds()) {
    if ((await page.locator(`[data-key="${key}"]`).count()) === 0) continue;
    const nominal = await cellText(page, key, 'nominal');
    const unit = /[^\d.\s−]*$/.exec(nominal)![0];
    for (const [column, end, isLow] of [
      ['low', low, true],
      ['high', high, false],
    ] as const) {
      const written = await cellText(page, key, column);
      const shown = number(/[VAΩSW]$/.test(written) ? written : written + unit);
      if (shown === null || end === null) continue;
      compared++;
      const slack = 1e-9 * Math.abs(end);
      expect(isLow ? shown <= end + slack : shown >= end - slack, `${key} ${column}: ${shown} for ${end}`).toBe(true);
      expect(Math.abs(shown - end), `${key} ${column}`).toBeLessThanOrEqual(0.011 * Math.abs(end) + 1e-15);
    }
  }
  expect(compared).toBeGreaterThan(20);
}, 120_000);

test('one stands at the low end of a value and comes back by Escape', async ({ page, address }) => {
  await openCounted(page, address);
  await page.locator('[data-key="value:A1.I_D"] [data-column="name"]').click();
  const nominal = await cellText(page, 'value:A1.I_D', 'nominal');
  const low = await cellText(page, 'value:A1.I_D', 'low');
  await page.getByRole('button', { name: 'stand there' }).first().click();
  await page.getByRole('status', { name: 'Standing at a corner' }).waitFor();
  await expect.poll(() => cellText(page, 'value:A1.I_D', 'nominal')).toBe(`${low}µA`);
  await page.getByRole('columnheader', { name: 'at corner' }).waitFor();
  // Entries stay as they are.
  expect(await cellText(page, 'cell:R_D', 'entry')).toBe('6.8 kohm ± 1 %');
  expect(await findings(page)).toEqual([]);
  await page.keyboard.press('Escape');
  await expect.poll(() => cellText(page, 'value:A1.I_D', 'nominal')).toBe(nominal);
  await page.getByRole('radio', { name: 'high device' }).check();
  await expect.poll(() => cellText(page, 'value:A1.I_D', 'nominal')).not.toBe(nominal);
}, 90_000);

test('a check that fails at an end says what would hold it, and a value put in does', async ({ page, address }) => {
  await openCounted(page, address);
  await page.locator('[data-key="cell:current"] [data-column="name"]').click();
  const putIn = page.getByRole('button', { name: 'put in' });
  await putIn.first().waitFor({ timeout: 40_000 });
  await expect.poll(() => page.getByText('Turning the inputs one by one').count(), { timeout: 60_000 }).toBe(0);
  await putIn.last().click();
  await page.getByRole('button', { name: /^All 9 checks hold at every extreme/ }).waitFor({ timeout: 40_000 });
  await page.keyboard.press('Control+z');
  await page.getByRole('button', { name: /^8 of 9 checks hold at every extreme/ }).waitFor({ timeout: 40_000 });
}, 150_000);
