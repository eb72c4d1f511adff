// An expression without cells, evaluated on its own: what printed workings are checked with.

import { parseExpression } from '../language/index.ts';
import type { Message } from '../language/index.ts';
import { createBuilder, runOperations } from '../program/index.ts';
import { compileExpression } from './expression.ts';
import { KERNELS } from './kernels.ts';
import type { ValueType } from './model.ts';
import { createScope } from './resolve.ts';
import { Stop } from './stop.ts';
import { readable } from './workings.ts';

/** The value of an expression of numbers, functions and constants, or what is wrong with it. */
export function evaluateExpression(text: string): { value: number | string | boolean; type: ValueType } | Message {
  const expr = parseExpression(text);
  if ('code' in expr) return expr;
  const builder = createBuilder(KERNELS);
  let later: Message | null = null;
  const scope = createScope(
    builder,
    { text },
    { look: () => null, names: () => [], later: (message) => (later ??= message) },
  );
  try {
    const { type, handle } = compileExpression(expr, scope);
    if (later) return later;
    const { segment, slot } = builder.finish(0);
    const slots = new Float64Array(segment.size);
    for (let i = 0; i < segment.constantSlots.length; i++)
      slots[segment.constantSlots[i]!] = segment.constantValues[i]!;
    runOperations(segment.ops, 0, segment.ops.length, segment.args, 0, slots, KERNELS);
    return { type, value: readable(type, slots[slot(handle)]!) };
  } catch (thrown) {
    if (thrown instanceof Stop) return thrown.fault;
    throw thrown;
  }
}
