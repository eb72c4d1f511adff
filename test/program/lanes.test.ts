// Loops over lanes against the same operations on columns of one number at a time, to the last bit.

import { describe, expect, test } from 'vitest';
import { createLaneMemory } from '../../src/program/accelerator.ts';
import { COLUMN_OPERATIONS } from '../../src/program/column-operations.ts';
import { compileLanes } from '../../src/program/lane-language.ts';
import { LANE_OPERATIONS } from '../../src/program/lane-operations.ts';
import { OP } from '../../src/program/operations.ts';
import { createDraw } from '../support/counter-random.ts';

const COUNT = 4096;
const SPECIAL = [
  0,
  -0,
  1,
  -1,
  NaN,
  Infinity,
  -Infinity,
  5e-324,
  1e-310,
  2 ** -1022,
  1.7e308,
  -1.7e308,
  0.5,
  2,
  10,
  1000,
];

function draws(seed: number): Float64Array {
  const draw = createDraw(seed);
  return Float64Array.from({ length: COUNT }, (_, i) => {
    const kind = draw();
    if (kind < 0.1) return SPECIAL[Math.floor(draw() * SPECIAL.length)]!;
    if (kind < 0.3) return 1 + 0.2 * (draw() - 0.5);
    if (kind < 0.5) return 1500 * (draw() - 0.5);
    if (kind < 0.6) return (i % 64) / 64 + 0.5;
    if (kind < 0.7) return draw() - 0.5;
    return (draw() < 0.3 ? -1 : 1) * 10 ** (600 * draw() - 300);
  });
}

describe('lanes', () => {
  const memory = createLaneMemory([], 3 * COUNT)!;
  const { all, free, operations } = memory;

  test.each(LANE_OPERATIONS.map(([name]) => name))('%s leaves what one number at a time leaves', (name) => {
    for (let seed = 0; seed < 8; seed++) {
      const [a, b] = [draws(2 * seed), draws(2 * seed + 1)];
      if (seed === 1) b.set(a);
      if (name === 'pow' && seed > 3) b.forEach((x, i) => (b[i] = seed > 5 ? Math.round(x) % 7 : x % 7));
      all.set(a, free);
      all.set(b, free + COUNT);
      const expected = new Float64Array(COUNT);
      COLUMN_OPERATIONS[OP[name]]!(expected, a, b, COUNT);
      operations[OP[name]]!(8 * free, 8 * (free + COUNT), 8 * (free + 2 * COUNT), COUNT);
      const found = all.subarray(free + 2 * COUNT, free + 3 * COUNT);
      const other = expected.findIndex((x, i) => !Object.is(found[i], x));
      expect(other, `${name}(${a[other]}, ${b[other]}) is ${found[other]}, not ${expected[other]}`).toBe(-1);
    }
  });

  test('nothing is written beyond the last two pairs that are begun', () => {
    all.fill(7, free, free + 3 * COUNT);
    operations[OP.add]!(8 * free, 8 * free, 8 * (free + 2 * COUNT), 5);
    expect([...all.subarray(free + 2 * COUNT, free + 2 * COUNT + 10)]).toEqual([14, 14, 14, 14, 14, 14, 14, 14, 7, 7]);
  });
});

describe('the language of lanes', () => {
  const lanes = (text: string) => () => compileLanes({ inputs: ['a'], outputs: ['t'], text }, {});

  test.each([
    ['t = a + c', 'nothing is called c'],
    ['t = a +', 'nothing is called'],
    ['t = (a', 'expected )'],
    ['t = a a', 'does not end'],
    ['t = a $ 2', 'does not end'],
    ['t = root(a)', 'no function is called root'],
    ['t = lookUp(LN, a)', 'no table is called LN'],
    ['t + a', 'is no statement'],
    ['u = a', 't is never computed'],
    ['while a > 0', 'while has no end'],
    ['end', 'end without'],
  ])('%s is refused', (text, reason) => {
    expect(lanes(text)).toThrow(reason);
  });
});
