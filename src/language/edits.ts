// Edits of the text of one line, as splices: nothing outside the place that is edited changes. Texts are
// written as given, also where they then cannot be read; only a line end has no place in a line.

import { skipBlanks, trimEnd } from './characters.ts';
import type { Line, Note, SheetTree, Span, Splice } from './syntax.ts';

/** Between an entry and the source or note that is put behind it. */
const GAP = '  ';

/** Replaces what `entrySpan` covers. Throws RangeError on a line end in `entry`. */
export function setEntry(tree: SheetTree, lineIndex: number, entry: string): Splice[] {
  const line = lineAt(tree, lineIndex);
  const span = entrySpan(line);
  const glued = span.start === span.end && '=:>#;'.includes(line.text[span.start - 1] ?? ' ') && entry !== '';
  return [splice(line, span, glued ? ` ${entry}` : entry)];
}

/** Replaces the whole text of a line, its blanks in front too. Throws RangeError on a line end in `text`. */
export function setLine(tree: SheetTree, lineIndex: number, text: string): Splice[] {
  const line = lineAt(tree, lineIndex);
  return [splice(line, { start: 0, end: line.text.length }, text)];
}

/** Puts, replaces or (null) removes the source of a line. Throws RangeError where the line cannot have one. */
export function setSource(tree: SheetTree, lineIndex: number, source: string | null): Splice[] {
  const line = lineAt(tree, lineIndex);
  const { tree: read } = line;
  if (!('source' in read) && read.type !== 'broken') throw new RangeError(`line ${lineIndex} takes no source`);
  const present = 'source' in read ? read.source : null;
  if (present && source === null) return [splice(line, withGap(line, present.span), '')];
  if (present) return [splice(line, { start: present.span.start + 1, end: present.span.end - 1 }, source!)];
  return source === null ? [] : [splice(line, emptyAt(bodyEnd(line)), `${GAP}[${source}]`)];
}

/** Puts, replaces or (null) removes the note of a line; of a blank line it makes a note. Throws RangeError where the line cannot have one. */
export function setNote(tree: SheetTree, lineIndex: number, note: string | null): Splice[] {
  const line = lineAt(tree, lineIndex);
  const { tree: read, text } = line;
  if (read.type === 'heading' || read.type === 'prose') throw new RangeError(`line ${lineIndex} takes no note`);
  const present = 'note' in read ? read.note : null;
  if (present && note === null) return [splice(line, withGap(line, present.span), '')];
  if (present) {
    const span = noteSpan(line, present);
    return [splice(line, span, span.start === present.span.start + 1 ? ` ${note}` : note!)];
  }
  if (note === null) return [];
  const end = trimEnd(text, 0, text.length);
  return [splice(line, emptyAt(end), end === 0 ? `; ${note}` : `${GAP}; ${note}`)];
}

/** The entry of a cell, the body of a field, the values of a row, the text of a heading, prose or note; else the whole line. */
export function entrySpan(line: Line): Span {
  const { tree, text } = line;
  switch (tree.type) {
    case 'cell':
      return tree.entry.span;
    case 'field':
      return tree.body.span;
    case 'row':
      return { start: tree.values[0].span.start, end: tree.values.at(-1)!.span.end };
    case 'heading':
    case 'prose':
      return tree.span;
    case 'note':
      return noteSpan(line, tree.note);
    default:
      return { start: 0, end: text.length };
  }
}

/** The line of this index; throws RangeError where there is none. */
function lineAt(tree: SheetTree, index: number): Line {
  const line = tree.lines[index];
  if (!line) throw new RangeError(`no line ${index} in a sheet of ${tree.lines.length}`);
  return line;
}

/** Behind the semicolon and the blanks that follow it. */
function noteSpan({ text }: Line, { span }: Note): Span {
  return { start: skipBlanks(text, span.start + 1, span.end), end: span.end };
}

function bodyEnd(line: Line): number {
  const { end } = entrySpan(line);
  return trimEnd(line.text, 0, end);
}

/** A source or note with the blanks that set it off. */
function withGap({ text }: Line, { start, end }: Span): Span {
  return { start: trimEnd(text, 0, start), end };
}

function emptyAt(at: number): Span {
  return { start: at, end: at };
}

function splice(line: Line, { start, end }: Span, text: string): Splice {
  if (/[\r\n]/.test(text)) throw new RangeError('a line end inside a line');
  return { start: line.offset + start, end: line.offset + end, text };
}
