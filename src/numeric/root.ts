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

/** Solves f(x) = 0 between low and high to `tolerance` (left out: 2^-70 of the larger end); a jump across 0 is found as if it were a root. */
export function solveBracketed(
  f: (x: number) => number,
  low: number,
  high: number,
  options: Partial<RootOptions> = {},
): Root {
  const tolerance = options.tolerance ?? Math.max(Math.abs(low), Math.abs(high)) * DEFAULT_TOLERANCE;
  const cap = options.cap ?? 200;
  if (!Number.isFinite(low) || !Number.isFinite(high)) throw new RangeError('solveBracketed: the ends must be finite');
  if (!(tolerance >= 0)) throw new RangeError('solveBracketed: the tolerance must not be negative');

  // a is the newest point, b the other end of the bracket, c the point that a or b has replaced.
  let a = low;
  let fa = f(a);
  let b = high;
  let fb = f(b);
  if (fa !== fa || fb !== fb) return { value: NaN, status: 'left domain', iterations: 0, residual: NaN };
  if (fa === 0) return { value: a, status: 'solved', iterations: 0, residual: fa };
  if (fb === 0) return { value: b, status: 'solved', iterations: 0, residual: fb };
  if (fa > 0 === fb > 0) return { value: NaN, status: 'not bracketed', iterations: 0, residual: NaN };
  let fraction = 0.5;
  for (let iterations = 1; ; iterations++) {
    const x = a + fraction * (b - a);
    const fx = f(x);
    if (fx !== fx) return { value: NaN, status: 'left domain', iterations, residual: NaN };
    let c = a;
    let fc = fa;
    if (fx > 0 !== fa > 0) {
      c = b;
      fc = fb;
      b = a;
      fb = fa;
    }
    a = x;
    fa = fx;

    const best = Math.abs(fa) < Math.abs(fb) ? a : b;
    const residual = best === a ? fa : fb;
    const width = Math.abs(b - a);
    const wanted = 2 * Number.EPSILON * Math.abs(best) + tolerance;
    if (residual === 0 || width <= 2 * wanted) return { value: best, status: 'solved', iterations, residual };
    if (iterations >= cap) return { value: best, status: 'cap reached', iterations, residual };

    const xi = (a - b) / (c - b);
    const phi = (fa - fb) / (fc - fb);
    fraction = 0.5;
    if (phi * phi < xi && (1 - phi) * (1 - phi) < 1 - xi) {
      const inverse = (fa / (fb - fa)) * (fc / (fb - fc)) + ((c - a) / (b - a)) * (fa / (fc - fa)) * (fb / (fc - fb));
      const least = wanted / width;
      if (inverse === inverse) fraction = Math.min(Math.max(inverse, least), 1 - least);
    }
  }
}
