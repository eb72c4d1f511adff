// Undo and redo as data.

import fc from 'fast-check';
import { expect, test } from 'vitest';
import { edit, EMPTY_HISTORY, redo, splicesBetween, undo } from '../../src/storage/index.ts';
import type { Edited } from '../../src/storage/index.ts';
import { applySplices } from '../../src/language/index.ts';
import { fits, HISTORY_LIMITS } from '../../src/storage/history.ts';

const blank: Edited = { text: '', history: EMPTY_HISTORY };
const typed = (texts: readonly string[]) =>
  texts.reduce((edited, text) => edit(edited, splicesBetween(edited.text, text), text), blank);

test('each undo leads one edit back, each redo one forward, whatever the texts', () => {
  fc.assert(
    fc.property(fc.array(fc.string({ unit: 'binary' }), { minLength: 1 }), (texts) => {
      let edited: Edited | null = typed(texts);
      const path = ['', ...texts];
      for (const text of path.toReversed()) {
        expect(edited!.text).toBe(text);
        expect(fits(edited!.text, edited!.history)).toBe(true);
        edited = undo(edited!);
      }
      expect(edited).toBeNull();
      edited = texts.reduce((at: Edited) => undo(at)!, typed(texts));
      for (const text of texts) {
        edited = redo(edited!);
        expect(edited!.text).toBe(text);
        expect(fits(edited!.text, edited!.history)).toBe(true);
      }
      expect(redo(edited!)).toBeNull();
    }),
    { seed: 1907 },
  );
});

test('an edit behind an undo forgets what could be done again', () => {
  const back = undo(typed(['a', 'ab']))!;
  expect(redo(back)!.text).toBe('ab');
  expect(redo(edit(back, [{ start: 1, end: 1, text: 'c' }], 'typing'))).toBeNull();
});

test('a step keeps what the edit was called, on either side', () => {
  const edited = edit(blank, [{ start: 0, end: 0, text: 'x' }], 'typing');
  expect(edited.history.undo[0].label).toBe('typing');
  expect(undo(edited)!.history.redo[0].label).toBe('typing');
});

test('one splice makes one text of another, and only what differs is in it', () => {
  fc.assert(
    fc.property(
      fc.string({ unit: fc.constantFrom('a', 'b') }),
      fc.string({ unit: fc.constantFrom('a', 'b') }),
      (a, b) => {
        expect(applySplices(a, splicesBetween(a, b))).toBe(b);
      },
    ),
    { seed: 1907 },
  );
  expect(splicesBetween('R = 1 kohm', 'R = 12 kohm')).toEqual([{ start: 5, end: 5, text: '2' }]);
  expect(splicesBetween('aa', 'a')).toEqual([{ start: 1, end: 2, text: '' }]);
  expect(splicesBetween('a', 'a')).toEqual([]);
});

test('only the latest steps are kept, by number and by size', () => {
  let edited = blank;
  for (let n = 0; n < HISTORY_LIMITS.steps + 5; n++) edited = edit(edited, [{ start: n, end: n, text: 'x' }], '');
  expect(edited.history.undo.length).toBe(HISTORY_LIMITS.steps);
  expect(undo(edited)!.text.length).toBe(edited.text.length - 1);
  const long = 'y'.repeat(HISTORY_LIMITS.characters / 2);
  const replaced = typed([long, 'a', long, 'b', long, 'c']);
  // Undoing 'c' takes the long text, and so does undoing 'b'; two of them and the rest of the steps are too much.
  expect(replaced.history.undo.map(({ label }) => label.length)).toEqual([1]);
});

test('steps that do not fit the text are told from steps that do', () => {
  const step = (start: number, end: number, text = '') => ({ splices: [{ start, end, text }], label: '' });
  expect(fits('abc', { undo: [step(0, 3)], redo: [] })).toBe(true);
  expect(fits('abc', { undo: [step(0, 4)], redo: [] })).toBe(false);
  expect(fits('abc', { undo: [], redo: [step(2, 1)] })).toBe(false);
  expect(fits('abc', { undo: [], redo: [step(-1, 1)] })).toBe(false);
  // The last step goes first: it makes the text long enough for the one before, or too short.
  expect(fits('abc', { undo: [step(0, 4), step(3, 3, 'd')], redo: [] })).toBe(true);
  expect(fits('abc', { undo: [step(0, 3), step(0, 1)], redo: [] })).toBe(false);
  const overlapping = { splices: [step(0, 2).splices[0], step(1, 3).splices[0]], label: '' };
  expect(fits('abc', { undo: [overlapping], redo: [] })).toBe(false);
});
