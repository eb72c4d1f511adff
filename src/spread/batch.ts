// Some values of a sheet at many positions at once.

import type { SpreadModel } from '../sheet/index.ts';
import { fillColumns } from './position.ts';
import type { Position } from './position.ts';
import { createStateColumns } from './state-columns.ts';

export interface Batch {
  /** Computes the values at every position; `visit` is called after each pass with the range that `column(k)` holds. */
  run(positions: readonly Position[], visit: (from: number, count: number) => void): void;
  /** The k-th wanted value of the present pass, one number per position. */
  column(k: number): Float64Array;
}

/** Prepares the evaluation of the values in these slots. */
export function createBatch(model: SpreadModel, wanted: readonly number[]): Batch {
  const { drawn } = model;
  const columns = createStateColumns(
    model,
    drawn.map(({ slot }) => slot),
    wanted,
  );
  return {
    run(positions, visit) {
      for (let from = 0; from < positions.length; from += columns.width) {
        const count = Math.min(columns.width, positions.length - from);
        fillColumns(drawn, positions, from, count, columns.input);
        columns.run(count);
        visit(from, count);
      }
    },
    column: columns.output,
  };
}
