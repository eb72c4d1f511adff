// Finding the part that a point or a stage is made of.

import { nearestNames } from '../../language/index.ts';
import type { NameRef } from '../../language/index.ts';
import type { CellContext } from '../draft.ts';
import type { PartInterface } from '../interface.ts';
import { Waiting, kindName } from '../resolve.ts';
import { stop } from '../stop.ts';

/** The part named by `ref`; stops when there is none, waits when it is broken. */
export function partOf(ref: NameRef, context: CellContext): PartInterface {
  const cell = context.look(ref.name);
  if (!cell) {
    const near = nearestNames(ref.name, context.names());
    stop(
      'unknown-name',
      `There is no part ${ref.name}.${near.length > 0 ? ` Did you mean ${near.join(' or ')}?` : ''}`,
      ref.span,
    );
  }
  if (!cell.settled) throw new Waiting(ref.name);
  if (!cell.extra)
    stop(
      'part-expected',
      `${ref.name} is ${kindName(cell.kind)}; a part is wanted here, such as Q1 = n-JFET.`,
      ref.span,
    );
  return cell.extra;
}
