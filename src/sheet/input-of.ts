// Inputs: what a plot or an inverse cell may turn.

import type { PathExpr, SheetTree } from '../language/index.ts';
import { isInputEntry } from './cells/quantity.ts';
import { labelOf } from './cells/stage-places.ts';
import type { CellContext } from './draft.ts';
import { stop } from './stop.ts';

/** Inputs that a message names at most. */
const MOST_NAMED = 4;

/** Stops where a path names a value that is computed: a quantity, or a field of a part or point, entered as one number. */
export function checkInput(path: PathExpr, context: CellContext): void {
  const [first, ...rest] = path.names.map(({ name }) => name);
  const cell = context.look(first!);
  const offer = rest.length === 0 ? cell : cell?.offers.get(rest.join('.'));
  if (offer?.isInput) return;
  const named = [first, ...rest].join('.');
  const known = context.inputs();
  const which =
    known.length === 0
      ? ''
      : ` Inputs here are ${known.slice(0, MOST_NAMED).join(', ')}${known.length > MOST_NAMED ? ' and others' : ''}.`;
  const ambient = named === 'T_A' && !cell ? ' Write T_A = 25 degC in a line of its own first.' : '';
  stop(
    'input-expected',
    `${named} is no input. What is turned here is a quantity, or a field of a part or point, whose entry is one number.${ambient}${which}`,
    path.span,
  );
}

/** The names of all inputs of a sheet, quantities first. */
export function inputNames({ cells }: SheetTree): string[] {
  const quantities: string[] = [];
  const inBlocks: string[] = [];
  for (const { name, entry, fields } of cells) {
    if (entry.type === 'quantity' && isInputEntry(entry)) quantities.push(name.name);
    if (entry.type !== 'part' && entry.type !== 'point') continue;
    const inputs = fields.filter(({ body }) => body.type === 'quantity' && isInputEntry(body)).map(labelOf);
    for (const label of new Set(inputs)) inBlocks.push(`${name.name}.${label}`);
  }
  return [...quantities, ...inBlocks];
}
