// sin, cos and tan in radians: the angle reduced to [-pi/4, pi/4], then Taylor series whose leading
// terms are kept apart, so that only the last addition rounds at full size.
//
// Every finite angle is reduced with its own full precision (reduction.ts).
//
// Source: the splitting of 1 - x^2/2 as in W. Kahan's lectures on elementary functions.

import { powerOfTwo } from './bits.ts';
import { productRemainder } from './exact.ts';
import { reduceAngle } from './reduction.ts';

const QUARTER_PI = 0.7853981633974483;
/** Below this sin x and tan x round to x. */
const TINY = powerOfTwo(-27);
const ANGLE = new Float64Array(2);

/** Sine of an angle in rad, within 1 ulp; NaN for an infinite angle. */
export function sin(x: number): number {
  if (Math.abs(x) < TINY) return x;
  if (Math.abs(x) <= QUARTER_PI) return x + sineTail(x, 0);
  if (!(Math.abs(x) < Infinity)) return NaN;
  const quadrant = reduceAngle(x, ANGLE);
  return sineInQuadrant(quadrant, ANGLE[0], ANGLE[1]);
}

/** Cosine of an angle in rad, within 1 ulp; NaN for an infinite angle. */
export function cos(x: number): number {
  if (Math.abs(x) <= QUARTER_PI) return cosineLead(x) + cosineTail(x, 0);
  if (!(Math.abs(x) < Infinity)) return NaN;
  const quadrant = reduceAngle(x, ANGLE);
  return sineInQuadrant((quadrant + 1) & 3, ANGLE[0], ANGLE[1]);
}

/** Tangent of an angle in rad, within 1 ulp; NaN for an infinite angle. */
export function tan(x: number): number {
  if (Math.abs(x) < TINY) return x;
  if (!(Math.abs(x) < Infinity)) return NaN;
  let odd = false;
  let r = x;
  let rLow = 0;
  if (Math.abs(x) > QUARTER_PI) {
    odd = (reduceAngle(x, ANGLE) & 1) === 1;
    r = ANGLE[0];
    rLow = ANGLE[1];
  }
  const sine = r + sineTail(r, rLow);
  const sineLow = r - sine + sineTail(r, rLow);
  const cosine = cosineLead(r) + cosineTail(r, rLow);
  const cosineLow = cosineLead(r) - cosine + cosineTail(r, rLow);
  return odd ? -quotient(cosine, cosineLow, sine, sineLow) : quotient(sine, sineLow, cosine, cosineLow);
}

function sineInQuadrant(quadrant: number, r: number, rLow: number): number {
  const value = quadrant & 1 ? cosineLead(r) + cosineTail(r, rLow) : r + sineTail(r, rLow);
  return quadrant & 2 ? -value : value;
}

/** sin(x + low) - x for |x| <= pi/4 and low below an ulp of x. */
function sineTail(x: number, low: number): number {
  const z = x * x;
  const series =
    z *
    (1 / 120 -
      z *
        (1 / 5040 -
          z *
            (1 / 362880 -
              z * (1 / 39916800 - z * (1 / 6227020800 - z * (1 / 1307674368000 - z * (1 / 355687428096000)))))));
  return x * z * (series - 1 / 6) + low * (1 - 0.5 * z);
}

/** 1 - x^2/2 rounded. */
function cosineLead(x: number): number {
  return 1 - 0.5 * (x * x);
}

/** cos(x + low) - cosineLead(x) for |x| <= pi/4. */
function cosineTail(x: number, low: number): number {
  const z = x * x;
  const half = 0.5 * z;
  const lead = 1 - half;
  const series =
    z *
    z *
    (1 / 24 -
      z *
        (1 / 720 -
          z *
            (1 / 40320 - z * (1 / 3628800 - z * (1 / 479001600 - z * (1 / 87178291200 - z * (1 / 20922789888000)))))));
  return 1 - lead - half + (series - x * low);
}

/** (a + aLow) / (b + bLow), rounded once but for terms of second order. */
function quotient(a: number, aLow: number, b: number, bLow: number): number {
  const q = a / b;
  const product = q * b;
  return q + (a - product - productRemainder(q, b, product) + aLow - q * bLow) / b;
}
