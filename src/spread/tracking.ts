// Draws that go together.
//
// With u the quantile of one, that of the other is v = fold(u + w r), w = 1 - |t| and r even in -1..1, where fold reflects
// at 0 and 1. Both stay even in 0..1, they are never more than w apart, and their rank correlation is 1 - 2 w² + w³.

/** The quantile that follows u at a tracking t in -1..1; r in -1..1 is a draw of its own. Below 0 high goes with low. */
export function follow(u: number, r: number, t: number): number {
  const free = u + (1 - Math.abs(t)) * r;
  const folded = free < 0 ? -free : free > 1 ? 2 - free : free;
  return t < 0 ? 1 - folded : folded;
}
