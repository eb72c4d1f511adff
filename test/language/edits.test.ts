// Edits as splices: exact examples, then laws over random sheets.

import fc from 'fast-check';
import { expect, test, vi } from 'vitest';
import type { SheetTree, Splice } from '../../src/language/index.ts';
import {
  applySplices,
  blockOf,
  deleteLines,
  entrySpan,
  insertLines,
  invertSplices,
  moveLines,
  parseSheet,
  setEntry,
  setLine,
  setNote,
  setSource,
} from '../../src/language/index.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomSheet } from '../support/random-sheet.ts';
import { withoutSpans } from './show.ts';

const SEED = 19_930_211;
vi.setConfig({ testTimeout: 30_000 });

/** The text after an edit of line 0 of `text`. */
function edited(text: string, edit: (tree: SheetTree) => Splice[]): string {
  return applySplices(text, edit(parseSheet(text)));
}

test.each([
  ['R_S = 1 kohm', 'R_S = 2 kohm'],
  ['R_S=1 kohm[src];note', 'R_S=2 kohm[src];note'],
  ['R_S  =  1 kohm   [src]', 'R_S  =  2 kohm   [src]'],
  ['R_S =', 'R_S = 2 kohm'],
  ['R_S = ', 'R_S = 2 kohm'],
  ['R_S = [src]', 'R_S = 2 kohm[src]'],
  ['R_S = 10 V/R ; broken', 'R_S = 2 kohm ; broken'],
  ['> prose', '> 2 kohm'],
  ['## Section', '## 2 kohm'],
  ['  ; note', '  ; 2 kohm'],
  ['not a line', '2 kohm'],
])('an entry is replaced and nothing else: %s', (text, expected) => {
  expect(edited(text, (tree) => setEntry(tree, 0, '2 kohm'))).toBe(expected);
});

test('the entry of a field and of a row is what stands between its label and its tail', () => {
  const block = 'M1 = bench\n  columns: V_GS [V]\n  -0.5, 2 [src] ; n\nQ1 = n-JFET\n  V_P:-2 V [src]\n';
  expect(edited(block, (tree) => setEntry(tree, 2, '1, 2'))).toBe(block.replace('-0.5, 2', '1, 2'));
  expect(edited(block, (tree) => setEntry(tree, 4, '-3 V'))).toBe(block.replace('-2 V', '-3 V'));
  expect(edited(block, (tree) => setEntry(tree, 1, 'I_D [mA]'))).toBe(block.replace('V_GS [V]', 'I_D [mA]'));
});

test.each([
  ['R_S = 1 kohm', 'R_S = 1 kohm  [p. 2]'],
  ['R_S = 1 kohm  ', 'R_S = 1 kohm  [p. 2]  '],
  ['R_S = 1 kohm ; note', 'R_S = 1 kohm  [p. 2] ; note'],
  ['R_S = 1 kohm [old] ; note', 'R_S = 1 kohm [p. 2] ; note'],
  ['R_S = 1 kohm []', 'R_S = 1 kohm [p. 2]'],
  ['R_S =', 'R_S =  [p. 2]'],
  ['R_S 5', 'R_S 5  [p. 2]'],
])('a source is put behind the entry: %s', (text, expected) => {
  expect(edited(text, (tree) => setSource(tree, 0, 'p. 2'))).toBe(expected);
});

test.each([
  ['R_S = 1 kohm', 'R_S = 1 kohm  ; n'],
  ['R_S = 1 kohm [src]  ', 'R_S = 1 kohm [src]  ; n  '],
  ['R_S = 1 kohm ;old', 'R_S = 1 kohm ; n'],
  ['R_S = 1 kohm ;   old', 'R_S = 1 kohm ;   n'],
  ['R_S = 1 kohm ;', 'R_S = 1 kohm ; n'],
  ['; old', '; n'],
  ['', '; n'],
])('a note is put at the end: %j', (text, expected) => {
  expect(edited(`${text}\n`, (tree) => setNote(tree, 0, 'n'))).toBe(`${expected}\n`);
});

test.each([
  ['R_S = 1 kohm', 'R_S = 1 kohm', 'R_S = 1 kohm'],
  ['R_S = 1 kohm   [src] ; note', 'R_S = 1 kohm ; note', 'R_S = 1 kohm   [src]'],
  ['R_S = 1 kohm ; note  ', 'R_S = 1 kohm ; note  ', 'R_S = 1 kohm  '],
])('null removes source or note with the blanks before it: %s', (text, noSource, noNote) => {
  expect(edited(text, (tree) => setSource(tree, 0, null))).toBe(noSource);
  expect(edited(text, (tree) => setNote(tree, 0, null))).toBe(noNote);
});

test('misuse is refused: a line end inside a line, a source of a heading, a line that is not there', () => {
  const tree = parseSheet('# T\nx = 1\n');
  expect(() => setEntry(tree, 1, 'a\nb')).toThrow(RangeError);
  expect(() => setLine(tree, 1, 'a\rb')).toThrow(RangeError);
  expect(() => setSource(tree, 0, 'a')).toThrow(RangeError);
  expect(() => setNote(tree, 0, 'a')).toThrow(RangeError);
  expect(() => setEntry(tree, 2, 'a')).toThrow(RangeError);
  expect(() => insertLines(tree, 3, 'a')).toThrow(RangeError);
  expect(() => deleteLines(tree, 1, 2)).toThrow(RangeError);
  expect(() => moveLines(tree, 0, 1, 3)).toThrow(RangeError);
  expect(() => applySplices('abc', [{ start: 2, end: 4, text: '' }])).toThrow(RangeError);
  expect(() =>
    applySplices('abc', [
      { start: 0, end: 2, text: '' },
      { start: 1, end: 3, text: '' },
    ]),
  ).toThrow(RangeError);
});

test.each([
  ['a\nb\n', 1, 'x', 'a\nx\nb\n'],
  ['a\nb\n', 2, 'x', 'a\nb\nx\n'],
  ['a\nb', 2, 'x', 'a\nb\nx'],
  ['a\nb', 0, 'x\ny\n', 'x\ny\na\nb'],
  ['a\r\nb\r\n', 1, 'x\ny', 'a\r\nx\r\ny\r\nb\r\n'],
  ['a\r\nb', 2, 'x', 'a\r\nb\r\nx'],
  ['', 0, 'x', 'x\n'],
])('into %j before line %i comes %j', (text, before, put, expected) => {
  expect(edited(text, (tree) => insertLines(tree, before, put))).toBe(expected);
});

test.each([
  ['a\nb\nc\n', 1, 1, 'a\nc\n'],
  ['a\nb\nc', 2, 1, 'a\nb'],
  ['a\r\nb\r\nc', 1, 2, 'a'],
  ['a\nb', 0, 2, ''],
  ['a\nb\n', 0, 0, 'a\nb\n'],
])('from %j line %i and %i in all are removed', (text, first, count, expected) => {
  expect(edited(text, (tree) => deleteLines(tree, first, count))).toBe(expected);
});

test.each([
  ['a\nb\nc\n', 0, 1, 2, 'b\na\nc\n'],
  ['a\nb\nc\n', 0, 1, 3, 'b\nc\na\n'],
  ['a\nb\nc', 0, 1, 3, 'b\nc\na'],
  ['a\nb\nc', 2, 1, 0, 'c\na\nb'],
  ['a\nb\nc', 1, 2, 0, 'b\nc\na'],
  ['a\r\nb\r\nc', 0, 2, 3, 'c\r\na\r\nb'],
  ['a\n\nb', 2, 1, 1, 'a\nb\n'],
  ['a\nb\nc\n', 1, 1, 1, 'a\nb\nc\n'],
  ['a\nb\nc\n', 1, 1, 2, 'a\nb\nc\n'],
])('in %j line %i and %i in all are moved before line %i', (text, first, count, before, expected) => {
  expect(edited(text, (tree) => moveLines(tree, first, count, before))).toBe(expected);
});

test('a block is its cell with fields and rows, a section all to the next heading', () => {
  const tree = parseSheet(
    '## S\nQ1 = n-JFET\n  V_P: -2 V\n\n; note\n  I_DSS: 5 mA\n\nx = 1\n## T\nM1 = bench\n  columns: a\n  1\n',
  );
  expect([0, 1, 2, 7, 8, 9].map((index) => blockOf(tree, index))).toEqual([
    { first: 0, count: 8 },
    { first: 1, count: 5 },
    { first: 2, count: 1 },
    { first: 7, count: 1 },
    { first: 8, count: 4 },
    { first: 9, count: 3 },
  ]);
});

test('splices at one place keep their order, and their inverse undoes them', () => {
  const text = 'abcdef';
  const splices = [
    { start: 3, end: 3, text: 'X' },
    { start: 3, end: 5, text: '' },
    { start: 0, end: 1, text: 'long' },
    { start: 6, end: 6, text: 'Y' },
  ];
  const after = applySplices(text, splices);
  expect(after).toBe('longbcXfY');
  expect(applySplices(after, invertSplices(text, splices))).toBe(text);
});

// ---------------------------------------------------------------- laws

const ENTRIES = [
  '5 V',
  '2 mA .. 9 mA at V_DS = 15 V',
  '10 V/R',
  'check a >= b',
  '',
  'R_G to 0 V',
  '1, 2',
  '[x',
  '; y',
  '𝛼',
];

type Edit = (tree: SheetTree, a: number, b: number, text: string) => Splice[];

const EDITS: readonly Edit[] = [
  (tree, a, _b, text) => setEntry(tree, a, text),
  (tree, a, _b, text) => setLine(tree, a, text),
  (tree, a, _b, text) => setSource(tree, a, text || null),
  (tree, a, _b, text) => setNote(tree, a, text || null),
  (tree, a, _b, text) => insertLines(tree, a, text),
  (tree, a, b) => deleteLines(tree, Math.min(a, b), Math.abs(a - b) % 5),
  (tree, a, b) => moveLines(tree, ...(Object.values(blockOf(tree, a)) as [number, number]), b),
];

function applyEdit(tree: SheetTree, edit: Edit, a: number, b: number, text: string): Splice[] {
  const index = a % tree.lines.length;
  const { type } = tree.lines[index].tree;
  const tailless = type === 'heading' || type === 'prose' || type === 'blank' || type === 'note';
  if (tailless && (edit === EDITS[2] || edit === EDITS[3])) return [];
  return edit(tree, index, b % (tree.lines.length + 1), text);
}

test('after any edits the tree of the edited text is the one that is read afresh, and undo restores every byte', () => {
  const step = fc.tuple(fc.constantFrom(...EDITS), fc.nat(), fc.nat(), fc.constantFrom(...ENTRIES));
  fc.assert(
    fc.property(
      fc.nat(),
      fc.constantFrom('\n', '\r\n'),
      fc.array(step, { minLength: 1, maxLength: 6 }),
      (seed, lineEnd, steps) => {
        const first = randomSheet(createDraw(seed), { lineEnd, quantities: 3 });
        let tree = parseSheet(first);
        const undo: Splice[][] = [];
        for (const [edit, a, b, text] of steps) {
          if (tree.lines.length === 0) break;
          const splices = applyEdit(tree, edit, a, b, text);
          undo.push(invertSplices(tree.text, splices));
          tree = parseSheet(applySplices(tree.text, splices), tree);
        }
        expect(withoutSpans(tree)).toBe(withoutSpans(parseSheet(tree.text)));
        let text = tree.text;
        for (const splices of undo.toReversed()) text = applySplices(text, splices);
        expect(text).toBe(first);
      },
    ),
    { seed: SEED, numRuns: 100 },
  );
});

test('setting an entry changes no other line, and the line has that entry', () => {
  fc.assert(
    fc.property(fc.nat(), fc.nat(), fc.constantFrom('5 V', '10 V/R', 'R_G to 0 V', '1, 2'), (seed, at, entry) => {
      const before = parseSheet(randomSheet(createDraw(seed), { quantities: 3 }));
      const index = at % before.lines.length;
      const after = parseSheet(applySplices(before.text, setEntry(before, index, entry)), before);
      const others = (tree: SheetTree): string[] =>
        tree.lines.filter((line) => line.index !== index).map((line) => line.text);
      expect(others(after)).toEqual(others(before));
      const line = after.lines[index];
      const { start, end } = entrySpan(line);
      expect(line.text.slice(start, end)).toBe(entry);
      const { start: from, end: to } = entrySpan(before.lines[index]);
      expect(line.text.slice(0, start)).toBe(before.lines[index].text.slice(0, from));
      expect(line.text.slice(end)).toBe(before.lines[index].text.slice(to));
    }),
    { seed: SEED, numRuns: 300 },
  );
});

test('a source and a note that are set are read back, and removing them restores the line', () => {
  fc.assert(
    fc.property(fc.nat(), fc.nat(), (seed, at) => {
      const before = parseSheet(randomSheet(createDraw(seed), { quantities: 3 }));
      const cells = before.lines.filter(
        ({ tree }) => tree.type === 'cell' || tree.type === 'field' || tree.type === 'row',
      );
      const { index, tree } = cells[at % cells.length];
      const withSource = parseSheet(applySplices(before.text, setSource(before, index, 'list, p. 7')));
      const withBoth = parseSheet(applySplices(withSource.text, setNote(withSource, index, 'a, b')));
      expect(withBoth.lines[index].tree).toMatchObject({ source: { text: 'list, p. 7' }, note: { text: 'a, b' } });
      if (!('source' in tree) || tree.source || tree.note) return;
      const less = parseSheet(applySplices(withBoth.text, setNote(withBoth, index, null)));
      expect(applySplices(less.text, setSource(less, index, null))).toBe(before.text);
    }),
    { seed: SEED, numRuns: 200 },
  );
});

test('moving lines there and back restores the text', () => {
  fc.assert(
    fc.property(fc.nat(), fc.nat(), fc.nat(), fc.constantFrom('\n', '\r\n'), (seed, a, b, lineEnd) => {
      const before = parseSheet(randomSheet(createDraw(seed), { lineEnd, quantities: 2 }));
      const { first, count } = blockOf(before, a % before.lines.length);
      const to = b % (before.lines.length + 1);
      const after = parseSheet(applySplices(before.text, moveLines(before, first, count, to)));
      const lines = before.lines.map((line) => line.text);
      const moved = lines.slice(first, first + count);
      const inside = to >= first && to <= first + count;
      const rest = lines.toSpliced(first, count);
      const place = inside ? first : to > first ? to - count : to;
      expect(after.lines.map((line) => line.text)).toEqual(rest.toSpliced(place, 0, ...moved));
      if (inside) return;
      const back = moveLines(after, place, count, to > first ? first : first + count);
      expect(applySplices(after.text, back)).toBe(before.text);
    }),
    { seed: SEED, numRuns: 200 },
  );
});
