// The sheet as rows: which there are, what they show, and that what is not touched stays the same object.

import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { sheetRows } from '../../src/ui/rows/index.ts';
import type { Row, SheetRows } from '../../src/ui/rows/index.ts';

const example = readFileSync('public/examples/crevasse-listener.txt', 'utf8');
const byDefault = (_key: string, folded: boolean): boolean => folded;
const rowsOf = (text: string, isFolded = byDefault): SheetRows => sheetRows(createSheet(text), isFolded);
const keysOf = ({ rows }: SheetRows): string[] => rows.map((row) => row.key);
const numbers = ({ low, nominal, high }: Row): string =>
  [low, nominal, high]
    .map((figure) => (figure ? `${figure.number}${figure.unit && ` ${figure.unit}`}` : '-'))
    .join(' | ');
const shown = (text: string, key: string): string => numbers(rowsOf(text).row(key)!);

const PART = 'Q1 = n-JFET\n  I_DSS: 2 mA .. 9 mA at V_DS = 15 V\n  V_P: -4 V .. -1 V\n';

describe('which rows there are', () => {
  test('one for each line that is not blank, results below their cell, and a place for a new line in each section', () => {
    const text = `# Title\n  project: P\n> Said.\n\n## One\nR_1 = 1 kohm\n${PART}\n## Two\n; note\nodd line\n`;
    expect(keysOf(rowsOf(text, () => false))).toEqual([
      'title',
      'title:project',
      'line:2',
      'section:1',
      'cell:R_1',
      'cell:Q1',
      'field:Q1.I_DSS',
      'field:Q1.V_P',
      'value:Q1.beta',
      'value:Q1.V_TO',
      'more:Q1',
      'value:Q1.g_fs0',
      'value:Q1.R_DSon',
      'value:Q1.lambda',
      'ghost:1',
      'section:2',
      'line:11',
      'line:12',
      'ghost:2',
    ]);
  });

  test('an empty sheet has a place for a new line and nothing else', () => {
    expect(keysOf(rowsOf(''))).toEqual(['ghost:0']);
    expect(rowsOf('').lineOf('ghost:0')).toBe(0);
  });

  test('two lines of one name have rows of their own', () => {
    const rows = rowsOf('x_1 = 1\nx_1 = 2\n');
    expect(keysOf(rows).slice(0, 2)).toEqual(['cell:x_1', 'cell:x_1#2']);
    expect(rows.row('cell:x_1#2')!.mark).toBe('broken');
  });

  test('a value that the sheet reads elsewhere has a row at once, others are folded', () => {
    const before = keysOf(rowsOf(PART));
    expect(before).not.toContain('value:Q1.g_fs0');
    expect(keysOf(rowsOf(`${PART}x_1 = Q1.g_fs0\n`))).toContain('value:Q1.g_fs0');
  });

  test('the readings of a long bench are folded, and unfold by themselves around a fault', () => {
    const bench = (readings: readonly string[]): string =>
      `M1 = bench\n  columns: V_GS [V], I_D [mA]\n  V_DS: 10 V\n${readings.map((each) => `  ${each}\n`).join('')}`;
    const readings = Array.from({ length: 12 }, (_, k) => `${-k / 8}, ${(2 - k / 8) ** 2}`);
    const rows = rowsOf(bench(readings));
    expect(rows.row('readings:M1')!.fold).toEqual({ key: 'readings:M1', open: false });
    expect(rows.row('row:M1.12')).toBeNull();
    expect(rowsOf(bench(readings.slice(0, 8))).row('row:M1.8')).not.toBeNull();
    const broken = rowsOf(bench(readings.with(3, '1 A, 2')));
    expect(broken.row('row:M1.4')!.fault?.text).toBe('V_GS is a voltage; 1 A is a current.');
  });

  test('the wiring of a solved stage is folded, and unfolds by itself around a fault', () => {
    const rows = rowsOf(example);
    expect(rows.row('wiring:A1')!.fold).toEqual({ key: 'wiring:A1', open: false });
    expect(rows.row('field:A1.gate')).toBeNull();
    const broken = rowsOf(example.replace('gate: R_G to 0 V, 47 nF', 'gate: R_G to 0 V, 47 nX'));
    expect(broken.row('field:A1.gate')!.fault).not.toBeNull();
  });

  test('a folded section shows the worst mark inside it', () => {
    const text = '## One\nx_1 = 1\nlow_1 = check x_1 >= 2\nx_2 = 1 V + 1 A\n## Two\nhigh_1 = check x_1 >= 3\n';
    const rows = rowsOf(text, (key) => key.startsWith('section'));
    expect(keysOf(rows)).toEqual(['section:1', 'section:2']);
    expect(rows.rows.map((row) => row.mark)).toEqual(['broken', 'fails']);
  });

  test('a place for a new line stands behind the last line of its section that is not blank', () => {
    expect(rowsOf('## One\nx_1 = 1\n\n\n## Two\n').lineOf('ghost:1')).toBe(2);
    expect(rowsOf('## One\nx_1 = 1\n\n\n## Two\n').lineOf('ghost:2')).toBe(5);
  });
});

describe('numbers', () => {
  test.each([
    ['R_1 = 1.2 kohm ± 1 %', '1.188 | 1.2 kΩ | 1.212'],
    ['R_1 = 4k7 ± 5 %', '4.465 | 4.7 kΩ | 4.935'],
    ['R_1 = 0.28 ohm', '- | 0.28 Ω | -'],
    ['V_1 = 24 V in 21 V .. 27 V service', '21 | 24 V | 27'],
    ['T_1 = -12 degC in -40 degC .. 10 degC', '−40 | −12 °C | 10'],
    ['I_1 = 8 mA in 5 mA ..', '5 | 8 mA | open'],
    // Ends are rounded outward.
    ['R_1 = 3.333 kohm ± 1 %', '3.299 | 3.333 kΩ | 3.367'],
  ])('of an input are as typed: %s', (line, expected) => {
    expect(shown(`${line}\n`, `cell:${line.split(' ')[0]}`)).toBe(expected);
  });

  test('of a formula are its value alone', () => {
    expect(shown('x_1 = 10 V / 3\n', 'cell:x_1')).toBe('- | 3.33 V | -');
  });

  test('of negative quantities in a part stand by magnitude, as data sheets print them', () => {
    expect(shown(PART, 'field:Q1.V_P')).toBe('−1 | −2.00 V | −4');
    expect(rowsOf(PART).row('field:Q1.V_P')!.nominal!.look).toBe('chosen');
  });

  test('a check shows what it compares, its limit on the bar and what is to spare', () => {
    const row = rowsOf('V_1 = 5 V\nok_1 = check abs(V_1) >= 2 V\n').row('cell:ok_1')!;
    expect(numbers(row)).toBe('- | 5 V | -');
    expect(row.bar!.posts).toEqual([{ at: 0.08, forbids: 'left', passed: false }]);
    expect([row.mark, row.source!.text, row.source!.look]).toEqual(['holds', '3.00 V to spare', 'ok']);
  });

  test('a limit on the left is the same limit', () => {
    const row = rowsOf('V_1 = 5 V\nbad_1 = check 2 V >= V_1\n').row('cell:bad_1')!;
    expect(row.bar!.posts).toMatchObject([{ forbids: 'right', passed: true }]);
    expect([row.mark, row.source!.text]).toEqual(['fails', '3.00 V short']);
  });
});

describe('marks, sources and faults', () => {
  test.each([
    ['R_1 = 1 ohm [stock list]', 'input', 'stock list'],
    ['R_1 = 1 ohm [assumed]', 'assumed', 'assumed'],
    ['R_1 = 1 ohm', 'no-source', 'no source yet'],
    ['R_1 = 1 ohm + 2 ohm', 'computed', undefined],
  ])('of %s', (line, mark, source) => {
    const row = rowsOf(`${line}\n`).row('cell:R_1')!;
    expect([row.mark, row.source?.text]).toEqual([mark, source]);
  });

  test('a fault is said once, at its place in the entry, and those that rest on it wait', () => {
    const rows = rowsOf('  \nV_1 = 15 V + 2 mA\nx_1 = V_1 / 2\n');
    const broken = rows.row('cell:V_1')!;
    expect([broken.mark, broken.fault!.at, broken.fault!.column]).toEqual([
      'broken',
      { column: 'entry', start: 0, end: 11 },
      1,
    ]);
    const waiting = rows.row('cell:x_1')!;
    expect([waiting.fault, waiting.waitsFor, waiting.nominal]).toEqual([null, 'V_1', null]);
  });

  test('the column of a fault counts characters of the entry from 1', () => {
    expect(rowsOf('x_1 = 1 + no_such\n').row('cell:x_1')!.fault!.column).toBe(5);
  });
});

describe('identity', () => {
  test('rows that say the same are the same objects after an edit elsewhere', () => {
    const sheet = createSheet(example);
    const before = sheetRows(sheet, byDefault);
    sheet.update(example.replace('R_probe = 2.2 kohm', 'R_probe = 2.7 kohm'));
    const after = sheetRows(sheet, byDefault, before);
    const changed = after.rows.filter((row) => before.row(row.key) !== row).map((row) => row.key);
    expect(changed).toContain('cell:R_probe');
    expect(changed).toContain('value:A3.I_D');
    expect(changed.filter((key) => !/A3|R_probe|loss|switch/.test(key))).toEqual([]);
  });

  test('a line put in above moves the lines of rows and changes none of them', () => {
    const sheet = createSheet('x_1 = 1\nx_2 = 2\n');
    const before = sheetRows(sheet, byDefault);
    sheet.update('x_0 = 0\nx_1 = 1\nx_2 = 2\n');
    const after = sheetRows(sheet, byDefault, before);
    expect(after.row('cell:x_2')).toBe(before.row('cell:x_2'));
    expect([before.lineOf('cell:x_2'), after.lineOf('cell:x_2')]).toEqual([1, 2]);
  });
});
