// Points of a curve: evenly spaced, with some moved to where it bends, cut where it leaves the chart.

/** How many points a curve has. */
const CURVE_POINTS = 129;
/** Of those, how many go where the curve bends most. */
const BEND_POINTS = 32;
const HALVINGS = 50;

interface Sampled {
  readonly x: Float64Array;
  readonly y: Float64Array;
}

/**
 * CURVE_POINTS points of `f` from `from` to `to` (either may be the larger), or to where it first rises above `limit`,
 * if it does; `f` must not fall on the way. The last point then lies on the limit.
 */
export function sampleRising(f: (x: number) => number, from: number, to: number, limit: number): Sampled {
  let end = to;
  if (f(to) > limit) {
    let inside = from;
    for (let step = 0; step < HALVINGS; step++) {
      const middle = (inside + end) / 2;
      if (f(middle) > limit) end = middle;
      else inside = middle;
    }
  }
  return sample(f, from, end);
}

/** CURVE_POINTS points of any function from `from` to `to`. */
export function sample(f: (x: number) => number, from: number, to: number): Sampled {
  const even = CURVE_POINTS - BEND_POINTS;
  const xs: number[] = [];
  const ys: number[] = [];
  for (let at = 0; at < even; at++) {
    const x = at === even - 1 ? to : from + ((to - from) * at) / (even - 1);
    xs.push(x);
    ys.push(f(x));
  }
  const extra: number[] = [];
  for (const at of sharpest(ys)) extra.push((xs[at - 1]! + xs[at]!) / 2, (xs[at]! + xs[at + 1]!) / 2);
  const sign = to < from ? -1 : 1;
  const points = [...new Set([...xs, ...extra])].toSorted((a, b) => sign * (a - b));
  // Neighbouring bends share a point; the gaps go to the widest steps.
  while (points.length < CURVE_POINTS) {
    let widest = 1;
    for (let at = 1; at < points.length; at++) {
      if (Math.abs(points[at]! - points[at - 1]!) > Math.abs(points[widest]! - points[widest - 1]!)) widest = at;
    }
    points.splice(widest, 0, (points[widest - 1]! + points[widest]!) / 2);
  }
  const x = Float64Array.from(points);
  return { x, y: x.map((value) => f(value)) };
}

/** Indices of the points with the largest second difference. */
function sharpest(ys: readonly number[]): number[] {
  const bend = ys.map((y, at) => (at === 0 || at === ys.length - 1 ? -1 : Math.abs(ys[at - 1]! - 2 * y + ys[at + 1]!)));
  return Array.from(ys.keys())
    .slice(1, -1)
    .toSorted((a, b) => bend[b]! - bend[a]!)
    .slice(0, BEND_POINTS / 2);
}
