// ln, log10 and log1p from one kernel that gives ln x as a sum of two doubles.
//
// x = 2^e m with m in [sqrt(1/2), sqrt 2), c = j/64 the table point next to m, and
// ln x = e ln 2 + ln c + 2 artanh(s), s = (m - c) / (m + c), |s| < 0.0057. s is carried to twice the
// working precision and the table too, so the sum is good to about 2^-68 of itself; that makes log10 of
// a power of ten exact and leaves pow the digits it needs.
//
// Source: P. T. P. Tang, "Table-driven implementation of the logarithm function in IEEE
// floating-point arithmetic", ACM TOMS 16 (1990); the quotient form as in R. P. Brent's artanh series.

import { biasedExponent, powerOfTwo, significand } from './bits.ts';
import { productRemainder, sumRemainder } from './exact.ts';
import { LN_TABLE, LN_TABLE_FIRST } from './table.ts';

/** ln 2 in two parts; the first is a multiple of 2^-42. */
export const LN2_HIGH = 0.6931471805598903;
const LN2_LOW = 5.497923018708371e-14;
/** 1 / ln 10 less its leading part, which is Math.LOG10E. */
const PER_LN10_LOW = 1.098319650216765e-17;

const TINY = powerOfTwo(-54);
const LEAST_NORMAL = powerOfTwo(-1022);
const TO_NORMAL = powerOfTwo(54);
const SCRATCH = new Float64Array(2);

/** Natural logarithm, within 1 ulp; -Infinity at 0, NaN below. */
export function ln(x: number): number {
  if (!(x > 0)) return x === 0 ? -Infinity : NaN;
  if (x === Infinity) return Infinity;
  lnAsSum(x, SCRATCH);
  return SCRATCH[0];
}

/** Logarithm to base ten, within 1 ulp and exact for every power of ten that is a double. */
export function log10(x: number): number {
  if (!(x > 0)) return x === 0 ? -Infinity : NaN;
  if (x === Infinity) return Infinity;
  lnAsSum(x, SCRATCH);
  const high = SCRATCH[0];
  const product = high * Math.LOG10E;
  return product + (productRemainder(high, Math.LOG10E, product) + high * PER_LN10_LOW + SCRATCH[1] * Math.LOG10E);
}

/** ln(1 + x) without cancellation near 0, within 1 ulp; -Infinity at -1, NaN below. */
export function log1p(x: number): number {
  if (Math.abs(x) < TINY) return x;
  if (!(x > -1)) return x === -1 ? -Infinity : NaN;
  if (x === Infinity) return Infinity;
  const u = 1 + x;
  lnAsSum(u, SCRATCH);
  return SCRATCH[0] + (SCRATCH[1] + sumRemainder(1, x, u) / u);
}

/** Writes ln x, 0 < x < Infinity, into out as leading part and remainder. */
export function lnAsSum(x: number, out: Float64Array): void {
  let e = -1023;
  if (x < LEAST_NORMAL) {
    x *= TO_NORMAL;
    e -= 54;
  }
  e += biasedExponent(x);
  let m = significand(x);
  if (m > Math.SQRT2) {
    m *= 0.5;
    e += 1;
  }
  const j = Math.round(m * 64);
  const c = j / 64;

  const d = m - c;
  const q = m + c;
  const s = d / q;
  const product = s * q;
  const sLow = (d - product - productRemainder(s, q, product) - s * sumRemainder(m, c, q)) / q;
  const z = s * s;
  const series = z * (1 / 3 + z * (1 / 5 + z * (1 / 7 + z * (1 / 9))));

  // The table's and ln 2's leading parts are multiples of 2^-42 below 2^10: their sum is exact.
  const row = 2 * (j - LN_TABLE_FIRST);
  const base = e * LN2_HIGH + LN_TABLE[row];
  const leading = base + 2 * s;
  const trailing = base - leading + 2 * s + (e * LN2_LOW + LN_TABLE[row + 1] + 2 * (sLow + s * series));
  const high = leading + trailing;
  out[0] = high;
  out[1] = leading - high + trailing;
}
