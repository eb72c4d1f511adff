// Whole cells written into the sheet from a dialog.

import { blockOf, insertLines } from '../../language/index.ts';
import type { Desk } from './desk.ts';

/** Writes cells behind the block of the selected row, else at the end, as one step of undo, and goes to the first of them. */
export function insertBlock(desk: Desk, lines: readonly string[], label: string): void {
  const { document } = desk;
  const tree = document.tree();
  const selected = desk.selection()?.cell;
  const cell = tree.cells.find((each) => each.name.name === selected);
  const block = cell && blockOf(tree, cell.line.index);
  const lastFilled = tree.lines.findLastIndex((line) => line.tree.type !== 'blank');
  const before = block ? block.first + block.count : lastFilled + 1;
  document.edit(insertLines(tree, before, lines.join('\n')), label);
  const written = document.tree().cells.find((each) => each.line.index === before);
  if (written) desk.jump(written.name.name);
}
