// What a cell of any kind says of its spread before its slots have addresses: what is drawn in it, which further limits
// cut the set of its specimens, and which of its draws go together.

import type { Line } from '../language/index.ts';
import type { Handle } from '../network/index.ts';
import type { Read } from './draft.ts';
import type { DeclaredSpread } from './model.ts';
import type { ValueKind } from '../quantity/index.ts';
import { isQuantity } from './value-type.ts';
import type { CompiledQuantity } from './cells/quantity.ts';

/** Where the draws of a quantity enter the program, and what of its declared spread they are drawn from. */
export interface QuantityDraw {
  readonly handle: Handle;
  /** Of a number the value itself; behind a formula what the formula's value is multiplied with, or what is added to it. */
  readonly form: 'value' | 'factor' | 'addend';
}

/** One draw; `field` is '' for a quantity cell, else the name of a part's or point's field. */
interface DrawDraft {
  readonly field: string;
  readonly handle: Handle;
  readonly line: Line;
  /** What is drawn from: limits of the value, or of the factor or addend that stands behind a formula. */
  readonly spread: (read: Read) => DeclaredSpread;
  /** The value whose spread it is. */
  readonly value: Handle;
  readonly type: ValueKind;
}

/** A row that is not needed to compute and has limits: specimens that read otherwise do not belong to the part. */
interface CutDraft {
  readonly field: string;
  readonly line: Line;
  /** What the row reads on the specimen. */
  readonly handle: Handle;
  readonly limits: (read: Read) => DeclaredSpread;
}

/** Two fields of a part whose draws go together (`tracking`). */
interface TieDraft {
  /** The row that places the threshold, and whether its quantile counts down as its value grows. */
  readonly threshold: string;
  readonly thresholdFalls: boolean;
  /** The row that says how much there is. */
  readonly gain: string;
  readonly gainFalls: boolean;
  readonly tracking: Handle;
}

export interface SpreadDraft {
  readonly draws: readonly DrawDraft[];
  readonly cuts: readonly CutDraft[];
  readonly tie: TieDraft | null;
}

/** What the draw of a quantity is drawn from: its declared spread, as a value, a factor or an addend. */
function drawnSpread({ form }: QuantityDraw, spread: DeclaredSpread): DeclaredSpread {
  const { low, nominal, high } = spread;
  switch (form) {
    case 'value':
      return spread;
    case 'factor': {
      const half = nominal === 0 ? 0 : (high! - low!) / (2 * Math.abs(nominal));
      return { ...spread, low: 1 - half, nominal: 1, high: 1 + half };
    }
    case 'addend':
      return { ...spread, low: low === null ? null : low - nominal, nominal: 0, high: high === null ? null : high - nominal };
  }
}

/** Nothing spreads. */
export const NO_SPREAD: SpreadDraft = { draws: [], cuts: [], tie: null };

/** The draw of one quantity; none where nothing is declared. */
export function drawsOf(field: string, quantity: CompiledQuantity, line: Line): DrawDraft[] {
  const { draw, spread, handle, type } = quantity;
  if (!draw || !spread || !isQuantity(type)) return [];
  return [{ field, handle: draw.handle, line, value: handle, type, spread: (read) => drawnSpread(draw, spread(read)) }];
}
