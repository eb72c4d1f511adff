// Whether two ways of computing the same cells agree: without that, their times say nothing.

/** The largest relative difference of two rows of results; both infinite or equal is no difference. */
export function worstDifference(a: Float64Array, b: Float64Array): number {
  let worst = 0;
  for (let k = 0; k < a.length; k++) {
    if (Object.is(a[k], b[k])) continue;
    const difference = Math.abs(a[k] - b[k]) / Math.max(Math.abs(a[k]), Math.abs(b[k]));
    if (!(difference <= worst)) worst = difference;
  }
  return worst;
}
