// Published data-sheet rows as parts: each computes as it is printed, the ends are kept, and where a sheet prints no
// typical value the geometric mean of the limits stands in, or the one limit there is.

import { describe, expect, test } from 'vitest';
import { comparePart } from './compare-part.ts';
import { publishedParts, sheetNames, sheetText } from './comparison.ts';
import { PART_SHEETS } from './part-sheets.ts';
import { PART_NAMES } from './published-ids.ts';
import { readSheet } from './read-sheet.ts';

const { units, parts } = publishedParts();

describe('the published parts', () => {
  test('stand in the data and in the table, each once and none besides', () => {
    expect(parts.map((one) => one.part)).toEqual(PART_NAMES);
    expect(PART_SHEETS.map((one) => one.part)).toEqual(PART_NAMES);
    expect(PART_SHEETS.map((one) => one.sheet).toSorted()).toEqual(sheetNames('parts'));
  });

  test.each(PART_SHEETS.map((one, k) => [one.part, k] as const))('%s', (_, k) => {
    const sheet = readSheet(sheetText(`parts/${PART_SHEETS[k]!.sheet}`));
    expect(comparePart(parts[k]!, PART_SHEETS[k]!, units, sheet)).toEqual([]);
  });
});
