// Inserting ready lines below the selected row.

import { blockOf, insertLines } from '../../language/index.ts';
import { insertionLines, plotAgainst } from '../rows/index.ts';
import type { InsertionChoice, PlotInput } from '../rows/index.ts';
import { DRAFT } from './draft.ts';
import type { Grid } from './grid.ts';

/** Writes the lines of a choice and goes to what is to be filled in first. */
export function insertChoice(grid: Grid, { insertion, title }: InsertionChoice): void {
  const { document } = grid.desk;
  const before = placeForBlock(grid);
  const lines = insertionLines(insertion, document.sheet);
  document.edit(insertLines(document.tree(), before, lines.join('\n')), `insert ${title}`);
  if (insertion.type === 'part') grid.focusLine(before + 1, 'low');
  else grid.focusLine(before + lines.findLastIndex((line) => !line.startsWith(' ')), 'entry');
}

/** Writes the plot of a value against an input and goes to it. */
export function insertPlot(grid: Grid, path: string, input: PlotInput): void {
  const { document } = grid.desk;
  const { splices, line } = plotAgainst(path, input, document.sheet);
  document.edit(splices, `plot ${path} against ${input.path}`);
  grid.focusLine(line, 'entry');
}

/** The line before which a new cell goes: behind the selected row's block, else at the end. */
function placeForBlock(grid: Grid): number {
  const { document } = grid.desk;
  const tree = document.tree();
  const selection = grid.desk.selection();
  const row = selection && selection.row !== DRAFT ? grid.row(selection.row) : null;
  const own = row ? grid.lineOf(row.key) : null;
  if (row?.type === 'ghost' && own !== null) return own;
  const cell = tree.cells.find((each) => each.name.name === row?.cell);
  if (cell) {
    const { first, count } = blockOf(tree, cell.line.index);
    return first + count;
  }
  if (own !== null && row?.type !== 'title' && row?.type !== 'title-field') return own + 1;
  const lastFilled = tree.lines.findLastIndex((line) => line.tree.type !== 'blank');
  return lastFilled + 1;
}
