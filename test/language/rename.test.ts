// Renaming a cell: exactly its uses, and nothing that is only spelled like it.

import fc from 'fast-check';
import { expect, test, vi } from 'vitest';
import { applySplices, invertSplices, parseSheet, renameCell } from '../../src/language/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomSheet } from '../support/random-sheet.ts';

vi.setConfig({ testTimeout: 30_000 });

function renamed(text: string, name: string, newName: string): string {
  return applySplices(text, renameCell(parseSheet(text), name, newName));
}

test('every use of a cell is renamed', () => {
  const text = [
    '# T',
    '  checked: R_S, A1.R_S, x [R_S]',
    'R_S = 1 kohm',
    'y = R_S + f(R_S, 2 * √R_S) || -R_S^2 as kohm',
    'z = (y with R_S = 2 kohm) + R_S.value',
    'R_Sb = another R_S',
    'A1 = stage of Q1',
    '  source: R_S to 0 V, R_S || y to V_DD - R_S * 1 mA, to common',
    '  driven: through R_S',
    '  midband: 1 / (R_S * 1 nF)',
    'c = check R_S > 1 ohm and not R_S within R_S .. 2 ohm',
    'i = R_S such that R_S = R_S over R_S .. 2 * R_S',
    'F1 = plot R_S, y against R_S over R_S .. 1 kohm',
  ].join('\n');
  expect(renamed(text, 'R_S', 'R_T')).toBe(
    text.replaceAll('R_S', 'R_T').replace('A1.R_T', 'A1.R_S').replace('[R_T]', '[R_S]').replace('R_Tb', 'R_Sb'),
  );
});

test('the names behind of, another, fitted to and in the head of a stage are uses', () => {
  const text = [
    'Q1 = n-JFET fitted to M1',
    'Q2 = another Q1',
    'P1 = point of Q1',
    '  V_GS: Q1.V_P / 2',
    'A1 = stage of Qa = Q1, Qb = Q1',
    'A2 = stage of Q1',
    'M1 = bench',
    'F1 = plot bench of M1',
    'F2 = plot transfer of A1',
    'F3 = plot spread of A1.I_D',
  ].join('\n');
  expect(renamed(text, 'Q1', 'T1')).toBe(text.replaceAll('Q1', 'T1'));
  expect(renamed(text, 'M1', 'N')).toBe(text.replaceAll('M1', 'N'));
  expect(renamed(text, 'A1', 'B1')).toBe(text.replaceAll('A1', 'B1'));
});

test('labels, offered values, conditions, functions, texts, sources and notes are no uses', () => {
  const text = [
    '# gain of V_DS',
    '  project: V_DS',
    '> V_DS',
    'V_DS = 1 V  [V_DS] ; V_DS',
    'x = A1.V_DS + V_DS(1) + 2 V at V_DS = 15 V',
    'P1 = point of Q1',
    '  V_DS: 5 V',
    'M1 = bench',
    '  columns: V_DS [V]',
    '  V_DS, 3',
    '; V_DS',
  ].join('\n');
  expect(renamed(text, 'V_DS', 'W')).toBe(text.replace('\nV_DS = 1', '\nW = 1'));
});

test('a node and a FET of a stage are no uses of a cell of their name, an element is', () => {
  const text = [
    'out = 1 kohm',
    'Qa = n-JFET',
    'A1 = stage of Qa = Qa, Qb = Qa',
    '  Qa.drain: out to out, out to Qa.gate, to out',
    '  out: 1 kohm to out + 1 V',
    '  output: out - Qa.drain',
    'A2 = stage of Qa',
    '  drain: to out',
  ].join('\n');
  expect(renamed(text, 'out', 'R')).toBe(
    text
      .replace('out = 1', 'R = 1')
      .replace('drain: out to out, out to', 'drain: R to out, R to')
      .replace('to out + 1', 'to R + 1')
      .replace('drain: to out', 'drain: to R'),
  );
  expect(renamed(text, 'Qa', 'Q')).toBe(
    text
      .replace('Qa = n', 'Q = n')
      .replace('Qa = Qa, Qb = Qa', 'Qa = Q, Qb = Q')
      .replace('stage of Qa\n', 'stage of Q\n'),
  );
});

test('both spellings of a Greek name are uses, and the new name is written as given', () => {
  expect(renamed('β = 1\nx = beta + β_1 + A1.β\n', 'beta', 'γ')).toBe('γ = 1\nx = γ + β_1 + A1.β\n');
});

test('uses below a stage whose head cannot be read are renamed', () => {
  expect(renamed('R_S = 1\nA1 = stage of\n  source: R_S to 0 V\n', 'R_S', 'R')).toBe(
    'R = 1\nA1 = stage of\n  source: R to 0 V\n',
  );
});

test('cells of the same name are renamed together', () => {
  expect(renamed('a = 1\na = 2\nb = a\n', 'a', 'c')).toBe('c = 1\nc = 2\nb = c\n');
});

test('renaming to a fresh name and back restores the sheet, and touches nothing but the name', () => {
  fc.assert(
    fc.property(fc.nat(), fc.nat(), (seed, at) => {
      const text = randomSheet(createDraw(seed), { quantities: 5 });
      const tree = parseSheet(text);
      const { name } = tree.cells[at % tree.cells.length].name;
      const splices = renameCell(tree, name, 'fresh_1');
      const after = applySplices(text, splices);
      expect(after.replaceAll('fresh_1', name)).toBe(text);
      expect(applySplices(after, renameCell(parseSheet(after), 'fresh_1', name))).toBe(text);
      expect(applySplices(after, invertSplices(text, splices))).toBe(text);
      expect(renameCell(parseSheet(after), name, 'x')).toEqual([]);
    }),
    { seed: 7_041_776, numRuns: 300 },
  );
});
