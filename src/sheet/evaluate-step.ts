// A line of workings, evaluated from its operands alone: what decides whether a closed form is shown.

import { parseExpression } from '../language/index.ts';
import { REGIONS } from '../network/index.ts';
import { createBuilder, runOperations } from '../program/index.ts';
import { compileExpression } from './expression.ts';
import { KERNELS } from './kernels.ts';
import type { WorkingStep } from './model.ts';
import { createScope } from './resolve.ts';

/** The number that a step's formula gives with its operands; a formula that cannot be compiled throws. */
export function evaluateStep(step: Pick<WorkingStep, 'formula' | 'operands'>): number {
  const expr = parseExpression(step.formula);
  if ('code' in expr) throw new Error(`${step.formula}: ${expr.text}`);
  const builder = createBuilder(KERNELS);
  const scope = createScope(builder, { text: step.formula }, { look: () => null, names: () => [], later: () => {} });
  const { handle } = compileExpression(expr, {
    ...scope,
    resolve(path) {
      const name = path.names.map((part) => part.name).join('.');
      const operand = step.operands.find((candidate) => candidate.name === name);
      if (!operand) return scope.resolve(path);
      const value =
        typeof operand.value === 'string' ? (REGIONS as readonly string[]).indexOf(operand.value) : operand.value;
      return { type: operand.type, handle: builder.constant(value) };
    },
  });
  const { segment, slot } = builder.finish(0);
  const slots = new Float64Array(segment.size);
  for (let i = 0; i < segment.constantSlots.length; i++) slots[segment.constantSlots[i]!] = segment.constantValues[i]!;
  runOperations(segment.ops, 0, segment.ops.length, segment.args, 0, slots, KERNELS);
  return slots[slot(handle)]!;
}

/** A closed form is shown only where it agrees with the engine's own number so closely (design, section 4). */
const AGREEMENT = 1e-9;

/** Whether a step's formula gives its value. */
export function stepAgrees(step: WorkingStep): boolean {
  const value = evaluateStep(step);
  if (typeof step.value !== 'number') return true;
  return (
    value === step.value || Math.abs(value - step.value) <= AGREEMENT * Math.max(Math.abs(value), Math.abs(step.value))
  );
}
