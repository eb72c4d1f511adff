// Every kind of cell and how it is compiled: the one table to extend for a new kind.

import { compileAnotherCell } from './cells/another.ts';
import { compileBenchCell } from './cells/bench.ts';
import { compileCheckCell } from './cells/check.ts';
import { compileInverseCell } from './cells/inverse.ts';
import { compilePartCell } from './cells/part.ts';
import { compilePlotCell } from './cells/plot.ts';
import { compilePointCell } from './cells/point.ts';
import { compileQuantityCell } from './cells/quantity.ts';
import { compileStageCell } from './cells/stage.ts';
import type { CellContext, Draft } from './draft.ts';
import type { CellKind } from './model.ts';

type Compile = (context: CellContext) => Draft;

/** By the type of a cell's entry; a broken entry never gets here. */
export const CELL_KINDS: Readonly<Record<Exclude<CellKind, 'broken'>, Compile>> = {
  quantity: compileQuantityCell,
  part: compilePartCell,
  another: compileAnotherCell,
  point: compilePointCell,
  stage: compileStageCell,
  bench: compileBenchCell,
  check: compileCheckCell,
  plot: compilePlotCell,
  inverse: compileInverseCell,
};
