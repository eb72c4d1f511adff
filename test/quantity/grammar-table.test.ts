// The rows of the grammar's table of examples, as far as numbers and units decide them: what is read as
// a number with its unit, and what is left for the language.

import { expect, test } from 'vitest';
import {
  isUnitFault,
  isUnitSymbol,
  knownUnit,
  readCode,
  scaleToSI,
  scanCode,
  scanUnit,
} from '../../src/quantity/index.ts';

/** Reads `NUMBER [blanks] UNIT` as far as it goes: the SI value, and what is left. */
function readNumber(text: string): readonly [value: number, rest: string] {
  const code = scanCode(text, 0);
  if (code) return [code.value, text.slice(code.end)];
  const [digits] = /^-?\d+(\.\d+)?/.exec(text)!;
  const blanks = /^ */.exec(text.slice(digits.length))![0].length;
  const scanned = scanUnit(text, digits.length + blanks);
  if (isUnitFault(scanned)) return [scaleToSI(digits, null), text.slice(digits.length)];
  return [scaleToSI(digits, scanned.unit), text.slice(scanned.end)];
}

test.each([
  ['10 V / R', 10, ' / R'],
  ['10 V/R', 10, '/R'],
  ['10 V/2', 10, '/2'],
  ['10 V*R', 10, '*R'],
  ['0.01 /V', 0.01, ''],
  ['0.01/V', 0.01, ''],
  ['0.5 V^0.5', 0.5, ''],
  ['1/A1.g_m || R', 1, '/A1.g_m || R'],
  ['1 /A1.g_m', 1, ' /A1.g_m'],
  ['1 /V', 1, ''],
  ['1/50 V', 1, '/50 V'],
  ['-20 V', -20, ''],
  ['-40 degC', 233.15, ''],
  ['5 mA in 2 mA .. 9 mA normal at V_DS = 15 V', 5e-3, ' in 2 mA .. 9 mA normal at V_DS = 15 V'],
  ['10 V^2', 10, ''],
  ['10 V ^ 2', 10, ' ^ 2'],
  ['1M0', 1e6, ''],
  ['4k7', 4700, ''],
  ['4K7', 4700, ''],
  ['47k', 47_000, ''],
  ['470R', 470, ''],
  ['4n7', 4.7e-9, ''],
  ['10p', 10e-12, ''],
  ['4m7', 4, 'm7'],
  ['4k7 ohm', 4700, ' ohm'],
  ['300K', 300, ''],
  ['8 mA in 5 mA ..', 8e-3, ' in 5 mA ..'],
  ['2 mA .. 9 mA', 2e-3, ' .. 9 mA'],
  ['1 nA', 1e-9, ''],
  ['1..5', 1, '..5'],
  ['15 V [see https://x, p. 2] ; [3]', 15, ' [see https://x, p. 2] ; [3]'],
])('%s begins with %d, then "%s"', (text, value, rest) => {
  expect(readNumber(text)).toEqual([value, rest]);
});

test('10 V^2 is in square volts', () => {
  expect(scanUnit('10 V^2', 3)).toMatchObject({ unit: { kind: knownUnit('V*V').kind } });
});

test('4.7k is no code, and its k is a prefix that wants an ohm', () => {
  expect(readCode('4.7k')).toBeNull();
  expect(scanUnit('4.7k', 3)).toMatchObject({ fault: 'prefix alone', text: 'k', hint: 'kohm' });
});

test('R47 is a name: no code and no unit', () => {
  expect(readCode('R47')).toBeNull();
  expect(isUnitSymbol('R47')).toBe(false);
});

test('V is a unit and so no cell name, A1 is none', () => {
  expect(isUnitSymbol('V')).toBe(true);
  expect(isUnitSymbol('A1')).toBe(false);
});

test('300K is kelvin', () => {
  expect(readCode('300K')).toBeNull();
  expect(scanUnit('300K', 3)).toMatchObject({ unit: { kind: knownUnit('K').kind } });
});
