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

/** A batch for a sheet of which one input takes other values. */
interface TurnedBatch extends Batch {
  /** The same sheet with that input at another value; what it rests on stands in the slots as before. */
  take(model: SpreadModel): void;
}

/** Prepares the evaluation of the values in these slots. */
export function createBatch(model: SpreadModel, wanted: readonly number[]): Batch {
  return batchOver(model, [], wanted);
}

/** The same, for sheets that differ in the input of this slot, in what rests on it, and in the limits of their draws. */
export function createTurnedBatch(model: SpreadModel, turned: number, wanted: readonly number[]): TurnedBatch {
  return batchOver(model, model.drawn.some(({ slot }) => slot === turned) ? [] : [turned], wanted);
}

function batchOver(model: SpreadModel, turned: readonly number[], wanted: readonly number[]): TurnedBatch {
  let { drawn, slots } = model;
  const columns = createStateColumns(model, [...drawn.map(({ slot }) => slot), ...turned], wanted);
  return {
    take(other) {
      ({ drawn, slots } = other);
    },
    run(positions, visit) {
      for (let from = 0; from < positions.length; from += columns.width) {
        const count = Math.min(columns.width, positions.length - from);
        fillColumns(drawn, positions, from, count, columns.input);
        turned.forEach((slot, n) => columns.input(drawn.length + n).fill(slots[slot]!, 0, count));
        columns.run(count);
        visit(from, count);
      }
    },
    column: columns.output,
  };
}
