// Published worked examples against the sheets that compute them. The tolerance is that of the seven digits to which
// the sources' own models were worked out again; a printed figure is held to half of its last digit where it agrees
// with that working, and is left alone where the source rounds early, reads a graph or errs (the verdict says so).

import { describe, expect, test } from 'vitest';
import { TOLERANCE, compareCase, comparedNumbers } from './compare-case.ts';
import type { CaseResult } from './compare-case.ts';
import { publishedCases, sheetNames, sheetText } from './comparison.ts';
import { JFET_COMPARISONS } from './jfet-comparisons.ts';
import { MOSFET_COMPARISONS } from './mosfet-comparisons.ts';
import { JFET_IDS, MOSFET_IDS } from './published-ids.ts';
import { readSheet } from './read-sheet.ts';

const COLLECTIONS = [
  { name: 'jfet', ids: JFET_IDS, cases: publishedCases('jfet'), comparisons: JFET_COMPARISONS },
  { name: 'mosfet', ids: MOSFET_IDS, cases: publishedCases('mosfet'), comparisons: MOSFET_COMPARISONS },
] as const;

test('every sheet belongs to a published case', () => {
  expect(sheetNames('')).toEqual([...JFET_IDS, ...MOSFET_IDS].toSorted());
});

for (const { name, ids, cases, comparisons } of COLLECTIONS) {
  describe(`the published ${name} cases`, () => {
    const results: (CaseResult | undefined)[] = [];
    const result = (k: number): CaseResult =>
      (results[k] ??= compareCase(cases[k]!, comparisons[ids[k]!]!, readSheet(sheetText(ids[k]!))));

    test('stand in the data and in the table, each once and none besides', () => {
      expect(cases.map((one) => one.id)).toEqual(ids);
      expect(Object.keys(comparisons)).toEqual(ids);
    });

    test.each(ids.map((id, k) => [id, k] as const))('%s', (_, k) => {
      expect(result(k).findings).toEqual([]);
    });

    test('deviate from their unrounded working by no more than its own digits, in the mean and at most', () => {
      const deviations = ids.flatMap((_, k) => result(k).deviations);
      const compared = cases.flatMap((one) => comparedNumbers(one, comparisons[one.id]!));
      expect(deviations).toHaveLength(compared.length);
      expect(deviations.reduce((sum, x) => sum + x, 0) / deviations.length).toBeLessThanOrEqual(TOLERANCE / 4);
      expect(Math.max(...deviations)).toBeLessThanOrEqual(TOLERANCE);
    });
  });
}
