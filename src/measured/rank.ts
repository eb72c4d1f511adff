// Rank correlation, and the tracking that gives it.
//
// Source of the correlation: C. Spearman, "The proof and measurement of association between two things", Am. J. Psychol. 15
// (1904); equal values share the mean of their ranks.

/** Spearman's rank correlation of two lists of equal length; 0 where one of them is all alike. */
export function rankCorrelation(a: readonly number[], b: readonly number[]): number {
  const [x, y] = [ranks(a), ranks(b)];
  const mean = (a.length + 1) / 2;
  let [xy, xx, yy] = [0, 0, 0];
  for (let i = 0; i < a.length; i++) {
    const [dx, dy] = [x[i]! - mean, y[i]! - mean];
    xy += dx * dy;
    xx += dx * dx;
    yy += dy * dy;
  }
  return xx === 0 || yy === 0 ? 0 : xy / Math.sqrt(xx * yy);
}

function ranks(values: readonly number[]): Float64Array {
  const order = [...values.keys()].toSorted((i, j) => values[i]! - values[j]!);
  const found = new Float64Array(values.length);
  for (let from = 0; from < order.length;) {
    let to = from;
    while (to + 1 < order.length && values[order[to + 1]!] === values[order[from]!]) to++;
    for (let k = from; k <= to; k++) found[order[k]!] = (from + to) / 2 + 1;
    from = to + 1;
  }
  return found;
}

/** Halvings until a tracking stands to the last bits of its range. */
const HALVINGS = 52;

/**
 * The tracking t, -1 to 1, whose draws have this rank correlation: with w = 1 - |t| it is 1 - 2w² + w³ in magnitude, and its
 * sign is that of t.
 */
export function trackingFor(correlation: number): number {
  const size = Math.min(1, Math.abs(correlation));
  let [low, high] = [0, 1];
  for (let n = 0; n < HALVINGS; n++) {
    const w = (low + high) / 2;
    if (1 - 2 * w * w + w * w * w > size) low = w;
    else high = w;
  }
  return correlation === 0 ? 0 : Math.sign(correlation) * (1 - (low + high) / 2);
}
