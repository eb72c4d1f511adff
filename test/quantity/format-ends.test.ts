// Rounding where two or three numbers stand together: outward, inward, to spare, short, told apart.

import { describe, expect, test } from 'vitest';
import {
  CURRENT,
  digitsToTell,
  formatReserve,
  formatRow,
  formatValue,
  formatWindow,
  knownUnit,
  PLAIN,
  RESISTANCE,
  VOLTAGE,
} from '../../src/quantity/index.ts';
import type { FormatOptions, FormattedRow, FormattedValue, ValueKind } from '../../src/quantity/index.ts';
import { createDraw } from '../support/counter-random.ts';

describe('one row', () => {
  const row = (low: number | null, nominal: number, high: number | null, kind: ValueKind, options?: FormatOptions) => {
    const shown: FormattedRow = formatRow({ low, nominal, high }, kind, options);
    const text = (value: FormattedValue | null) => value && value.text;
    return [text(shown.low), text(shown.nominal), text(shown.high)];
  };

  test('shares the prefix of the nominal value', () => {
    expect(row(980, 1180.4, 1250, RESISTANCE)).toEqual(['0.980 kΩ', '1.18 kΩ', '1.25 kΩ']);
    expect(row(0.212, 1.16e-3, 9e-4, CURRENT)).toEqual(['212 mA', '1.16 mA', '0.900 mA']);
    expect(row(1e-6, 999.6e-6, 2e-3, CURRENT)).toEqual(['0.00100 mA', '1.00 mA', '2.00 mA']);
  });

  test('an end more than 1000 times away takes its own prefix, at 1000 it does not', () => {
    expect(row(1, 1000, 1e6, RESISTANCE)).toEqual(['0.00100 kΩ', '1.00 kΩ', '1000 kΩ']);
    expect(row(0.99, 1000, 1.01e6, RESISTANCE)).toEqual(['990 mΩ', '1.00 kΩ', '1.01 MΩ']);
  });

  test('rounds the ends outward', () => {
    expect(row(-4.946, -2.2, -0.9991, VOLTAGE)).toEqual(['−4.95 V', '−2.20 V', '−0.999 V']);
    expect(row(14.25, 15, 15.7501, VOLTAGE)).toEqual(['14.2 V', '15.0 V', '15.8 V']);
    expect(row(14.25, 15, 15.75, VOLTAGE, { digits: 4 })).toEqual(['14.25 V', '15.00 V', '15.75 V']);
  });

  test('open ends stay open, infinite ones are infinite', () => {
    expect(row(null, 5e-3, null, CURRENT)).toEqual([null, '5.00 mA', null]);
    expect(row(2e4, Infinity, Infinity, RESISTANCE)).toEqual(['20.0 kΩ', '∞', '∞']);
  });

  test('a nominal value of 0 takes the prefix of the larger end', () => {
    expect(row(-2e-3, 0, 1e-3, VOLTAGE)).toEqual(['−2.00 mV', '0 mV', '1.00 mV']);
    expect(row(0, 0, 0, VOLTAGE)).toEqual(['0 V', '0 V', '0 V']);
  });

  test('an explicit unit or prefix serves the whole row', () => {
    expect(row(0.04, 0.05, 0.06, PLAIN, { unit: knownUnit('%') })).toEqual(['4.00 %', '5.00 %', '6.00 %']);
    expect(row(900, 1000, 1100, RESISTANCE, { prefix: 0 })).toEqual(['900 Ω', '1000 Ω', '1100 Ω']);
  });
});

test('a window to buy from is rounded inward', () => {
  const window = (low: number, high: number) => {
    const shown = formatWindow(low, high, RESISTANCE);
    return [shown.low.text, shown.high.text];
  };
  expect(window(1501, 1829)).toEqual(['1.51 kΩ', '1.82 kΩ']);
  expect(window(1500, 1820)).toEqual(['1.50 kΩ', '1.82 kΩ']);
  expect(window(950.1, 1829)).toEqual(['951 Ω', '1820 Ω']);
  expect(window(1, 2.001e6)).toEqual(['1.00 Ω', '2.00 MΩ']);
  expect(window(0, 1829)).toEqual(['0 kΩ', '1.82 kΩ']);
});

test('what is to spare is rounded down and what is short up', () => {
  expect(formatReserve(0.4029, VOLTAGE)).toMatchObject({ text: '402 mV', short: false });
  expect(formatReserve(-0.4021, VOLTAGE)).toMatchObject({ text: '403 mV', short: true });
  expect(formatReserve(-0.4021, VOLTAGE, { digits: 1 })).toMatchObject({ text: '500 mV', short: true });
  expect(formatReserve(0, VOLTAGE)).toMatchObject({ text: '0 V', short: false });
  expect(formatReserve(Infinity, VOLTAGE)).toMatchObject({ text: '∞', short: false });
});

test('a comparison is given the digits that decide it, and no fewer than asked', () => {
  expect(digitsToTell(1.5, 2)).toBe(3);
  expect(digitsToTell(1.9996, 2)).toBe(5);
  expect(digitsToTell(1.9996, 2, 5)).toBe(5);
  expect(digitsToTell(2, 2 + 4.5e-16)).toBe(17);
  expect(digitsToTell(-1.0001, 1.0001)).toBe(3);
});

test('two different values print differently with the digits that tell them, and not with one less', () => {
  const draw = createDraw(17);
  const wrong: unknown[] = [];
  for (let i = 0; i < 5000; i++) {
    const a = (1 + 9 * draw()) * 10 ** Math.floor(draw() * 4 - 2);
    const b = a * (1 + 10 ** (-1 - 10 * draw()));
    const digits = digitsToTell(a, b);
    const alike = (count: number) =>
      formatValue(a, PLAIN, { digits: count }).text === formatValue(b, PLAIN, { digits: count }).text;
    if (alike(digits) || (digits > 3 && !alike(digits - 1))) wrong.push([a, b, digits]);
  }
  expect(wrong).toEqual([]);
});
