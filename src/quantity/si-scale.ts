// From a number with its unit to SI and back, in decimal where the unit is a power of ten.

import type { Decimal } from './decimal.ts';
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
  return Number.isFinite(value) ? decimalToNumber(decimalFromSI(value, unit)) : value;
}

/** The same as a decimal, for a finite value: with all the digits that lead back to the value. */
export function decimalFromSI(value: number, unit: Unit): Decimal {
  if (unit.exponent10 === null) return decimalOf(value / unit.factor);
  const decimal = decimalOf(value);
  if (unit.kind.scale === 'celsius') return addDecimals(decimal, negateDecimal(CELSIUS_ZERO));
  return { coefficient: decimal.coefficient, exponent: decimal.exponent - unit.exponent10 };
}
