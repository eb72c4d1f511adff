// What a part was given, read and checked, as the files that work on parts share it.

import type { FieldTree } from '../language/index.ts';
import type { Route } from '../fet/index.ts';
import type { Handle } from '../network/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { CompiledQuantity } from './compiled-quantity.ts';

/** One field of a part as it was given. */
export interface GivenField {
  readonly name: string;
  readonly handle: Handle;
  readonly kind: ValueKind;
  readonly quantity: CompiledQuantity;
  /** By condition name: `V_DS`, `I_D`. */
  readonly conditions: ReadonlyMap<string, number>;
  readonly tree: FieldTree;
  /** Where it comes from a bench: which of its values it is, as a formula, and its standard error. */
  readonly measured?: { readonly formula: string; readonly error: number | null };
}

/** What a part was given, by field name; R_DSon and e_n may stand several times. */
export type GivenFields = ReadonlyMap<string, readonly GivenField[]>;

/** One complete route of a part and what it gives: beta in A/V² and V_TO in the n-channel frame. */
export interface RouteResult {
  readonly route: Route;
  readonly inputs: readonly Handle[];
  readonly beta: Handle;
  readonly V_TO: Handle;
  readonly status: Handle;
  /** Series resistance that the rows fit, in ohm; null where the route has none. */
  readonly R_0: Handle | null;
}
