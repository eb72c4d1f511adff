// What a way to bias comes to: the band that its stage reaches over everything that spreads, by the sheet's own engine, and
// the transfer plane with both limit devices.

import { planesOf } from '../../figure/index.ts';
import type { Chart } from '../../figure/index.ts';
import { createSheet } from '../../sheet/index.ts';
import { openEnds, searchExtremes } from '../../spread/index.ts';
import { CURRENT, formatValue } from '../../quantity/index.ts';
import type { BiasForm } from './band-forms.ts';
import { bandLines } from './band-lines.ts';
import { bandHeld, findPoints, pointLines } from './band-points.ts';
import type { BandWish } from './band-wish.ts';

/** A value over everything, SI; an end that is not known is null. */
interface Ends {
  readonly low: number | null;
  readonly nominal: number;
  readonly high: number | null;
}

export interface Reached {
  readonly I_D: Ends;
  readonly margin: Ends;
  /** Draws whose missing limit leaves an end open. */
  readonly open: readonly string[];
  readonly transfer: Chart | null;
}

/** Computes the stage of a form; or says why it is not solved. */
export function reachedBand(wish: BandWish, form: BiasForm): Reached | string {
  const { lines, stage } = bandLines(wish, form);
  const ohms = form.bias?.source.type === 'resistor' ? form.bias.source.ohms : 0;
  const held = bandHeld(wish, ohms);
  const points = pointLines({ ...wish, taken: new Set([...wish.taken, stage]) }, held);
  const sheet = createSheet([...wish.behind, ...lines, ...points.lines].join('\n'));
  const fault = sheet.cells().find((cell) => cell.fault !== null)?.fault;
  if (fault) return fault.text;
  const model = sheet.spreadModel();
  const slots = [`${stage}.I_D`, `${stage}.margin`].map(
    (path) => model.values.find((each) => each.path === path)!.slot,
  );
  const search = searchExtremes(model, slots);
  const open = openEnds(model, slots, search);
  const ends = (k: number): Ends => {
    const { low, high, unsolved } = search.of(k);
    const isKnown = unsolved === null && !search.isEmpty;
    return {
      low: isKnown && open[k]!.low.length === 0 ? low.value : null,
      nominal: model.slots[slots[k]!]!,
      high: isKnown && open[k]!.high.length === 0 ? high.value : null,
    };
  };
  const [current, margin] = [ends(0), ends(1)];
  return { I_D: current, margin, open: open[0]!.any, transfer: transferOf() };

  /** Both limit devices with everything else nominal, and the ends of the band as posts. */
  function transferOf(): Chart | null {
    const nominal = sheet.stage(stage);
    const found = findPoints(sheet, wish, held, points.names);
    if (nominal === null || typeof found === 'string') return null;
    const others = found.flatMap(({ at }, k) => {
      const device = sheet.standing(at).stage(stage);
      const role = k === 0 ? ('low' as const) : ('high' as const);
      return device ? [{ role, label: `${role} device`, stage: device }] : [];
    });
    const plane = planesOf(nominal, sheet, others)?.transfer ?? null;
    return plane && withBand(plane, wish, current);
  }
}

/** The plane with the limits of the band across it; red where one is passed. */
function withBand(plane: Chart, { least, most }: BandWish, reached: Ends): Chart {
  const text = (value: number): string => formatValue(value, CURRENT, { zeros: 'drop' }).text;
  const posts = [
    { value: least, forbids: 'below', passed: reached.low !== null && reached.low < least },
    { value: most, forbids: 'above', passed: reached.high !== null && reached.high > most },
  ] as const;
  return {
    ...plane,
    sentence: `${plane.sentence} The band wanted is from ${text(least)} to ${text(most)}.`,
    posts: posts
      .filter(({ value }) => value <= plane.y.high)
      .map((post) => ({ axis: 'y', ...post, label: text(post.value) })),
  };
}
