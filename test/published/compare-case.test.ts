// The comparison itself: what it must not let pass.

import { describe, expect, test } from 'vitest';
import { compareCase } from './compare-case.ts';
import type { Comparison, PublishedCase } from './comparison.ts';
import type { ComputedSheet } from './read-sheet.ts';

const CASE: PublishedCase = {
  id: 'one',
  source: 'none',
  seen: 'none',
  topic: 'none',
  given: {},
  circuit: 'none',
  expect: {
    ID: { printed: '1.4 mA', unit: 'mA', recomputed: 1.40625, value: 1.4, halfDigit: 0.05 },
    region: { printed: 'saturation', unit: '', recomputed: 'saturation' },
  },
  verdict: 'none',
};
const PATHS: Comparison = { quantities: { ID: 'A1.I_D', region: 'A1.region' } };

function sheet(values: Record<string, number | string | null>, faults: string[] = []): ComputedSheet {
  return { value: (path) => values[path] ?? null, faults: () => faults, spread: () => null };
}
const RIGHT = { 'A1.I_D': 1.40625e-3, 'A1.region': 'saturation' };

describe('the comparison of a case', () => {
  test('finds nothing where all agrees, and counts each number once', () => {
    const { findings, deviations } = compareCase(CASE, PATHS, sheet(RIGHT));
    expect(findings).toEqual([]);
    expect(deviations).toHaveLength(1);
  });

  test('finds a number that is off by two millionths', () => {
    expect(compareCase(CASE, PATHS, sheet({ ...RIGHT, 'A1.I_D': 1.40625e-3 * 1.000002 })).findings).toHaveLength(1);
  });

  test('finds a value that is missing, and one that is no number', () => {
    expect(compareCase(CASE, PATHS, sheet({ ...RIGHT, 'A1.I_D': null })).findings).toHaveLength(1);
    expect(compareCase(CASE, PATHS, sheet({ ...RIGHT, 'A1.I_D': NaN })).findings).toHaveLength(1);
  });

  test('finds another region', () => {
    expect(compareCase(CASE, PATHS, sheet({ ...RIGHT, 'A1.region': 'ohmic' })).findings).toHaveLength(1);
  });

  test('finds a quantity that stands nowhere, and one that the case does not have', () => {
    expect(compareCase(CASE, { quantities: { ID: 'A1.I_D' } }, sheet(RIGHT)).findings).toHaveLength(1);
    const more = { quantities: { ...PATHS.quantities, VDS: 'A1.V_DS' } };
    expect(compareCase(CASE, more, sheet(RIGHT)).findings).toHaveLength(1);
  });

  test('finds a faulty cell even where every number agrees', () => {
    expect(compareCase(CASE, PATHS, sheet(RIGHT, ['R_D: broken'])).findings).toEqual(['R_D: broken']);
  });

  test('finds a figure that is not the printed one', () => {
    const off = { ...CASE, expect: { ...CASE.expect, ID: { ...CASE.expect['ID']!, value: 1.5 } } };
    expect(compareCase(off, PATHS, sheet(RIGHT)).findings).toHaveLength(1);
  });

  test('finds a value of our own that is off', () => {
    const own = [{ path: 'A1.V_DS', value: 10, unit: 'V', because: 'as designed' }];
    expect(compareCase(CASE, { ...PATHS, own }, sheet({ ...RIGHT, 'A1.V_DS': 10 })).findings).toEqual([]);
    expect(compareCase(CASE, { ...PATHS, own }, sheet({ ...RIGHT, 'A1.V_DS': 10.1 })).findings).toHaveLength(1);
    expect(compareCase(CASE, { ...PATHS, own }, sheet(RIGHT)).findings).toHaveLength(1);
  });

  test('finds a quantity that is computed though it is said to wait', () => {
    const waits = { ID: 'several FETs' } as const;
    expect(compareCase(CASE, { ...PATHS, waits }, sheet(RIGHT)).findings).toHaveLength(1);
    expect(compareCase(CASE, { ...PATHS, waits }, sheet({ 'A1.region': 'saturation' })).findings).toEqual([]);
  });
});
