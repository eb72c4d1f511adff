// What may stand behind an entry or a field: tail = [ "[" {not "]"} "]" ] [ ";" TEXT ] ;

import { skipBlanks, trimEnd } from './characters.ts';
import { message } from './messages.ts';
import type { Message, Note, Source } from './syntax.ts';

export interface Tail {
  /** Where the body ends. */
  readonly limit: number;
  readonly source: Source | null;
  readonly note: Note | null;
  readonly fault: Message | null;
}

/** Finds where the body that begins at `at` ends and reads what follows; with `unitBrackets` a bracket behind a name is a unit. */
export function readTail(text: string, at: number, { unitBrackets = false } = {}): Tail {
  let i = at;
  for (; i < text.length; i++) {
    if (text[i] === ';') return { limit: i, source: null, note: readNote(text, i), fault: null };
    if (text[i] !== '[') continue;
    if (!unitBrackets || text[trimEnd(text, at, i) - 1] === ']') return readSource(text, i);
    const close = text.indexOf(']', i);
    if (close > 0) i = close;
  }
  return { limit: text.length, source: null, note: null, fault: null };
}

/** The note that begins with the semicolon at `at`. */
export function readNote(text: string, at: number): Note {
  const start = skipBlanks(text, at + 1, text.length);
  const end = trimEnd(text, start, text.length);
  return { text: text.slice(start, end), span: { start: at, end: Math.max(end, at + 1) } };
}

function readSource(text: string, open: number): Tail {
  const close = text.indexOf(']', open);
  if (close < 0) {
    const fault = message('source-open', { start: open, end: open + 1 });
    return { limit: open, source: null, note: null, fault };
  }
  const start = skipBlanks(text, open + 1, close);
  const source = { text: text.slice(start, trimEnd(text, start, close)), span: { start: open, end: close + 1 } };
  const behind = skipBlanks(text, close + 1, text.length);
  if (text[behind] === ';') return { limit: open, source, note: readNote(text, behind), fault: null };
  const end = trimEnd(text, behind, text.length);
  const fault = behind < text.length ? message('source-behind', { start: behind, end }, text.slice(behind, end)) : null;
  return { limit: open, source, note: null, fault };
}
