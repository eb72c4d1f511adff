// Keeping a followed figure: it becomes a plot cell of the sheet, and so of the link and the record.

import { insertLines } from '../../language/index.ts';
import type { CellReading } from '../../sheet/index.ts';
import type { Desk } from '../desk/index.ts';

export type PlaneName = 'transfer' | 'output';

/** Whether the sheet already has that plane of that stage as a plot cell. */
export function isKept(cells: readonly CellReading[], plane: PlaneName, stage: string): boolean {
  return cells.some(({ tree }) => {
    return tree.entry.type === 'plot' && tree.entry.figure === plane && tree.entry.of?.name === stage;
  });
}

/** Writes the plot cell behind the last one, else at the end of the sheet. */
export function keepPlane(desk: Desk, plane: PlaneName, stage: string): void {
  const { document } = desk;
  const cells = document.cells();
  const tree = document.tree();
  const taken = new Set(cells.map(({ name }) => name));
  let number = 1;
  while (taken.has(`F${number}`)) number++;
  const name = `F${number}`;
  const last = cells.findLast(({ kind }) => kind === 'plot');
  const before = last ? last.tree.line.index + 1 : tree.lines.length;
  document.edit(insertLines(tree, before, `${name} = plot ${plane} of ${stage}`), `keep ${plane} of ${stage}`);
  desk.say(`${name} now stands in the sheet.`, { title: 'Undo', run: () => document.undo() });
}
