// A further piece of the same kind: what its first piece is, with draws of its own.

import type { AnotherEntry, CellTree } from '../../language/index.ts';
import type { CellContext, Draft } from '../draft.ts';
import { Waiting, kindName } from '../resolve.ts';
import { stop } from '../stop.ts';
import { compilePartCell } from './part.ts';
import { compileQuantityCell } from './quantity.ts';

/** Compiles an `another` cell: the entry of its first piece once more, under its own name. */
export function compileAnotherCell(context: CellContext): Draft {
  const { tree } = context;
  const { of } = tree.entry as AnotherEntry;
  const first = context.look(of.name);
  if (first && !first.settled) throw new Waiting(of.name);
  const original = first && firstPiece(of.name, context);
  if (!original) {
    stop(
      'another-of',
      `another wants a component or a part of this sheet; ${of.name} is ${first ? kindName(first.kind) : 'not there'}.`,
      of.span,
    );
  }
  const again: CellContext = { ...context, tree: { ...original, name: tree.name } };
  const draft = original.entry.type === 'part' ? compilePartCell(again) : compileQuantityCell(again);
  return { ...draft, isInput: false };
}

/** The quantity or part at the end of a chain of `another`; null where there is another kind of cell. */
function firstPiece(name: string, context: CellContext): CellTree | null {
  const found = context.treeOf(name);
  if (found?.entry.type === 'another') return firstPiece(found.entry.of.name, context);
  return found?.entry.type === 'quantity' || found?.entry.type === 'part' ? found : null;
}
