// How large figures are.

import type { Size } from '../../figure/index.ts';

/** Below this a chart has no room for its numbers. */
const LEAST_WIDTH = 120;
const NARROW = 330;
const HEIGHTS = { narrow: 212, wide: 236 };

/** The size of a chart in a place of that width in pixels; null where there is no room. */
export function chartSize(width: number): Size | null {
  if (width < LEAST_WIDTH) return null;
  return { width, height: width < NARROW ? HEIGHTS.narrow : HEIGHTS.wide };
}
