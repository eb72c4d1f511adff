// Where in the declared set something happens, as the draws that stand away from their nominal there.

import type { SpreadModel } from '../sheet/index.ts';
import { valueAt } from './position.ts';
import type { Position } from './position.ts';

/** One draw of a place in the declared set. */
export interface StandingDraw {
  /** Index of the draw in the model. */
  readonly draw: number;
  /** -1 low end .. 1 high end. */
  readonly t: number;
  /** The value itself there, SI. */
  readonly value: number;
}

/** The draws among `counting` that do not stand at their nominal. */
export function whereIs(model: SpreadModel, position: Position, counting: (k: number) => boolean): StandingDraw[] {
  return model.drawn.flatMap((drawn, k) => {
    const t = position[k]!;
    if (t === 0 || !counting(k)) return [];
    const x = valueAt(drawn, t);
    const nominal = model.slots[drawn.valueSlot]!;
    const value = drawn.form === 'value' ? x : drawn.form === 'factor' ? nominal * x : nominal + x;
    return [{ draw: k, t, value }];
  });
}

/** The numbers that put a sheet where these draws stand, by slot. */
export function slotsOf({ drawn }: SpreadModel, where: readonly StandingDraw[]): Map<number, number> {
  return new Map(where.map(({ draw, t }) => [drawn[draw]!.slot, valueAt(drawn[draw]!, t)]));
}

/** The numbers that put a sheet on a position, by slot. */
export function slotsAt({ drawn }: SpreadModel, position: Position): Map<number, number> {
  return new Map(drawn.map((each, k) => [each.slot, valueAt(each, position[k]!)]));
}
