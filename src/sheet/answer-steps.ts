// Workings of an inverse cell: both sides of its equation with the answer in place.

import { pathsOf } from '../language/index.ts';
import type { Expr } from '../language/index.ts';
import { REGIONS } from '../network/index.ts';
import type { Asked } from './answer-text.ts';
import type { Read } from './draft.ts';
import type { WorkingStep } from './model.ts';
import type { Scope, Typed } from './scope.ts';
import { readable } from './workings.ts';

/** A value that a formula names. */
interface Named extends Typed {
  readonly name: string;
}

/** The values that an expression names, each once. */
export function namedIn(expr: Expr, scope: Scope): Named[] {
  const found = new Map<string, Named>();
  for (const path of pathsOf(expr)) {
    const name = path.names.map((part) => part.name).join('.');
    if (!found.has(name) && !(REGIONS as readonly string[]).includes(name))
      found.set(name, { name, ...scope.resolve(path) });
  }
  return [...found.values()];
}

/** The steps; `at` reads the sheet turned to the answer. */
export function answerSteps({ entry, line, target, value }: Asked, at: Read): WorkingStep[] {
  const asked = entry.input.names.map(({ name }) => name).join('.');
  const step = (expr: Expr, side: Asked['target'], sentence: string): WorkingStep => ({
    name: null,
    formula: line.text.slice(expr.span.start, expr.span.end).trim(),
    operands: side.named.map(({ name, type, handle }) => ({ name, type, value: readable(type, at(handle)), as: null })),
    type: side.type,
    value: at(side.handle),
    as: null,
    sentence,
  });
  return [
    step(entry.target, target, `The target, with the answer for ${asked}.`),
    step(entry.value, value, 'The value it is to have.'),
  ];
}
