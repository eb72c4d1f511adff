// What is said of a text that is no unit: the fault, where it is, and what would be right there.

import { expect, test } from 'vitest';
import { describeUnitFault, isUnitFault, parseUnit, scanUnit } from '../../src/quantity/index.ts';
import type { UnitFault } from '../../src/quantity/index.ts';

test.each([
  // text, fault, the text at fault, its start, hint
  ['mv', 'wrong case', 'mv', 0, 'mV'],
  ['uv', 'wrong case', 'uv', 0, 'uV'],
  ['µv', 'wrong case', 'µv', 0, 'uV'],
  ['Kohm', 'wrong case', 'Kohm', 0, 'kohm'],
  ['KOHM', 'wrong case', 'KOHM', 0, 'kohm'],
  ['Ohm', 'wrong case', 'Ohm', 0, 'ohm'],
  ['KΩ', 'wrong case', 'KΩ', 0, 'kohm'],
  ['khz', 'wrong case', 'khz', 0, 'kHz'],
  ['KHz', 'wrong case', 'KHz', 0, 'kHz'],
  ['mhz', 'wrong case', 'mhz', 0, 'MHz or mHz'],
  ['PF', 'wrong case', 'PF', 0, 'pF'],
  ['db', 'wrong case', 'db', 0, 'dB'],
  ['degc', 'wrong case', 'degc', 0, 'degC'],
  ['mA/v^2', 'wrong case', 'v', 3, 'V'],
  ['ohms', 'unknown symbol', 'ohms', 0, 'ohm'],
  ['kOhms', 'unknown symbol', 'kOhms', 0, 'kohm'],
  ['volts', 'unknown symbol', 'volts', 0, 'V'],
  ['millivolts', 'unknown symbol', 'millivolts', 0, 'mV'],
  ['mAmps', 'unknown symbol', 'mAmps', 0, 'mA'],
  ['megohm', 'unknown symbol', 'megohm', 0, 'Mohm'],
  ['microfarads', 'unknown symbol', 'microfarads', 0, 'uF'],
  ['Siemens', 'unknown symbol', 'Siemens', 0, 'S'],
  ['mmho', 'unknown symbol', 'mmho', 0, 'mS'],
  ['percent', 'unknown symbol', 'percent', 0, '%'],
  ['celsius', 'unknown symbol', 'celsius', 0, 'degC'],
  ['degF', 'unknown symbol', 'degF', 0, null],
  ['R', 'unknown symbol', 'R', 0, 'ohm'],
  ['J', 'unknown symbol', 'J', 0, 'W*s'],
  ['Vrms', 'unknown symbol', 'Vrms', 0, 'V'],
  ['mVpp', 'unknown symbol', 'mVpp', 0, 'mV'],
  ['Vdc', 'unknown symbol', 'Vdc', 0, 'V'],
  ['dBm', 'unknown symbol', 'dBm', 0, 'dB'],
  ['nV/rtHz', 'unknown symbol', 'rtHz', 3, 'Hz^0.5'],
  ['mA/V2', 'unknown symbol', 'V2', 3, 'V^2'],
  ['cm', 'unknown symbol', 'cm', 0, 'm'],
  ['Tohm', 'unknown symbol', 'Tohm', 0, 'ohm'],
  ['kohn', 'unknown symbol', 'kohn', 0, 'kohm'],
  ['xyz', 'unknown symbol', 'xyz', 0, null],
  ['A1', 'unknown symbol', 'A1', 0, null],
  ['constructor', 'unknown symbol', 'constructor', 0, null],
  ['toString', 'unknown symbol', 'toString', 0, null],
  ['hasOwnProperty', 'unknown symbol', 'hasOwnProperty', 0, null],
  ['kconstructors', 'unknown symbol', 'kconstructors', 0, null],
  ['__proto__', 'unit missing', '', 0, null],
  ['k', 'prefix alone', 'k', 0, 'kohm'],
  ['M', 'prefix alone', 'M', 0, 'Mohm'],
  ['u', 'prefix alone', 'u', 0, 'uF'],
  ['mdB', 'prefix not allowed', 'mdB', 0, 'dB'],
  ['m%', 'prefix not allowed', 'm%', 0, '%'],
  ['kppm', 'prefix not allowed', 'kppm', 0, 'ppm'],
  ['mdegC', 'prefix not allowed', 'mdegC', 0, 'degC'],
  ['m°C', 'prefix not allowed', 'm°C', 0, 'degC'],
  ['mrad', 'prefix not allowed', 'mrad', 0, 'rad'],
  ['degC^2', 'power not allowed', 'degC^2', 0, 'degC'],
  ['%^0.5', 'power not allowed', '%^0.5', 0, '%'],
  ['V^0', 'power not allowed', 'V^0', 0, null],
  ['V^10', 'power not allowed', 'V^10', 0, null],
  ['kV^0.3', 'power not allowed', 'kV^0.3', 0, 'V^0.3'],
  ['√V^0.5', 'power not allowed', '√V^0.5', 0, null],
  ['dB/K', 'stands alone', 'dB/K', 0, 'dB'],
  ['/dB', 'stands alone', '/dB', 0, 'dB'],
  ['V/dB', 'stands alone', 'V/dB', 0, 'dB'],
  ['', 'unit missing', '', 0, null],
  ['/', 'unit missing', '', 1, null],
  ['V/', 'unit missing', '', 2, null],
  ['5', 'unit missing', '', 0, null],
  ['sqrt(Hz', 'unit missing', 'sqrt(Hz', 0, null],
  ['V)', 'text behind', ')', 1, null],
  ['V^x', 'text behind', '^x', 1, null],
] as const)('%s: %s', (text, fault, part, start, hint) => {
  const expected: UnitFault = { fault, text: part, start, end: start + part.length, hint };
  expect(parseUnit(text)).toEqual(expected);
});

test.each([
  ['V / K', 1, 2, 'V/K'],
  ['mA /V^2', 2, 3, 'mA/V^2'],
  ['x y', 1, 2, null],
] as const)('a blank inside %s is pointed at', (text, start, end, hint) => {
  expect(parseUnit(text)).toEqual({ fault: 'blank inside', text, start, end, hint });
});

test('spans count from the start of the text that is scanned', () => {
  expect(scanUnit('V_x = 5 mv', 8)).toEqual({ fault: 'wrong case', text: 'mv', start: 8, end: 10, hint: 'mV' });
  expect(scanUnit('x = 5 degC^2', 6)).toEqual({
    fault: 'power not allowed',
    text: 'degC^2',
    start: 6,
    end: 12,
    hint: 'degC',
  });
});

test.each([
  ['mv', 'mv is not a unit: capital and small letters differ. Write mV.'],
  ['ohms', 'ohms is not a unit known here. Write ohm.'],
  ['xyz', 'xyz is not a unit known here.'],
  ['k', 'k is a prefix without a unit behind it. Write kohm.'],
  ['mdB', 'mdB carries a prefix, which this unit never has. Write dB.'],
  ['degC^2', 'degC^2 carries a power that this unit does not take. Write degC.'],
  ['dB/K', 'dB takes no other unit beside it, so dB/K is not a unit. Write dB.'],
  ['V / K', 'A unit has no blank inside. Write V/K.'],
  ['V)', ') does not belong to the unit before it.'],
  ['', 'A unit should stand here.'],
])('the fault of "%s" in words', (text, sentence) => {
  const fault = parseUnit(text);
  expect(isUnitFault(fault) && describeUnitFault(fault)).toBe(sentence);
});

test('a hint that is one unit can be read', () => {
  for (const text of [
    'mv',
    'KOHM',
    'kOhms',
    'mmho',
    'celsius',
    'J',
    'mA/V2',
    'nV/rtHz',
    'kV^0.3',
    'm°C',
    'u',
    'Tohm',
  ]) {
    const fault = parseUnit(text);
    if (!isUnitFault(fault) || fault.hint === null) throw new Error(text);
    const mended = text.slice(0, fault.start) + fault.hint + text.slice(fault.end);
    expect(isUnitFault(parseUnit(mended)), mended).toBe(false);
  }
});
