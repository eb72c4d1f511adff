// Running text of the record: sentences with the names in them typeset, names, blanks.

import { typeset } from '../figure/index.ts';
import type { Run } from '../figure/index.ts';
import { proseParts } from './prose.ts';
import type { Cell, Inline, Inlines } from './record-tree.ts';

/** A sentence; names with `_` in it are typeset, that of `subject` in front of a path is left out. */
export function sentence(text: string, subject: string | null = null): Inlines {
  return proseParts(text, subject).map((part) => (part.type === 'text' ? part : name(part.text, subject)));
}

/** A name or path, the cell that owns a value in its subscript unless it is `subject`. */
export function name(path: string, subject: string | null = null): Inline {
  return { type: 'name', text: path, runs: pathRuns(path, subject) };
}

/** A sentence set strongly. */
export function strong(text: string): Inline {
  return { type: 'strong', content: sentence(text) };
}

export function plainText(text: string): Inlines {
  return text === '' ? [] : [{ type: 'text', text }];
}

/** A text the author may have left out; then there is room to write it by hand. */
export function orBlank(text: string | null): Inlines {
  return text === null ? [{ type: 'blank' }] : plainText(text);
}

export function textCell(text: string): Cell {
  return { content: plainText(text) };
}

export const EMPTY_CELL: Cell = { content: [] };

function pathRuns(path: string, subject: string | null): readonly Run[] {
  const names = path.split('.');
  const runs = typeset(names[names.length - 1]!);
  const owners = names.slice(names.length > 1 && names[0] === subject ? 1 : 0, -1);
  if (owners.length === 0) return runs;
  const below = runs[1] ? [runs[1].text, owners.join('.')] : [owners.join('.')];
  return [runs[0]!, { text: below.join(', '), style: 'subscript' }];
}
