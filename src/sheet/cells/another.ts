// A further piece of the same kind: of one type with the first; its own draws are not computed yet.

import type { AnotherEntry } from '../../language/index.ts';
import { EMPTY_DRAFT } from '../draft.ts';
import type { CellContext, Draft } from '../draft.ts';
import { Waiting, kindName } from '../resolve.ts';
import { stop } from '../stop.ts';

/** Checks an `another` cell. */
export function compileAnotherCell(context: CellContext): Draft {
  const { tree } = context;
  const { of, span } = tree.entry as AnotherEntry;
  const first = context.look(of.name);
  if (first && !first.settled) throw new Waiting(of.name);
  if (!first || (first.kind !== 'quantity' && first.kind !== 'part' && first.kind !== 'another')) {
    stop(
      'another-of',
      `another wants a component or a part of this sheet; ${of.name} is ${first ? kindName(first.kind) : 'not there'}.`,
      of.span,
    );
  }
  context.later('A further piece of the same kind', span, tree.line);
  return {
    ...EMPTY_DRAFT,
    type: first.type,
    offers: [...first.offers].map(([name, offer]) => ({
      name,
      type: offer.type,
      handle: null,
      sentence: '',
      missing: offer.missing,
    })),
    extra: first.extra,
  };
}
