// x^y = exp(y ln x), with ln x and the product carried to about 2^-68.
//
// That leaves less than 0.05 ulp of doubt before the last rounding, so a power that is a double (3^5,
// 10^22, 2^-1074, 0.25^0.5) comes out exactly. Special values are those of ECMAScript's `**`.
//
// Source: special values: ECMA-262, Number::exponentiate.

import { powerOfTwo } from './bits.ts';
import { productRemainder } from './exact.ts';
import { expOfSum } from './exponential.ts';
import { lnAsSum } from './logarithm.ts';

/** Below this size of the exponent e^x rounds to 1. */
const ONE_BELOW = powerOfTwo(-60);
const SCRATCH = new Float64Array(2);

/** x to the power y, within 1 ulp; NaN for a negative base with a fractional exponent and for (±1)^±Infinity. */
export function pow(x: number, y: number): number {
  if (y === 0) return 1;
  if (x !== x || y !== y) return NaN;
  const size = Math.abs(x);
  if (y === Infinity || y === -Infinity) {
    if (size === 1) return NaN;
    return size > 1 === y > 0 ? Infinity : 0;
  }
  const odd = Math.abs(y % 2) === 1;
  const negative = odd && (x < 0 || Object.is(x, -0));
  if (size === 0 || size === Infinity) {
    const magnitude = (size === 0) === y > 0 ? 0 : Infinity;
    return negative ? -magnitude : magnitude;
  }
  if (x < 0 && y % 1 !== 0) return NaN;
  const magnitude = powOfPositive(size, y);
  return negative ? -magnitude : magnitude;
}

function powOfPositive(x: number, y: number): number {
  if (x === 1) return 1;
  if (y === 1) return x;
  lnAsSum(x, SCRATCH);
  const high = y * SCRATCH[0];
  if (high > 710) return Infinity;
  if (high < -746) return 0;
  if (Math.abs(high) < ONE_BELOW) return 1;
  return expOfSum(high, productRemainder(y, SCRATCH[0], high) + y * SCRATCH[1]);
}
