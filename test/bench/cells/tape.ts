// A sheet of many small cells as the product's compiled form: one segment per input and per cell.

import { assemble, createBuilder } from '../../../src/program/index.ts';
import type { Program, Segment } from '../../../src/program/index.ts';
import type { CellGraph } from './graph.ts';

/** The program of `graph`, and the slot of each of its values. */
export function createProgram({ inputs, left, right, scale }: CellGraph): { program: Program; slotOf: Int32Array } {
  const segments: Segment[] = [];
  const feeds: number[][] = [];
  const slotOf = new Int32Array(inputs + left.length);
  let base = 0;
  for (let index = 0; index < slotOf.length; index++) {
    const builder = createBuilder([]);
    const cell = index - inputs;
    const value =
      cell < 0
        ? builder.constant(1)
        : builder.add(
            builder.mul(slotOf[left[cell]], builder.constant(scale[cell])),
            builder.mul(slotOf[right[cell]], builder.constant(0.25)),
          );
    const { segment, slot } = builder.finish(base, value, []);
    segments.push(segment);
    feeds.push([]);
    slotOf[index] = slot(value);
    base += segment.size;
    if (cell >= 0) for (const source of new Set([left[cell], right[cell]])) feeds[source].push(index);
  }
  return { program: assemble(segments, feeds), slotOf };
}
