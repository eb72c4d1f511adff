// Terms of the lowering: a value whose sign and whose being zero or one are known before any number is, so
// that nothing is emitted for what the shape of a network settles, and sums of one sign stay free of subtraction.

import type { Emitter, Handle } from './emitter.ts';

/** null is 0. `handle` null is 1. `negative`: minus the handle's value. */
export type Term = { readonly handle: Handle | null; readonly negative: boolean } | null;

export const ONE: Term = { handle: null, negative: false };

export function term(handle: Handle): Term {
  return { handle, negative: false };
}

export function negate(x: Term): Term {
  return x && { handle: x.handle, negative: !x.negative };
}

/** x + y. */
export function plus(e: Emitter, x: Term, y: Term): Term {
  if (!x) return y;
  if (!y) return x;
  const a = x.handle ?? e.constant(1);
  const b = y.handle ?? e.constant(1);
  if (x.negative === y.negative) return { handle: e.add(a, b), negative: x.negative };
  if (a === b) return null;
  return x.negative ? { handle: e.sub(b, a), negative: false } : { handle: e.sub(a, b), negative: false };
}

/** x - y. */
export function minus(e: Emitter, x: Term, y: Term): Term {
  return plus(e, x, negate(y));
}

/** x y. */
export function times(e: Emitter, x: Term, y: Term): Term {
  if (!x || !y) return null;
  const negative = x.negative !== y.negative;
  if (x.handle === null) return { handle: y.handle, negative };
  if (y.handle === null) return { handle: x.handle, negative };
  return { handle: e.mul(x.handle, y.handle), negative };
}

/** x / y; y is no structural zero. */
export function over(e: Emitter, x: Term, y: Term): Term {
  if (!y) throw new RangeError('over: division by a structural zero');
  if (!x) return null;
  const negative = x.negative !== y.negative;
  if (y.handle === null) return { handle: x.handle, negative };
  if (x.handle === y.handle) return { handle: null, negative };
  return { handle: e.div(x.handle ?? e.constant(1), y.handle), negative };
}

/** The handle of a term's value. */
export function emit(e: Emitter, x: Term): Handle {
  if (!x) return e.constant(0);
  if (x.handle === null) return e.constant(x.negative ? -1 : 1);
  return x.negative ? e.neg(x.handle) : x.handle;
}
