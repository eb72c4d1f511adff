// Dimensions as exponents of volt, ampere, second, kelvin and metre: the base in which a circuit's
// quantities have small exponents (an ohm is V/A, a farad A·s/V). Half powers occur (V/√Hz, √V).

/** Exponents of V, A, s, K, m, in this order. */
export type Dimension = readonly [volt: number, ampere: number, second: number, kelvin: number, metre: number];

export const DIMENSIONLESS: Dimension = [0, 0, 0, 0, 0];

/** Exponents that differ by less are the same: 1/3 + 1/3 + 1/3 is 1 whatever the floats say. */
const SAME_EXPONENT = 1e-9;

/** The dimension of a product. */
export function multiplyDimensions(a: Dimension, b: Dimension): Dimension {
  return [a[0] + b[0], a[1] + b[1], a[2] + b[2], a[3] + b[3], a[4] + b[4]];
}

/** The dimension of a quotient. */
export function divideDimensions(a: Dimension, b: Dimension): Dimension {
  return [a[0] - b[0], a[1] - b[1], a[2] - b[2], a[3] - b[3], a[4] - b[4]];
}

/** The dimension of a power; `n` is any real exponent. */
export function raiseDimension(a: Dimension, n: number): Dimension {
  return [a[0] * n, a[1] * n, a[2] * n, a[3] * n, a[4] * n];
}

/** Whether two dimensions are equal, up to the rounding of fractional exponents. */
export function sameDimension(a: Dimension, b: Dimension): boolean {
  return a.every((exponent, i) => Math.abs(exponent - b[i]) < SAME_EXPONENT);
}
