// A cell as the engine keeps it between edits.

import type { CellTree } from '../language/index.ts';
import type { CompiledCell } from './compiled-cell.ts';
import type { Placed } from './draft.ts';
import type { CellReading } from './model.ts';

/** A cell of the sheet as the engine keeps it. */
export interface Node {
  readonly key: string;
  tree: CellTree;
  /** The tree its code was compiled from: the same text, perhaps on other lines. */
  compiledTree: CellTree;
  compiled: CompiledCell;
  /** `compiled` only stands in for code: the cell is on a circle, or its name is taken. */
  standsIn: boolean;
  /** Its block of slots. */
  base: number;
  capacity: number;
  /** Why it has no values just now; own faults before waiting. */
  fault: Placed | null;
  waitsFor: string | null;
  /** The cell without values at the root of the waiting; null where it does not wait. */
  root: Node | null;
  /** What is said of its waiting: it changes with the line of the root. */
  waitingText: string;
  uses: readonly number[];
  usedBy: number[];
  /** The pass in which its values last changed. */
  changedAt: number;
  /** Reading of the pass it was made in. */
  reading: CellReading | null;
}
