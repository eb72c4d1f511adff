// Keeping a followed figure: it becomes a plot cell of the sheet, and so of the link and the record.

import type { CellReading } from '../../sheet/index.ts';
import type { Desk } from '../desk/index.ts';
import { writePlot } from '../rows/index.ts';

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
  const { splices, name } = writePlot(`${plane} of ${stage}`, document.sheet);
  document.edit(splices, `keep ${plane} of ${stage}`);
  desk.say(`${name} now stands in the sheet.`, { title: 'Undo', run: () => document.undo() });
}
