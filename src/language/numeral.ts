// The digits to write for an SI value in a unit, so that reading them gives the same value to the last bit.

import type { Unit } from '../quantity/index.ts';
import { scaleToSI } from '../quantity/index.ts';

/** Plain digits are written for exponents between these, as String does. */
const LEAST_PLAIN = -7;
const MOST_PLAIN = 21;

/** How far from the quotient the number is sought where a unit is no power of ten. */
const NEIGHBOURS = 4;

/** The shortest numeral that reads as `value` in `unit`; `value` is finite. */
export function numeralOf(value: number, unit: Unit | null): string {
  if (unit?.kind.scale === 'celsius') return celsiusNumeral(value);
  if (unit && unit.exponent10 === null) return quotientNumeral(value, unit);
  const { negative, digits, exponent } = decimalOf(value);
  return (negative ? '-' : '') + writeDecimal(digits, exponent - (unit?.exponent10 ?? 0));
}

interface Digits {
  readonly negative: boolean;
  /** Without zeros at either end; value = digits × 10^exponent. */
  readonly digits: string;
  readonly exponent: number;
}

function decimalOf(value: number): Digits {
  const [coefficient, exponent = '0'] = String(Math.abs(value)).split('e');
  const [whole, fraction = ''] = coefficient.split('.');
  return trimmed(Object.is(value, -0) || value < 0, whole + fraction, Number(exponent) - fraction.length);
}

function trimmed(negative: boolean, written: string, exponent: number): Digits {
  const digits = written.replace(/^0+/, '').replace(/0+$/, '');
  const behind = written.length - written.replace(/0+$/, '').length;
  return digits === '' ? { negative, digits: '0', exponent: 0 } : { negative, digits, exponent: exponent + behind };
}

function writeDecimal(digits: string, exponent: number): string {
  const point = digits.length + exponent;
  if (point <= LEAST_PLAIN + 1 || point > MOST_PLAIN) {
    const mantissa = digits.length > 1 ? `${digits[0]}.${digits.slice(1)}` : digits;
    return `${mantissa}e${point - 1}`;
  }
  if (exponent >= 0) return digits + '0'.repeat(exponent);
  if (point > 0) return `${digits.slice(0, point)}.${digits.slice(point)}`;
  return `0.${'0'.repeat(-point)}${digits}`;
}

/** value - 273.15, digit by digit. */
function celsiusNumeral(kelvin: number): string {
  const { negative, digits, exponent } = decimalOf(kelvin);
  const least = Math.min(exponent, -2);
  const scaled = BigInt(digits) * 10n ** BigInt(exponent - least) * (negative ? -1n : 1n);
  const difference = scaled - 27315n * 10n ** BigInt(-2 - least);
  const magnitude = difference < 0n ? -difference : difference;
  const result = trimmed(difference < 0n, magnitude.toString(), least);
  return (result.negative ? '-' : '') + writeDecimal(result.digits, result.exponent);
}

function quotientNumeral(value: number, unit: Unit): string {
  const quotient = value / unit.factor;
  for (let digits = 1; digits <= 17; digits++) {
    const text = String(Number(quotient.toPrecision(digits)));
    if (scaleToSI(text, unit) === value) return text;
  }
  const step = Math.abs(quotient) * Number.EPSILON;
  for (let k = 1; k <= NEIGHBOURS; k++)
    for (const near of [quotient + k * step, quotient - k * step])
      if (scaleToSI(String(near), unit) === value) return String(near);
  return String(quotient);
}
