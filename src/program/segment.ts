// One cell, compiled: straight-line operations on a shared array of slots.
//
// A segment owns a block of slots, [base, base + size): first what other segments may read, last its constants. It
// reads slots of other segments and writes only its own. Constants are written once, when the segment is installed;
// the operations never overwrite them. Segments are plain data and can be posted to a worker.

import type { LaneText } from './lane-language.ts';

export interface Segment {
  readonly base: number;
  readonly size: number;
  /** Other segments read the slots [base, base + visible) and no others. */
  readonly visible: number;
  readonly ops: Int32Array;
  readonly args: Int32Array;
  readonly constantSlots: Int32Array;
  readonly constantValues: Float64Array;
}

/** A multi-result operation: `args[at]`, `args[at + 1]`, .. are slots, inputs first, then outputs. */
export type Kernel = (slots: Float64Array, args: Int32Array, at: number) => void;
/** A kernel down columns: place `at + n` is where the column of its n-th argument begins in `all`; results overlap no input. */
type ColumnKernel = (all: Float64Array, places: Int32Array, at: number, count: number) => void;
/**
 * The kernels a program may call, by name; a program refers to them by their position. What `columns` and `lanes` leave is
 * to the last bit what `run` leaves sample by sample.
 */
export type KernelTable = readonly {
  readonly name: string;
  readonly run: Kernel;
  readonly columns?: ColumnKernel;
  readonly lanes?: LaneText;
}[];
