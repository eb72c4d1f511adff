// The columnar evaluator: each operation runs down its columns before the next one starts.
//
// All columns stand in one array, a little apart from multiples of the page so that they do not fall on each other in the
// cache. A kernel with a form for columns runs in that; the others run sample by sample.

import { createLaneMemory } from './accelerator.ts';
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

interface ColumnOptions {
  /** Whether loops go two numbers at a time where the machine can; the results are the same. */
  readonly lanes: boolean;
}

const DEFAULTS: ColumnOptions = { lanes: true };

/** Columns for a plan, run with the kernels of the program that was planned. */
export function createColumns(plan: ColumnPlan, kernels: KernelTable, options: Partial<ColumnOptions> = {}): Columns {
  const width = plan.columnCount * WIDTH * 8 > ROOM ? NARROW : WIDTH;
  const stride = width + GAP;
  const numbers = plan.columnCount * stride;
  const memory = { ...DEFAULTS, ...options }.lanes ? createLaneMemory(kernels, numbers) : null;
  const all = memory?.all ?? new Float64Array(numbers);
  const first = memory?.free ?? 0;
  const place = (column: number): number => first + column * stride;
  const columns = Array.from({ length: plan.columnCount }, (_, k) => all.subarray(place(k), place(k) + width));
  plan.constantColumns.forEach((column, i) => columns[column].fill(plan.constantValues[i]));
  const { ops, args } = plan;
  const places = new Int32Array(args.length);
  return {
    width,
    input: (k) => columns[plan.inputColumns[k]],
    output: (k) => columns[plan.outputColumns[k]],
    run(count) {
      for (let i = 0; i < ops.length; i += STRIDE) {
        const [code, target, at, length] = [ops[i], ops[i + 1], ops[i + 2], ops[i + 3]];
        if (code !== OP.call) {
          const loop = memory?.operations[code];
          if (loop === undefined) COLUMN_OPERATIONS[code](columns[target], columns[at], columns[length], count);
          else loop(8 * place(at), 8 * place(length), 8 * place(target), count);
          continue;
        }
        const { run, columns: runColumns, lanes } = kernels[target];
        for (let n = at; n < at + length; n++) places[n] = place(args[n]);
        const zero = lanes?.zero === undefined ? -1 : at + lanes.inputs.indexOf(lanes.zero);
        const loop = zero < 0 || isZero(columns[args[zero]], count) ? memory?.kernels[target] : undefined;
        if (loop !== undefined) loop(...Array.from(places.subarray(at, at + length), (each) => 8 * each), count);
        else if (runColumns !== undefined) runColumns(all, places, at, count);
        else call(run, all, places, at, length, count);
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

function isZero(column: Float64Array, count: number): boolean {
  for (let i = 0; i < count; i++) if (column[i] !== 0) return false;
  return true;
}
