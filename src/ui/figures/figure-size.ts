// How large figures are, and where a pointer stands in them.

import { chartFrame, positionOn, valueOn } from '../../figure/index.ts';
import type { Chart, Size } from '../../figure/index.ts';

/** Below this a chart has no room for its numbers. */
const LEAST_WIDTH = 120;
const NARROW = 330;
const HEIGHTS = { narrow: 212, wide: 236 };

/** The size of a chart in a place of that width in pixels; null where there is no room. */
export function chartSize(width: number): Size | null {
  if (width < LEAST_WIDTH) return null;
  return { width, height: width < NARROW ? HEIGHTS.narrow : HEIGHTS.wide };
}

/** Where a point of a chart lies in its picture, in pixels. */
export function placeOf(
  chart: Chart,
  size: Size,
  { x, y }: { readonly x: number; readonly y: number },
): { left: number; top: number } {
  const { x0, y0, x1, y1 } = chartFrame(chart, size);
  return { left: x0 + positionOn(chart.x, x) * (x1 - x0), top: y1 - positionOn(chart.y, y) * (y1 - y0) };
}

/** The value on a linear x axis so many pixels to the right of another one. */
export function valueBeside(chart: Chart, size: Size, from: number, pixels: number): number {
  const { x0, x1 } = chartFrame(chart, size);
  return valueOn(chart.x, positionOn(chart.x, from) + pixels / (x1 - x0));
}
