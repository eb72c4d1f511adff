// From a number with its unit to SI and back, in decimal where the unit is a power of ten.

import { addDecimals, CELSIUS_ZERO, decimalOf, decimalToNumber, negateDecimal, readDecimal } from './decimal.ts';
import type { Unit } from './unit.ts';

/**
 * The SI value of a decimal number (`4.7`, `-40`, `1e-9`) in a unit, correctly rounded: one rounding for units
 * that are a power of ten and for degC, where 273.15 is added before it. Throws RangeError where the text is no number.
 */
export function scaleToSI(decimalText: string, unit: Unit | null): number {
  const decimal = readDecimal(decimalText);
  if (!unit) return decimalToNumber(decimal);
  if (unit.kind.scale === 'celsius') return decimalToNumber(addDecimals(decimal, CELSIUS_ZERO));
  return unit.exponent10 === null ? decimalToNumber(decimal) * unit.factor : decimalToNumber(decimal, unit.exponent10);
}

/** How many of `unit` an SI value is: the shortest decimal of the value, moved; ±infinity stays. */
export function fromSI(value: number, unit: Unit): number {
  if (!Number.isFinite(value)) return value;
  if (unit.kind.scale === 'celsius') return decimalToNumber(addDecimals(decimalOf(value), negateDecimal(CELSIUS_ZERO)));
  return unit.exponent10 === null ? value / unit.factor : decimalToNumber(decimalOf(value), -unit.exponent10);
}
