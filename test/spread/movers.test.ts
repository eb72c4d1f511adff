// What moves a value most, against sums of independent parts, whose shares are known.

import { expect, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { moversOf } from '../../src/spread/index.ts';

function movers(text: string, path: string) {
  const model = createSheet(text).spreadModel();
  const { slot } = model.values.find((value) => value.path === path)!;
  return moversOf(model, slot, 1).map((mover) => ({ ...mover, name: model.drawn[mover.draw]!.name }));
}

test('of a sum of even parts each has the share of its width squared, the strongest first', () => {
  const found = movers('a = 0 V in -1 V .. 1 V\nb = 0 V in -2 V .. 2 V\nc = 0 V in -3 V .. 3 V\nx = a + b + c', 'x');
  expect(found.map(({ name }) => name)).toEqual(['c', 'b', 'a']);
  expect(found.map(({ atLow, atHigh }) => [atLow, atHigh])).toEqual([
    [-3, 3],
    [-2, 2],
    [-1, 1],
  ]);
  [9 / 14, 4 / 14, 1 / 14].forEach((share, i) => expect(Math.abs(found[i]!.share! - share)).toBeLessThan(0.05));
});

test('what does not reach the value is not named, and what changes in use has an effect but no share', () => {
  const found = movers('V_1 = 10 V ± 10 % service\nR = 1 kohm ± 5 %\nR_x = 1 kohm ± 5 %\nI = V_1 / R', 'I');
  expect(found.map(({ name }) => name)).toEqual(['V_1', 'R']);
  expect(found[0]!.share).toBeNull();
  expect(found[1]!.share).toBeGreaterThan(0.95);
});

test('an input that only acts together with another has no first-order share', () => {
  const found = movers('a = 0 in -1 .. 1\nb = 0 in -1 .. 1\nc = 0 in -0.1 .. 0.1\nx = a * b + c', 'x');
  expect(found.map(({ name }) => name)).toEqual(['c']);
});
