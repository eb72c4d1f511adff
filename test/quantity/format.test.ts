// Values as text: prefixes, digits, signs, and the ASCII form that goes back into a sheet.

import { describe, expect, test } from 'vitest';
import {
  bestPrefix,
  CAPACITANCE,
  CONDUCTANCE,
  CURRENT,
  DECIBEL,
  formatValue,
  FREQUENCY,
  knownUnit,
  LENGTH,
  linearKind,
  NOISE_CURRENT_DENSITY,
  NOISE_VOLTAGE_DENSITY,
  PLAIN,
  plainText,
  POWER,
  RECIPROCAL_VOLTAGE,
  RESISTANCE,
  ROOT_VOLTAGE,
  SQUARE_LAW_CONSTANT,
  superscript,
  TEMPERATURE_DIFFERENCE,
  TEMPERATURE_POINT,
  THERMAL_RESISTANCE,
  TIME,
  VOLTAGE,
  VOLTAGE_TEMPERATURE_COEFFICIENT,
} from '../../src/quantity/index.ts';
import type { FormatOptions, ValueKind } from '../../src/quantity/index.ts';

const text = (value: number, kind: ValueKind, options?: FormatOptions) => formatValue(value, kind, options).text;

describe('three significant digits under an engineering prefix', () => {
  test.each<[number, ValueKind, string]>([
    [1180, RESISTANCE, '1.18 kΩ'],
    [999.4, RESISTANCE, '999 Ω'],
    [999.6, RESISTANCE, '1.00 kΩ'],
    [999_500, RESISTANCE, '1.00 MΩ'],
    [0.9996, VOLTAGE, '1.00 V'],
    [1.185e-3, CURRENT, '1.19 mA'],
    [1185, RESISTANCE, '1.19 kΩ'],
    [-2.2, VOLTAGE, '−2.20 V'],
    [-0.05, VOLTAGE, '−50.0 mV'],
    [15, VOLTAGE, '15.0 V'],
    [47e-9, CAPACITANCE, '47.0 nF'],
    [1e-6, CAPACITANCE, '1.00 µF'],
    [3.5e-3, CONDUCTANCE, '3.50 mS'],
    [2.2e6, FREQUENCY, '2.20 MHz'],
    [0.02, FREQUENCY, '20.0 mHz'],
    [5e-13, CURRENT, '500 fA'],
    [1e-15, CURRENT, '1.00 fA'],
    [0.0342, POWER, '34.2 mW'],
    [1e-3, TIME, '1.00 ms'],
    [3723, TIME, '3720 s'],
    [37_230, TIME, '37\u2009200 s'],
    [2e-6, LENGTH, '2.00 µm'],
    [5.6e-3, SQUARE_LAW_CONSTANT, '5.60 mA/V²'],
    [4.7e-9, NOISE_VOLTAGE_DENSITY, '4.70 nV/√Hz'],
    [1e-15, NOISE_CURRENT_DENSITY, '1.00 fA/√Hz'],
    [-2.2e-3, VOLTAGE_TEMPERATURE_COEFFICIENT, '−2.20 mV/K'],
    [0.01, RECIPROCAL_VOLTAGE, '0.0100 /V'],
    [0.5, ROOT_VOLTAGE, '0.500 √V'],
    [357, THERMAL_RESISTANCE, '357 K/W'],
    [2.5e-17, linearKind([2, 0, 1, 0, 0]), '25.0 nV²/Hz'],
    [4e-12, linearKind([0, 0, 0, 0, 2]), '4.00 µm²'],
    [1500, linearKind([2, 0, 0, 0, 0]), '1500 V²'],
    [1.234, linearKind([0, 0, 0, 0, 0]), '1.23'],
  ])('%d as kind %o', (value, kind, shown) => expect(text(value, kind)).toBe(shown));
});

describe('numbers that no prefix brings near 1', () => {
  test.each<[number, ValueKind, string]>([
    [1e-18, CURRENT, '1.00×10⁻¹⁸ A'],
    [9.996e-16, CURRENT, '1.00 fA'],
    [1e14, RESISTANCE, '1.00×10¹⁴ Ω'],
    [9.99e11, RESISTANCE, '999 GΩ'],
    [12_345, PLAIN, '12\u2009300'],
    [1234, PLAIN, '1230'],
    [9_994_000, PLAIN, '9\u2009990\u2009000'],
    [9_996_000, PLAIN, '1.00×10⁷'],
    [-5e7, PLAIN, '−5.00×10⁷'],
    [0.000123, PLAIN, '0.000123'],
    [0.0000123, PLAIN, '1.23×10⁻⁵'],
    [3e-5, linearKind([0, 0, 0, -1, 0]), '3.00×10⁻⁵ /K'],
  ])('%d as kind %o', (value, kind, shown) => expect(text(value, kind)).toBe(shown));
});

describe('temperatures and levels', () => {
  test.each<[number, ValueKind, string]>([
    [298.15, TEMPERATURE_POINT, '25.0 °C'],
    [278.15, TEMPERATURE_POINT, '5.0 °C'],
    [273.15, TEMPERATURE_POINT, '0 °C'],
    [273.16, TEMPERATURE_POINT, '0.0 °C'],
    [233.15, TEMPERATURE_POINT, '−40.0 °C'],
    [373.15 - 0.04, TEMPERATURE_POINT, '100 °C'],
    [423.15, TEMPERATURE_POINT, '150 °C'],
    [10, TEMPERATURE_DIFFERENCE, '10.0 K'],
    [0.02, TEMPERATURE_DIFFERENCE, '0.0200 K'],
    [20, DECIBEL, '20.0 dB'],
    [-3.0103, DECIBEL, '−3.01 dB'],
    [0.0512, DECIBEL, '0.05 dB'],
    [-0.001, DECIBEL, '0.00 dB'],
    [120.4, DECIBEL, '120 dB'],
  ])('%d as kind %o', (value, kind, shown) => expect(text(value, kind)).toBe(shown));

  test('outward rounding leaves a temperature alone that is only off by float noise', () => {
    expect(text(273.15 + 12.3, TEMPERATURE_POINT, { rounding: 'up' })).toBe('12.3 °C');
    expect(text(273.15 + 12.3, TEMPERATURE_POINT, { rounding: 'down' })).toBe('12.3 °C');
    expect(text(273.15 + 5.000001, TEMPERATURE_POINT, { rounding: 'up' })).toBe('5.1 °C');
    expect(text(273.15 - 5.000001, TEMPERATURE_POINT, { rounding: 'up' })).toBe('−5.0 °C');
  });
});

describe('an explicit unit', () => {
  test.each<[number, ValueKind, string, string, string]>([
    [0.05, PLAIN, '%', '5.00 %', '5 %'],
    [0.999_96, PLAIN, '%', '100 %', '99.996 %'],
    [30e-6, PLAIN, 'ppm', '30.0 ppm', '30 ppm'],
    [1180, RESISTANCE, 'ohm', '1180 Ω', '1180 ohm'],
    [123_456, RESISTANCE, 'ohm', '123\u2009000 Ω', '123456 ohm'],
    [2.2e-3, SQUARE_LAW_CONSTANT, 'uA/V^2', '2200 µA/V²', '2200 uA/V^2'],
    [1e-9, VOLTAGE, 'V', '1.00×10⁻⁹ V', '1e-9 V'],
    [Math.PI / 4, PLAIN, 'deg', '45.0°', '45 deg'],
    [298.15, TEMPERATURE_POINT, 'degC', '25.0 °C', '25 degC'],
    [298.15, TEMPERATURE_POINT, 'K', '298 K', '298.15 K'],
    [0.0125, RECIPROCAL_VOLTAGE, '%/V', '1.25 %/V', '1.25 %/V'],
    [3e-8, NOISE_VOLTAGE_DENSITY, 'nV/sqrt(Hz)', '30.0 nV/√Hz', '30 nV/Hz^0.5'],
    [1e-3, CONDUCTANCE, 'mA/V', '1.00 mA/V', '1 mA/V'],
  ])('%d as kind %o in %s', (value, kind, unit, typeset, typed) => {
    expect(text(value, kind, { unit: knownUnit(unit) })).toBe(typeset);
    expect(plainText(value, kind, { unit: knownUnit(unit) })).toBe(typed);
  });

  test('a unit of another dimension or scale is our fault', () => {
    expect(() => formatValue(1, VOLTAGE, { unit: knownUnit('mA') })).toThrow('mA is no unit for a voltage');
    expect(() => formatValue(1, PLAIN, { unit: knownUnit('dB') })).toThrow(RangeError);
    expect(() => plainText(1, DECIBEL, { unit: knownUnit('%') })).toThrow(RangeError);
  });
});

test('number, unit and text are given apart and together', () => {
  expect(formatValue(1180, RESISTANCE)).toEqual({ number: '1.18', unit: 'kΩ', text: '1.18 kΩ' });
  expect(formatValue(2.5, PLAIN)).toEqual({ number: '2.50', unit: '', text: '2.50' });
});

test('zero has no sign and no digits behind it', () => {
  expect(text(0, RESISTANCE)).toBe('0 Ω');
  expect(text(-0, VOLTAGE)).toBe('0 V');
  expect(plainText(-0, VOLTAGE)).toBe('0 V');
});

test('infinity is shown without a unit and cannot be typed', () => {
  expect(formatValue(Infinity, RESISTANCE)).toEqual({ number: '∞', unit: '', text: '∞' });
  expect(text(-Infinity, RESISTANCE)).toBe('−∞');
  expect(() => plainText(Infinity, RESISTANCE)).toThrow(RangeError);
});

test('NaN is our fault', () => {
  expect(() => formatValue(NaN, VOLTAGE)).toThrow(RangeError);
  expect(() => plainText(NaN, VOLTAGE)).toThrow(RangeError);
});

test('the count of digits can be chosen', () => {
  expect(text(Math.PI, PLAIN, { digits: 1 })).toBe('3');
  expect(text(Math.PI, PLAIN, { digits: 6 })).toBe('3.14159');
  expect(text(Math.PI, PLAIN, { digits: 17 })).toBe('3.1415926535897931');
  expect(text(0.1, PLAIN, { digits: 20 })).toBe('0.10000000000000000555');
  expect(text(4700, RESISTANCE, { digits: 'all' })).toBe('4.7 kΩ');
  expect(text(0.1 + 0.2, PLAIN, { digits: 'all' })).toBe('0.30000000000000004');
  expect(() => formatValue(1, PLAIN, { digits: 0 })).toThrow(RangeError);
  expect(() => formatValue(1, PLAIN, { digits: 2.5 })).toThrow(RangeError);
});

test('zeros behind the point go on request, zeros before it never', () => {
  expect(text(15, VOLTAGE, { zeros: 'drop' })).toBe('15 V');
  expect(text(1200, RESISTANCE, { zeros: 'drop' })).toBe('1.2 kΩ');
  expect(text(12_000, PLAIN, { zeros: 'drop' })).toBe('12\u2009000');
  expect(text(4700, RESISTANCE, { digits: 'all', zeros: 'keep' })).toBe('4.7 kΩ');
});

describe('the text for the sheet', () => {
  test.each<[number, ValueKind, FormatOptions, string]>([
    [1180, RESISTANCE, {}, '1.18 kohm'],
    [-2.2, VOLTAGE, {}, '-2.2 V'],
    [0.01, RECIPROCAL_VOLTAGE, {}, '0.01 /V'],
    [47e-6, CAPACITANCE, {}, '47 uF'],
    [4.7e-9, NOISE_VOLTAGE_DENSITY, {}, '4.7 nV/Hz^0.5'],
    [0.6, ROOT_VOLTAGE, {}, '0.6 V^0.5'],
    [5.6e-3, SQUARE_LAW_CONSTANT, {}, '5.6 mA/V^2'],
    [298.15, TEMPERATURE_POINT, {}, '25 degC'],
    [20, DECIBEL, {}, '20 dB'],
    [0.05, PLAIN, {}, '0.05'],
    [12_345, PLAIN, {}, '12345'],
    [1.2e-9, PLAIN, {}, '1.2e-9'],
    [1e-18, CURRENT, {}, '1e-18 A'],
    [1234.5678, RESISTANCE, { digits: undefined }, '1.2345678 kohm'],
    [1234.5678, RESISTANCE, { digits: 3 }, '1.23 kohm'],
    [1200.4, RESISTANCE, { digits: 3 }, '1.2 kohm'],
    [1234.5678, RESISTANCE, { digits: 3, rounding: 'up' }, '1.24 kohm'],
  ])('%d as kind %o with %o', (value, kind, options, typed) => expect(plainText(value, kind, options)).toBe(typed));
});

test('the prefix of a value is that of its rounded digits', () => {
  expect(bestPrefix(999.4, RESISTANCE)).toBe(0);
  expect(bestPrefix(999.6, RESISTANCE)).toBe(3);
  expect(bestPrefix(999.6, RESISTANCE, { digits: 4 })).toBe(0);
  expect(bestPrefix(2e-9, CURRENT)).toBe(-9);
  expect(bestPrefix(0, CURRENT)).toBe(0);
  expect(bestPrefix(Infinity, RESISTANCE)).toBe(0);
  expect(formatValue(50, RESISTANCE, { prefix: 3 }).text).toBe('0.0500 kΩ');
  expect(() => formatValue(50, RESISTANCE, { prefix: 2 })).toThrow(RangeError);
});

test('whole numbers are raised', () => {
  expect([2, -12, 0, 345].map(superscript)).toEqual(['²', '⁻¹²', '⁰', '³⁴⁵']);
});
