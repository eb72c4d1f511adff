// The columnar evaluator: each operation runs down its columns before the next one starts.
//
// All columns stand in one array, a little apart from multiples of the page so that they do not fall on each other in the
// cache. Loops are written out for each operation: only then are they compiled to what they are.

import { atan, cos, exp, hypot, ln, log10, pow, sin, tan } from '../numeric/index.ts';
import type { ColumnPlan } from './column-plan.ts';
import { parallel } from './evaluate.ts';
import { OP, STRIDE } from './operations.ts';
import type { OperationName } from './operations.ts';
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
        if (ops[i] === OP.call) {
          for (let n = ops[i + 2]; n < ops[i + 2] + ops[i + 3]; n++) places[n] = args[n] * stride;
          call(kernels[ops[i + 1]].run, all, places, ops[i + 2], ops[i + 3], count);
        } else OPERATIONS[ops[i]](columns[ops[i + 1]], columns[ops[i + 2]], columns[ops[i + 3]], count);
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

type ColumnOperation = (t: Float64Array, a: Float64Array, b: Float64Array, count: number) => void;

/** Each operation down its columns, by its code: a function of its own each, so that each is compiled for itself. */
const OPERATIONS: readonly ColumnOperation[] = inOrder({
  add: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = a[i] + b[i];
  },
  sub: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = a[i] - b[i];
  },
  mul: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = a[i] * b[i];
  },
  div: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = a[i] / b[i];
  },
  neg: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = -a[i];
  },
  abs: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = Math.abs(a[i]);
  },
  sqrt: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = Math.sqrt(a[i]);
  },
  min: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = Math.min(a[i], b[i]);
  },
  max: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = Math.max(a[i], b[i]);
  },
  parallel: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = parallel(a[i], b[i]);
  },
  sign: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = Math.sign(a[i]);
  },
  exp: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = exp(a[i]);
  },
  ln: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = ln(a[i]);
  },
  log10: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = log10(a[i]);
  },
  sin: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = sin(a[i]);
  },
  cos: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = cos(a[i]);
  },
  tan: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = tan(a[i]);
  },
  atan: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = atan(a[i]);
  },
  hypot: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = hypot(a[i], b[i]);
  },
  pow: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = pow(a[i], b[i]);
  },
  less: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = a[i] < b[i] ? 1 : 0;
  },
  lessOrEqual: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = a[i] <= b[i] ? 1 : 0;
  },
  equal: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = a[i] === b[i] ? 1 : 0;
  },
  and: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = a[i] * b[i];
  },
  or: (t, a, b, count) => {
    for (let i = 0; i < count; i++) t[i] = Math.max(a[i], b[i]);
  },
  not: (t, a, _b, count) => {
    for (let i = 0; i < count; i++) t[i] = 1 - a[i];
  },
});

function inOrder(byName: Readonly<Record<Exclude<OperationName, 'copy'>, ColumnOperation>>): ColumnOperation[] {
  const list: ColumnOperation[] = [];
  for (const [name, operation] of Object.entries(byName)) list[OP[name as OperationName]] = operation;
  return list;
}
