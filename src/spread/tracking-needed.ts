// From which tracking on a check that fails would hold at every extreme.

import type { SpreadModel, Tie } from '../sheet/index.ts';
import { searchExtremes } from './extremes.ts';

/** Halvings of 0..1: the answer is good to a hundredth. */
const HALVINGS = 7;

/** A part and the tracking of its two rows from which a check holds. */
export interface NeededTracking {
  readonly part: string;
  readonly tracking: number;
}

/** The least tracking of one part, of either sense, with which the check holds; null where none does, or none is wanted. */
export function trackingNeeded(model: SpreadModel, check: string): NeededTracking | null {
  const wanted = model.checks.find(({ name }) => name === check);
  if (!wanted || holdsWith(model, wanted.slot, wanted.reserve)) return null;
  for (const pair of model.pairs) {
    for (const sense of pair.tracking < 0 ? [-1] : pair.tracking > 0 ? [1] : [1, -1]) {
      const holds = (t: number): boolean => holdsWith(tiedBy(model, pair, sense * t), wanted.slot, wanted.reserve);
      if (!holds(1)) continue;
      let [fails, does] = [Math.abs(pair.tracking), 1];
      for (let n = 0; n < HALVINGS; n++) {
        const middle = (fails + does) / 2;
        if (holds(middle)) does = middle;
        else fails = middle;
      }
      return { part: pair.cell, tracking: sense * Math.ceil(does * 100) * 0.01 };
    }
  }
  return null;
}

function tiedBy(model: SpreadModel, pair: Tie, tracking: number): SpreadModel {
  const others = model.ties.filter(({ cell }) => cell !== pair.cell);
  return { ...model, ties: [...others, { ...pair, tracking }] };
}

function holdsWith(model: SpreadModel, slot: number, reserve: number | null): boolean {
  const search = searchExtremes(model, reserve === null ? [slot] : [slot, reserve]);
  const { low, unsolved } = search.of(0);
  return !search.isEmpty && unsolved === null && low.value === 1;
}
