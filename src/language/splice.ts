// Edits as lists of splices of the document.

import type { Splice } from './syntax.ts';

/** The text after the splices, all of which count offsets in the text before. Throws RangeError where they overlap or lie outside. */
export function applySplices(text: string, splices: readonly Splice[]): string {
  let result = '';
  let at = 0;
  for (const { start, end, text: put } of inOrder(text, splices)) {
    result += text.slice(at, start) + put;
    at = end;
  }
  return result + text.slice(at);
}

/** The splices that lead back: applied to the text after `splices` they give `text`. */
export function invertSplices(text: string, splices: readonly Splice[]): Splice[] {
  let shift = 0;
  return inOrder(text, splices).map(({ start, end, text: put }) => {
    const at = start + shift;
    shift += put.length - (end - start);
    return { start: at, end: at + put.length, text: text.slice(start, end) };
  });
}

/** By place; splices at one place keep their order. */
function inOrder(text: string, splices: readonly Splice[]): readonly Splice[] {
  const ordered = [...splices].toSorted((a, b) => a.start - b.start || a.end - b.end);
  let at = 0;
  for (const { start, end } of ordered) {
    if (start < at || end < start || end > text.length)
      throw new RangeError(`splice ${start}..${end} overlaps or lies outside`);
    at = end;
  }
  return ordered;
}
