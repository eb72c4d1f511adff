// Where the verdict leads: to the first thing that keeps it from being good, else to the first check.

import type { Verdict } from '../../record/index.ts';
import type { CellReading } from '../../sheet/index.ts';

/** A cell by its name, or a line that belongs to none, from 0. */
export type Target = { readonly cell: string } | { readonly line: number };

/** null where there is nothing to go to. */
export function verdictTarget(verdict: Verdict, cells: readonly CellReading[]): Target | null {
  const [broken] = verdict.broken;
  const line = /^line (\d+)$/.exec(broken ?? '');
  if (line) return { line: Number(line[1]) - 1 };
  const check = cells.find(({ kind }) => kind === 'check');
  const cell = broken ?? verdict.failing[0]?.name ?? verdict.waiting[0] ?? check?.name ?? null;
  return cell === null ? null : { cell };
}
