// atan by a table of atan(j/16) and the addition theorem.
//
// For |x| <= 1: atan x = atan c + atan((x - c) / (1 + c x)), c = j/16 next to x; for |x| > 1 the same of
// 1/x, without forming it: pi/2 - atan c - atan((1 - c x) / (x + c)). The argument left is at most 1/32.
//
// Source: the addition theorem; table method as in J.-M. Muller, Elementary Functions, 3rd ed., ch. 4.

import { powerOfTwo } from './bits.ts';
import { productRemainder, sumRemainder } from './exact.ts';
import { ATAN_TABLE } from './table.ts';

const HALF_PI_HIGH = 1.5707963267948966;
const HALF_PI_LOW = 6.123233995736766e-17;
/** Below this atan x rounds to x; beyond the other to pi/2. */
const TINY = powerOfTwo(-28);
const HUGE = powerOfTwo(60);

/** Arc tangent in rad, within 1 ulp. */
export function atan(x: number): number {
  const size = Math.abs(x);
  if (size !== size || size < TINY) return x;
  const value = size <= 1 ? atanWithinOne(size) : atanBeyondOne(size);
  return x < 0 ? -value : value;
}

function atanWithinOne(x: number): number {
  const j = Math.round(x * 16);
  const c = j / 16;
  const cx = c * x;
  const q = 1 + cx;
  const t = (x - c) / q;
  const product = t * q;
  const qLow = sumRemainder(1, cx, q) + productRemainder(c, x, cx);
  const tLow = (x - c - product - productRemainder(t, q, product) - t * qLow) / q;
  const lead = ATAN_TABLE[2 * j];
  const sum = lead + t;
  return sum + (sumRemainder(lead, t, sum) + (tLow + atanTail(t) + ATAN_TABLE[2 * j + 1]));
}

function atanBeyondOne(x: number): number {
  if (x > HUGE) return HALF_PI_HIGH;
  const j = Math.round(16 / x);
  const c = j / 16;
  const product = c * x;
  const t = (1 - product - productRemainder(c, x, product)) / (x + c);
  const lead = HALF_PI_HIGH - ATAN_TABLE[2 * j];
  const leadLow = HALF_PI_HIGH - lead - ATAN_TABLE[2 * j] + (HALF_PI_LOW - ATAN_TABLE[2 * j + 1]);
  return lead + (leadLow - atanTail(t) - t);
}

/** atan t - t for |t| <= 1/32; the first term left out is below 1e-19 t. */
function atanTail(t: number): number {
  const z = t * t;
  return -t * z * (1 / 3 - z * (1 / 5 - z * (1 / 7 - z * (1 / 9 - z * (1 / 11)))));
}
