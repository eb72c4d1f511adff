// Which known name was probably meant: the edit distance in which swapping two neighbouring letters
// counts once (optimal string alignment), with a different case counting a tenth.

/** Cost of a letter in the wrong case, and of an underscore left out or put in: Idss is I_DSS. */
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
  let last = [0];
  for (let j = 1; j <= b.length; j++) last.push(last[j - 1] + stepCost(b[j - 1]));
  for (let i = 1; i <= a.length; i++) {
    const row = [last[0] + stepCost(a[i - 1])];
    for (let j = 1; j <= b.length; j++) {
      const change = last[j - 1] + changeCost(a[i - 1], b[j - 1]);
      row[j] = Math.min(change, last[j] + stepCost(a[i - 1]), row[j - 1] + stepCost(b[j - 1]));
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1])
        row[j] = Math.min(row[j], beforeLast[j - 2] + 1);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length];
}

function stepCost(letter: string): number {
  return letter === '_' ? CASE_COST : 1;
}

function changeCost(a: string, b: string): number {
  if (a === b) return 0;
  return a.toLowerCase() === b.toLowerCase() ? CASE_COST : 1;
}
