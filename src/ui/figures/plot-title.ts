// What a plot cell shows, in a few words, and whether it shows anything new.

import type { CellReading } from '../../sheet/index.ts';

/** `transfer of A1`, `A1.I_D against R_S2`; a range stands on the axis and is left out. */
export function plotTitle(cell: CellReading | null): string {
  const entry = cell?.tree.entry;
  if (!cell || entry?.type !== 'plot') return '';
  const text = (span: { readonly start: number; readonly end: number }): string =>
    cell.tree.line.text.slice(span.start, span.end).trim();
  if (entry.figure === 'against' || entry.figure === 'spread') {
    const values = entry.values.map(({ span }) => text(span)).join(', ');
    return entry.against ? `${values} against ${text(entry.against.span)}` : `spread of ${values}`;
  }
  return `${entry.figure} of ${entry.of?.name ?? ''}`;
}

/** Whether a plot cell is a plane of the stage that the figures speak of, or shows the bench that is selected. */
export function isFollowed(cell: CellReading | null, stage: string | null, bench: string | null): boolean {
  const entry = cell?.tree.entry;
  if (entry?.type !== 'plot' || !entry.of) return false;
  return entry.figure === 'bench'
    ? entry.of.name === bench
    : ['transfer', 'output'].includes(entry.figure) && entry.of.name === stage;
}
