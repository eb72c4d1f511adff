// Reading units: their spellings, their factors, and where a unit ends in a longer text.

import { expect, test } from 'vitest';
import {
  asciiUnit,
  isUnitFault,
  isUnitSymbol,
  knownUnit,
  parseUnit,
  scanUnit,
  typesetUnit,
} from '../../src/quantity/index.ts';

test.each([
  // as written, typeset, ASCII, power of ten
  ['V', 'V', 'V', 0],
  ['kohm', 'kΩ', 'kohm', 3],
  ['k\u03a9', 'kΩ', 'kohm', 3],
  ['k\u2126', 'kΩ', 'kohm', 3],
  ['mohm', 'mΩ', 'mohm', -3],
  ['Mohm', 'MΩ', 'Mohm', 6],
  ['Gohm', 'GΩ', 'Gohm', 9],
  ['uA', 'µA', 'uA', -6],
  ['\u00b5A', 'µA', 'uA', -6],
  ['\u03bcA', 'µA', 'uA', -6],
  ['fF', 'fF', 'fF', -15],
  ['nH', 'nH', 'nH', -9],
  ['mS', 'mS', 'mS', -3],
  ['MHz', 'MHz', 'MHz', 6],
  ['mHz', 'mHz', 'mHz', -3],
  ['pC', 'pC', 'pC', -12],
  ['m', 'm', 'm', 0],
  ['mm', 'mm', 'mm', -3],
  ['ms', 'ms', 'ms', -3],
  ['mA/V^2', 'mA/V²', 'mA/V^2', -3],
  ['mA/V²', 'mA/V²', 'mA/V^2', -3],
  ['mA*V^-2', 'mA·V⁻²', 'mA*V^-2', -3],
  ['mA\u22c5V\u207b\u00b2', 'mA·V⁻²', 'mA*V^-2', -3],
  ['mA×V^−2', 'mA·V⁻²', 'mA*V^-2', -3],
  ['kV/mA', 'kV/mA', 'kV/mA', 6],
  ['/V', '/V', '/V', 0],
  ['1/V', '/V', '/V', 0],
  ['1/mV', '/mV', '/mV', 3],
  ['nV/√Hz', 'nV/√Hz', 'nV/Hz^0.5', -9],
  ['nV/Hz^0.5', 'nV/√Hz', 'nV/Hz^0.5', -9],
  ['nV/Hz^(1/2)', 'nV/√Hz', 'nV/Hz^0.5', -9],
  ['nV/sqrt(Hz)', 'nV/√Hz', 'nV/Hz^0.5', -9],
  ['nV²/Hz', 'nV²/Hz', 'nV^2/Hz', -18],
  ['√V', '√V', 'V^0.5', 0],
  ['√V³', '√V³', 'V^1.5', 0],
  ['V^(2/3)', 'V^(2/3)', 'V^(2/3)', 0],
  ['V^1.5', '√V³', 'V^1.5', 0],
  ['V^-0.5', '√V⁻¹', 'V^-0.5', 0],
  ['V^0.3', 'V^0.3', 'V^0.3', 0],
  ['mm^2', 'mm²', 'mm^2', -6],
  ['kV^(1/3)', 'kV^(1/3)', 'kV^(1/3)', 1],
  ['%', '%', '%', -2],
  ['ppm', 'ppm', 'ppm', -6],
  ['%/V', '%/V', '%/V', -2],
  ['ppm/K', 'ppm/K', 'ppm/K', -6],
  ['dB', 'dB', 'dB', 0],
  ['rad', 'rad', 'rad', 0],
  ['degC', '°C', 'degC', 0],
  ['°C', '°C', 'degC', 0],
  ['\u00baC', '°C', 'degC', 0],
  ['℃', '°C', 'degC', 0],
  ['mV/°C', 'mV/°C', 'mV/degC', -3],
  ['K/W', 'K/W', 'K/W', 0],
])('%s is set %s, typed %s, and is 10^%d', (text, symbol, ascii, exponent10) => {
  const unit = knownUnit(text);
  expect(unit.text).toBe(text);
  expect(unit.symbol).toBe(symbol);
  expect(typesetUnit(text)).toBe(symbol);
  expect(asciiUnit(unit)).toBe(ascii);
  expect(unit.exponent10).toBe(exponent10);
  expect(unit.factor).toBe(Number(`1e${exponent10}`));
  for (const spelling of [symbol, ascii])
    expect(parseUnit(spelling)).toMatchObject({ symbol, kind: unit.kind, exponent10 });
});

test('units that are no power of ten have their factor and no exponent', () => {
  expect(knownUnit('deg')).toMatchObject({ symbol: '°', factor: Math.PI / 180, exponent10: null });
  expect(knownUnit('°').kind).toEqual(knownUnit('deg').kind);
  expect(knownUnit('deg/s').factor).toBe(Math.PI / 180);
  expect(knownUnit('/deg').factor).toBe(180 / Math.PI);
  expect(knownUnit('√kHz')).toMatchObject({ factor: Math.sqrt(10) * 10, exponent10: null });
  expect(knownUnit('mV/√kHz')).toMatchObject({ factor: Math.sqrt(10) * 1e-5, exponent10: null });
});

test('degC alone is a point of the scale, and a kelvin wherever it is joined with something', () => {
  expect(knownUnit('degC').kind.scale).toBe('celsius');
  for (const [celsius, kelvin] of [
    ['mV/degC', 'mV/K'],
    ['degC/W', 'K/W'],
    ['/degC', '/K'],
  ])
    expect(knownUnit(celsius).kind).toEqual(knownUnit(kelvin).kind);
});

test.each([
  // text, where the unit begins, the unit that is taken, where it ends
  ['10 V / R', 3, 'V', 4],
  ['10 V/R', 3, 'V', 4],
  ['10 V/2', 3, 'V', 4],
  ['10 V*R', 3, 'V', 4],
  ['10 V//R', 3, 'V', 4],
  ['10 V||R', 3, 'V', 4],
  ['10 V/A1.x', 3, 'V', 4],
  ['10 V/V_x', 3, 'V', 4],
  ['10 V/m_x', 3, 'V', 4],
  ['10 V^2', 3, 'V^2', 6],
  ['10 V ^ 2', 3, 'V', 4],
  ['10 V^x', 3, 'V', 4],
  ['0.01 /V', 5, '/V', 7],
  ['0.01/V', 4, '/V', 6],
  ['0.5 V^0.5', 4, 'V^0.5', 9],
  ['1 V..5 V', 2, 'V', 3],
  ['1 V^2..5', 2, 'V^2', 5],
  ['5%±1', 1, '%', 2],
  ['4.7 nV/√Hz)', 4, 'nV/√Hz', 10],
  ['2 V-1 V', 2, 'V', 3],
  ['2 mA,', 2, 'mA', 4],
  ['25 °C in', 3, '°C', 5],
  ['3 mA·V⁻²;', 2, 'mA·V⁻²', 8],
])('in %s the unit from %d is %s', (text, at, unit, end) => {
  const scanned = scanUnit(text, at);
  expect(scanned).toMatchObject({ end, unit: { text: unit } });
});

test('what stands behind a mark that is no part of the unit is told', () => {
  expect(scanUnit('10 V/R', 3)).toMatchObject({ behind: { fault: 'unknown symbol', text: 'R', start: 5, end: 6 } });
  expect(scanUnit('2 mA/v^2', 2)).toMatchObject({
    behind: { fault: 'wrong case', text: 'v', start: 5, end: 6, hint: 'V' },
  });
  expect(scanUnit('10 V / R', 3)).toMatchObject({ behind: null });
});

test.each([
  ['1/A1.g_m || R', 1],
  ['1/dB(x)', 1],
  ['1/sqrt(x)', 1],
  ['1 /R', 2],
  ['1/50 V', 1],
  ['5 in 2', 2],
])('in %s no unit begins at %d', (text, at) => {
  expect(isUnitFault(scanUnit(text, at))).toBe(true);
});

test.each([
  'V',
  'A',
  'ohm',
  'Ω',
  'F',
  'H',
  'S',
  'W',
  'Hz',
  's',
  'K',
  'C',
  'm',
  'mA',
  'kohm',
  'GS',
  'fs',
  'µA',
  'dB',
  'ppm',
  'deg',
  'rad',
  'degC',
])('%s is a unit symbol and so no cell name', (name) => expect(isUnitSymbol(name)).toBe(true));

test.each(['R', 'Q1', 'A1', 'V_1', 'ms2', 'mdB', 'k', 'M', 'u', 'T', 'J', 'gm', 'mv', ''])(
  '%s is no unit symbol and may be a cell name',
  (name) => expect(isUnitSymbol(name)).toBe(false),
);
