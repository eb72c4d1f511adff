// Ends of values that cannot be known because a limit of some draw is open: the draw is moved beyond its nominal on that
// side, and whatever then lies beyond an extreme has no such end.

import { reachOf, reaches } from '../program/index.ts';
import type { Drawn, SpreadModel } from '../sheet/index.ts';
import { createBatch } from './batch.ts';
import { choicesOf } from './state-columns.ts';
import type { ExtremeSearch } from './extremes.ts';

/** How far beyond its nominal a draw with an open end is moved, as shares of the nominal. */
const BEYOND = [0.1, 1, 9, 999];

/** What is open of one value: names of the draws whose missing limit would move its ends. */
interface OpenEnds {
  readonly low: readonly string[];
  readonly high: readonly string[];
  /** Draws with an open end on which the value depends at all: its spread is not known. */
  readonly any: readonly string[];
}

/** The open ends of the values in these slots, in their order. */
export function openEnds(model: SpreadModel, wanted: readonly number[], search: ExtremeSearch): OpenEnds[] {
  const found = wanted.map(() => ({ low: [] as string[], high: [] as string[], any: [] as string[] }));
  const open = model.drawn.flatMap((drawn, k) => (drawn.spread.low === null || drawn.spread.high === null ? [k] : []));
  if (open.length === 0 || search.isEmpty) return found;
  const reach = reachOf(
    model.program,
    model.drawn.map(({ slot }) => slot),
    new Set(choicesOf(model)),
  );
  for (const k of open) {
    const { name } = model.drawn[k]!;
    const reached = wanted.flatMap((slot, w) => (reaches(reach, k, slot) ? [w] : []));
    for (const w of reached) found[w]!.any.push(name);
    const slots = reached.map((w) => wanted[w]!);
    for (const share of BEYOND) {
      const batch = createBatch(
        { ...model, drawn: model.drawn.map((drawn, n) => (n === k ? opened(drawn, share) : drawn)) },
        slots,
      );
      // A row of two positions per value: from its least and from its largest.
      const sides = [-1, 1].filter((t) => (t < 0 ? model.drawn[k]!.spread.low : model.drawn[k]!.spread.high) === null);
      const positions = reached.flatMap((w) => {
        const { low, high } = search.of(w);
        return sides.flatMap((t) => [low.position.with(k, t), high.position.with(k, t)]);
      });
      batch.run(positions, (from, count) => {
        for (let i = from; i < from + count; i++) {
          const n = Math.floor(i / (2 * sides.length));
          const value = batch.column(n)[i - from]!;
          const ends = found[reached[n]!]!;
          const { low, high } = search.of(reached[n]!);
          if (!(value >= low.value) && !ends.low.includes(name)) ends.low.push(name);
          if (!(value <= high.value) && !ends.high.includes(name)) ends.high.push(name);
        }
      });
    }
  }
  return found;
}

/** The draw with its open end moved out to a share of its nominal, or as far as 1 where that is 0. */
function opened(drawn: Drawn, share: number): Drawn {
  const { low, nominal, high } = drawn.spread;
  const step = share * (nominal === 0 ? 1 : Math.abs(nominal));
  return { ...drawn, spread: { ...drawn.spread, low: low ?? nominal - step, high: high ?? nominal + step } };
}
