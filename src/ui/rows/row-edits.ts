// What the columns of a row edit: the text that is put before the user, and the splices that their answer makes.

import { entrySpan, insertLines, isCellName, renameCell, setEntry } from '../../language/index.ts';
import type { Line, SheetTree, Splice } from '../../language/index.ts';
import type { Column } from '../desk/index.ts';
import { numberText, setNumber } from './part-numbers.ts';
import type { Row } from './row.ts';
import { setTail, tailText } from './tail-text.ts';

/** A place in the sheet where text is edited: a column of a line, or a new line before `line`. */
export interface EditPlace {
  readonly row: Row;
  readonly line: number;
  readonly column: Column;
  /** The line is not there yet. */
  readonly isNew: boolean;
}

const FIELD_INDENT = '  ';

/** The text of a column as it stands in the sheet. */
export function editText(tree: SheetTree, { row, line: index, column, isNew }: EditPlace): string {
  const line = tree.lines[index];
  if (isNew || line === undefined) return '';
  switch (column) {
    case 'name':
      return namePart(row, line).text;
    case 'source':
      return 'source' in line.tree ? tailText(line.tree.source, line.tree.note) : '';
    case 'low':
    case 'nominal':
    case 'high':
      return numberText(line, column);
    default:
      return slice(line, entrySpan(line));
  }
}

/** The edit that gives a column this text. */
export function editSplices(tree: SheetTree, place: EditPlace, text: string): Splice[] {
  const { row, line: index, column, isNew } = place;
  if (isNew) return text.trim() === '' ? [] : insertLines(tree, index, newLine(tree, index, text));
  switch (column) {
    case 'name':
      return rename(tree, row, index, text);
    case 'source':
      return setTail(tree, index, text);
    case 'low':
    case 'nominal':
    case 'high':
      return setNumber(tree, index, column, text);
    default:
      return setEntry(tree, index, text);
  }
}

/** What the step is called in the history. */
export function editLabel({ row, column, isNew }: EditPlace, text: string): string {
  if (isNew) return `new line ${text.trim().split(/[=:]/)[0]!.trim()}`;
  const name = row.name?.text ?? 'line';
  return column === 'name' ? `rename ${name}` : column === 'source' ? `source of ${name}` : `edit ${name}`;
}

/** A line as it will stand: one that reads as a field of the block above is set in. */
function newLine(tree: SheetTree, before: number, text: string): string {
  const isField = /^[A-Za-zͰ-Ͽ_][\w.Ͱ-Ͽ]*\s*:/.test(text);
  return isField && inBlock(tree, before) ? FIELD_INDENT + text : text;
}

/** Whether a line put before `before` would belong to a block. */
export function inBlock(tree: SheetTree, before: number): boolean {
  for (let index = before - 1; index >= 0; index--) {
    const { type } = tree.lines[index]!.tree;
    if (type === 'field' || type === 'row') return true;
    if (type === 'cell' || type === 'broken' || type === 'heading') {
      const entry = tree.lines[index]!.tree;
      const opens =
        entry.type === 'cell' && !['quantity', 'check', 'plot', 'inverse', 'another'].includes(entry.entry.type);
      return opens || index === tree.title?.line.index;
    }
  }
  return false;
}

function rename(tree: SheetTree, row: Row, index: number, text: string): Splice[] {
  const line = tree.lines[index]!;
  const part = namePart(row, line);
  const own: Splice = { start: line.offset + part.start, end: line.offset + part.end, text };
  if (row.type !== 'cell' || line.tree.type !== 'cell') return [own];
  const free = isCellName(text) && !tree.cells.some((cell) => cell.name.name === text);
  const first = tree.cells.find((cell) => cell.name.name === row.cell);
  // A name that is taken or none at all stays here, where its message is, and breaks no other line.
  return free && first?.line.index === index ? renameCell(tree, line.tree.name.name, text) : [own];
}

function namePart({ type }: Row, line: Line): { start: number; end: number; text: string } {
  const { tree } = line;
  const span =
    tree.type === 'cell'
      ? tree.name.span
      : tree.type === 'field' && type !== 'title'
        ? tree.labelSpan
        : entrySpan(line);
  return { ...span, text: slice(line, span) };
}

function slice({ text }: Line, { start, end }: { readonly start: number; readonly end: number }): string {
  return text.slice(start, end);
}
