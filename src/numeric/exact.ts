// Rounding left over from one addition or product, as a double of its own.
//
// Source: T. J. Dekker, "A floating-point technique for extending the available precision",
// Numerische Mathematik 18 (1971); D. E. Knuth, The Art of Computer Programming 2, 4.2.2.

/** 2^27 + 1 splits 53 bits into two halves whose products are exact. */
const SPLITTER = 134217729;

/** a + b - sum, exactly, where sum is the rounded a + b. */
export function sumRemainder(a: number, b: number, sum: number): number {
  const bRounded = sum - a;
  return a - (sum - bRounded) + (b - bRounded);
}

/** a b - product, exactly, where product is the rounded a b; |a| and |b| below 1e300, the product far from underflow. */
export function productRemainder(a: number, b: number, product: number): number {
  const aWide = a * SPLITTER;
  const aHigh = aWide - (aWide - a);
  const aLow = a - aHigh;
  const bWide = b * SPLITTER;
  const bHigh = bWide - (bWide - b);
  const bLow = b - bHigh;
  return aLow * bLow - (product - aHigh * bHigh - aLow * bHigh - aHigh * bLow);
}
