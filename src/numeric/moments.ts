// Count, mean and sum of squared deviations of many values side by side, built up from columns.
//
// Each column is reduced on its own (mean first, deviations from it second, and the mean corrected by what they leave) and then merged, so that the result depends on
// how the sample was cut into columns and in which order they were added, and on nothing else.
// Source: T. F. Chan, G. H. Golub and R. J. LeVeque, "Algorithms for computing the sample variance", The American
// Statistician 37 (1983).

export interface Moments {
  /** Finite numbers counted, by value. */
  readonly count: Float64Array;
  readonly mean: Float64Array;
  /** Sum of squared deviations from the mean. */
  readonly m2: Float64Array;
}

/** Moments of nothing, for so many values. */
export function createMoments(values: number): Moments {
  return { count: new Float64Array(values), mean: new Float64Array(values), m2: new Float64Array(values) };
}

/** Adds column[0 .. count) to value k; numbers that are not finite and those marked in `skip` are not counted. */
export function addColumn(moments: Moments, k: number, column: Float64Array, count: number, skip: Uint8Array): void {
  let n = 0;
  let sum = 0;
  for (let i = 0; i < count; i++) {
    if (skip[i] === 1 || !isFinite(column[i])) continue;
    n++;
    sum += column[i];
  }
  if (n === 0) return;
  const mean = sum / n;
  let m2 = 0;
  let left = 0;
  for (let i = 0; i < count; i++) {
    if (skip[i] === 1 || !isFinite(column[i])) continue;
    const off = column[i] - mean;
    m2 += off * off;
    left += off;
  }
  merge(moments, k, n, mean + left / n, m2 - (left * left) / n);
}

/** Adds the moments of what follows, value by value. */
export function addMoments(sum: Moments, next: Moments): void {
  for (let k = 0; k < sum.count.length; k++) {
    if (next.count[k] > 0) merge(sum, k, next.count[k], next.mean[k], next.m2[k]);
  }
}

function merge({ count, mean, m2 }: Moments, k: number, n: number, itsMean: number, itsM2: number): void {
  const total = count[k] + n;
  const apart = itsMean - mean[k];
  m2[k] += itsM2 + apart * apart * ((count[k] * n) / total);
  mean[k] += apart * (n / total);
  count[k] = total;
}

function isFinite(x: number): boolean {
  return x - x === 0;
}
