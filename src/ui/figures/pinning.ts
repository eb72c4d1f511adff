// Keeping a followed figure: it becomes a plot cell of the sheet, and so of the link and the record.

import type { CellReading } from '../../sheet/index.ts';
import type { Desk } from '../desk/index.ts';
import { writePlot } from '../rows/index.ts';

export type PlaneName = 'transfer' | 'output';

/** Figures that stand on the page while their cell is selected. */
type FollowedFigure = PlaneName | 'bench';

/** Whether the sheet already has that figure of that cell as a plot cell. */
export function isKept(cells: readonly CellReading[], figure: FollowedFigure, of: string): boolean {
  return cells.some(({ tree }) => {
    return tree.entry.type === 'plot' && tree.entry.figure === figure && tree.entry.of?.name === of;
  });
}

/** Writes the plot cell behind the last one, else at the end of the sheet. */
export function keepFigure(desk: Desk, figure: FollowedFigure, of: string): void {
  const { document } = desk;
  const { splices, name } = writePlot(`${figure} of ${of}`, document.sheet);
  document.edit(splices, `keep ${figure} of ${of}`);
  desk.say(`${name} now stands in the sheet.`, { title: 'Undo', run: () => document.undo() });
}
