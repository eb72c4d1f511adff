// The columnar evaluator against the scalar one, sample by sample and to the last bit.

import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { createColumns, planColumns, runAll } from '../../src/program/index.ts';
import { KERNELS, createSheet } from '../../src/sheet/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomEngineSheet } from '../support/random-engine-sheet.ts';

/** Turns some inputs of a sheet and compares every slot of every sample. */
function compare(text: string, seed: number, samples: number, share: number, lanes: boolean): number {
  const sheet = createSheet(text);
  const { program, slots, values } = sheet.spreadModel();
  const draw = createDraw(seed);
  const inputs = new Set(sheet.cells().flatMap(({ name, isInput }) => (isInput ? [name] : [])));
  const varying = values.flatMap(({ path, slot }) => (inputs.has(path) && draw() < share ? [slot] : []));
  const outputs = Array.from({ length: program.slotCount }, (_, slot) => slot);
  const columns = createColumns(planColumns({ program, slots, varying, frozen: [], outputs }), KERNELS, { lanes });
  const special = [0, -0, NaN, Infinity, -Infinity, 1e-300, -1e300];
  const given = varying.map((slot) =>
    Float64Array.from({ length: samples }, () =>
      draw() < 0.02 ? special[Math.floor(draw() * special.length)]! : slots[slot]! * (0.5 + draw()),
    ),
  );
  let compared = 0;
  for (let from = 0; from < samples; from += columns.width) {
    const count = Math.min(columns.width, samples - from);
    given.forEach((values, k) => columns.input(k).set(values.subarray(from, from + count)));
    columns.run(count);
    for (let i = 0; i < count; i++) {
      const one = slots.slice();
      varying.forEach((slot, k) => (one[slot] = given[k]![from + i]!));
      runAll(program, one, KERNELS);
      for (const slot of outputs) {
        compared++;
        if (!Object.is(columns.output(slot)[i], one[slot])) {
          throw new Error(`slot ${slot} of sample ${from + i} is ${columns.output(slot)[i]}, not ${one[slot]}`);
        }
      }
    }
  }
  return compared;
}

describe('columns', () => {
  test.each(Array.from({ length: 40 }, (_, seed) => seed))(
    'of random sheet %d hold what its samples compute',
    (seed) => {
      const draw = createDraw(seed);
      expect(compare(randomEngineSheet(draw).text(), seed, 40, 0.6, seed % 2 === 0)).toBeGreaterThan(0);
    },
  );

  test('of the worked sheet hold what its samples compute, over more than one pass', () => {
    const text = readFileSync(new URL('../../public/examples/crevasse-listener.txt', import.meta.url), 'utf8');
    for (const lanes of [true, false]) expect(compare(text, 5, 1100, 0.5, lanes)).toBeGreaterThan(100_000);
  });

  test('what is frozen keeps its nominal value, and what is not wanted is not computed', () => {
    const { program, slots } = createSheet('a = 2\nb = a * 3\nc = b + 1\nd = sqrt(c)').compiled();
    const [a, b, c] = [2, 6, 7].map((x) => slots.indexOf(x));
    const plan = planColumns({ program, slots, varying: [a!], frozen: [b!], outputs: [c!, a!, b!] });
    expect(plan.ops.length).toBe(0);
    const columns = createColumns(plan, KERNELS);
    columns.input(0)[0] = 5;
    columns.run(1);
    expect([columns.output(0)[0], columns.output(1)[0], columns.output(2)[0]]).toEqual([7, 5, 6]);
  });

  test('a plan is plain data', () => {
    const { program, slots } = createSheet('a = 2\nb = a * 3').compiled();
    const plan = planColumns({ program, slots, varying: [slots.indexOf(2)], frozen: [], outputs: [slots.indexOf(6)] });
    const columns = createColumns(structuredClone(plan), KERNELS);
    columns.input(0)[3] = 7;
    columns.run(4);
    expect(columns.output(0)[3]).toBe(21);
  });
});
