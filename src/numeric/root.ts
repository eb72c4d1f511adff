// A root of a continuous function between two points where its signs differ.
//
// The bracket always holds a sign change and shrinks at every step: inverse quadratic interpolation
// where three points show that it is safe, bisection otherwise.
//
// Source: T. R. Chandrupatla, "A new hybrid quadratic/bisection algorithm for finding the zero of a
// nonlinear function without using derivatives", Advances in Engineering Software 28 (1997).

import { powerOfTwo } from './bits.ts';

/** `left domain`: the function gave NaN; `not bracketed`: the signs at the ends are equal. */
type RootStatus = 'solved' | 'not bracketed' | 'left domain' | 'cap reached';

interface Root {
  /** The best point found, NaN unless there was a bracket. */
  readonly value: number;
  readonly status: RootStatus;
  readonly iterations: number;
  /** The function at `value`. */
  readonly residual: number;
}

interface RootOptions {
  /** Half width of the final bracket, in the unit of x, beside two ulp of x. */
  readonly tolerance: number;
  readonly cap: number;
}

const DEFAULT_TOLERANCE = powerOfTwo(-70);
const DEFAULT_CAP = 200;

/** A bracket that is narrowed step by step by whoever computes the function; used again and again. */
export interface Narrowing {
  /** Begins between two places where the function is known; without a change of sign it is over at once. */
  start(low: number, atLow: number, high: number, atHigh: number, options?: Partial<RootOptions>): void;
  /** null while the function is wanted at `next`. */
  readonly status: RootStatus | null;
  readonly next: number;
  /** Takes the function at `next`. */
  take(fx: number): void;
  readonly root: Root;
}

/** A bracket to narrow. `start` throws RangeError where an end is not finite or the tolerance negative. */
export function createNarrowing(): Narrowing {
  // a is the newest point, b the other end of the bracket, c the point that a or b has replaced.
  let [a, fa, b, fb] = [NaN, NaN, NaN, NaN];
  let [next, best, residual] = [NaN, NaN, NaN];
  let [tolerance, cap, iterations] = [0, 0, 0];
  let status: RootStatus | null = 'not bracketed';
  const end = (how: RootStatus, x: number, fx: number): void => {
    status = how;
    best = x;
    residual = fx;
  };
  return {
    get status() {
      return status;
    },
    get next() {
      return next;
    },
    get root() {
      return { value: best, status: status ?? 'cap reached', iterations, residual };
    },
    start(low, atLow, high, atHigh, options = {}) {
      tolerance = options.tolerance ?? Math.max(Math.abs(low), Math.abs(high)) * DEFAULT_TOLERANCE;
      cap = options.cap ?? DEFAULT_CAP;
      if (!Number.isFinite(low) || !Number.isFinite(high)) throw new RangeError('the ends of a bracket must be finite');
      if (!(tolerance >= 0)) throw new RangeError('the tolerance of a bracket must not be negative');
      [a, fa, b, fb] = [low, atLow, high, atHigh];
      iterations = 0;
      status = null;
      if (fa !== fa || fb !== fb) end('left domain', NaN, NaN);
      else if (fa === 0) end('solved', a, fa);
      else if (fb === 0) end('solved', b, fb);
      else if (fa > 0 === fb > 0) end('not bracketed', NaN, NaN);
      else next = a + 0.5 * (b - a);
    },
    take(fx) {
      iterations++;
      if (fx !== fx) {
        end('left domain', NaN, NaN);
        return;
      }
      let c = a;
      let fc = fa;
      if (fx > 0 !== fa > 0) {
        c = b;
        fc = fb;
        b = a;
        fb = fa;
      }
      a = next;
      fa = fx;

      best = Math.abs(fa) < Math.abs(fb) ? a : b;
      residual = best === a ? fa : fb;
      const width = Math.abs(b - a);
      const wanted = 2 * Number.EPSILON * Math.abs(best) + tolerance;
      if (residual === 0 || width <= 2 * wanted) status = 'solved';
      else if (iterations >= cap) status = 'cap reached';

      const xi = (a - b) / (c - b);
      const phi = (fa - fb) / (fc - fb);
      let fraction = 0.5;
      if (phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi) {
        const inverse = (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb));
        const least = wanted / width;
        if (inverse === inverse) fraction = Math.min(Math.max(inverse, least), 1 - least);
      }
      next = a + fraction * (b - a);
    },
  };
}

/** One for each solve that another one's function may begin. */
const narrowings: Narrowing[] = [];
let depth = 0;

/** Solves f(x) = 0 between low and high to `tolerance` (left out: 2^-70 of the larger end); a jump across 0 is found as if it were a root. */
export function solveBracketed(
  f: (x: number) => number,
  low: number,
  high: number,
  options: Partial<RootOptions> = {},
): Root {
  const narrowing = (narrowings[depth] ??= createNarrowing());
  depth++;
  try {
    narrowing.start(low, f(low), high, f(high), options);
    while (narrowing.status === null) narrowing.take(f(narrowing.next));
    return narrowing.root;
  } finally {
    depth--;
  }
}
