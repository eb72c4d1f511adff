// The bar of a spread beside its row, as shares of the bar's width. Values of one sign share one logarithmic scale, a quarter
// to four times the nominal, so that bars can be compared from row to row; what crosses zero, temperatures,
// levels and checks have a linear scale of their own and are drawn as an outline.

import { log2 } from './log-scale.ts';

export interface SpreadInput {
  /** Null where that end is open. */
  readonly low: number | null;
  readonly nominal: number;
  readonly high: number | null;
  /** A scale of its own even where the signs agree: temperatures, levels, checks. */
  readonly own: boolean;
  /** What a check asks for; null on a side without limit. */
  readonly limits: { readonly low: number | null; readonly high: number | null };
  /** Values of the low and the high device; null where there are none. */
  readonly devices: { readonly low: number | null; readonly high: number | null };
  /** Not all builds are drawn yet. */
  readonly refining: boolean;
}

/** How an end of the bar is drawn: closed, beyond the scale, or without limit. */
type BarEnd = 'cap' | 'point' | 'open';

export interface SpreadBar {
  readonly scale: 'shared' | 'own';
  readonly dashed: boolean;
  /** Left and right end, 0 to 1. */
  readonly from: number;
  readonly to: number;
  readonly nominal: number;
  readonly fromEnd: BarEnd;
  readonly toEnd: BarEnd;
  /** Largest ratio to the nominal, either way, where the shared scale is too narrow; null otherwise. */
  readonly ratio: number | null;
  /** Parts of the bar beyond a limit. */
  readonly failing: readonly { readonly from: number; readonly to: number }[];
  /** Limits inside the scale; `forbids` is the side of the bar that is not allowed. */
  readonly posts: readonly { readonly at: number; readonly forbids: 'left' | 'right'; readonly passed: boolean }[];
  readonly ticks: readonly { readonly at: number; readonly device: 'low' | 'high' }[];
}

/** Factor from the nominal to either end of the shared scale. */
const SHARED_FACTOR = 4;
/** Free room at either end of an own scale, as a share of what it shows. */
const PADDING = 0.08;

/** The bar of a spread. Throws RangeError for a nominal that is not finite. */
export function spreadBar(input: SpreadInput): SpreadBar {
  const { low, nominal, high, limits, devices, refining } = input;
  if (!Number.isFinite(nominal)) throw new RangeError(`a spread cannot stand around ${nominal}`);
  const known = [low, high].filter((value) => value !== null);
  const shared = !input.own && nominal !== 0 && known.every((value) => value * nominal > 0);
  const place = shared ? sharedPlace(nominal) : ownPlace(input);
  // Negative values are read by their magnitude on the shared scale: the larger one stands on the right.
  const flipped = shared && nominal < 0;
  const [left, right] = flipped ? [high, low] : [low, high];
  const [leftLimit, rightLimit] = flipped ? [limits.high, limits.low] : [limits.low, limits.high];
  const from = left === null ? 0 : clamp(place(left));
  const to = right === null ? 1 : clamp(place(right));
  const posts: SpreadBar['posts'][number][] = [];
  const failing: { from: number; to: number }[] = [];
  if (leftLimit !== null) {
    const at = clamp(place(leftLimit));
    const passed = left === null || place(left) < place(leftLimit);
    posts.push({ at, forbids: 'left', passed });
    if (passed) failing.push({ from, to: Math.min(at, to) });
  }
  if (rightLimit !== null) {
    const at = clamp(place(rightLimit));
    const passed = right === null || place(right) > place(rightLimit);
    posts.push({ at, forbids: 'right', passed });
    if (passed) failing.push({ from: Math.max(at, from), to });
  }
  const ratios = known.map((value) => Math.max(value / nominal, nominal / value));
  const widest = Math.max(1, ...ratios);
  return {
    scale: shared ? 'shared' : 'own',
    dashed: refining,
    from,
    to,
    nominal: clamp(place(nominal)),
    fromEnd: endOf(left, place),
    toEnd: endOf(right, place),
    ratio: shared && widest > SHARED_FACTOR ? widest : null,
    failing,
    posts,
    ticks: (['low', 'high'] as const).flatMap((device) => {
      const value = devices[device];
      return value === null || (shared && value * nominal <= 0) ? [] : [{ at: clamp(place(value)), device }];
    }),
  };
}

function sharedPlace(nominal: number): (value: number) => number {
  return (value) => {
    const ratio = value / nominal;
    return ratio > 0 ? 0.5 + log2(ratio) / (2 * log2(SHARED_FACTOR)) : -Infinity;
  };
}

function ownPlace({ low, nominal, high, limits, devices }: SpreadInput): (value: number) => number {
  const all = [low, nominal, high, limits.low, limits.high, devices.low, devices.high];
  const finite = all.filter((value): value is number => value !== null && Number.isFinite(value));
  const [least, most] = [Math.min(...finite), Math.max(...finite)];
  if (least === most) return (value) => (value === least ? 0.5 : value < least ? -Infinity : Infinity);
  return (value) => PADDING + ((1 - 2 * PADDING) * (value - least)) / (most - least);
}

function endOf(value: number | null, place: (value: number) => number): BarEnd {
  if (value === null) return 'open';
  const at = place(value);
  return at < 0 || at > 1 ? 'point' : 'cap';
}

function clamp(share: number): number {
  return Math.min(1, Math.max(0, share));
}
