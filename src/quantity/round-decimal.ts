// Rounding to printed digits, done on decimal digits and not on the binary number.
//
// A value is first read to 13 significant digits. Computed values carry noise of a few parts in 1e16:
// what differs from a printable decimal by less than 1e-12 of itself *is* that decimal here, so that
// 0.1 + 0.2 rounded up to one digit is 0.3, not 0.4. Beyond that allowance `down` never prints a
// number above the value and `up` never one below. Who asks for more than 12 digits gets the exact
// digits of the double, without the allowance.

import type { Decimal } from './decimal.ts';
import { readDecimal } from './decimal.ts';

/** nearest: halves away from zero; down: towards -infinity; up: towards +infinity. */
export type Rounding = 'nearest' | 'down' | 'up';

/** ± digits × 10^exponent; `digits` is a whole number without leading zeros, `0` for zero. */
export interface RoundedDecimal {
  readonly negative: boolean;
  readonly digits: string;
  readonly exponent: number;
}

interface RoundOptions {
  /** Significant digits, 1 to 30. */
  readonly digits: number;
  readonly rounding: Rounding;
  /** Digits are counted from this power of ten on where the value is smaller: for scales whose zero is arbitrary. */
  readonly leastLead?: number;
}

const NOISE_DIGITS = 13;
const EXACT_DIGITS = 40;
const MOST_DIGITS = 30;

/** Rounds a finite value; throws RangeError for any other, and for a count of digits that is none. */
export function roundDecimal(value: number, options: RoundOptions): RoundedDecimal {
  const { digits, rounding, leastLead } = options;
  if (!Number.isFinite(value)) throw new RangeError(`no finite value to print: ${value}`);
  if (!Number.isInteger(digits) || digits < 1 || digits > MOST_DIGITS)
    throw new RangeError(`no count of digits: ${digits}`);
  const { coefficient, exponent } = readDigits(value, digits, leastLead);
  const magnitude = coefficient < 0n ? -coefficient : coefficient;
  if (magnitude === 0n) return { negative: false, digits: '0', exponent: 0 };
  const first = String(magnitude).length - 1 + exponent;
  const lead = leastLead === undefined ? first : Math.max(first, leastLead);
  const place = lead - digits + 1;
  const kept = roundAt(coefficient, place - exponent, rounding);
  // 999.6 became 1000: one digit more in front, one less behind.
  const carried = String(kept < 0n ? -kept : kept).length > digits;
  return carried ? asRounded(kept / 10n, place + 1) : asRounded(kept, place);
}

/** A decimal as it is, without zeros at its end. */
export function unroundedDecimal({ coefficient, exponent }: Decimal): RoundedDecimal {
  if (coefficient === 0n) return { negative: false, digits: '0', exponent: 0 };
  const zeros = /0*$/.exec(String(coefficient))![0].length;
  return asRounded(coefficient / 10n ** BigInt(zeros), exponent + zeros);
}

function readDigits(value: number, digits: number, leastLead: number | undefined): Decimal {
  if (digits >= NOISE_DIGITS) return readDecimal(value.toExponential(EXACT_DIGITS));
  if (leastLead !== undefined && Math.abs(value) < Number(`1e${leastLead}`))
    return readDecimal(value.toFixed(NOISE_DIGITS - 1 - leastLead));
  return readDecimal(value.toExponential(NOISE_DIGITS - 1));
}

/** The coefficient without its last `cut` digits (with -cut more zeros where that is negative). */
function roundAt(coefficient: bigint, cut: number, rounding: Rounding): bigint {
  if (cut <= 0) return coefficient * 10n ** BigInt(-cut);
  const unit = 10n ** BigInt(cut);
  const rest = coefficient % unit; // has the coefficient's sign
  const towardsZero = coefficient / unit;
  if (rest === 0n) return towardsZero;
  const away = coefficient < 0n ? -1n : 1n;
  if (rounding === 'down') return coefficient < 0n ? towardsZero - 1n : towardsZero;
  if (rounding === 'up') return coefficient < 0n ? towardsZero : towardsZero + 1n;
  return 2n * rest * away >= unit ? towardsZero + away : towardsZero;
}

function asRounded(coefficient: bigint, exponent: number): RoundedDecimal {
  const negative = coefficient < 0n;
  return { negative, digits: String(negative ? -coefficient : coefficient), exponent };
}
