// A row's value against an input behind it: what is offered, and that the line written for it draws.

import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { applySplices } from '../../src/language/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { inputsBehind, plotAgainst, plottedPath, sheetRows, writePlot } from '../../src/ui/rows/index.ts';

const SHEET = `V_DD = 15 V
V_G = 0 V
R_S = 1.2 kohm ± 1 %
R_D = R_S * 2
T_A = 25 degC
a_1 = 6 dB
Q1 = n-JFET
  I_DSS: 6 mA
  V_P: -3 V
A1 = stage of Q1
  gate: 1 Mohm to V_G
  drain: R_D to V_DD
  source: R_S to 0 V
  output: drain
y = A1.I_D * R_S
c = check A1.I_D > 0.1 mA
`;
const sheet = createSheet(SHEET);
const paths = (path: string): string[] => inputsBehind(path, sheet).map((input) => input.path);

test('numbers of quantities and offered values can be plotted, regions, checks and blocks cannot', () => {
  const rows = sheetRows(sheet, () => false);
  const path = (key: string): string | null => plottedPath(rows.row(key)!, sheet);
  expect(['cell:R_D', 'value:A1.I_D', 'value:A1.region', 'cell:c', 'cell:A1', 'ghost:0'].map(path)).toEqual([
    'R_D',
    'A1.I_D',
    null,
    null,
    null,
    null,
  ]);
});

test('the inputs offered are those behind the value, in sheet order', () => {
  expect(paths('R_D')).toEqual(['R_S']);
  expect(paths('A1.I_D').filter((path) => path !== 'T_A')).toEqual(['V_DD', 'V_G', 'R_S', 'Q1.I_DSS', 'Q1.V_P']);
  expect(paths('R_S')).toEqual([]);
});

const example = createSheet(readFileSync('public/examples/crevasse-listener.txt', 'utf8'));

test.each([
  ...inputsBehind('A1.I_D', sheet).map((input) => ['A1.I_D', sheet, input] as const),
  ...inputsBehind('G_chain', example).map((input) => ['G_chain', example, input] as const),
])('%s is drawn over each input: %#', (path, from, input) => {
  const { splices, name, line } = plotAgainst(path, input, from);
  const after = createSheet(applySplices(from.tree.text, splices));
  expect([after.error(name)?.text ?? null, after.tree.lines[line]?.text.startsWith(`${name} = plot ${path} `)]).toEqual(
    [null, true],
  );
  const sweep = after.sweep(name, 9)!;
  expect(sweep.input.values[0]).toBeLessThan(input.value);
  expect(sweep.input.values[8]).toBeGreaterThan(input.value);
});

test('a range is a quarter to four times the value, and a step to either side where that has no sense', () => {
  const range = (path: string): string => {
    const text = `${SHEET}z = y + (T_A - 20 degC) / 1 K * 1 V + V_G * (a_1 - 3 dB) / 1 dB\n`;
    const wide = createSheet(text);
    const input = inputsBehind('z', wide).find((each) => each.path === path);
    return input
      ? plotAgainst('z', input, wide)
          .splices.map((each) => each.text)
          .join('')
          .trim()
      : 'none';
  };
  expect(range('R_S')).toBe('F1 = plot z against R_S over 300 ohm .. 4.8 kohm log');
  expect(range('V_G')).toBe('F1 = plot z against V_G over -1 V .. 1 V');
  expect(range('T_A')).toBe('F1 = plot z against T_A over -25 degC .. 75 degC');
  expect(range('a_1')).toBe('F1 = plot z against a_1 over -14 dB .. 26 dB');
  expect(range('Q1.V_P')).toBe('F1 = plot z against Q1.V_P over -12 V .. -750 mV');
});

test('a new plot stands behind the last one under a free name', () => {
  const text = `${SHEET}F1 = plot transfer of A1\nend = 1\n`;
  const { splices, name } = writePlot('output of A1', createSheet(text));
  expect(name).toBe('F2');
  expect(applySplices(text, splices)).toContain('F1 = plot transfer of A1\nF2 = plot output of A1\nend = 1\n');
});
