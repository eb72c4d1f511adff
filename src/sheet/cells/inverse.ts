// An inverse cell: its dimensions are checked; the search itself is not computed yet.

import type { InverseEntry } from '../../language/index.ts';
import { EMPTY_DRAFT } from '../draft.ts';
import type { CellContext, Draft } from '../draft.ts';
import { checkInput } from '../input-of.ts';
import { operandText } from '../scope.ts';
import { stop } from '../stop.ts';
import { sameType, typeName } from '../value-type.ts';

/** Checks an inverse cell; its type is that of the input it asks for. */
export function compileInverseCell(context: CellContext): Draft {
  const { tree } = context;
  const entry = tree.entry as InverseEntry;
  const scope = context.scope(tree.line);
  const input = scope.resolve(entry.input);
  checkInput(entry.input, context);
  const target = scope.compile(entry.target);
  const value = scope.compile(entry.value);
  if (!sameType(target.type, value.type)) {
    stop(
      'inverse-target',
      `${operandText(scope, entry.target.span, 'The target')} is ${typeName(target.type)} and ${operandText(scope, entry.value.span, 'its value')} is ${typeName(value.type)}. Give the target a value of its own kind.`,
      entry.value.span,
    );
  }
  for (const end of [entry.over.low, entry.over.high]) {
    const { type } = scope.compile(end);
    if (!sameType(type, input.type)) {
      stop(
        'range-dimension',
        `${operandText(scope, entry.input.span, 'The input')} is ${typeName(input.type)} and ${operandText(scope, end.span, 'this end')} is ${typeName(type)}. Give the range in the unit of the input.`,
        end.span,
      );
    }
  }
  context.later('An inverse cell', entry.span, tree.line);
  return { ...EMPTY_DRAFT, type: input.type };
}
