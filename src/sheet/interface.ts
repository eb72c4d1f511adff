// What a cell is to the cells that use it. Two compilations with equal interfaces are the same to the
// users of a cell, so the old object is kept and nothing downstream is compiled again.

import type { DeviceHandles, Handle } from '../network/index.ts';
import type { Message } from '../language/index.ts';
import type { Measured } from './bench/measured.ts';
import type { CellKind, ValueType } from './model.ts';

export interface Offer {
  readonly type: ValueType;
  /** -1 where it is not computed. */
  readonly slot: number;
  readonly missing: Message | null;
  /** A field that was entered as one number: its slot may be turned. */
  readonly isInput: boolean;
}

/** What a part tells points and stages. */
export interface PartInterface {
  readonly type: 'part';
  readonly channel: 1 | -1;
  readonly family: 'JFET' | 'MOSFET';
  readonly device: DeviceHandles;
  /** What its data sheet forbids: V_DSmax, V_DGmax, V_GSmax, I_Dmax, T_Jmax, as far as given. */
  readonly limits: Readonly<Partial<Record<LimitName, Handle>>>;
  /** Temperature laws were given, not taken by default. */
  readonly statedTemperatureLaws: boolean;
}

export type LimitName = 'V_DSmax' | 'V_DGmax' | 'V_GSmax' | 'I_Dmax' | 'T_Jmax';

export interface Interface {
  readonly kind: CellKind;
  /** null for parts, stages and points, and for a cell whose type could not be settled. */
  readonly type: ValueType | null;
  readonly slot: number;
  readonly offers: ReadonlyMap<string, Offer>;
  readonly extra: PartInterface | null;
  /** What a bench tells the parts that are fitted to it. */
  readonly bench: Measured | null;
  /** Its entry is one number: its slot may be turned. */
  readonly isInput: boolean;
  /** Its value is declared with a spread. */
  readonly toleranced: boolean;
  /** False where the type (or the offers) could not be settled: users wait, unchecked. */
  readonly settled: boolean;
}

/** Whether users of a cell may keep their code when `a` is replaced by `b`. */
export function sameInterface(a: Interface, b: Interface): boolean {
  return signature(a) === signature(b);
}

function signature(x: Interface): string {
  return JSON.stringify([x.kind, x.type, x.slot, x.settled, x.isInput, x.toleranced, [...x.offers], x.extra, x.bench]);
}
