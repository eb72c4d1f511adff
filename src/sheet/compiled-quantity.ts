// A quantity cell, or a field of a part or point, as it was compiled, and its draw.

import type { Line } from '../language/index.ts';
import type { Handle } from '../network/index.ts';
import type { Draft, Read } from './draft.ts';
import type { DeclaredSpread, ValueType } from './model.ts';
import { isQuantity } from './value-type.ts';

/** Where the draws of a quantity enter the program, and what of its declared spread they are drawn from. */
export interface QuantityDraw {
  readonly handle: Handle;
  /** Of a number the value itself; behind a formula what the formula's value is multiplied with, or what is added to it. */
  readonly form: 'value' | 'factor' | 'addend';
}

export interface CompiledQuantity {
  readonly type: ValueType;
  readonly handle: Handle;
  /** null where nothing is drawn. */
  readonly draw: QuantityDraw | null;
  /** null where no spread is declared. */
  readonly spread: ((read: Read) => DeclaredSpread) | null;
  /** The entry is one number. */
  readonly isInput: boolean;
  /** The sheet chose the nominal between the limits: a sentence for the list of assumptions. */
  readonly chosen: boolean;
  /** Its low end was left open and is 0 by nature. */
  readonly fromZero: boolean;
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
      return {
        ...spread,
        low: low === null ? null : low - nominal,
        nominal: 0,
        high: high === null ? null : high - nominal,
      };
  }
}

/** The draw of one quantity; none where nothing is declared. */
export function drawsOf(field: string, quantity: CompiledQuantity, line: Line): Draft['drawn']['draws'] {
  const { draw, spread, handle, type } = quantity;
  if (!draw || !spread || !isQuantity(type)) return [];
  return [
    {
      field,
      handle: draw.handle,
      line,
      value: handle,
      type,
      form: draw.form,
      spread: (read) => drawnSpread(draw, spread(read)),
    },
  ];
}
