// Faults of a line as the row that shows it says them.

import type { Fault } from '../../sheet/index.ts';
import { entrySpan } from '../../language/index.ts';
import type { Line, Message, Span } from '../../language/index.ts';
import type { Column } from '../desk/index.ts';
import type { RowFault } from './row.ts';

/** Codes of what is nobody's mistake: another cell is missing, or nothing computes it yet. */
const UNCOMPUTED: ReadonlySet<string> = new Set(['waits-for', 'not-computed-yet']);

/** Whether a fault is the author's to mend. */
export function isBroken(fault: Fault | null): fault is Fault {
  return fault !== null && !UNCOMPUTED.has(fault.code);
}

/** A message as the row of its line shows it: the column concerned and the place in that column's text. */
export function rowFault({ text, span }: Pick<Message, 'text' | 'span'>, line: Line): RowFault {
  const entry = entrySpan(line);
  const named = nameSpan(line);
  const at = place('entry', entry, span, true) ?? (named ? place('name', named, span, false) : null);
  const column = at?.column === 'entry' ? characters(line.text.slice(entry.start, entry.start + at.start)) + 1 : null;
  return { text, at, column };
}

function nameSpan({ tree }: Line): Span | null {
  return tree.type === 'cell' ? tree.name.span : tree.type === 'field' ? tree.labelSpan : null;
}

/** Where a span lies in the text of a column; what begins behind an open column's text belongs to its end. */
function place(column: Column, shown: Span, span: Span, open: boolean): RowFault['at'] {
  const end = open ? Math.max(shown.end, span.end) : shown.end;
  if (span.start < shown.start || span.end > end) return null;
  const length = shown.end - shown.start;
  const start = Math.min(span.start - shown.start, length);
  return { column, start, end: Math.min(span.end - shown.start, length) };
}

function characters(text: string): number {
  return [...text].length;
}
