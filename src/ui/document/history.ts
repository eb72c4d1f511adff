// Undo and redo as splices and their inverses. Pure data: a history is kept with the sheet and survives a reload.

import type { Splice } from '../../language/index.ts';

/** One undoable step: how to do it and how to take it back, each against the text it meets. */
export interface Step {
  readonly label: string;
  readonly redo: readonly Splice[];
  readonly undo: readonly Splice[];
  /** Steps of one run (a drag, repeated key steps) bear the same mark and are taken back together. */
  readonly run: string | null;
}

export interface History {
  readonly past: readonly Step[];
  readonly future: readonly Step[];
}

export const EMPTY_HISTORY: History = { past: [], future: [] };

/** Steps kept; older ones are forgotten. */
const LONGEST = 500;

/** The history after a new step; what was undone before it can no longer be redone. */
export function withStep(history: History, step: Step): History {
  return { past: [...history.past, step].slice(-LONGEST), future: [] };
}

/** The steps that the next undo takes back, latest first: one, or a whole run. */
export function stepsToUndo({ past }: History): readonly Step[] {
  return runAtEnd(past);
}

/** The steps that the next redo does again, in order. */
export function stepsToRedo({ future }: History): readonly Step[] {
  return runAtEnd(future);
}

/** Moves steps between past and future. */
export function afterUndo(history: History, count: number): History {
  const kept = history.past.length - count;
  return { past: history.past.slice(0, kept), future: [...history.future, ...history.past.slice(kept).reverse()] };
}

/** The reverse of `afterUndo`. */
export function afterRedo(history: History, count: number): History {
  const kept = history.future.length - count;
  return { past: [...history.past, ...history.future.slice(kept).reverse()], future: history.future.slice(0, kept) };
}

function runAtEnd(steps: readonly Step[]): readonly Step[] {
  const last = steps[steps.length - 1];
  if (!last) return [];
  const found: Step[] = [last];
  for (let i = steps.length - 2; i >= 0 && last.run !== null && steps[i]!.run === last.run; i--) found.push(steps[i]!);
  return found;
}
