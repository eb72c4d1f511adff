// The corners at which one can stand, from what is known of the spread.

import { whereText } from '../../record/index.ts';
import type { SheetSpread, StandingDraw } from '../../spread/index.ts';

/** A place within the spread where the page can stand. */
export interface Corner {
  /** `low end of A1.I_D`. */
  readonly name: string;
  /** How its draws stand, in words. */
  readonly words: string;
  /** By the name of the draw: -1 low end, 0 nominal, 1 high end. */
  readonly at: ReadonlyMap<string, number>;
}

/** Draws that are told one by one in the line over a sheet that stands at a corner. */
const MOST_DRAWS = 8;

/** A corner by its name and the draws that stand away from their nominal there. */
function cornerAt(name: string, where: readonly StandingDraw[], spread: SheetSpread): Corner {
  const { drawn } = spread.model;
  return {
    name,
    words: whereText(spread, where, MOST_DRAWS),
    at: new Map(where.map(({ draw, t }) => [drawn[draw]!.name, t])),
  };
}

/** The end of a value; null where it is not known. */
export function endCorner(path: string, which: 'low' | 'high', spread: SheetSpread | null): Corner | null {
  const end = spread?.value(path)?.[which];
  if (!spread || !end || end.value === null || end.where.length === 0) return null;
  return cornerAt(`${which} end of ${path}`, end.where, spread);
}

/** Where one can stand with a stage in view: its low and high device, and where the first failing check fails. */
export function stageCorners(stage: string | null, spread: SheetSpread | null): Corner[] {
  if (!spread) return [];
  const devices = spread.report.devices.find((each) => each.stage === stage);
  const failing = spread.report.checks.find(({ failsAt }) => failsAt !== null && failsAt.length > 0);
  return [
    ...(devices
      ? [
          cornerAt(`low device of ${devices.part}`, devices.low.where, spread),
          cornerAt(`high device of ${devices.part}`, devices.high.where, spread),
        ]
      : []),
    ...(failing ? [cornerAt(`worst end of ${failing.name}`, failing.failsAt!, spread)] : []),
  ];
}
