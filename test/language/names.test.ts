// Which names a cell may bear, and which known name was meant.

import { expect, test } from 'vitest';
import { isCellName, nearestNames, RESERVED } from '../../src/language/index.ts';

test.each(['R_S', 'x', 'β', 'λ_1', 'Q1', 'E24', 'gain', 'normal', 'log', 'M', 'k', 'T_A', 'R47', 'Ω_1', 'headroom'])(
  '%s may name a cell',
  (name) => {
    expect(isCellName(name)).toBe(true);
  },
);

test.each([
  'V',
  'mA',
  'K',
  'C',
  'ohm',
  'Ω',
  '\u2126',
  'kΩ',
  'µA',
  'dB',
  'ppm',
  'in',
  'gate',
  'pi',
  'π',
  'k_B',
  '',
  '1x',
  '_x',
  'a.b',
  'a b',
  'é',
])('%s may not', (name) => {
  expect(isCellName(name)).toBe(false);
});

test('the words of the grammar are reserved, one by one', () => {
  const words =
    'in at as to from of over such that with within against another each through common and or not if check plot stage point bench ' +
    'fitted pi k_B q_e cutoff ohmic saturation signal gate drain source bulk';
  expect([...RESERVED]).toEqual(words.split(' '));
});

test.each([
  ['I_DS', ['I_DSS', 'R_DS'], ['I_DSS', 'R_DS']],
  ['i_dss', ['V_P', 'I_DSS'], ['I_DSS']],
  ['maring', ['margin', 'region'], ['margin']],
  ['R_D', ['R_S', 'R_G', 'R_D'], ['R_S', 'R_G']],
  ['headrom', ['heat', 'headroom'], ['headroom']],
  ['xyz', ['headroom', 'a'], []],
  ['a', ['b', 'A'], ['A']],
  ['transfr', ['transfer', 'transfer'], ['transfer']],
  ['aaaa', ['aaab', 'aaac', 'aaad', 'aaae'], ['aaab', 'aaac', 'aaad']],
])('for %s among %j is meant %j', (name, candidates, expected) => {
  expect(nearestNames(name, candidates)).toEqual(expected);
});
