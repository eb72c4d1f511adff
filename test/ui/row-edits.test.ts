// Edits of rows as splices: what a column puts before the user, and what their answer makes of the text.

import { describe, expect, test } from 'vitest';
import { applySplices } from '../../src/language/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import type { Column } from '../../src/ui/desk/index.ts';
import {
  editSplices,
  editText,
  nextValue,
  setNumbers,
  setTurned,
  sheetRows,
  snapped,
  turnedNumber,
} from '../../src/ui/rows/index.ts';
import type { EditPlace } from '../../src/ui/rows/index.ts';

function placeOf(
  text: string,
  key: string,
  column: Column,
): { sheet: ReturnType<typeof createSheet>; place: EditPlace } {
  const sheet = createSheet(text);
  const rows = sheetRows(sheet, () => false);
  const row = rows.row(key)!;
  return { sheet, place: { row, line: rows.lineOf(key)!, column, isNew: row.type === 'ghost' } };
}

/** The text before and after an edit: `was -> text of the sheet`. */
function edited(text: string, key: string, column: Column, written: string): [string, string] {
  const { sheet, place } = placeOf(text, key, column);
  return [editText(sheet.tree, place), applySplices(text, editSplices(sheet.tree, place, written))];
}

describe('entries, names and sources', () => {
  test.each<[string, string, Column, string, string, string]>([
    ['R_1  =  1 kohm   [a] ; b\n', 'cell:R_1', 'entry', '2 kohm', '1 kohm', 'R_1  =  2 kohm   [a] ; b\n'],
    ['R_1 = 1 kohm\nx = R_1 * 2\n', 'cell:R_1', 'name', 'R_2', 'R_1', 'R_2 = 1 kohm\nx = R_2 * 2\n'],
    ['R_1 = 1 kohm [list]\n', 'cell:R_1', 'source', 'note 3 ; new', 'list', 'R_1 = 1 kohm [note 3]  ; new\n'],
    ['R_1 = 1 kohm [list] ; old\n', 'cell:R_1', 'source', '', 'list ; old', 'R_1 = 1 kohm\n'],
    ['R_1 = 1 kohm\n', 'cell:R_1', 'source', 'assumed', '', 'R_1 = 1 kohm  [assumed]\n'],
    ['R_1 = 1 kohm [a; b]\n', 'cell:R_1', 'source', '[a; c]', '[a; b]', 'R_1 = 1 kohm [a; c]\n'],
    ['## One\nx = 1\n', 'section:1', 'name', 'Two', 'One', '## Two\nx = 1\n'],
    ['odd line\n', 'line:0', 'entry', 'x = 1', 'odd line', 'x = 1\n'],
    ['x = 1\n', 'cell:x', 'entry', '1 V + ((', '1', 'x = 1 V + ((\n'],
  ])('%j: %s %s', (text, key, column, written, was, after) => {
    expect(edited(text, key, column, written)).toEqual([was, after]);
  });

  test('a name that is taken changes its own line alone', () => {
    expect(edited('a_1 = 1\nb_1 = a_1\n', 'cell:a_1', 'name', 'b_1')[1]).toBe('b_1 = 1\nb_1 = a_1\n');
  });
});

describe('new lines', () => {
  const PART = 'Q1 = n-JFET\n  I_DSS: 2 mA\n';

  test.each([
    ['x_1 = 1\n', 'x_2 = 2 [assumed]', 'x_1 = 1\nx_2 = 2 [assumed]\n'],
    [PART, 'V_P: -2 V', `${PART}  V_P: -2 V\n`],
    [PART, '  V_P: -2 V', `${PART}  V_P: -2 V\n`],
    [PART, 'x_1 = 1', `${PART}x_1 = 1\n`],
    ['x_1 = 1\n', 'note: this', 'x_1 = 1\nnote: this\n'],
    ['', 'V_DD = 15 V', 'V_DD = 15 V'],
    ['x_1 = 1\n', '   ', 'x_1 = 1\n'],
  ])('%j and %j', (text, written, after) => {
    const { sheet, place } = placeOf(text, 'ghost:0', 'name');
    expect(applySplices(text, editSplices(sheet.tree, place, written)).trimEnd()).toBe(after.trimEnd());
  });
});

describe('numbers of a data-sheet row', () => {
  const row = (body: string): string => `Q1 = n-JFET\n  I_DSS: 5 mA\n  V_P: ${body}\n`;
  const after = (body: string, column: Column, written: string): string =>
    edited(row(body), 'field:Q1.V_P', column, written)[1].split('\n')[2]!.replace('  V_P: ', '');

  test.each<[string, Column, string, string]>([
    ['-4 V .. -1 V', 'low', '-1.2 V', '-4 V .. -1.2 V'],
    ['-4 V .. -1 V', 'high', '-5', '-5 V .. -1 V'],
    ['-4 V .. -1 V', 'nominal', '-2', '-2 V in -4 V .. -1 V'],
    ['-2 V in -4 V .. -1 V at I_D = 10 nA', 'nominal', '', '-4 V .. -1 V at I_D = 10 nA'],
    ['-2 V', 'high', '-4', '-2 V in -4 V ..'],
    ['-2 V', 'low', '-1', '-2 V in .. -1 V'],
    ['-4 V .. -1 V', 'high', '', '.. -1 V'],
    ['-4 V .. -1 V normal at I_D = 10 nA', 'low', '-2 V', '-4 V .. -2 V normal at I_D = 10 nA'],
  ])('%s with %s %s', (body, column, written, expected) => {
    expect(after(body, column, written)).toBe(expected);
  });

  test('three numbers of a table fill the row', () => {
    const text = row('-2 V at I_D = 10 nA');
    const sheet = createSheet(text);
    expect(applySplices(text, setNumbers(sheet.tree, 2, ['-1', '', '-4']))).toBe(row('-4 V .. -1 V at I_D = 10 nA'));
  });
});

describe('turning a number', () => {
  const turn = (line: string, way: 'up' | 'down', column: Column = 'entry'): string | null => {
    const { tree } = createSheet(line);
    const turned = turnedNumber(tree, 0, column);
    const next = turned && nextValue(turned, way);
    return turned && next !== null ? applySplices(line, setTurned(turned, next)) : null;
  };

  test.each([
    ['R_S = 1.2 kohm ± 1 %', 'up', 'R_S = 1.3 kohm ± 1 %'],
    ['R_S = 910 ohm', 'up', 'R_S = 1 kohm'],
    ['R_S = 910Ω ± 5 %', 'up', 'R_S = 1kΩ ± 5 %'],
    ['R_S = 9k1', 'up', 'R_S = 10k'],
    ['R_S = 1.25 kohm', 'down', 'R_S = 1.2 kohm'],
    ['C_1 = 4n7', 'down', 'C_1 = 4n3'],
    ['V_1 = 18 V', 'up', 'V_1 = 18.1 V'],
    ['V_1 = -2.2 V', 'up', 'V_1 = -2.18 V'],
    ['V_1 = 999 mV', 'up', 'V_1 = 1 V'],
    ['T_1 = -12 degC', 'up', 'T_1 = -11.9 degC'],
    ['l_1 = 0.004 /V', 'down', 'l_1 = 0.00398 /V'],
  ] as const)('%s %s', (line, way, expected) => {
    expect(turn(line, way)).toBe(expected);
  });

  test('a formula has no number to turn', () => {
    expect(turn('x = 2 * 3 V', 'up')).toBeNull();
    expect(turn('I_1 = 2 mA .. 9 mA', 'up')).toBeNull();
  });

  test('a dragged tick snaps to the series', () => {
    const turned = turnedNumber(createSheet('R_1 = 1 kohm').tree, 0, 'nominal')!;
    expect([1490, 1560].map((value) => snapped(turned, value))).toEqual([1500, 1600]);
  });
});
