// Means and standard deviations against certified values, however a data set is cut.

import { describe, expect, test } from 'vitest';
import { addColumn, addMoments, createMoments } from '../../src/numeric/index.ts';
import type { Moments } from '../../src/numeric/index.ts';
import { CERTIFIED } from './certified-data.ts';

/** Half of the last printed digit; nothing where so few are printed that they are exact. */
const halfDigit = (printed: string): number =>
  printed.length < 10 || printed.startsWith('1000000') ? 0 : 0.5 * 10 ** -printed.split('.')[1]!.length;

/** Half of the last bit of the largest number: by so much each number of the set may differ from its decimal text. */
const halfBit = (numbers: readonly number[]): number =>
  2 ** (Math.floor(Math.log2(Math.max(...numbers.map(Math.abs)))) - 53);

/** The moments of a set cut into columns of `size` numbers, each counted on its own and merged in their order. */
function momentsOf(numbers: readonly number[], size: number): Moments {
  const sum = createMoments(1);
  for (let from = 0; from < numbers.length; from += size) {
    const column = Float64Array.from(numbers.slice(from, from + size));
    const part = createMoments(1);
    addColumn(part, 0, column, column.length, new Uint8Array(column.length));
    addMoments(sum, part);
  }
  return sum;
}

describe.each(CERTIFIED)('$name', ({ numbers, mean, sd }) => {
  // Beside the two halves: rounding of sums, a few parts in 1e16 of the numbers.
  const rounding = 4 * halfBit(numbers);

  test.each([numbers.length, 100, 7, 1])('in columns of %d', (size) => {
    const moments = momentsOf(numbers, size);
    expect(moments.count[0]).toBe(numbers.length);
    expect(Math.abs(moments.mean[0]! - Number(mean))).toBeLessThanOrEqual(
      halfDigit(mean) + halfBit(numbers) + rounding,
    );
    const found = Math.sqrt(moments.m2[0]! / (numbers.length - 1));
    expect(Math.abs(found - Number(sd))).toBeLessThanOrEqual(halfDigit(sd) + halfBit(numbers) + rounding);
  });
});
