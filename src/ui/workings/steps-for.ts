// Which steps of a cell's workings lead to one of its values.

import type { SheetView, WorkingStep } from '../../sheet/index.ts';

interface Steps {
  /** Those to be read first. */
  readonly first: readonly WorkingStep[];
  /** All of them, where `first` is a part; empty otherwise. */
  readonly all: readonly WorkingStep[];
}

/** The workings of a cell; with a `value` first the steps that it rests on. */
export function stepsFor(sheet: SheetView, cell: string, value: string | null): Steps {
  const steps = sheet.workings(cell);
  const chain = value === null ? wholeOf(steps, sheet.bench(cell)) : chainTo(steps, value);
  return chain.length === 0 || chain.length === steps.length ? { first: steps, all: [] } : { first: chain, all: steps };
}

/** Of a bench of several specimens what they come to together; the law of each is in a table, too. */
function wholeOf(steps: readonly WorkingStep[], bench: ReturnType<SheetView['bench']>): readonly WorkingStep[] {
  return bench && bench.specimens.length > 1 ? steps.filter(({ name }) => name !== 'I_D') : steps;
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
