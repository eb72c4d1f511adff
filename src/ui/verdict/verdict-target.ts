// Where the verdict leads: to the first cell that keeps it from being good, else to the first check.

import type { Verdict } from '../../record/index.ts';
import type { CellReading } from '../../sheet/index.ts';

/** Name of a cell; null where there is nothing to go to. */
export function verdictTarget(verdict: Verdict, cells: readonly CellReading[]): string | null {
  const names = new Set(cells.map(({ name }) => name));
  // `line 12` among the broken belongs to no cell.
  const broken = verdict.broken.find((name) => names.has(name));
  const check = cells.find(({ kind }) => kind === 'check');
  return broken ?? verdict.failing[0]?.name ?? verdict.waiting[0] ?? check?.name ?? null;
}
