// exp and expm1 by tables of 2^(j/32) and a short Taylor series.
//
// x = (32 k + j) (ln 2 / 32) + r with |r| <= ln 2 / 64, so exp(x) = 2^k 2^(j/32) exp(r). The table holds
// 2^(j/32) to about 107 bits, and exp(r) - 1 is at most 0.011: the rounding of the last addition is
// nearly all of the deviation (0.54 ulp at most).
//
// Source: P. T. P. Tang, "Table-driven implementation of the exponential function in IEEE
// floating-point arithmetic", ACM TOMS 15 (1989).

import { powerOfTwo, scaleByPowerOfTwo } from './bits.ts';
import { sumRemainder } from './exact.ts';
import { EXP_TABLE } from './table.ts';

/** ln 2 / 32 in two parts; the first has 36 bits, so its product with any step number is exact. */
const STEP_HIGH = 0.021660849392446835;
const STEP_LOW = 5.145609244655338e-14;
const STEPS_PER_UNIT = 46.16624130844683;

/** Added and taken away again, 1.5 2^52 leaves the nearest whole number (a third of the time of Math.round). */
const ROUNDER = 1.5 * powerOfTwo(52);

/** Above this exp(x) is beyond the largest double; below the other it rounds to 0. */
const OVERFLOW = 709.79;
const UNDERFLOW = -745.2;
/** Below this e^x - 1 rounds to x. */
const TINY = powerOfTwo(-54);

/** e^x, within 1 ulp. */
export function exp(x: number): number {
  return expOfSum(x, 0);
}

/** e^(high + low), where low is at most about an ulp of high. */
export function expOfSum(high: number, low: number): number {
  if (high !== high) return NaN;
  if (high > OVERFLOW) return Infinity;
  if (high < UNDERFLOW) return 0;
  const step = high * STEPS_PER_UNIT + ROUNDER - ROUNDER;
  const rest = high - step * STEP_HIGH - step * STEP_LOW + low;
  const j = step & 31;
  const table = EXP_TABLE[2 * j];
  return scaleByPowerOfTwo(table + (EXP_TABLE[2 * j + 1] + table * expm1Short(rest)), (step - j) / 32);
}

/** e^x - 1 without cancellation near 0, within 1 ulp. */
export function expm1(x: number): number {
  if (x > 40) return exp(x);
  if (x < -40) return -1;
  if (Math.abs(x) < 0.25) return Math.abs(x) < TINY ? x : expm1Series(x);
  if (x !== x) return NaN;
  const step = x * STEPS_PER_UNIT + ROUNDER - ROUNDER;
  const rest = x - step * STEP_HIGH - step * STEP_LOW;
  const j = step & 31;
  const table = EXP_TABLE[2 * j];
  const scale = powerOfTwo((step - j) / 32);
  const leading = table * scale;
  const trailing = (EXP_TABLE[2 * j + 1] + table * expm1Short(rest)) * scale;
  const difference = leading - 1;
  return difference + (sumRemainder(leading, -1, difference) + trailing);
}

/** e^r - 1 for |r| <= 0.011; the first term left out is below 4e-18. */
function expm1Short(r: number): number {
  return r + r * r * (1 / 2 + r * (1 / 6 + r * (1 / 24 + r * (1 / 120 + r * (1 / 720)))));
}

/** e^x - 1 for |x| < 0.25; the first term left out is below 2e-19 x. */
function expm1Series(x: number): number {
  const tail =
    1 / 6 +
    x *
      (1 / 24 +
        x *
          (1 / 120 +
            x *
              (1 / 720 +
                x *
                  (1 / 5040 +
                    x *
                      (1 / 40320 +
                        x *
                          (1 / 362880 +
                            x * (1 / 3628800 + x * (1 / 39916800 + x * (1 / 479001600 + x * (1 / 6227020800))))))))));
  return x + x * x * (1 / 2 + x * tail);
}
