// The bar of a spread in pixels.

import type { SpreadBar } from '../../figure/index.ts';

export const BAR_WIDTH = 118;
export const BAR_HEIGHT = 25;
const HALF = 4;
const MIDDLE = BAR_HEIGHT / 2;
/** Length of the point of a bar that goes beyond the scale. */
const POINT = 5;
/** A bar narrower than this would not be seen. */
const LEAST = 1.5;

interface BarShape {
  /** The line that the scale is. */
  readonly scale: string;
  readonly outline: string;
  readonly open: string;
  readonly tick: number;
  readonly posts: readonly { readonly path: string; readonly passed: boolean }[];
  readonly failing: readonly { readonly x: number; readonly width: number }[];
  readonly devices: readonly { readonly x: number; readonly device: 'low' | 'high' }[];
}

/** Paths and places of a bar; `shift` moves it as a share of the scale, as while its tick is dragged. */
export function barShape(bar: SpreadBar, shift = 0): BarShape {
  const x = (share: number): number => (share + shift) * BAR_WIDTH;
  const middle = (x(bar.from) + x(bar.to)) / 2;
  const half = Math.max((x(bar.to) - x(bar.from)) / 2, LEAST / 2);
  const [left, right] = [middle - half, middle + half];
  return {
    scale: `M0 ${MIDDLE}H${BAR_WIDTH}`,
    outline: outline(bar, left, right),
    open: openEnds(bar, left, right),
    tick: x(bar.nominal),
    posts: bar.posts.map(({ at, forbids, passed }) => ({ path: post(x(at), forbids), passed })),
    failing: bar.failing.map(({ from, to }) => ({ x: x(from), width: Math.max(x(to) - x(from), LEAST) })),
    devices: bar.ticks.map(({ at, device }) => ({ x: x(at), device })),
  };
}

/** The factor on the nominal value for a drag of the tick by so many pixels, on the scale from a quarter to four times. */
export function factorOf(pixels: number): number {
  return 4 ** ((2 * pixels) / BAR_WIDTH);
}

/** Room at either end of a scale of its own, as a share of it. */
const OWN_ROOM = 0.08;

/** How much of a value one pixel is on a scale of its own; null where that is not between two ends. */
export function ownSpan(low: number | null, high: number | null): number | null {
  if (low === null || high === null || low === high) return null;
  return (high - low) / ((1 - 2 * OWN_ROOM) * BAR_WIDTH);
}

/** The share of the scale by which a value stands off the one in its middle. */
export function shiftOf(value: number, middle: number): number {
  const ratio = value / middle;
  return ratio > 0 ? Math.log2(ratio) / 4 : 0;
}

function outline({ fromEnd, toEnd }: SpreadBar, left: number, right: number): string {
  const [top, bottom] = [MIDDLE - HALF, MIDDLE + HALF];
  const start = fromEnd === 'point' ? `M${left + POINT} ${top}` : `M${left} ${top}`;
  const end =
    toEnd === 'point'
      ? `H${right - POINT}L${right} ${MIDDLE}L${right - POINT} ${bottom}`
      : toEnd === 'open'
        ? `H${openFrom(left, right)}M${openFrom(left, right)} ${bottom}`
        : `H${right}V${bottom}`;
  const close =
    fromEnd === 'point' ? `H${left + POINT}L${left} ${MIDDLE}Z` : fromEnd === 'open' ? `H${left}` : `H${left}V${top}`;
  return start + end + close;
}

/** The half next to an open end is dashed. */
function openEnds({ fromEnd, toEnd }: SpreadBar, left: number, right: number): string {
  const [top, bottom] = [MIDDLE - HALF, MIDDLE + HALF];
  const lines = (from: number, to: number): string => `M${from} ${top}H${to}M${from} ${bottom}H${to}`;
  return (toEnd === 'open' ? lines(openFrom(left, right), right) : '') + (fromEnd === 'open' ? lines(left, left) : '');
}

function openFrom(left: number, right: number): number {
  return (left + right) / 2;
}

function post(x: number, forbids: 'left' | 'right'): string {
  const foot = forbids === 'left' ? -3 : 3;
  return `M${x + foot} ${MIDDLE - 7}H${x}V${MIDDLE + 7}H${x + foot}`;
}
