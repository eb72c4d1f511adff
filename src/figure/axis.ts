// Axes: a range, ticks at steps of 1, 2 or 5 times a power of ten (3 to 6 of them), and their numbers under one
// prefix. Values are SI; a temperature axis has its ticks at whole degrees Celsius.

import { bestPrefix, formatValue } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import { log2 } from './log-scale.ts';

export interface Axis {
  readonly kind: ValueKind;
  /** Name of the quantity as cells are named: `I_D`. */
  readonly symbol: string;
  readonly low: number;
  readonly high: number;
  readonly log: boolean;
  readonly ticks: readonly number[];
  /** The number at each tick, without unit. */
  readonly labels: readonly string[];
  /** The unit of the numbers, typeset: `mA`; '' for plain numbers. */
  readonly unit: string;
  /** Power of ten of the numbers' prefix, for other numbers that stand beside the axis. */
  readonly prefix: number;
}

const LEAST_TICKS = 3;
const MOST_TICKS = 6;
const ICE_POINT = 273.15;
/** How far beyond an end, in shares of a step, a tick still counts as standing on it. */
const TICK_SLACK = 1e-9;
const DIGITS = 6;

/**
 * An axis from `low` to `high`, widened outwards to whole ticks where no step gives 3 to 6 of them inside. Throws
 * RangeError where an end is not finite, `low` is not below `high`, or a logarithmic axis does not stay above 0.
 */
export function createAxis(
  symbol: string,
  kind: ValueKind,
  range: { readonly low: number; readonly high: number; readonly log?: boolean },
): Axis {
  const { low, high, log = false } = range;
  if (!Number.isFinite(low) || !Number.isFinite(high) || low >= high) {
    throw new RangeError(`an axis cannot go from ${low} to ${high}`);
  }
  if (log && low <= 0) throw new RangeError(`a logarithmic axis cannot begin at ${low}`);
  const offset = kind.scale === 'celsius' ? ICE_POINT : 0;
  const found = (log ? logTicks(low, high) : null) ?? linearTicks(low - offset, high - offset);
  const ticks = found.map((tick) => tick + offset);
  const largest = found.reduce((most, tick) => Math.max(most, Math.abs(tick)), 0);
  const prefix = bestPrefix(largest, kind);
  const shown = ticks.map((tick) => formatValue(tick, kind, { prefix, digits: DIGITS, zeros: 'drop' }));
  return {
    kind,
    symbol,
    low: Math.min(low, ticks[0]!),
    high: Math.max(high, ticks.at(-1)!),
    log,
    ticks,
    labels: shown.map(({ number }) => number),
    unit: shown.at(-1)!.unit,
    prefix,
  };
}

/** Where a value lies on an axis: 0 at its low end, 1 at its high end; beyond them outside 0..1. -Infinity for values that a logarithmic axis has not. */
export function positionOn({ low, high, log }: Axis, value: number): number {
  if (!log) return (value - low) / (high - low);
  return value > 0 ? log2(value / low) / log2(high / low) : -Infinity;
}

/** The value at a share of a linear axis, the inverse of `positionOn`. Throws RangeError for a logarithmic one. */
export function valueOn({ low, high, log }: Axis, share: number): number {
  if (log) throw new RangeError('a logarithmic axis has no values by share');
  return low + share * (high - low);
}

/** Steps of 1, 2 or 5 times a power of ten inside a range, 3 to 6 if that can be, else 4 to 6 that reach outside it. */
export function linearTicks(low: number, high: number): number[] {
  const exponent = exponentOf(high - low);
  let best: number[] | null = null;
  for (const shift of [-1, 0, 1]) {
    for (const factor of [1, 2, 5]) {
      const ticks = multiplesIn(low, high, factor, exponent + shift - 1, 'inside');
      if (ticks.length < LEAST_TICKS || ticks.length > MOST_TICKS) continue;
      if (best === null || Math.abs(ticks.length - 4.6) < Math.abs(best.length - 4.6)) best = ticks;
    }
  }
  if (best !== null) return best;
  for (const shift of [-1, 0, 1]) {
    for (const factor of [1, 2, 5]) {
      const ticks = multiplesIn(low, high, factor, exponent + shift - 1, 'around');
      if (ticks.length >= LEAST_TICKS && ticks.length <= MOST_TICKS) return ticks;
    }
  }
  throw new Error(`no ticks from ${low} to ${high}`);
}

/** Ticks of a logarithmic axis: 1-2-5 in each decade, fewer over many decades; null where steps of equal width serve better. */
function logTicks(low: number, high: number): number[] | null {
  const first = exponentOf(low);
  const last = exponentOf(high);
  for (const [factors, stride] of [
    [[1, 2, 5], 1],
    [[1, 5], 1],
    [[1], 1],
    [[1], 2],
    [[1], 3],
    [[1], 5],
    [[1], 10],
  ] as const) {
    const ticks: number[] = [];
    for (let exponent = first; exponent <= last; exponent++) {
      if (exponent % stride !== 0) continue;
      for (const factor of factors) {
        const tick = decimal(factor, exponent);
        if (tick >= low * (1 - TICK_SLACK) && tick <= high * (1 + TICK_SLACK)) ticks.push(tick);
      }
    }
    if (ticks.length >= LEAST_TICKS && ticks.length <= MOST_TICKS) return ticks;
  }
  return null;
}

function multiplesIn(low: number, high: number, factor: number, exponent: number, ends: 'inside' | 'around'): number[] {
  const step = decimal(factor, exponent);
  const from = ends === 'inside' ? Math.ceil(low / step - TICK_SLACK) : Math.floor(low / step + TICK_SLACK);
  const to = ends === 'inside' ? Math.floor(high / step + TICK_SLACK) : Math.ceil(high / step - TICK_SLACK);
  if (to - from > 4 * MOST_TICKS) return [];
  const ticks: number[] = [];
  for (let k = from; k <= to; k++) ticks.push(k === 0 ? 0 : decimal(k * factor, exponent));
  return ticks;
}

/** The double nearest to a decimal, without the error of a multiplication. */
function decimal(digits: number, exponent: number): number {
  return Number(`${digits}e${exponent}`);
}

function exponentOf(value: number): number {
  return Number(value.toExponential().split('e')[1]);
}
