// ln, log10 and log1p, and ln x as a sum of two doubles for pow.
//
// x = 2^e m with m in [sqrt(1/2), sqrt 2), c = j/64 the table point next to m, and
// log x = e log 2 + log c + 2 artanh(s), s = (m - c) / (m + c), |s| < 0.0057. The leading parts of
// log 2 and of the table are multiples of 2^-42, so e log 2 + log c loses nothing, and what is rounded
// at full size is the last addition alone; so log10 of a power of ten is exact. Next to 1, where that
// sum would be as small as its last term, the series of log(1 + d) takes over.
//
// Source: P. T. P. Tang, "Table-driven implementation of the logarithm function in IEEE
// floating-point arithmetic", ACM TOMS 16 (1990).

import { biasedExponent, powerOfTwo } from './bits.ts';
import { productRemainder, sumRemainder } from './exact.ts';
import { LN_TABLE, LN_TABLE_FIRST, LOG10_TABLE } from './table.ts';

const LN2_HIGH = 0.6931471805598903;
const LN2_LOW = 5.497923018708371e-14;
const LOG10_2_HIGH = 0.3010299956640665;
const LOG10_2_LOW = -8.532344317057107e-14;
/** 1 / ln 10 less its leading part, which is Math.LOG10E. */
const PER_LN10_LOW = 1.098319650216765e-17;
const TINY = powerOfTwo(-54);
const LEAST_NORMAL = powerOfTwo(-1022);
const TO_NORMAL = powerOfTwo(54);
/** Half width of the interval around 1 that has a series of its own. */
const NEAR_ONE = 1 / 16;
const SCRATCH = new Float64Array(2);

/** Natural logarithm, within 1 ulp; -Infinity at 0, NaN below. */
export function ln(x: number): number {
  const d = x - 1;
  if (d < NEAR_ONE && d > -NEAR_ONE) return d + nearOneTail(d);
  if (!(x >= LEAST_NORMAL && x < Infinity)) return outsideNormal(x, Math.LN2, ln);
  let e = biasedExponent(x) - 1023;
  let m = x * powerOfTwo(-e);
  if (m > Math.SQRT2) {
    m *= 0.5;
    e += 1;
  }
  const j = (m * 64 + 0.5) | 0;
  const s = (m - j / 64) / (m + j / 64);
  const row = 2 * (j - LN_TABLE_FIRST);
  return e * LN2_HIGH + LN_TABLE[row] + (2 * s + (2 * s * artanhTail(s) + (e * LN2_LOW + LN_TABLE[row + 1])));
}

/** Logarithm to base ten, within 1 ulp and exact for every power of ten that is a double. */
export function log10(x: number): number {
  const d = x - 1;
  if (d < NEAR_ONE && d > -NEAR_ONE) {
    const product = d * Math.LOG10E;
    const rest = productRemainder(d, Math.LOG10E, product) + d * PER_LN10_LOW;
    return product + (nearOneTail(d) * Math.LOG10E + rest);
  }
  if (!(x >= LEAST_NORMAL && x < Infinity)) return outsideNormal(x, LOG10_2_HIGH + LOG10_2_LOW, log10);
  let e = biasedExponent(x) - 1023;
  let m = x * powerOfTwo(-e);
  if (m > Math.SQRT2) {
    m *= 0.5;
    e += 1;
  }
  const j = (m * 64 + 0.5) | 0;
  const s = (m - j / 64) / (m + j / 64);
  const row = 2 * (j - LN_TABLE_FIRST);
  const small = 2 * s * Math.LOG10E;
  return (
    e * LOG10_2_HIGH + LOG10_TABLE[row] + (small + (small * artanhTail(s) + (e * LOG10_2_LOW + LOG10_TABLE[row + 1])))
  );
}

/** ln(1 + x) without cancellation near 0, within 1 ulp; -Infinity at -1, NaN below. */
export function log1p(x: number): number {
  if (x < NEAR_ONE && x > -NEAR_ONE) return Math.abs(x) < TINY ? x : x + nearOneTail(x);
  if (!(x > -1)) return x === -1 ? -Infinity : NaN;
  if (x === Infinity) return Infinity;
  const u = 1 + x;
  lnAsSum(u, SCRATCH);
  return SCRATCH[0] + (SCRATCH[1] + sumRemainder(1, x, u) / u);
}

/** Writes ln x, 0 < x < Infinity, into out as leading part and remainder, good to about 2^-68 of itself. */
export function lnAsSum(x: number, out: Float64Array): void {
  let e = -1023;
  if (x < LEAST_NORMAL) {
    x *= TO_NORMAL;
    e = -1077;
  }
  const biased = biasedExponent(x);
  e += biased;
  let m = x * powerOfTwo(1023 - biased);
  if (m > Math.SQRT2) {
    m *= 0.5;
    e += 1;
  }
  const j = (m * 64 + 0.5) | 0;
  const c = j / 64;

  const d = m - c;
  const q = m + c;
  const s = d / q;
  const product = s * q;
  const sLow = (d - product - productRemainder(s, q, product) - s * sumRemainder(m, c, q)) / q;

  const row = 2 * (j - LN_TABLE_FIRST);
  const base = e * LN2_HIGH + LN_TABLE[row];
  const leading = base + 2 * s;
  const trailing = base - leading + 2 * s + (e * LN2_LOW + LN_TABLE[row + 1] + 2 * (sLow + s * artanhTail(s)));
  const high = leading + trailing;
  out[0] = high;
  out[1] = leading - high + trailing;
}

/** The logarithm of what is not a normal positive number; `log2` is that of 2 in the same base. */
function outsideNormal(x: number, log2: number, log: (x: number) => number): number {
  if (x > 0) return x === Infinity ? x : log(x * TO_NORMAL) - 54 * log2;
  return x === 0 ? -Infinity : NaN;
}

/** artanh(s) / s - 1 for |s| < 0.006; the first term left out is below 1e-23. */
function artanhTail(s: number): number {
  const z = s * s;
  return z * (1 / 3 + z * (1 / 5 + z * (1 / 7 + z * (1 / 9))));
}

/** ln(1 + d) - d for |d| < 1/16; the first term left out is below 1e-18 d. */
function nearOneTail(d: number): number {
  const z = d * d;
  const odd = 1 / 3 + z * (1 / 5 + z * (1 / 7 + z * (1 / 9 + z * (1 / 11 + z * (1 / 13 + z * (1 / 15))))));
  const even = 1 / 4 + z * (1 / 6 + z * (1 / 8 + z * (1 / 10 + z * (1 / 12 + z * (1 / 14)))));
  return z * (d * odd - z * even) - 0.5 * z;
}
