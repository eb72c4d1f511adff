// Dimensions, units, numerals, preferred values and formatting. Numbers are SI, a point of the
// temperature scale is in kelvin, a level in dB. Positions in a text are UTF-16 units from its start.

export type { Dimension } from './dimension.ts';
export { DIMENSIONLESS, divideDimensions, multiplyDimensions, raiseDimension, sameDimension } from './dimension.ts';
export type { ValueKind } from './kind.ts';
export {
  CAPACITANCE,
  CONDUCTANCE,
  CURRENT,
  DECIBEL,
  FREQUENCY,
  INDUCTANCE,
  LENGTH,
  linearKind,
  NOISE_CURRENT_DENSITY,
  NOISE_VOLTAGE_DENSITY,
  PLAIN,
  POWER,
  RECIPROCAL_VOLTAGE,
  RESISTANCE,
  ROOT_VOLTAGE,
  sameKind,
  SQUARE_LAW_CONSTANT,
  TEMPERATURE_DIFFERENCE,
  TEMPERATURE_POINT,
  THERMAL_RESISTANCE,
  TIME,
  VOLTAGE,
  VOLTAGE_TEMPERATURE_COEFFICIENT,
} from './kind.ts';
export { dimensionName, siUnitText } from './dimension-name.ts';
export { isUnitSymbol } from './unit-symbols.ts';
export { superscript } from './unit-factor.ts';
export type { UnitFault } from './unit-fault.ts';
export { describeUnitFault, isUnitFault } from './unit-fault.ts';
export type { Unit } from './unit.ts';
export { asciiUnit, knownUnit, parseUnit, scanUnit, typesetUnit } from './unit.ts';
export { fromSI, scaleToSI } from './si-scale.ts';
export { readCode, scanCode } from './rkm-code.ts';
export type { Rounding } from './round-decimal.ts';
export type { FormatOptions, FormattedValue } from './format.ts';
export { bestPrefix, formatValue, plainText } from './format.ts';
export type { FormattedRow } from './format-ends.ts';
export { digitsToTell, formatReserve, formatRow, formatWindow } from './format-ends.ts';
export type { SeriesName } from './e-series.ts';
export { SERIES, SERIES_NAMES } from './e-series.ts';
export type { PreferredDirection } from './preferred.ts';
export { nextPreferred, preferredValue } from './preferred.ts';
export { dividerPairs } from './divider.ts';
export type { DividerPair } from './divider.ts';
