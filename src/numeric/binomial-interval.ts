// The exact interval of a share of successes.
//
// Its ends are quantiles of beta distributions, found by halving. The distribution is the continued fraction of the
// regularized incomplete beta function in front of a binomial probability, which is computed without large terms that
// cancel: deviance and Stirling's error.
//
// Source: C. J. Clopper and E. S. Pearson, "The use of confidence or fiducial limits illustrated in the case of the
// binomial", Biometrika 26 (1934); C. Loader, "Fast and accurate computation of binomial probabilities" (2000).

import { exp } from './exponential.ts';
import { ln, log1p } from './logarithm.ts';

/** Halvings of 0..1 until nothing remains. */
const HALVINGS = 200;
const FRACTION_CAP = 100_000;
const TINY = 1e-300;

/** Lowest and highest probability at which k of n is not too unlikely, at a confidence of 0.95 unless given; 0 <= k <= n, n >= 1; off by less than 2e-15. */
export function binomialInterval(k: number, n: number, confidence = 0.95): { low: number; high: number } {
  const tail = (1 - confidence) / 2;
  return {
    low: k === 0 ? 0 : betaQuantile(k, n - k + 1, tail),
    high: k === n ? 1 : betaQuantile(k + 1, n - k, 1 - tail),
  };
}

/** x with I_x(a, b) = p, for whole a, b from 1. */
function betaQuantile(a: number, b: number, p: number): number {
  let low = 0;
  let high = 1;
  for (let i = 0; i < HALVINGS; i++) {
    // In the small end the halving goes by ratio, so that a tiny probability keeps its digits.
    const middle = low > 0 && high / low > 4 ? Math.sqrt(low * high) : (low + high) / 2;
    if (middle <= low || middle >= high) break;
    if (incompleteBeta(a, b, middle, 1 - middle) < p) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** I_x(a, b) for whole a, b from 1, y = 1 - x: the smaller of the two has all its digits. */
function incompleteBeta(a: number, b: number, x: number, y: number): number {
  if (b === 1) return power(a, x, y);
  // The fraction converges fast below the mean; beyond, its mirror image does.
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(b, a, y, x);
  return binomialProbability(a, a + b - 1, x, y) * y * betaFraction(a, b, x);
}

/** Continued fraction of the incomplete beta function, by Lentz's rule. */
function betaFraction(a: number, b: number, x: number): number {
  let c = 1;
  let d = 1 / nonZero(1 - ((a + b) * x) / (a + 1));
  let value = d;
  for (let m = 1; m < FRACTION_CAP; m++) {
    const even = (m * (b - m) * x) / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 / nonZero(1 + even * d);
    c = nonZero(1 + even / c);
    value *= d * c;
    const odd = (-(a + m) * (a + b + m) * x) / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 / nonZero(1 + odd * d);
    c = nonZero(1 + odd / c);
    value *= d * c;
    if (Math.abs(d * c - 1) <= Number.EPSILON) break;
  }
  return value;
}

function nonZero(x: number): number {
  return Math.abs(x) < TINY ? TINY : x;
}

/** p to the n-th, q = 1 - p. */
function power(n: number, p: number, q: number): number {
  return exp(n * (q < 0.5 ? log1p(-q) : ln(p)));
}

/** Probability of k successes of n at a probability p each, q = 1 - p. */
function binomialProbability(k: number, n: number, p: number, q: number): number {
  if (k === n) return power(n, p, q);
  const error = stirlingError(n) - stirlingError(k) - stirlingError(n - k);
  const apart = deviance(k, n * p) + deviance(n - k, n * q);
  return exp(error - apart) * Math.sqrt(n / (2 * Math.PI * k * (n - k)));
}

/** ln n! - ln(sqrt(2 pi n) (n / e)^n). */
function stirlingError(n: number): number {
  if (n > 15) return (1 / 12 - (1 / 360 - (1 / 1260 - 1 / 1680 / (n * n)) / (n * n)) / (n * n)) / n;
  let factorial = 1;
  for (let i = 2; i <= n; i++) factorial *= i;
  return ln(factorial) - (n + 0.5) * ln(n) + n - 0.5 * ln(2 * Math.PI);
}

/** x ln(x / m) + m - x, without cancellation where x is near m. */
function deviance(x: number, m: number): number {
  const apart = x - m;
  if (Math.abs(apart) >= 0.1 * (x + m)) return x * ln(x / m) + m - x;
  const v = apart / (x + m);
  let sum = apart * v;
  let term = 2 * x * v;
  for (let j = 1; j < 1000; j++) {
    term *= v * v;
    const next = sum + term / (2 * j + 1);
    if (next === sum) break;
    sum = next;
  }
  return sum;
}
