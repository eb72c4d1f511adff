// An inverse cell: the value that an input would need for a target to be met. What is chosen from the answer is the same in
// every build, unless it is asked for in each.

import type { Expr, InverseEntry } from '../../language/index.ts';
import { EMPTY_DRAFT } from '../draft.ts';
import type { CellContext, Draft, Placed, Read } from '../draft.ts';
import { answerSteps, namedIn } from '../answer-steps.ts';
import { answerText } from '../answer-text.ts';
import { checkInput } from '../input-of.ts';
import { compileQuantity } from '../operand.ts';
import { operandText } from '../scope.ts';
import { stop } from '../stop.ts';
import type { Answers } from '../answers.ts';
import { sameType, typeName } from '../value-type.ts';

/** Compiles an inverse cell; its type is that of the input it asks for. */
export function compileInverseCell(context: CellContext): Draft {
  const { tree, builder } = context;
  const entry = tree.entry as InverseEntry;
  const scope = context.scope(tree.line);
  const input = scope.resolve(entry.input);
  checkInput(entry.input, context);
  const target = compileQuantity(entry.target, scope);
  const value = compileQuantity(entry.value, scope);
  if (!sameType(target.type, value.type)) {
    stop(
      'inverse-target',
      `${operandText(scope, entry.target.span, 'The target')} is ${typeName(target.type)} and ${operandText(scope, entry.value.span, 'its value')} is ${typeName(value.type)}. Give the target a value of its own kind.`,
      entry.value.span,
    );
  }
  const [low, high] = [entry.over.low, entry.over.high].map((end) => {
    const compiled = scope.compile(end);
    if (!sameType(compiled.type, input.type)) {
      stop(
        'range-dimension',
        `${operandText(scope, entry.input.span, 'The input')} is ${typeName(input.type)} and ${operandText(scope, end.span, 'this end')} is ${typeName(compiled.type)}. Give the range in the unit of the input.`,
        end.span,
      );
    }
    return compiled.handle;
  });
  const residual = builder.sub(target.handle, value.handle);
  const held = builder.input(NaN);
  const answer = builder.call('answer', [residual, low!, high!, held], 1)[0]!;
  const chosen = entry.each ? answer : builder.call('nominal', [answer], 1)[0]!;
  let found: Answers | null = null;
  let atAnswer: Read | null = null;
  const side = (expr: Expr, typed: typeof target) => ({ ...typed, named: namedIn(expr, scope) });
  const subject = {
    entry,
    line: tree.line,
    input: input.type,
    target: side(entry.target, target),
    value: side(entry.value, value),
  };
  const verify = (read: Read): Placed | null => {
    const fault = found && answerText(found, subject, read(value.handle));
    return fault && { line: tree.line, message: { ...fault, span: entry.span } };
  };
  return {
    ...EMPTY_DRAFT,
    type: input.type,
    value: chosen,
    verify: (read) => (Number.isNaN(read(chosen)) ? verify(read) : null),
    workings: () => (found && atAnswer ? answerSteps(subject, found, atAnswer) : []),
    asks: {
      cell: entry.input.names[0]!.name,
      input: input.handle,
      residual,
      low: low!,
      high: high!,
      held,
      answer,
      each: entry.each,
      take: (answers, at) => {
        found = answers;
        atAnswer = at;
      },
    },
  };
}
