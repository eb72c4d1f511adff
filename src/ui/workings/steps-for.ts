// Which steps of a cell's workings lead to one of its values.

import { printStep } from '../../record/index.ts';
import type { PrintedStep } from '../../record/index.ts';
import type { Sheet, WorkingStep } from '../../sheet/index.ts';

export interface Steps {
  /** Those to be read first. */
  readonly first: readonly PrintedStep[];
  /** All of them, where `first` is a part; empty otherwise. */
  readonly all: readonly PrintedStep[];
}

/** The workings of a cell; with a `value` first the steps that it rests on. */
export function stepsFor(sheet: Sheet, cell: string, value: string | null): Steps {
  const steps = sheet.workings(cell);
  const print = (step: WorkingStep): PrintedStep => printStep(step, cell);
  const chain = value === null ? steps : chainTo(steps, value);
  if (chain.length === 0 || chain.length === steps.length) return { first: steps.map(print), all: [] };
  return { first: chain.map(print), all: steps.map(print) };
}

/** The last step of that name with all steps before it whose results it uses, directly or not. */
function chainTo(steps: readonly WorkingStep[], value: string): readonly WorkingStep[] {
  const end = steps.findLastIndex(({ name }) => name === value);
  const wanted = new Set([value]);
  const chain: WorkingStep[] = [];
  for (let at = end; at >= 0; at--) {
    const step = steps[at]!;
    if (step.name === null || !wanted.has(step.name)) continue;
    chain.unshift(step);
    for (const { name } of step.operands) wanted.add(name);
  }
  return chain;
}
