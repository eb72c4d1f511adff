// Which known name was probably meant: the edit distance in which swapping two neighbouring letters
// counts once (optimal string alignment), with a different case counting a tenth.

/** Cost of a letter in the wrong case. */
const CASE_COST = 0.1;

/** The candidates close enough to `name` to be a slip for it, nearest first, at most three; ties keep the candidates' order. */
export function nearestNames(name: string, candidates: Iterable<string>): string[] {
  // A third of the letters may be wrong, so that short names are not matched to everything.
  const allowed = Math.max(1, Math.floor(name.length / 3));
  const found: { candidate: string; distance: number }[] = [];
  for (const candidate of new Set(candidates)) {
    if (candidate === name || Math.abs(candidate.length - name.length) > allowed) continue;
    const distance = editDistance(name, candidate);
    if (distance <= allowed && distance < Math.max(name.length, candidate.length)) found.push({ candidate, distance });
  }
  found.sort((a, b) => a.distance - b.distance);
  return found.slice(0, 3).map((each) => each.candidate);
}

/** Least number of insertions, deletions, changes and swaps of neighbours that turn `a` into `b`. */
function editDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const change = last[j - 1] + changeCost(a[i - 1], b[j - 1]);
      row[j] = Math.min(change, last[j] + 1, row[j - 1] + 1);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        row[j] = Math.min(row[j], beforeLast[j - 2] + 1);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length];
}

function changeCost(a: string, b: string): number {
  if (a === b) return 0;
  return a.toLowerCase() === b.toLowerCase() ? CASE_COST : 1;
}
