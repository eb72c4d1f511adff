// A compiled stage with its numbers, as cautions and workings take it.

import type { CellTree, FieldTree, Leg } from '../language/index.ts';
import type { NetLeg, StageLowering } from '../network/index.ts';
import type { CellContext, Read } from './draft.ts';
import type { PartInterface } from './interface.ts';

/** One leg with where it was written. */
export interface PlacedLeg {
  readonly net: NetLeg;
  readonly leg: Leg;
  readonly field: FieldTree;
}

export interface StageInHand {
  readonly tree: CellTree;
  readonly fets: readonly { readonly part: PartInterface; readonly partName: string }[];
  readonly legs: readonly PlacedLeg[];
  readonly lowering: StageLowering;
  readonly read: Read;
  readonly context: CellContext;
}
