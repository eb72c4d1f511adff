// Every root of a function over a range, as far as a scan tells: each step across which the sign changes is narrowed down,
// and so is the border of what is defined. A jump across 0 is told from a root.

import { exp } from './exponential.ts';
import { ln } from './logarithm.ts';
import { solveBracketed } from './root.ts';

/** What a scan has found, in the order of the range. */
export interface ScannedRoots {
  readonly roots: readonly number[];
  /** Where the function changes its sign without passing 0. */
  readonly jumps: readonly number[];
  /** The function at both ends of the range; NaN where it is not defined. */
  readonly atFirst: number;
  readonly atLast: number;
  /** It was the same number wherever it was looked at. */
  readonly isConstant: boolean;
}

/** Steps of a scan. */
const SCAN_STEPS = 64;
/** A range above 0 whose ends are this far apart is walked through in equal ratios. */
const DECADE = 10;
/** Halvings by which the border of what is defined is found. */
const BORDER_HALVINGS = 40;
/** At a root the function falls below this share of what it was at the ends of the step; at a jump it does not. */
const JUMP_SHARE = 1e-6;

/** The places of a scan from `first` to `last`: evenly, or in equal ratios where the range spans a decade above 0; the ends are exact. */
export function scanPlaces(first: number, last: number): Float64Array {
  const places = new Float64Array(SCAN_STEPS + 1);
  const inRatios = Math.min(first, last) > 0 && Math.max(first / last, last / first) >= DECADE;
  for (let i = 1; i < SCAN_STEPS; i++) {
    const share = i / SCAN_STEPS;
    places[i] = inRatios ? exp(ln(first) * (1 - share) + ln(last) * share) : first + (last - first) * share;
  }
  places[0] = first;
  places[SCAN_STEPS] = last;
  return places;
}

/** Whether what is left at the end of a narrowing, begun where the function was fa and fb, is that of a root and not of a jump. */
export function isRoot(residual: number, fa: number, fb: number): boolean {
  const finite = (height: number): number => (Math.abs(height) < Infinity ? Math.abs(height) : 0);
  return Math.abs(residual) <= JUMP_SHARE * Math.max(finite(fa), finite(fb));
}

/** Scans f from `first` to `last`, both finite; f may be NaN where it is not defined. */
export function scanRoots(f: (x: number) => number, first: number, last: number): ScannedRoots {
  const places = scanPlaces(first, last);
  const values = places.map(f);
  const roots: number[] = [];
  const jumps: number[] = [];
  const narrow = (a: number, fa: number, b: number, fb: number): void => {
    const { value, residual, status } = solveBracketed(f, a, b);
    if (status === 'left domain') return;
    if (isRoot(residual, fa, fb)) roots.push(value);
    else jumps.push(value);
  };
  for (let i = 0; i < SCAN_STEPS; i++) {
    let [a, b] = [places[i]!, places[i + 1]!];
    let [fa, fb] = [values[i]!, values[i + 1]!];
    if (fa === 0) roots.push(a);
    if (fa !== fa && fb !== fb) continue;
    if (fa !== fa) [a, fa] = border(f, b, fb, a);
    if (fb !== fb) [b, fb] = border(f, a, fa, b);
    if (fa !== 0 && fb !== 0 && fa > 0 !== fb > 0) narrow(a, fa, b, fb);
  }
  if (values[SCAN_STEPS] === 0) roots.push(last);
  return {
    roots,
    jumps,
    atFirst: values[0]!,
    atLast: values[SCAN_STEPS]!,
    isConstant: values.every((value) => Object.is(value, values[0])),
  };
}

/** The last place with a value on the way from one that has a value to one that has none. */
function border(f: (x: number) => number, inside: number, value: number, outside: number): [number, number] {
  let [a, fa, b] = [inside, value, outside];
  for (let n = 0; n < BORDER_HALVINGS; n++) {
    const middle = a + (b - a) / 2;
    const there = f(middle);
    if (there !== there) b = middle;
    else [a, fa] = [middle, there];
  }
  return [a, fa];
}
