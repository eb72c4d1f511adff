// The undo history of a sheet, as data that can be kept beside its text.
//
// A step holds the splices that lead away from the text at which it is applied. The last step of `undo` is the
// next one to take back, the last one of `redo` the next one to do again; taking one puts its inverse on the
// other side. Texts and offsets count UTF-16 units.

import { applySplices, invertSplices } from '../language/index.ts';
import type { Splice } from '../language/index.ts';

export interface HistoryStep {
  readonly splices: readonly Splice[];
  /** What the edit was, for "Undo ...". */
  readonly label: string;
}
export interface History {
  readonly undo: readonly HistoryStep[];
  readonly redo: readonly HistoryStep[];
}
/** A text with the history that leads to it. */
export interface Edited {
  readonly text: string;
  readonly history: History;
}

export const EMPTY_HISTORY: History = Object.freeze({ undo: [], redo: [] });

/** How much of a history is kept: the latest steps up to these many, and up to so many characters in them. */
export const HISTORY_LIMITS = Object.freeze({ steps: 1000, characters: 1_000_000 });

/** Makes an edit that can be undone; what could be done again is forgotten. Throws RangeError as `applySplices` does. */
export function edit({ text, history }: Edited, splices: readonly Splice[], label: string): Edited {
  const step = { splices: invertSplices(text, splices), label };
  return { text: applySplices(text, splices), history: trim({ undo: [...history.undo, step], redo: [] }) };
}

/** Takes the latest edit back, or returns null where there is none. */
export function undo({ text, history }: Edited): Edited | null {
  const step = history.undo.at(-1);
  if (!step) return null;
  const inverse = { splices: invertSplices(text, step.splices), label: step.label };
  return {
    text: applySplices(text, step.splices),
    history: { undo: history.undo.slice(0, -1), redo: [...history.redo, inverse] },
  };
}

/** Does the edit again that was taken back last, or returns null where there is none. */
export function redo({ text, history }: Edited): Edited | null {
  const done = undo({ text, history: { undo: history.redo, redo: history.undo } });
  return done && { text: done.text, history: { undo: done.history.redo, redo: done.history.undo } };
}

/** The one splice that makes `to` of `from`: what both share at the start and at the end stays. None where they are equal. */
export function splicesBetween(from: string, to: string): Splice[] {
  if (from === to) return [];
  const shorter = Math.min(from.length, to.length);
  let start = 0;
  while (start < shorter && from[start] === to[start]) start++;
  let same = 0;
  while (same < shorter - start && from[from.length - 1 - same] === to[to.length - 1 - same]) same++;
  return [{ start, end: from.length - same, text: to.slice(start, to.length - same) }];
}

/** Whether every step of `history` can be applied, one behind the other, from `text`. */
export function fits(text: string, { undo, redo }: History): boolean {
  return stepsFit(text.length, undo) && stepsFit(text.length, redo);
}

function stepsFit(length: number, steps: readonly HistoryStep[]): boolean {
  for (const { splices } of steps.toReversed()) {
    let at = 0;
    let next = length;
    for (const { start, end, text } of splices.toSorted((a, b) => a.start - b.start || a.end - b.end)) {
      if (!(start >= at && end >= start && end <= length)) return false;
      at = end;
      next += text.length - (end - start);
    }
    length = next;
  }
  return true;
}

function trim({ undo, redo }: History): History {
  const { steps, characters } = HISTORY_LIMITS;
  let first = undo.length;
  let size = 0;
  while (first > 0 && undo.length - first < steps && (size += sizeOf(undo[first - 1])) <= characters) first--;
  return first === 0 ? { undo, redo } : { undo: undo.slice(first), redo };
}

/** An empty step still takes room. */
function sizeOf({ splices, label }: HistoryStep): number {
  return splices.reduce((sum, { text }) => sum + text.length + 20, label.length + 20);
}
