// Decimal numbers as text, moved by powers of ten without a rounding of their own: the digits stay
// and the exponent moves, so that 4.7 kohm, 4k7, 4700 ohm and 0.0047 Mohm are one double.

/** coefficient × 10^exponent, exactly. */
export interface Decimal {
  readonly coefficient: bigint;
  readonly exponent: number;
}

const DECIMAL = /^([+\-\u2212]?)(\d+)(?:\.(\d+))?(?:[eE]([+\-\u2212]?)(\d+))?$/;

/** 0 degC in kelvin, exactly (SI brochure, 9th edition, 2.3.1). */
export const CELSIUS_ZERO: Decimal = { coefficient: 27315n, exponent: -2 };

/** No double needs more; keeps an absurd exponent printable. */
const LARGEST_EXPONENT = 1e9;

/** Digits behind which two decimals count as far apart when they are added: keeps `1e300 degC` from filling memory. */
const WIDEST_SUM = 400;

/** Reads `12`, `-4.7`, `1.5e-9` (sign `-` or `−`); throws RangeError where the text is no decimal number. */
export function readDecimal(text: string): Decimal {
  const match = DECIMAL.exec(text);
  if (!match) throw new RangeError(`no decimal number: ${text}`);
  const [, sign, whole, fraction = '', exponentSign, exponentDigits = '0'] = match;
  const magnitude = BigInt(whole + fraction);
  const exponent = Math.min(Number(exponentDigits), LARGEST_EXPONENT) * (exponentSign && exponentSign !== '+' ? -1 : 1);
  return { coefficient: sign && sign !== '+' ? -magnitude : magnitude, exponent: exponent - fraction.length };
}

/** The shortest decimal that reads back as `value`, which is finite. */
export function decimalOf(value: number): Decimal {
  return readDecimal(String(value));
}

/** The double nearest to `decimal` × 10^shift (ties to even); infinite or 0 beyond the range of doubles. */
export function decimalToNumber(decimal: Decimal, shift = 0): number {
  return Number(`${decimal.coefficient}e${decimal.exponent + shift}`);
}

/** a + b, exactly; where they lie more than 400 digits apart, the larger one. */
export function addDecimals(a: Decimal, b: Decimal): Decimal {
  const exponent = Math.min(a.exponent, b.exponent);
  if (Math.max(a.exponent, b.exponent) - exponent > WIDEST_SUM) {
    if (a.coefficient === 0n) return b;
    if (b.coefficient === 0n) return a;
    return a.exponent > b.exponent ? a : b;
  }
  return {
    coefficient:
      a.coefficient * 10n ** BigInt(a.exponent - exponent) + b.coefficient * 10n ** BigInt(b.exponent - exponent),
    exponent,
  };
}

/** -a. */
export function negateDecimal(a: Decimal): Decimal {
  return { coefficient: -a.coefficient, exponent: a.exponent };
}
