// Completion: which token it replaces, what it offers first, and when it keeps quiet.

import { describe, expect, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { Column } from '../../src/ui/desk/index.ts';
import { complete, sheetRows } from '../../src/ui/rows/index.ts';
import type { Completion } from '../../src/ui/rows/index.ts';

const TEXT = `V_DD = 15 V [power note]
R_D = 3.3 kohm [stock list]
R_D2 = 1 kohm
Q1 = n-JFET
  I_DSS: 6 mA
  V_P: -2 V
P1 = point of Q1
  I_D: 1 mA
  V_DS: 8 V
`;

/** Completes at the `|` of a text in a cell of the sheet. */
function at(key: string, column: Column, written: string, asked = false, text = TEXT): Completion | null {
  const sheet = createSheet(text);
  const rows = sheetRows(sheet, () => false);
  const row = rows.row(key)!;
  const caret = written.indexOf('|');
  const place = { row, line: rows.lineOf(key)!, column, isNew: row.type === 'ghost' };
  return complete(sheet, sheet.tree, place, { text: written.replace('|', ''), caret, asked });
}
const offered = (found: Completion | null): string[] => (found?.items ?? []).map((item) => item.text);

describe('names', () => {
  test('it opens after two letters, or when asked', () => {
    expect(at('ghost:0', 'name', 'x = V|')).toBeNull();
    expect(offered(at('ghost:0', 'name', 'x = V_|'))).toContain('V_DD');
    expect(offered(at('ghost:0', 'name', 'x = V|', true))).toContain('V_DD');
  });

  test('the first line of which the token is a proper prefix is marked; a finished name never', () => {
    const found = at('ghost:0', 'name', 'x = V_D|')!;
    expect(found.items[found.marked]!.text).toBe('V_DD');
    const finished = at('ghost:0', 'name', 'x = R_D|')!;
    expect([offered(finished).slice(0, 2), finished.marked]).toEqual([['R_D', 'R_D2'], -1]);
    expect(at('ghost:0', 'name', 'x = V_DD|')).toBeNull();
  });

  test('values of a block follow its name, and are found by their own', () => {
    expect(offered(at('ghost:0', 'name', 'x = P1.V|'))).toContain('P1.V_GS');
    expect(offered(at('ghost:0', 'name', 'x = marg|'))).toEqual(['P1.margin']);
    expect(at('ghost:0', 'name', 'x = 2 * P1.V_G|')).toMatchObject({ from: 8, to: 14, token: 'P1.V_G' });
  });

  test('what has the dimension of the other side comes first, and is said', () => {
    const found = at('ghost:0', 'name', 'x = check R_D >= |', true)!;
    expect(found.expected).toBe('a resistance is expected here');
    expect(offered(found).slice(0, 2)).toEqual(['R_D', 'R_D2']);
  });

  test('letters are matched whatever their case and without the underscore', () => {
    expect(offered(at('ghost:0', 'name', 'x = vdd|'))).toContain('V_DD');
  });

  test('a cell is not offered to itself', () => {
    const found = offered(at('cell:R_D', 'entry', 'R_|'));
    expect(found[0]).toBe('R_D2');
    expect(found).not.toContain('R_D');
  });
});

describe('in other places', () => {
  test('behind a number stand units, those of the wanted kind first', () => {
    expect(offered(at('ghost:0', 'name', 'x = 47 ko|'))).toEqual(['kohm']);
    expect(offered(at('ghost:0', 'name', 'x = V_DD - 3 |', true))[0]).toBe('V');
    expect(offered(at('field:Q1.V_P', 'low', '-1 |', true))[0]).toBe('V');
  });

  test('behind the equals sign stand kinds of cell, behind their words what they are of', () => {
    expect(offered(at('ghost:0', 'name', 'Q2 = n-|'))).toEqual(['n-JFET', 'n-MOSFET']);
    expect(offered(at('ghost:0', 'name', 'A1 = stage of |', true))).toEqual(['Q1']);
  });

  test('behind a kind of part stands what it may be fitted to, and below a bench what can be asked of it', () => {
    const more = `${TEXT}M1 = bench\n  columns: V_GS [V], I_D [mA]\n`;
    expect(offered(at('ghost:0', 'name', 'Q2 = n-JFET fi|', false, more))).toEqual(['fitted to ']);
    expect(offered(at('ghost:0', 'name', 'Q2 = n-JFET fitted to |', true, more))).toEqual(['M1']);
    expect(offered(at('ghost:0', 'name', 'F1 = plot bench of |', true, more))).toEqual(['M1']);
    expect(offered(at('ghost:0', 'name', '  ma|', false, more))).toEqual(['match: ']);
    expect(offered(at('ghost:0', 'name', '  col|', false, more))).toEqual([]);
  });

  test('in brackets and in the column of sources stand those used, latest first', () => {
    const expected = ['stock list', 'power note', 'same', 'assumed', 'measured'];
    expect(offered(at('cell:R_D2', 'source', '|', true))).toEqual(expected);
    expect(offered(at('ghost:0', 'name', 'x = 1 [sto|'))).toEqual(['stock list']);
  });

  test('below a block stand the lines it may still have', () => {
    const found = offered(at('ghost:0', 'name', 'V_|'));
    expect(found).toEqual(['V_GS: ', 'V_SB: ']);
  });
});
