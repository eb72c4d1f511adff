// The measuring itself, on a clock that only the measured work moves.

import { expect, test } from 'vitest';
import { compare, formatTimings } from './compare.ts';

function clocked() {
  let now = 0;
  const order: string[] = [];
  const work = (name: string, milliseconds: () => number) => ({
    name,
    run: () => {
      now += milliseconds();
      order.push(name);
      return 1;
    },
  });
  return { work, order, clock: () => now };
}

test('time is given for one unit of the work, and as a ratio to the first variant', () => {
  const { work, clock } = clocked();
  const timings = compare([work('a', () => 2), work('b', () => 5)], { units: 1000, turn: 1, clock });
  expect(timings).toMatchObject([
    { name: 'a', ns: 2000, ratio: 1 },
    { name: 'b', ns: 5000, ratio: 2.5 },
  ]);
});

test('each round begins with another variant', () => {
  const { work, order, clock } = clocked();
  const variants = ['a', 'b', 'c'].map((name) => work(name, () => 1));
  compare(variants, { rounds: 3, warmUps: 0, turn: 1, clock });
  expect(order.join('')).toBe('abcbcacab');
});

test('warming up and a slow moment do not count', () => {
  const { work, clock } = clocked();
  const slow = [9, 9, 1, 1, 50, 1, 1];
  const timings = compare([work('a', () => slow.shift()!)], { rounds: 5, warmUps: 2, turn: 1, clock });
  expect(timings[0].ns).toBe(1e6);
});

test('work that comes out as NaN is not timed', () => {
  expect(() => compare([{ name: 'a', run: () => NaN }], { turn: 0 })).toThrow('NaN');
});

test('a ratio stands beside its target', () => {
  const text = formatTimings('Work', 'run', [
    { name: 'a', ns: 10, ratio: 1, target: undefined },
    { name: 'b', ns: 30, ratio: 3, target: { atMost: 2 } },
    { name: 'c', ns: 1234.5, ratio: 123, target: { atLeast: 50 } },
  ]);
  expect(text.split('\n').slice(2)).toEqual([
    '  a       10.0      1.00  ',
    '  b       30.0      3.00  at most 2: MISSED',
    '  c       1235       123  at least 50: met',
  ]);
});
