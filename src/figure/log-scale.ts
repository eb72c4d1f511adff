// Logarithms for positions on a drawing. They never become a number that is shown, and figures stand
// above no folder that has exact ones.

/** log2 of a positive number to about 1e-15; NaN below 0, -Infinity at 0. */
export function log2(value: number): number {
  if (value === 0) return -Infinity;
  if (!(value > 0)) return NaN;
  if (value === Infinity) return Infinity;
  let exponent = 0;
  let mantissa = value;
  while (mantissa > Math.SQRT2) {
    mantissa /= 2;
    exponent++;
  }
  while (mantissa < Math.SQRT1_2) {
    mantissa *= 2;
    exponent--;
  }
  // ln m = 2 artanh z with z = (m - 1) / (m + 1), |z| < 0.172: 11 terms suffice.
  const z = (mantissa - 1) / (mantissa + 1);
  const square = z * z;
  let sum = 0;
  for (let n = 21; n > 0; n -= 2) sum = sum * square + 1 / n;
  return exponent + (2 * z * sum) / Math.LN2;
}
