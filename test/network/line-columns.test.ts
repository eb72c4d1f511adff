// The line solve down columns against the line solve of one sample, to the last bit.

import { expect, test } from 'vitest';
import { solveLines } from '../../src/network/line-columns.ts';
import { LINE_LANES } from '../../src/network/line-lanes.ts';
import { line, solveLine } from '../../src/network/line-solve.ts';
import { createLaneMemory } from '../../src/program/accelerator.ts';
import { createDraw } from '../support/counter-random.ts';

const COUNT = 1000;
const STRIDE = COUNT + 24;

const LANES = {
  inputs: ['beta', 'lambda', 'A', 'r', 'b', 'R'],
  outputs: ['I', 'vov', 'vds', 'margin', 'region'],
  text: LINE_LANES,
};
const memory = createLaneMemory([{ name: 'line', run: () => {}, lanes: LANES }], 11 * STRIDE)!;

function solveInLanes(all: Float64Array, places: Int32Array, at: number, count: number): void {
  memory.all.set(all, memory.free);
  memory.kernels[0]!(...Array.from(places.subarray(at, at + 11), (place) => 8 * (memory.free + place)), count);
  all.set(memory.all.subarray(memory.free, memory.free + all.length));
}

test.each([
  ['down columns', solveLines],
  ['in lanes', solveInLanes],
])('lines solved %s come out as those solved one by one, extremes and borders included', (_, solve) => {
  const draw = createDraw(11);
  const decades = (from: number, to: number): number => 10 ** (from + (to - from) * draw());
  const all = new Float64Array(11 * STRIDE);
  const places = Int32Array.from({ length: 14 }, (_, n) => (n - 3) * STRIDE);
  const seen = [0, 0, 0];
  for (let round = 0; round < 40; round++) {
    for (let i = 0; i < COUNT; i++) {
      const R = draw() < 0.05 ? 0 : decades(0, 8);
      const r = draw() < 0.1 ? R : draw() < 0.1 ? 0 : R * draw();
      const A = draw() < 0.1 ? -draw() : decades(-3, 3);
      const b = draw() < 0.05 ? 0 : draw() < 0.05 ? Math.abs(A) : decades(-3, 3);
      [decades(-6, 0), draw() < 0.2 ? 0 : 0.2 * draw(), A, r, b, R].forEach((x, k) => (all[k * STRIDE + i] = x));
    }
    solve(all, places, 3, COUNT);
    for (let i = 0; i < COUNT; i++) {
      const at = (k: number): number => all[k * STRIDE + i];
      solveLine(at(0), at(1), at(2), at(3), at(4), at(5));
      seen[line[4]]++;
      for (let k = 0; k < line.length; k++) {
        if (!Object.is(at(6 + k), line[k])) throw new Error(`result ${k} is ${at(6 + k)}, not ${line[k]}`);
      }
    }
  }
  for (const times of seen) expect(times).toBeGreaterThan(1000);
});
