// A plot cell: what it draws is checked here and drawn elsewhere.

import type { PlotEntry } from '../../language/index.ts';
import { FREQUENCY, sameKind } from '../../quantity/index.ts';
import { EMPTY_DRAFT } from '../draft.ts';
import type { CellContext, Draft } from '../draft.ts';
import { compileQuantity } from '../operand.ts';
import { checkInput } from '../input-of.ts';
import type { CellKind } from '../model.ts';
import { Waiting, kindName } from '../resolve.ts';
import { operandText } from '../scope.ts';
import { stop } from '../stop.ts';
import { sameType, typeName } from '../value-type.ts';

/** The cells a figure may be drawn of. */
const SUBJECTS: Readonly<Record<'transfer' | 'output' | 'response' | 'noise' | 'bench', readonly CellKind[]>> = {
  transfer: ['stage', 'point', 'part'],
  output: ['stage', 'point', 'part'],
  response: ['stage'],
  noise: ['stage'],
  bench: ['bench'],
};

/** Compiles a plot cell. */
export function compilePlotCell(context: CellContext): Draft {
  const { tree } = context;
  const entry = tree.entry as PlotEntry;
  const scope = context.scope(tree.line);
  const { figure } = entry;
  if (figure !== 'against' && figure !== 'spread') {
    const subject = context.look(entry.of!.name);
    const wanted = SUBJECTS[figure];
    if (subject?.kind === 'broken') throw new Waiting(entry.of!.name);
    if (!subject || !wanted.includes(subject.kind)) {
      const found = subject ? `is ${kindName(subject.kind)}` : 'is not in this sheet';
      stop('plot-subject', `A ${figure} plot is drawn of a ${wanted[0]}; ${entry.of!.name} ${found}.`, entry.of!.span);
    }
    if (figure === 'response' || figure === 'noise') {
      if (!entry.over) stop('plot-range', `A ${figure} plot wants its range: over 10 Hz .. 1 MHz log.`, entry.span);
      context.later(`A ${figure} plot`, entry.span, tree.line);
    }
    if (entry.over) range(entry, context);
    return EMPTY_DRAFT;
  }
  for (const value of entry.values) compileQuantity(value, scope);
  if (figure === 'spread') {
    if (entry.values[0]!.type !== 'path')
      context.later('The spread of a formula without a name', entry.span, tree.line);
    return EMPTY_DRAFT;
  }
  const input = scope.resolve(entry.against!);
  checkInput(entry.against!, context);
  const low = range(entry, context);
  if (!sameType(input.type, low)) {
    const name = operandText(scope, entry.against!.span, 'the input');
    stop(
      'plot-range-dimension',
      `${name} is ${typeName(input.type)} and the range is ${typeName(low)}. Give the range in the unit of ${name}.`,
      entry.over!.span,
    );
  }
  const over = entry.over!;
  if (!over.log) return EMPTY_DRAFT;
  const reachesZero = (): boolean => [over.low, over.high].some((end) => context.now(end, tree.line).value <= 0);
  if (reachesZero()) {
    stop('plot-log-range', 'A logarithmic range does not reach 0: both ends lie above it.', over.span);
  }
  return { ...EMPTY_DRAFT, shape: () => String(reachesZero()) };
}

function range(entry: PlotEntry, context: CellContext) {
  const scope = context.scope(context.tree.line);
  const over = entry.over!;
  const low = compileQuantity(over.low, scope).type;
  const high = compileQuantity(over.high, scope).type;
  if (!sameKind(low, high)) {
    stop(
      'range-dimension',
      `${operandText(scope, over.low.span, 'One end')} is ${typeName(low)} and ${operandText(scope, over.high.span, 'the other')} is ${typeName(high)}. Both ends are of one kind.`,
      over.span,
    );
  }
  const isResponse = entry.figure === 'response' || entry.figure === 'noise';
  if (isResponse && !sameKind(low, FREQUENCY)) {
    stop(
      'range-dimension',
      `A ${entry.figure} plot runs over frequency; ${operandText(scope, over.low.span, 'this')} is ${typeName(low)}.`,
      over.span,
    );
  }
  return low;
}
