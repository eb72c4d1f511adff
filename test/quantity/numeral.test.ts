// Numbers with units, and component codes: one quantity is one double, however it is spelled.

import { expect, test } from 'vitest';
import {
  CAPACITANCE,
  CURRENT,
  fromSI,
  knownUnit,
  plainText,
  readCode,
  RESISTANCE,
  scaleToSI,
  scanCode,
} from '../../src/quantity/index.ts';
import { createDraw } from '../support/counter-random.ts';

const si = (number: string, unit: string) => scaleToSI(number, knownUnit(unit));

test.each([
  ['4.7', 'kohm', 4700],
  ['4700', 'ohm', 4700],
  ['0.0047', 'Mohm', 4700],
  ['4.7e6', 'mohm', 4700],
  ['47', 'nF', 47e-9],
  ['0.047', 'uF', 47e-9],
  ['47000', 'pF', 47e-9],
  ['2.2', 'mA/V^2', 2.2e-3],
  ['4.7', 'nV/√Hz', 4.7e-9],
  ['5', '%', 0.05],
  ['30', 'ppm/K', 30e-6],
  ['0.1', 'kV/mA', 1e5],
  ['25', 'degC', 298.15],
  ['-40', 'degC', 233.15],
  ['−40', 'degC', 233.15],
  ['0.1', 'degC', 273.25],
  ['300', 'K', 300],
  ['-2.2', 'mV/K', -2.2e-3],
  ['+1', 'V', 1],
  ['20', 'dB', 20],
  ['90', 'deg', Math.PI / 2],
  ['1e-400', 'V', 0],
  ['1e400', 'V', Infinity],
  ['1e99999999999999999999999', 'mV', Infinity],
  ['1e-400', 'degC', 273.15],
])('%s %s is %d in SI, to the last bit', (number, unit, value) => {
  expect(si(number, unit)).toBe(value);
});

test('a number without a unit is itself', () => {
  expect(scaleToSI('0.1', null)).toBe(0.1);
  expect(() => scaleToSI('1,5', null)).toThrow(RangeError);
  expect(() => scaleToSI('', null)).toThrow(RangeError);
});

test('all spellings of a quantity with different prefixes are one double, and none is a second rounding', () => {
  const draw = createDraw(62);
  const wrong: string[] = [];
  for (let i = 0; i < 20_000; i++) {
    const digits = String(1 + Math.floor(draw() * 999_999));
    const exponent = Math.floor(draw() * 20 - 12);
    const written = Number(`${digits}e${exponent}`);
    for (const [unit, shift] of [
      ['uA', 6],
      ['mA', 3],
      ['A', 0],
      ['kA', -3],
    ] as const)
      if (si(`${digits}e${exponent + shift}`, unit) !== written) wrong.push(`${digits}e${exponent + shift} ${unit}`);
  }
  expect(wrong).toEqual([]);
});

test.each(['kohm', 'uF', '%', 'degC', 'nV/√Hz', '/mV', 'mA/V^2'])('going from SI to %s undoes going to SI', (text) => {
  const unit = knownUnit(text);
  const draw = createDraw(63);
  const wrong: number[] = [];
  for (let i = 0; i < 5000; i++) {
    const number = Number((draw() * 200 - 100).toFixed(Math.floor(draw() * 6)));
    if (fromSI(scaleToSI(String(number), unit), unit) !== number) wrong.push(number);
  }
  expect(wrong).toEqual([]);
  expect(fromSI(Infinity, unit)).toBe(Infinity);
});

test.each([
  ['1M0', 1e6],
  ['4k7', 4700],
  ['4K7', 4700],
  ['47k', 47e3],
  ['47K3', 47.3e3],
  ['470R', 470],
  ['4R7', 4.7],
  ['4M7', 4.7e6],
  ['1G', 1e9],
  ['0R22', 0.22],
])('the code %s is %d ohms', (code, value) => {
  expect(readCode(code)).toEqual({ value, kind: RESISTANCE, unit: knownUnit('ohm') });
});

test.each([
  ['4n7', 4.7e-9],
  ['10p', 10e-12],
  ['1u0', 1e-6],
  ['2µ2', 2.2e-6],
  ['2μ2', 2.2e-6],
  ['100n', 1e-7],
])('the code %s is %d farads', (code, value) => {
  expect(readCode(code)).toEqual({ value, kind: CAPACITANCE, unit: knownUnit('F') });
});

test.each([
  'R47',
  '4m7',
  '300K',
  '4.7k',
  '4k7 ohm',
  '4k7k',
  '10L',
  '1F0',
  '4k7_',
  '4k7.5',
  '47k.5',
  '10uF',
  '10',
  'k47',
  '',
])('%s is no component code', (text) => expect(readCode(text)).toBeNull());

test.each([
  ['R = 4k7 + 1', 4, 7],
  ['4k7/2', 0, 3],
  ['1k..10k', 0, 2],
  ['1k..10k', 4, 7],
  ['47k, 10n', 5, 8],
])('in %s the code from %d ends before %d', (text, at, end) => {
  expect(scanCode(text, at)?.end).toBe(end);
});

test('a code and the same value with a unit are one double', () => {
  const draw = createDraw(64);
  const wrong: string[] = [];
  for (let i = 0; i < 5000; i++) {
    const whole = Math.floor(draw() * 1000);
    const behind = String(Math.floor(draw() * 1000));
    for (const [letter, unit] of [
      ['k', 'kohm'],
      ['p', 'pF'],
    ])
      if (readCode(whole + letter + behind)?.value !== si(`${whole}.${behind}`, unit))
        wrong.push(whole + letter + behind);
  }
  expect(wrong).toEqual([]);
});

test('a value written into a sheet reads back as itself', () => {
  const draw = createDraw(65);
  const wrong: number[] = [];
  for (let i = 0; i < 20_000; i++) {
    const value = (draw() < 0.5 ? -1 : 1) * 10 ** (draw() * 30 - 18) * (1 + draw());
    const [number, unit] = plainText(value, CURRENT).split(' ');
    if (si(number, unit) !== value) wrong.push(value);
  }
  expect(wrong).toEqual([]);
});
