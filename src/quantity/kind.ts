// What a value is, apart from its number: a dimension, and whether it is an amount, a point of the
// temperature scale or a level. The stored number is SI: kelvin for a point of the scale, dB for a level.

import type { Dimension } from './dimension.ts';
import { DIMENSIONLESS, sameDimension } from './dimension.ts';

type Scale = 'linear' | 'celsius' | 'decibel';

export interface ValueKind {
  readonly dimension: Dimension;
  readonly scale: Scale;
}

/** The kind of an amount (neither a temperature point nor a level) of this dimension. */
export function linearKind(dimension: Dimension): ValueKind {
  return { dimension, scale: 'linear' };
}

/** Whether two values may be added, subtracted and compared as far as dimension and scale go. */
export function sameKind(a: ValueKind, b: ValueKind): boolean {
  return a.scale === b.scale && sameDimension(a.dimension, b.dimension);
}

export const PLAIN = linearKind(DIMENSIONLESS);
export const VOLTAGE = linearKind([1, 0, 0, 0, 0]);
export const CURRENT = linearKind([0, 1, 0, 0, 0]);
export const RESISTANCE = linearKind([1, -1, 0, 0, 0]);
export const CONDUCTANCE = linearKind([-1, 1, 0, 0, 0]);
export const CAPACITANCE = linearKind([-1, 1, 1, 0, 0]);
export const INDUCTANCE = linearKind([1, -1, 1, 0, 0]);
export const CHARGE = linearKind([0, 1, 1, 0, 0]);
export const POWER = linearKind([1, 1, 0, 0, 0]);
export const FREQUENCY = linearKind([0, 0, -1, 0, 0]);
export const TIME = linearKind([0, 0, 1, 0, 0]);
export const LENGTH = linearKind([0, 0, 0, 0, 1]);
/** A point of the temperature scale, stored in kelvin. */
export const TEMPERATURE_POINT: ValueKind = { dimension: [0, 0, 0, 1, 0], scale: 'celsius' };
export const TEMPERATURE_DIFFERENCE = linearKind([0, 0, 0, 1, 0]);
export const THERMAL_RESISTANCE = linearKind([-1, -1, 0, 1, 0]);
export const VOLTAGE_TEMPERATURE_COEFFICIENT = linearKind([1, 0, 0, -1, 0]);
/** A/V²: K and beta of the square law. */
export const SQUARE_LAW_CONSTANT = linearKind([-2, 1, 0, 0, 0]);
/** 1/V: lambda, g_m/I_D. */
export const RECIPROCAL_VOLTAGE = linearKind([-1, 0, 0, 0, 0]);
/** √V: gamma of the body effect. */
export const ROOT_VOLTAGE = linearKind([0.5, 0, 0, 0, 0]);
/** V/√Hz: e_n. */
export const NOISE_VOLTAGE_DENSITY = linearKind([1, 0, 0.5, 0, 0]);
/** A/√Hz: i_n. */
export const NOISE_CURRENT_DENSITY = linearKind([0, 1, 0.5, 0, 0]);
/** A level in dB, stored in dB. */
export const DECIBEL: ValueKind = { dimension: DIMENSIONLESS, scale: 'decibel' };
