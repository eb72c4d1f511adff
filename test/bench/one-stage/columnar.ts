// The one-stage bench as columns: every operation runs down all samples before the next one starts.

import { createColumns, planColumns } from '../../../src/program/index.ts';
import { CELLS, INPUT_NAMES, SUMMED } from './inputs.ts';
import type { InputName } from './inputs.ts';
import { KERNELS, createTape } from './tape.ts';

/** As `createHandLoop`, in columns; `wanted` are the cells that are computed. */
export function createColumnar(columns: Readonly<Record<InputName, Float64Array>>, wanted: readonly number[]) {
  const { program, slots, cells, runOne } = createTape(columns);
  // What does not vary is taken from the slots as they stand.
  runOne(0);
  const plan = planColumns({
    program,
    slots,
    varying: INPUT_NAMES.map((_, k) => k),
    frozen: [],
    outputs: wanted.map((k) => cells[k]),
  });
  const batch = createColumns(plan, KERNELS);
  const samples = columns.V_DD.length;
  const places = SUMMED.map((k) => wanted.indexOf(k));
  const pass = (from: number): number => {
    const count = Math.min(batch.width, samples - from);
    INPUT_NAMES.forEach((name, k) => batch.input(k).set(columns[name].subarray(from, from + count)));
    batch.run(count);
    return count;
  };
  const row = new Float64Array(CELLS.length);
  return {
    row,
    runOne(i: number): void {
      const from = i - (i % batch.width);
      if (i === from) pass(from);
      wanted.forEach((cell, k) => (row[cell] = batch.output(k)[i - from]));
    },
    run(): number {
      let sum = 0;
      for (let from = 0; from < samples; from += batch.width) {
        const count = pass(from);
        for (const place of places) {
          const column = batch.output(place);
          for (let i = 0; i < count; i++) sum += column[i];
        }
      }
      return sum;
    },
  };
}
