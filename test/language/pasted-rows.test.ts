// Tables as spreadsheets and instruments hand them over, read as the rows of a bench.

import { describe, expect, test } from 'vitest';
import { parseSheet, pastedBench, readPastedRows } from '../../src/language/index.ts';

const HEAD = 'VGS [V]\tID [mA]\tVDS [V]';

/** The rows of a table without faults, a line each. */
function rows(text: string, options = {}): string[] {
  const { faults, rows: found } = readPastedRows(text, options);
  expect(faults).toEqual([]);
  return found.map((row) => row.join(' | '));
}

/** The faults of a table as `line:column text`. */
function faults(text: string): string[] {
  return readPastedRows(text).faults.map(({ line, column, text: said }) => `${line}:${column} ${said}`);
}

describe('separators', () => {
  test.each([
    ['tabs', `${HEAD}\r\n-0.5\t2.1\t15\r\n-1\t1.2\t15\r\n`],
    ['semicolons', 'VGS [V];ID [mA];VDS [V]\n-0.5;2.1;15\n\n-1;1.2;15'],
    ['commas', 'VGS [V],ID [mA],VDS [V]\n-0.5,2.1,15\n-1,1.2,15'],
    ['quotation marks', '"VGS [V]","ID [mA]","VDS [V]"\n"-0.5","2.1","15"\n"-1","1.2","15"\n'],
    ['a true minus and a plus', `${HEAD}\n−0.5\t+2.1\t15\n−1\t1.2\t15`],
  ])('%s stand between the columns', (_, text) => {
    expect(rows(text)).toEqual(['-0.5 | 2.1 | 15', '-1 | 1.2 | 15']);
  });
});

describe('the comma in a number', () => {
  test('is a decimal mark where tabs or semicolons separate, and that is said', () => {
    const table = readPastedRows(`VGS [V];ID [mA];VDS [V]\n-0,5;2,1;15\n-1;1,234;15`);
    expect(table.rows).toEqual([
      ['-0.5', '2.1', '15'],
      ['-1', '1.234', '15'],
    ]);
    expect(table.notes).toEqual(['The comma is read as a decimal mark.']);
    expect(table.isAmbiguous).toBe(false);
  });

  test('is one as well inside quotation marks', () => {
    expect(rows('VGS [V],ID [mA],VDS [V]\n"-0,5","2,1",15')).toEqual(['-0.5 | 2.1 | 15']);
  });

  test('stands between thousands where another number has a decimal point', () => {
    expect(rows(`VGS [V]\tID [uA]\tVDS [V]\n-0.5\t2,100\t15\n-1\t1,234,567.5\t15`)).toEqual([
      '-0.5 | 2100 | 15',
      '-1 | 1234567.5 | 15',
    ]);
  });

  test('is a decimal mark behind a point between thousands', () => {
    expect(rows(`VGS [V]\tID [uA]\tVDS [V]\n-1\t1.234,5\t15`)).toEqual(['-1 | 1234.5 | 15']);
  });

  test('is said to be open where every comma has three digits behind it, and is read as it is told', () => {
    const text = `VGS [V]\tID [uA]\tVDS [V]\n-1\t1,234\t15\n-2\t2,345\t15`;
    const table = readPastedRows(text);
    expect(table.isAmbiguous).toBe(true);
    expect(table.notes).toEqual(['1,234 can be read in two ways: it is taken as 1.234, not as 1234.']);
    expect(table.rows.map((row) => row[1])).toEqual(['1.234', '2.345']);
    expect(rows(text, { decimal: 'point' })).toEqual(['-1 | 1234 | 15', '-2 | 2345 | 15']);
  });

  test('of -0,500 is no mark between thousands, which never begin with 0', () => {
    const table = readPastedRows(`${HEAD}\n-0,500\t2,100\t15`);
    expect([table.isAmbiguous, table.rows]).toEqual([false, [['-0.500', '2.100', '15']]]);
  });

  test('is refused where it also separates the columns', () => {
    expect(faults('VGS [V],ID [mA],VDS [V]\n-0,5,2,1,15')).toEqual([
      '2:4 Commas stand here between the numbers and perhaps inside them, which cannot be told apart. Paste the table with tabs or semicolons between its columns.',
    ]);
  });
});

describe('headings', () => {
  test.each([
    ['V_GS [V]', 'V_GS [V]'],
    ['VGS (mV)', 'V_GS [mV]'],
    ['Vgs/V', 'V_GS [V]'],
    ['U_GS / V', 'V_GS [V]'],
    ['Gate voltage [V]', 'V_GS [V]'],
    ['v gs V', 'V_GS [V]'],
  ])('%s is the gate voltage', (heading, written) => {
    const table = readPastedRows(`${heading}\tID(µA)\tV_DS [V]\n1\t2\t3`);
    expect(table.columns.map(({ name, unit }) => `${name} [${unit}]`)).toEqual([written, 'I_D [uA]', 'V_DS [V]']);
  });

  test('units may stand in a line of their own', () => {
    const table = readPastedRows('part\tVGS\tID\tVDS\n\t(V)\t(mA)\t(V)\nQ7\t-0.5\t2.1\t15');
    expect(table.columns).toEqual([
      { name: 'part', unit: null },
      { name: 'V_GS', unit: 'V' },
      { name: 'I_D', unit: 'mA' },
      { name: 'V_DS', unit: 'V' },
    ]);
    expect(table.rows).toEqual([['Q7', '-0.5', '2.1', '15']]);
  });

  test('a voltage without a unit is read in V, which is said; a current without one is refused', () => {
    const table = readPastedRows('VGS\tID\n-0.5\t2.1');
    expect(table.notes).toEqual(['VGS has no unit and is read in V.']);
    expect(table.faults.map(({ text }) => text)).toEqual([
      'ID has no unit of current. Write it in the first line, as in ID [mA].',
    ]);
    expect(table.lacksDrainVoltage).toBe(true);
  });

  test('further columns are left out, which is said', () => {
    const table = readPastedRows(`unit\tdate\t${HEAD}\ns1\t3 May\t-0.5\t2.1\t15`);
    expect(table.rows).toEqual([['s1', '-0.5', '2.1', '15']]);
    expect(table.notes).toEqual([
      'date is left out: a bench has V_GS, I_D, V_DS and one column that names the specimen, which is unit.',
    ]);
  });

  test('a table without headings, or without V_GS or I_D, is refused', () => {
    expect(faults('-0.5\t2.1\t15')).toEqual([
      '1:1 The first line names no columns. Put a line above the numbers such as VGS [V], ID [mA], VDS [V].',
    ]);
    expect(faults('VGS [V]\tVDS [V]\n1\t2')).toEqual([
      '1:1 No column is I_D. Name one in the first line, as in ID [mA].',
    ]);
    expect(faults('VGS [V]\tID [mA]\tUgs [V]\n1\t2\t3')).toEqual([
      '1:3 Ugs [V] is V_GS, and so is VGS [V]. Keep one of the two columns.',
    ]);
  });
});

describe('places', () => {
  test('an empty or unreadable one is told by line and column of the pasted text', () => {
    expect(faults(`${HEAD}\n-0.5\t\t15\n\n-1\tn/a\t15\n-1\t1\t15\t9`)).toEqual([
      '2:2 The place of I_D is empty. Write what was measured there, or take the line out.',
      '4:2 n/a is no number for I_D.',
      '5:4 This line has 4 places and the first line names 3 columns.',
    ]);
  });

  test('a number may bring its unit', () => {
    expect(rows(`${HEAD}\n-500 mV\t2.1mA\t15`)).toEqual(['-500 mV | 2.1 mA | 15']);
  });

  test('specimens get names of the language, each its own, and an empty place takes the one above', () => {
    const table = readPastedRows(`no.\t${HEAD}\n3\t1\t1\t1\nA-1\t1\t1\t1\n\t2\t1\t1\nA 1\t1\t1\t1\n7/2\t1\t1\t1`);
    expect(table.rows.map(([name]) => name)).toEqual(['3', 'A_1', 'A_1', 'A_1_2', 's7_2']);
    expect(table.columns[0]).toEqual({ name: 'specimen', unit: null });
    expect(table.notes).toEqual(['Specimens are written as names: A-1 as A_1, A 1 as A_1_2, 7/2 as s7_2.']);
  });
});

test('what is written reads as a bench with the same numbers', () => {
  const table = readPastedRows('nr;VGS (V);ID (µA)\n1;-0,5;2100\n1;-1;1200\n2;-0,75;1800');
  const lines = pastedBench('M1', table, '10 V');
  expect(lines).toEqual([
    'M1 = bench',
    '  columns: nr, V_GS [V], I_D [uA]',
    '  V_DS: 10 V',
    '  1, -0.5, 2100',
    '  1, -1, 1200',
    '  2, -0.75, 1800',
  ]);
  const [cell] = parseSheet(lines.join('\n')).cells;
  expect(cell.fields.map(({ body }) => body.type)).toEqual(['columns', 'quantity']);
  expect(cell.rows.map(({ values }) => values.map((value) => ('name' in value ? value.name : value.value)))).toEqual([
    [1, -0.5, 2100],
    [1, -1, 1200],
    [2, -0.75, 1800],
  ]);
});
