// An emitter in front of another that emits nothing twice and nothing that is known already: equal operations
// share one handle, and sums with 0 and products with 1 are what they were.

import type { Emitter, Handle } from './emitter.ts';

/** Wraps `e`; constants that anyone has emitted through `e` as 0 and 1 are recognised where `e` shares its constants. */
export function shareEmitter(e: Emitter): Emitter {
  const known = new Map<string, Handle>();
  const [zero, one] = [e.constant(0), e.constant(1)];
  const share = (key: string, make: () => Handle): Handle => {
    const present = known.get(key);
    if (present !== undefined) return present;
    const made = make();
    known.set(key, made);
    return made;
  };
  const either = (a: Handle, b: Handle): string => (a < b ? `${a} ${b}` : `${b} ${a}`);
  return {
    constant: (x) => e.constant(x),
    add: (a, b) => {
      if (a === zero) return b;
      return b === zero ? a : share(`+ ${either(a, b)}`, () => e.add(a, b));
    },
    sub: (a, b) => (b === zero ? a : share(`- ${a} ${b}`, () => e.sub(a, b))),
    mul: (a, b) => {
      if (a === one) return b;
      return b === one ? a : share(`* ${either(a, b)}`, () => e.mul(a, b));
    },
    div: (a, b) => (b === one ? a : share(`/ ${a} ${b}`, () => e.div(a, b))),
    neg: (a) => (a === zero ? a : share(`neg ${a}`, () => e.neg(a))),
    min: (a, b) => share(`min ${either(a, b)}`, () => e.min(a, b)),
    max: (a, b) => share(`max ${either(a, b)}`, () => e.max(a, b)),
    abs: (a) => share(`abs ${a}`, () => e.abs(a)),
    sqrt: (a) => share(`sqrt ${a}`, () => e.sqrt(a)),
    call: (kernel, inputs, outputs) => e.call(kernel, inputs, outputs),
  };
}
