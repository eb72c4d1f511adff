// hypot without overflow or lost digits: scaled by a power of two, then one Newton correction with the
// exact residual of the squares.
//
// Source: C. F. Borges, "An improved algorithm for hypot(a, b)", arXiv:1904.09481 (2019).

import { biasedExponent, powerOfTwo } from './bits.ts';
import { productRemainder, sumRemainder } from './exact.ts';

/** Below this ratio of the sides the second term of the series is the whole correction. */
const NEGLIGIBLE_SQUARE = powerOfTwo(-30);

/** sqrt(a^2 + b^2), within 1 ulp; Infinity if either is infinite. */
export function hypot(a: number, b: number): number {
  let large = Math.abs(a);
  let small = Math.abs(b);
  if (large === Infinity || small === Infinity) return Infinity;
  if (large < small) {
    const kept = large;
    large = small;
    small = kept;
  }
  if (small === 0 || large !== large || small !== small) return large + small;
  const exponent = Math.min(Math.max(biasedExponent(large) - 1023, -1000), 1000);
  const scale = powerOfTwo(-exponent);
  large *= scale;
  small *= scale;
  if (small < large * NEGLIGIBLE_SQUARE) return (large + 0.5 * small * (small / large)) * powerOfTwo(exponent);

  const largeSquared = large * large;
  const smallSquared = small * small;
  const sum = largeSquared + smallSquared;
  const root = Math.sqrt(sum);
  const rootSquared = root * root;
  const residual =
    sum -
    rootSquared -
    productRemainder(root, root, rootSquared) +
    (sumRemainder(largeSquared, smallSquared, sum) +
      productRemainder(large, large, largeSquared) +
      productRemainder(small, small, smallSquared));
  return (root + residual / (2 * root)) * powerOfTwo(exponent);
}
