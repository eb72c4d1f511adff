// Edits of whole lines, as splices: inserting, deleting, moving, and which lines belong together.
//
// Line ends stay as they are: a sheet with CRLF gets CRLF, and one whose last line has no end keeps that.

import type { CellTree, SheetTree, Splice } from './syntax.ts';

/** Lines `first`, .. , `first + count - 1`. */
interface LineRange {
  readonly first: number;
  readonly count: number;
}

/** Puts one or more lines before line `before`, which may be the number of lines; a line end at the end of `text` is optional. */
export function insertLines(tree: SheetTree, before: number, text: string): Splice[] {
  const { lines } = tree;
  if (before < 0 || before > lines.length) throw new RangeError(`no place ${before} in a sheet of ${lines.length}`);
  const end = lineEndOf(tree, before);
  const put = text.replace(/\r?\n$/, '').replace(/\r?\n/g, end);
  const at = startOf(tree, before);
  return [{ start: at, end: at, text: before === lines.length && unended(tree) ? end + put : put + end }];
}

/** Removes lines. */
export function deleteLines(tree: SheetTree, first: number, count: number): Splice[] {
  checkRange(tree, first, count);
  const end = startOf(tree, first + count);
  const start =
    first + count === tree.lines.length && unended(tree) && first > 0 ? textEnd(tree, first - 1) : startOf(tree, first);
  return end > start ? [{ start, end, text: '' }] : [];
}

/** Moves lines to before line `before`, counted before the move. */
export function moveLines(tree: SheetTree, first: number, count: number, before: number): Splice[] {
  checkRange(tree, first, count);
  if (before < 0 || before > tree.lines.length)
    throw new RangeError(`no place ${before} in a sheet of ${tree.lines.length}`);
  if (count === 0 || (before >= first && before <= first + count)) return [];
  const moved = tree.text.slice(startOf(tree, first), textEnd(tree, first + count - 1));
  return [...deleteLines(tree, first, count), ...insertText(tree, first + count - 1, before, moved)];
}

/** The line end of the moved block goes before it where it becomes the end of a sheet that ends without one. */
function insertText(tree: SheetTree, last: number, before: number, moved: string): Splice[] {
  const own = tree.text.slice(textEnd(tree, last), startOf(tree, last + 1));
  const end = own === '' ? lineEndOf(tree, last) : own;
  const at = startOf(tree, before);
  return [{ start: at, end: at, text: before === tree.lines.length && unended(tree) ? end + moved : moved + end }];
}

/** The lines that go with one: a block's fields and rows with its cell, everything to the next heading with a heading; else the line alone. */
export function blockOf(tree: SheetTree, lineIndex: number): LineRange {
  const { tree: read } = tree.lines[lineIndex];
  if (read.type === 'heading') {
    let end = lineIndex + 1;
    while (end < tree.lines.length && tree.lines[end].tree.type !== 'heading') end++;
    return { first: lineIndex, count: end - lineIndex };
  }
  const cell = tree.cells.find((each) => each.line.index === lineIndex);
  return { first: lineIndex, count: cell ? lastLineOf(cell) - lineIndex + 1 : 1 };
}

function lastLineOf({ line, fields, rows }: CellTree): number {
  return Math.max(line.index, fields.at(-1)?.line.index ?? 0, rows.at(-1)?.line.index ?? 0);
}

// ---------------------------------------------------------------- offsets

function checkRange(tree: SheetTree, first: number, count: number): void {
  if (first < 0 || count < 0 || first + count > tree.lines.length)
    throw new RangeError(`no lines ${first}, ${count} in a sheet of ${tree.lines.length}`);
}

function startOf(tree: SheetTree, index: number): number {
  return index < tree.lines.length ? tree.lines[index].offset : tree.text.length;
}

function textEnd(tree: SheetTree, index: number): number {
  const { offset, text } = tree.lines[index];
  return offset + text.length;
}

/** Whether the last line has no line end. */
function unended({ text }: SheetTree): boolean {
  return text !== '' && !text.endsWith('\n');
}

/** The line end in use at a line: its own, or that of the line before; LF in a sheet without any. */
function lineEndOf(tree: SheetTree, index: number): string {
  for (const near of [index, index - 1, 0]) {
    if (near < 0 || near >= tree.lines.length) continue;
    const end = tree.text.slice(textEnd(tree, near), startOf(tree, near + 1));
    if (end !== '') return end;
  }
  return '\n';
}
