// Values of the naive evaluator: an SI number that carries its own kind through every operation, and a bound
// on how far another honest evaluation may lie from it (zero for plain arithmetic, which is exact to the bit).

export interface NaiveKind {
  /** Exponents of V, A, s, K, m. */
  readonly dimension: readonly number[];
  readonly scale: 'linear' | 'celsius' | 'decibel';
}

export type NaiveType = NaiveKind | 'condition' | 'region';

export interface NaiveValue {
  readonly type: NaiveType;
  /** SI; 1 or 0 of a condition; index of a region; NaN: no number comes out; null: what it needs has no value. */
  readonly value: number | null;
  readonly bound: number;
  /** A border is so near that either answer is right. */
  readonly unsure: boolean;
}

export const linear = (...dimension: number[]): NaiveKind => ({ dimension, scale: 'linear' });
export const KINDS = {
  plain: linear(0, 0, 0, 0, 0),
  V: linear(1, 0, 0, 0, 0),
  A: linear(0, 1, 0, 0, 0),
  ohm: linear(1, -1, 0, 0, 0),
  S: linear(-1, 1, 0, 0, 0),
  F: linear(-1, 1, 1, 0, 0),
  H: linear(1, -1, 1, 0, 0),
  W: linear(1, 1, 0, 0, 0),
  Hz: linear(0, 0, -1, 0, 0),
  K: linear(0, 0, 0, 1, 0),
  degC: { dimension: [0, 0, 0, 1, 0], scale: 'celsius' },
  dB: { dimension: [0, 0, 0, 0, 0], scale: 'decibel' },
  'A/V^2': linear(-2, 1, 0, 0, 0),
  '/V': linear(-1, 0, 0, 0, 0),
  'V^0.5': linear(0.5, 0, 0, 0, 0),
  'V/K': linear(1, 0, 0, -1, 0),
  'K/W': linear(-1, -1, 0, 1, 0),
  m: linear(0, 0, 0, 0, 1),
} as const satisfies Record<string, NaiveKind>;

/** What the author wrote cannot be: thrown where it is met, caught at the cell. */
export class Broken extends Error {}
/** A cell that is needed has no settled kind; thrown likewise. */
export class Waits extends Error {}

export function isKind(type: NaiveType): type is NaiveKind {
  return typeof type !== 'string';
}

export function sameKinds(a: NaiveType, b: NaiveType): boolean {
  if (!isKind(a) || !isKind(b)) return a === b;
  return a.scale === b.scale && a.dimension.every((exponent, i) => Math.abs(exponent - b.dimension[i]) < 1e-9);
}

export function sure(type: NaiveType, value: number | null, bound = 0): NaiveValue {
  return { type, value, bound, unsure: false };
}

/** Applies `f` to numbers; the bound is what the operands' own bounds can do, and `rounding` of the result. */
export function lift(
  type: NaiveType,
  f: (...x: number[]) => number,
  operands: readonly NaiveValue[],
  rounding = 0,
): NaiveValue {
  const unsure = operands.some((operand) => operand.unsure);
  if (operands.some((operand) => operand.value === null)) return { type, value: null, bound: 0, unsure };
  const center = operands.map((operand) => operand.value!);
  const value = f(...center);
  let bound = Number.isFinite(value) ? rounding * Math.abs(value) : 0;
  let split = false;
  for (const signs of corners(operands.map((operand) => operand.bound))) {
    const there = f(...center.map((x, i) => x + signs[i]));
    if (Number.isNaN(there) !== Number.isNaN(value)) split = true;
    else if (Number.isFinite(there) && Number.isFinite(value)) bound = Math.max(bound, Math.abs(there - value));
    else if (!Object.is(there, value)) split = true;
  }
  return { type, value, bound, unsure: unsure || split };
}

/** As `lift` for what jumps: where the corners disagree either answer is right. */
export function liftStep(type: NaiveType, f: (...x: number[]) => number, operands: readonly NaiveValue[]): NaiveValue {
  const lifted = lift(type, f, operands);
  return lifted.bound > 0 ? { ...lifted, unsure: true } : lifted;
}

function corners(bounds: readonly number[]): number[][] {
  let all: number[][] = [[]];
  for (const bound of bounds) {
    const steps = bound > 0 ? [-bound, bound] : [0];
    all = all.flatMap((corner) => steps.map((step) => [...corner, step]));
  }
  return bounds.every((bound) => bound === 0) ? [] : all;
}
