// The columnar evaluator: each operation runs down its columns before the next one starts.
//
// All columns stand in one array, a little apart from multiples of the page so that they do not fall on each other in the
// cache. A kernel with a form for columns runs in that; the others run sample by sample.

import { COLUMN_OPERATIONS } from './column-operations.ts';
import type { ColumnPlan } from './column-plan.ts';
import { OP, STRIDE } from './operations.ts';
import type { Kernel, KernelTable } from './segment.ts';

interface Columns {
  /** Samples of one pass. */
  readonly width: number;
  /** The column of the k-th slot that varies: the caller fills it. */
  input(k: number): Float64Array;
  /** The column of the k-th wanted slot. */
  output(k: number): Float64Array;
  /** Computes the first `count` samples. */
  run(count: number): void;
}

const WIDTH = 1024;
const NARROW = 256;
/** Bytes of columns beyond which they are kept narrow. */
const ROOM = 1 << 20;
/** Numbers between two columns: 192 bytes. */
const GAP = 24;

/** Columns for a plan, run with the kernels of the program that was planned. */
export function createColumns(plan: ColumnPlan, kernels: KernelTable): Columns {
  const width = plan.columnCount * WIDTH * 8 > ROOM ? NARROW : WIDTH;
  const stride = width + GAP;
  const all = new Float64Array(plan.columnCount * stride);
  const columns = Array.from({ length: plan.columnCount }, (_, k) => all.subarray(k * stride, k * stride + width));
  plan.constantColumns.forEach((column, i) => columns[column].fill(plan.constantValues[i]));
  const { ops, args } = plan;
  const places = new Int32Array(args.length);
  return {
    width,
    input: (k) => columns[plan.inputColumns[k]],
    output: (k) => columns[plan.outputColumns[k]],
    run(count) {
      for (let i = 0; i < ops.length; i += STRIDE) {
        if (ops[i] !== OP.call) {
          COLUMN_OPERATIONS[ops[i]](columns[ops[i + 1]], columns[ops[i + 2]], columns[ops[i + 3]], count);
          continue;
        }
        const [at, length] = [ops[i + 2], ops[i + 3]];
        const kernel = kernels[ops[i + 1]];
        for (let n = at; n < at + length; n++) places[n] = args[n] * stride;
        if (kernel.columns === undefined) call(kernel.run, all, places, at, length, count);
        else kernel.columns(all, places, at, count);
      }
    },
  };
}

/** Runs a kernel sample by sample; its slots walk down their columns. */
function call(run: Kernel, all: Float64Array, places: Int32Array, at: number, length: number, count: number): void {
  const end = at + length;
  for (let i = 0; i < count; i++) {
    run(all, places, at);
    for (let n = at; n < end; n++) places[n]++;
  }
}
