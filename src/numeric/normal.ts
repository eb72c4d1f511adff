// The standard normal distribution and its quantile.

import { exp } from './exponential.ts';
import { ln } from './logarithm.ts';

const A = [
  3.3871328727963665, 133.14166789178438, 1971.5909503065513, 13731.69376550946, 45921.95393154987, 67265.7709270087,
  33430.57558358813, 2509.0809287301227,
];
const B = [
  1, 42.31333070160091, 687.1870074920579, 5394.196021424751, 21213.794301586597, 39307.89580009271, 28729.085735721943,
  5226.495278852854,
];
const C = [
  1.4234371107496835, 4.630337846156546, 5.769497221460691, 3.6478483247632045, 1.2704582524523684, 0.2417807251774506,
  0.022723844989269184, 0.0007745450142783414,
];
const D = [
  1, 2.053191626637759, 1.6763848301838038, 0.6897673349851, 0.14810397642748008, 0.015198666563616457,
  0.0005475938084995345, 1.0507500716444169e-9,
];
const E = [
  6.657904643501103, 5.463784911164114, 1.7848265399172913, 0.29656057182850487, 0.026532189526576124,
  0.0012426609473880784, 2.7115555687434876e-5, 2.0103343992922881e-7,
];
const F = [
  1, 0.599832206555888, 0.1369298809227358, 0.014875361290850615, 0.0007868691311456133, 1.8463183175100548e-5,
  1.421511758316446e-7, 2.0442631033899397e-15,
];

/**
 * The number below which a share p in 0..1 of a standard normal lies; relative error about 1e-15.
 * Source: M. J. Wichura, Algorithm AS 241 (PPND16), Applied Statistics 37 (1988).
 */
export function normalQuantile(p: number): number {
  const q = p - 0.5;
  if (Math.abs(q) <= 0.425) return q * ratio(A, B, 0.180625 - q * q);
  const tail = Math.sqrt(-ln(q < 0 ? p : 1 - p));
  const z = tail <= 5 ? ratio(C, D, tail - 1.6) : ratio(E, F, tail - 5);
  return q < 0 ? -z : z;
}

/**
 * The share of a standard normal below x, for |x| up to 6; error below 1e-15.
 * Source: G. Marsaglia, "Evaluating the normal distribution", Journal of Statistical Software 11 (2004), the series of odd powers.
 */
export function normalShare(x: number): number {
  let term = x;
  let sum = x;
  for (let n = 3; Math.abs(term) > Number.EPSILON * 0.1 * Math.abs(sum); n += 2) {
    term *= (x * x) / n;
    sum += term;
  }
  return 0.5 + sum * ROOT * exp(-0.5 * x * x);
}

/** 1 / sqrt(2 pi). */
const ROOT = 0.3989422804014327;

function ratio(numerator: readonly number[], denominator: readonly number[], x: number): number {
  let above = 0;
  let below = 0;
  for (let i = 7; i >= 0; i--) {
    above = above * x + numerator[i];
    below = below * x + denominator[i];
  }
  return above / below;
}
