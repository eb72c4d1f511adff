// The two points of a part that bound a band, from the sheet's own engine: the largest V_GS at which any device carries the
// least current, and the smallest at which any carries the largest, over the part's declared set and the ambient temperature.

import type { BandPoints } from '../../network/index.ts';
import { CURRENT, formatValue, plainText, VOLTAGE } from '../../quantity/index.ts';
import { createSheet } from '../../sheet/index.ts';
import type { Sheet } from '../../sheet/index.ts';
import { searchExtremes, slotsAt } from '../../spread/index.ts';
import { ownName } from './band-wish.ts';
import type { BandWish } from './band-wish.ts';

/** A current at which the part is held, and the end of V_GS that is looked for; n-channel frame. */
interface Held {
  readonly current: number;
  /** V between drain and source, above 0. */
  readonly vds: number;
  readonly end: 'largest' | 'smallest';
}

/** V_GS in the n-channel frame at that end, and the slots that put the sheet of the points there. */
interface FoundPoint {
  readonly vgs: number;
  readonly at: ReadonlyMap<number, number>;
}

/** The lines of points that hold the part at these currents, and their names. */
export function pointLines(wish: BandWish, held: readonly Held[]): { names: string[]; lines: string[] } {
  const taken = new Set(wish.taken);
  const names = held.map(() => {
    const name = ownName(wish.sheet, 'P_I', taken);
    taken.add(name);
    return name;
  });
  const lines = held.flatMap(({ current, vds }, k) => [
    `${names[k]} = point of ${wish.part}`,
    `  I_D: ${plainText(current, CURRENT)}`,
    `  V_DS: ${plainText(wish.rails.channel * vds, VOLTAGE)}`,
  ]);
  return { names, lines };
}

/** Looks for the ends in a sheet that has the points; or says why a point has none. */
export function findPoints(
  sheet: Sheet,
  wish: BandWish,
  held: readonly Held[],
  names: readonly string[],
): readonly FoundPoint[] | string {
  const { channel } = wish.rails;
  const cannotCarry = (k: number): string =>
    `Not every device of ${wish.part} carries ${formatValue(held[k]!.current, CURRENT).text} at the voltage that is left for it.`;
  const faulty = names.findIndex((name) => sheet.error(name) !== null);
  if (faulty >= 0) {
    const { code, text } = sheet.error(names[faulty]!)!;
    return code === 'not-solved' ? cannotCarry(faulty) : text;
  }
  const model = sheet.spreadModel();
  const slots = names.map((name) => model.values.find(({ path }) => path === `${name}.V_GS`)!.slot);
  const search = searchExtremes(model, slots);
  if (search.isEmpty) return `No device of ${wish.part} keeps all its limits: its rows contradict each other.`;
  const found = held.map(({ end }, k) => {
    const { low, high, unsolved } = search.of(k);
    const { value, position } = (end === 'largest') === channel > 0 ? high : low;
    return { vgs: channel * value, at: slotsAt(model, position), isKnown: unsolved === null };
  });
  const unknown = found.findIndex(({ isKnown }) => !isKnown);
  if (unknown >= 0) return cannotCarry(unknown);
  return found;
}

/**
 * The points of the band with so much source resistance: it takes its share of the supply, and V_DS moves V_GS by lambda.
 * A sentence where there are none.
 */
export function bandPoints(wish: BandWish, sourceOhms: number): BandPoints | string {
  const held = bandHeld(wish, sourceOhms);
  const { names, lines } = pointLines(wish, held);
  const sheet = createSheet([...wish.behind, ...wish.added, ...lines].join('\n'));
  const found = findPoints(sheet, wish, held, names);
  if (typeof found === 'string') return found;
  return { least: wish.least, most: wish.most, vgsLeast: found[0]!.vgs, vgsMost: found[1]!.vgs };
}

/** What holds the two points of a band; with room for tolerances each at the V_DS that is worse for it. */
export function bandHeld(wish: BandWish, sourceOhms: number): readonly [Held, Held] {
  return [
    { current: wish.least, vds: drainSource(wish, wish.least, sourceOhms, -1), end: 'largest' },
    { current: wish.most, vds: drainSource(wish, wish.most, sourceOhms, 1), end: 'smallest' },
  ];
}

/** Where nothing is left, a share of the supply stands in: the margin will say it. */
const LEAST_SHARE = 0.02;

/** What drain and source resistors leave of the supply at a current: the least (-1) or the most (1) where room is left for tolerances. */
function drainSource(wish: BandWish, current: number, sourceOhms: number, side: 1 | -1): number {
  const { rails, drain, roomy, supplyOff, tolerance } = wish;
  const [supply, resistors] = roomy ? [1 + side * supplyOff, 1 - side * tolerance.share] : [1, 1];
  const left = rails.height * supply - ((drain?.ohms ?? 0) + sourceOhms) * resistors * current;
  return Math.max(left, LEAST_SHARE * rails.height);
}
