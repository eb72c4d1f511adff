// Which single input would mend failing checks: the window of its value in which every check holds at every extreme.
//
// The value is turned over a wide range while all spread stays relative as the sheet declares it; at each place the extremes
// of all checks are searched quickly. The ends of the window around the nearest good place are then narrowed by halving.

import { exp, ln } from '../numeric/index.ts';
import { reachOf, reaches } from '../program/index.ts';
import type { SpreadModel } from '../sheet/index.ts';
import { searchExtremes } from './extremes.ts';
import { turnedModel } from './turned-model.ts';

/** How far an input is turned to either side, as a factor, and in how many places on each. */
const RANGE = 8;
const PLACES = 40;
/** Halvings of an end of the window: to a thousandth of the step between two places. */
const HALVINGS = 8;

/** What turning one input comes to. */
export interface Mending {
  /** The input by name. */
  readonly input: string;
  /** Values between which all checks hold at every extreme, SI; null where there are none. */
  readonly window: { readonly low: number; readonly high: number } | null;
  /** Where there is no window: the check that fails at most places. */
  readonly closedBy: string | null;
}

/** A check at its worst extreme. */
export interface CheckStanding {
  readonly check: string;
  readonly holds: boolean;
  /** The least reserve, in the unit compared; NaN for a check without one. */
  readonly reserve: number;
}

/** How the checks stand with an input at another value. */
interface Standing {
  readonly holds: readonly boolean[];
}

/** The inputs that reach a check, by name. */
export function tunersOf({ program, tunable, checks }: SpreadModel, check: string): string[] {
  const slots = tunable.map(({ slot }) => slot);
  const reach = reachOf(program, slots, new Set());
  const wanted = checks.find(({ name }) => name === check);
  return wanted ? tunable.flatMap(({ name }, k) => (reaches(reach, k, wanted.slot) ? [name] : [])) : [];
}

/** Turns one of the model's tunable inputs; throws RangeError for another. */
export function mendWith(model: SpreadModel, name: string): Mending {
  const input = tunerOf(model, name);
  const present = model.slots[input.slot]!;
  const known = new Map<number, Standing>();
  const at = (value: number): Standing => {
    let found = known.get(value);
    if (!found) known.set(value, (found = standingAt(model, input.slot, value)));
    return found;
  };
  const isGood = (value: number): boolean => at(value).holds.every((holds) => holds);
  const step = ln(RANGE) / PLACES;
  const places = Array.from({ length: 2 * PLACES + 1 }, (_, i) => present * exp((i - PLACES) * step));
  places[PLACES] = present;
  const good = places.map(isGood);
  const nearest = places
    .map((_, i) => i)
    .filter((i) => good[i])
    .toSorted((a, b) => Math.abs(a - PLACES) - Math.abs(b - PLACES))[0];
  if (nearest === undefined) {
    const fails = model.checks.map((_, c) => places.filter((value) => !at(value).holds[c]).length);
    const most = fails.indexOf(Math.max(...fails));
    return { input: name, window: null, closedBy: model.checks[most]?.name ?? null };
  }
  let [first, last] = [nearest, nearest];
  while (first > 0 && good[first - 1]) first--;
  while (last < places.length - 1 && good[last + 1]) last++;
  const narrow = (inside: number, outside: number | undefined): number => {
    if (outside === undefined) return inside;
    let [a, b] = [inside, outside];
    for (let n = 0; n < HALVINGS; n++) {
      const middle = (a + b) / 2;
      if (isGood(middle)) a = middle;
      else b = middle;
    }
    return a;
  };
  const window = { low: narrow(places[first]!, places[first - 1]), high: narrow(places[last]!, places[last + 1]) };
  return { input: name, window, closedBy: null };
}

/** Every check with an input at another value. */
export function reservesWith(model: SpreadModel, name: string, value: number): readonly CheckStanding[] {
  const input = tunerOf(model, name);
  const turned = turnedModel(model, input.slot, value, 'scaled');
  const reserves = turned.checks.flatMap(({ reserve }) => (reserve === null ? [] : [reserve]));
  const search = searchExtremes(turned, [...turned.checks.map(({ slot }) => slot), ...reserves]);
  let next = turned.checks.length;
  return turned.checks.map(({ name: check, reserve }, c) => {
    const { low, unsolved } = search.of(c);
    const least = reserve === null ? NaN : search.of(next++).low.value;
    return { check, holds: !search.isEmpty && unsolved === null && low.value === 1, reserve: least };
  });
}

function tunerOf({ tunable }: SpreadModel, name: string): SpreadModel['tunable'][number] {
  const found = tunable.find((each) => each.name === name);
  if (!found) throw new RangeError(`${name} cannot be turned.`);
  return found;
}

function standingAt(model: SpreadModel, slot: number, value: number): Standing {
  const turned = turnedModel(model, slot, value, 'scaled');
  const reserves = turned.checks.flatMap(({ reserve }) => (reserve === null ? [] : [reserve]));
  const wanted = [...turned.checks.map((check) => check.slot), ...reserves];
  const search = searchExtremes(turned, wanted, { effort: 'quick' });
  return {
    holds: turned.checks.map((_, c) => {
      const { low, unsolved } = search.of(c);
      return !search.isEmpty && unsolved === null && low.value === 1;
    }),
  };
}
