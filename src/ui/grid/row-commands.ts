// Commands that insert, move and remove whole rows, and the way from one failing row to the next.

import { blockOf, deleteLines, moveLines } from '../../language/index.ts';
import type { SheetTree, Splice } from '../../language/index.ts';
import type { Row } from '../rows/index.ts';
import { DRAFT } from './draft.ts';
import type { Grid } from './grid.ts';

interface Lines {
  readonly first: number;
  readonly count: number;
}

/** Opens a place for a new line beside the selected row; inside a block it becomes a field. */
export function newLineBeside(grid: Grid, side: 'above' | 'below'): void {
  const key = grid.desk.selection()?.row ?? grid.keys().at(-1);
  if (key === undefined || key === DRAFT) return;
  const row = grid.row(key);
  const tree = grid.desk.document.tree();
  if (!row) return;
  const own = grid.lineOf(key);
  if (row.type === 'ghost') {
    grid.focus(key, 'name');
    grid.edit();
    return;
  }
  const line = own !== null ? (side === 'above' ? own : own + 1) : endOfBlock(row, tree);
  grid.openDraft({ beside: key, side: own === null ? 'below' : side, line });
}

/** Removes the rows of the range, with what belongs to them, and offers to take it back. */
export function removeRows(grid: Grid): void {
  const { document } = grid.desk;
  const tree = document.tree();
  const blocks = linesOf(grid, tree);
  if (blocks.length === 0) return grid.desk.say('This row is a result: it goes with the line that gives it.');
  const names = grid.range().map((key) => grid.row(key)?.name?.text ?? 'a line');
  const what = names.length === 1 ? names[0]! : `${names.length} rows`;
  const column = grid.desk.selection()?.column ?? 'entry';
  const splices: Splice[] = blocks.flatMap(({ first, count }) => deleteLines(tree, first, count));
  document.edit(splices, `remove ${what}`);
  grid.focusLine(blocks[0]!.first, column);
  grid.desk.say(`Removed ${what}.`, { title: 'Undo', run: () => document.undo() });
}

/** Moves the rows of the range past their neighbour, blocks as a whole. */
export function moveRows(grid: Grid, way: 'up' | 'down'): void {
  const { document } = grid.desk;
  const tree = document.tree();
  const selection = grid.desk.selection();
  const blocks = linesOf(grid, tree);
  if (blocks.length === 0 || !selection) return;
  const first = blocks[0]!.first;
  const last = blocks[blocks.length - 1]!;
  const end = last.first + last.count;
  const isField = isInner(tree, first);
  const before = way === 'up' ? placeAbove(tree, first, isField) : placeBelow(tree, end, isField);
  if (before === null) return;
  const splices = moveLines(tree, first, end - first, before);
  document.edit(splices, 'move');
  grid.focus(selection.row, selection.column);
}

/** Goes to the next row, around the end, that is broken or fails. */
export function nextFault(grid: Grid, step: 1 | -1): void {
  const shown = grid.keys();
  const start = Math.max(0, grid.indexOf(grid.desk.selection()?.row ?? ''));
  for (let k = 1; k <= shown.length; k++) {
    const key = shown[(start + k * step + shown.length * 2) % shown.length]!;
    const row = grid.row(key);
    if (
      row &&
      (row.fault !== null || row.mark === 'broken' || row.mark === 'fails' || row.mark === 'fails-at-an-end')
    ) {
      grid.focus(key, row.fault?.at?.column ?? 'entry');
      return;
    }
  }
  grid.desk.say('Nothing fails and nothing is broken.');
}

/** The lines of the rows of the range with what belongs to them, in order and without overlap. */
function linesOf(grid: Grid, tree: SheetTree): Lines[] {
  const found: Lines[] = [];
  for (const key of grid.range()) {
    const row = grid.row(key);
    const line = grid.lineOf(key);
    if (!row || line === null || row.type === 'ghost' || row.type === 'title') continue;
    const last = found[found.length - 1];
    if (last && line < last.first + last.count) continue;
    const whole = row.type === 'section' ? row.fold?.open === false : row.type === 'cell';
    found.push(whole ? blockOf(tree, line) : { first: line, count: 1 });
  }
  return found;
}

function isInner(tree: SheetTree, line: number): boolean {
  const { type } = tree.lines[line]!.tree;
  return type === 'field' || type === 'row';
}

/** A field stays in its block; a cell passes its neighbour's block or a line between. */
function placeAbove(tree: SheetTree, first: number, isField: boolean): number | null {
  if (first === 0) return null;
  if (isField) return isInner(tree, first - 1) ? first - 1 : null;
  const head = headOf(tree, first - 1);
  return head === tree.title?.line.index ? null : head;
}

function placeBelow(tree: SheetTree, end: number, isField: boolean): number | null {
  if (end >= tree.lines.length) return null;
  if (isField) return isInner(tree, end) ? end + 1 : null;
  const { type } = tree.lines[end]!.tree;
  if (type !== 'cell') return end + 1;
  const { first, count } = blockOf(tree, end);
  return first + count;
}

/** The line of the block that a line belongs to, or the line itself. */
function headOf(tree: SheetTree, line: number): number {
  const cell = tree.cells.find((each) => {
    const { first, count } = blockOf(tree, each.line.index);
    return line >= first && line < first + count;
  });
  return cell?.line.index ?? line;
}

function endOfBlock(row: Row, tree: SheetTree): number {
  const cell = tree.cells.find((each) => each.name.name === row.cell);
  if (!cell) return tree.lines.length;
  const { first, count } = blockOf(tree, cell.line.index);
  return first + count;
}
