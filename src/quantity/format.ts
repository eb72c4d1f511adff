// Values as text: typeset for the page and the record (1.18 kΩ, −2.20 V, 12 300 Ω, ∞), and in plain
// ASCII for the sheet text (1.18 kohm, -2.2 V). The digits come from round-decimal.ts.
//
// Three significant digits stand where nothing else is asked. Points of the Celsius scale and levels
// in dB have an arbitrary zero, so their digits are counted from the tens and the units at least: 5.0 °C,
// not 5.00 °C; 0.05 dB. A number that no prefix brings near 1 is written with a power of ten.

import type { DisplayUnit } from './display-unit.ts';
import { choosePrefix, displayUnitOf, prefixedUnit } from './display-unit.ts';
import { sameDimension } from './dimension.ts';
import { decimalOf } from './decimal.ts';
import { dimensionName } from './dimension-name.ts';
import type { ValueKind } from './kind.ts';
import type { RoundedDecimal, Rounding } from './round-decimal.ts';
import { roundDecimal, unroundedDecimal } from './round-decimal.ts';
import { decimalFromSI, fromSI } from './si-scale.ts';
import { superscript } from './unit-factor.ts';
import type { Unit } from './unit.ts';
import { knownUnit } from './unit.ts';

export interface FormatOptions {
  /** The unit to show it in (`as UNIT`); without one an engineering prefix is chosen. */
  readonly unit?: Unit | null;
  /** Significant digits, 3 unless given; `all` for the shortest decimal that reads back as the value. */
  readonly digits?: number | 'all';
  readonly rounding?: Rounding;
  /** Power of ten of the prefix to use instead of the best one (3 for k, 0 for none); `unit` overrides it. */
  readonly prefix?: number;
  /** Whether zeros at the end of the decimals stay (1.20) or go (1.2); they stay unless `digits` is `all`. */
  readonly zeros?: 'keep' | 'drop';
}

/** `text` is number and unit together; `unit` is empty for plain numbers and for ∞. */
export interface FormattedValue {
  readonly number: string;
  readonly unit: string;
  readonly text: string;
}

interface Shown {
  readonly rounded: RoundedDecimal;
  readonly unit: DisplayUnit;
  /** Power of ten of the last digit, in the unit shown. */
  readonly exponent: number;
  readonly dropZeros: boolean;
}

const DIGITS = 3;
const THIN_SPACE = '\u2009';
const MINUS = '\u2212';
/** First digits from 0.0001 to below ten million are written out; others with a power of ten. */
const LOWEST_LEAD = -4;
const HIGHEST_LEAD = 6;

const CELSIUS = knownUnit('degC');

/**
 * A value (SI, kelvin for a temperature point, dB for a level) as it is shown. Infinities are ∞ and −∞. Throws
 * RangeError for NaN and for a unit of another dimension.
 */
export function formatValue(value: number, kind: ValueKind, options: FormatOptions = {}): FormattedValue {
  checkUnit(kind, options);
  if (value === Infinity) return { number: '∞', unit: '', text: '∞' };
  if (value === -Infinity) return { number: `${MINUS}∞`, unit: '', text: `${MINUS}∞` };
  const shown = show(value, kind, options);
  const number = typesetNumber(shown);
  const unit = shown.unit.typeset;
  return { number, unit, text: unit === '' || unit === '°' ? number + unit : `${number} ${unit}` };
}

/**
 * A value as the sheet language reads it: `1.18 kohm`, `-2.2 V`, `0.01 /V`, `25 degC`. Without `digits` it has all
 * that it takes to read back as the same double. Throws RangeError where `formatValue` does and for infinities.
 */
export function plainText(value: number, kind: ValueKind, options: FormatOptions = {}): string {
  checkUnit(kind, options);
  const shown = show(value, kind, { ...options, digits: options.digits ?? 'all', zeros: options.zeros ?? 'drop' });
  const number = plainNumber(shown);
  return shown.unit.ascii === '' ? number : `${number} ${shown.unit.ascii}`;
}

/** The power of ten of the prefix that `formatValue` chooses for a value: what other numbers beside it share. */
export function bestPrefix(value: number, kind: ValueKind, options: FormatOptions = {}): number {
  if (value === 0 || !Number.isFinite(value)) return 0;
  const { digits = DIGITS, rounding = 'nearest' } = options;
  return choosePrefix(kind, leadOf(roundValue(value, digits, rounding)));
}

// ---------------------------------------------------------------- parts

function checkUnit(kind: ValueKind, { unit }: FormatOptions): void {
  if (!unit) return;
  const levels = (kind.scale === 'decibel') === (unit.kind.scale === 'decibel');
  if (!levels || !sameDimension(kind.dimension, unit.kind.dimension))
    throw new RangeError(`${unit.text} is no unit for ${dimensionName(kind)}`);
}

function show(value: number, kind: ValueKind, options: FormatOptions): Shown {
  const { digits = DIGITS, rounding = 'nearest', zeros = digits === 'all' ? 'drop' : 'keep' } = options;
  const asUnit = options.unit ?? (kind.scale === 'celsius' ? CELSIUS : null);
  const dropZeros = zeros === 'drop';
  if (asUnit && (asUnit.exponent10 === null || asUnit.kind.scale === 'celsius')) {
    // No shift of the decimal point leads to this unit: the number itself is another.
    const leastLead = asUnit.kind.scale === 'celsius' ? 1 : undefined;
    const rounded =
      digits === 'all'
        ? unroundedDecimal(decimalFromSI(finite(value), asUnit))
        : roundDecimal(fromSI(value, asUnit), { digits, rounding, leastLead });
    return { rounded, unit: displayUnitOf(asUnit), exponent: rounded.exponent, dropZeros };
  }
  const leastLead = kind.scale === 'decibel' ? 0 : undefined;
  const rounded = roundValue(value, digits, rounding, leastLead);
  const prefix = options.prefix ?? (value === 0 ? 0 : choosePrefix(kind, leadOf(rounded)));
  const unit = asUnit ? displayUnitOf(asUnit) : prefixedUnit(kind, prefix);
  return { rounded, unit, exponent: rounded.exponent - unit.exponent10, dropZeros };
}

function roundValue(value: number, digits: number | 'all', rounding: Rounding, leastLead?: number): RoundedDecimal {
  if (digits === 'all') return unroundedDecimal(decimalOf(finite(value)));
  return roundDecimal(value, { digits, rounding, leastLead });
}

function finite(value: number): number {
  if (!Number.isFinite(value)) throw new RangeError(`no finite value to print: ${value}`);
  return value;
}

function leadOf({ digits, exponent }: RoundedDecimal): number {
  return digits.length - 1 + exponent;
}

function typesetNumber(shown: Shown): string {
  const sign = shown.rounded.negative ? MINUS : '';
  const { whole, fraction, power } = placeDigits(shown);
  const grouped = whole.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, THIN_SPACE);
  return sign + joinDecimals(grouped, fraction) + (power === 0 ? '' : `×10${superscript(power)}`);
}

function plainNumber(shown: Shown): string {
  const { whole, fraction, power } = placeDigits(shown);
  return (shown.rounded.negative ? '-' : '') + joinDecimals(whole, fraction) + (power === 0 ? '' : `e${power}`);
}

function joinDecimals(whole: string, fraction: string): string {
  return fraction === '' ? whole : `${whole}.${fraction}`;
}

/** The digits before and behind the point, and the power of ten behind them (0: none is written). */
function placeDigits({ rounded, exponent, dropZeros }: Shown): { whole: string; fraction: string; power: number } {
  const { digits } = rounded;
  // Zero itself; what was rounded to zero keeps its decimals.
  if (digits === '0' && rounded.exponent === 0) return { whole: '0', fraction: '', power: 0 };
  const lead = digits.length - 1 + exponent;
  const power = digits !== '0' && (lead < LOWEST_LEAD || lead > HIGHEST_LEAD) ? lead : 0;
  const places = power - exponent;
  const padded = places > 0 ? digits.padStart(places + 1, '0') : digits.padEnd(digits.length - places, '0');
  const point = places > 0 ? padded.length - places : padded.length;
  const decimals = padded.slice(point);
  return { whole: padded.slice(0, point), fraction: dropZeros ? decimals.replace(/0+$/, '') : decimals, power };
}
