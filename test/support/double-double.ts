// Arithmetic with about 32 digits: a number is an unevaluated sum of two doubles, [high, low].
// Source: T. J. Dekker, "A floating-point technique for extending the available precision",
// Numerische Mathematik 18 (1971).

export type Twofold = readonly [high: number, low: number];

export function twofold(x: number): Twofold {
  return [x, 0];
}

export function addTwofold(a: Twofold, b: Twofold): Twofold {
  const s = a[0] + b[0];
  const v = s - a[0];
  const e = a[0] - (s - v) + (b[0] - v) + a[1] + b[1];
  const high = s + e;
  return [high, e - (high - s)];
}

export function subTwofold(a: Twofold, b: Twofold): Twofold {
  return addTwofold(a, [-b[0], -b[1]]);
}

export function mulTwofold(a: Twofold, b: Twofold): Twofold {
  const p = a[0] * b[0];
  const [ah, al] = split(a[0]);
  const [bh, bl] = split(b[0]);
  const e = ah * bh - p + ah * bl + al * bh + al * bl + (a[0] * b[1] + a[1] * b[0]);
  const high = p + e;
  return [high, e - (high - p)];
}

function split(x: number): Twofold {
  const t = 134217729 * x;
  const high = t - (t - x);
  return [high, x - high];
}
