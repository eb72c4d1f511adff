// One line, read in the context of the block it stands in.
//
// line = [BLANKS] [";" TEXT] | ("# " | "## ") TEXT | ">" TEXT | cellname [BLANKS] "=" entry tail
//      | BLANKS label [BLANKS] ":" body tail | BLANKS value { "," value } tail | ANYTHING ;

import { readCellLine } from './cell-line.ts';
import { skipBlanks, trimEnd } from './characters.ts';
import type { Context } from './context.ts';
import { readIndentedLine } from './field-line.ts';
import { message } from './messages.ts';
import type { LineTree, Message } from './syntax.ts';
import { readNote } from './tail.ts';

const BYTE_ORDER_MARK = 0xfeff;

/** Reads a line; what cannot be read is in the tree as something broken. Never throws. */
export function parseLine(text: string, context: Context): LineTree {
  const margin = text.charCodeAt(0) === BYTE_ORDER_MARK ? 1 : 0;
  const at = skipBlanks(text, margin, text.length);
  if (at === text.length) return { type: 'blank' };
  if (text[at] === ';') return { type: 'note', note: readNote(text, at) };
  if (text[at] === '>') return readProse(text, at);
  if (text[at] === '#') return at === margin ? readHeading(text, at, context) : refuse('heading-indented', at);
  return at === margin ? readCellLine(text, at, context) : readIndentedLine(text, at, context);
}

function readProse(text: string, at: number): LineTree {
  const start = skipBlanks(text, at + 1, Math.min(at + 2, text.length));
  const end = trimEnd(text, start, text.length);
  return { type: 'prose', text: text.slice(start, end), span: { start, end } };
}

function readHeading(text: string, at: number, context: Context): LineTree {
  let end = at;
  while (text[end] === '#') end++;
  const marks = text.slice(at, end);
  const start = skipBlanks(text, end, text.length);
  if (marks.length > 2) return broken(message('heading-level', { start: at, end }));
  if (end < text.length && start === end)
    return broken(message('heading-blank', { start: at, end }, `${marks} ${text.slice(end).trimEnd()}`));
  const stop = trimEnd(text, start, text.length);
  // A later title reads as a section.
  const level = marks.length === 1 && !context.titled ? 1 : 2;
  return { type: 'heading', level, text: text.slice(start, stop), span: { start, end: stop } };
}

function refuse(code: 'heading-indented', at: number): LineTree {
  return broken(message(code, { start: at, end: at + 1 }));
}

function broken(fault: Message): LineTree {
  return { type: 'broken', name: null, message: fault };
}
