// Many samples of a program, as columns: the caller fills the columns of what varies and reads those of what it wants.

import { runOperations } from './evaluate.ts';
import { OP, STRIDE } from './operations.ts';
import type { Program } from './program.ts';
import type { KernelTable } from './segment.ts';

/** What is to be computed for many samples. */
interface ColumnRequest {
  readonly program: Program;
  /** All values at the nominal state. */
  readonly slots: Float64Array;
  /** Slots that the caller fills for each sample; what writes them in the program is left out. */
  readonly varying: ArrayLike<number>;
  /** Slots that keep their nominal value whatever they depend on. */
  readonly frozen: ArrayLike<number>;
  /** Slots that are wanted for each sample. */
  readonly outputs: ArrayLike<number>;
}

/** Plain data. */
interface ColumnPlan {
  readonly ops: Int32Array;
  readonly args: Int32Array;
  readonly slots: Float64Array;
  readonly varying: Int32Array;
  readonly outputs: Int32Array;
}

interface Columns {
  /** Samples of one pass. */
  readonly width: number;
  input(k: number): Float64Array;
  output(k: number): Float64Array;
  /** Computes the first `count` samples of the columns. */
  run(count: number): void;
}

const WIDTH = 1024;

/** Leaves out what the caller supplies and what is frozen. */
export function planColumns(
  { program, slots, varying, frozen, outputs }: ColumnRequest,
  _kernels: KernelTable,
): ColumnPlan {
  const given = new Set([...Array.from(varying), ...Array.from(frozen)]);
  const kept: number[] = [];
  for (let i = 0; i < program.ops.length; i += STRIDE) {
    const [code, target, at, length] = program.ops.subarray(i, i + STRIDE);
    const written = code === OP.call ? program.args[at + length - 1] : target;
    if (!given.has(written)) kept.push(code, target, at, length);
  }
  return {
    ops: Int32Array.from(kept),
    args: program.args,
    slots,
    varying: Int32Array.from(varying),
    outputs: Int32Array.from(outputs),
  };
}

/** Columns for a plan, made with the kernels it was planned for. */
export function createColumns({ ops, args, slots, varying, outputs }: ColumnPlan, kernels: KernelTable): Columns {
  const given = Array.from(varying, () => new Float64Array(WIDTH));
  const wanted = Array.from(outputs, () => new Float64Array(WIDTH));
  const s = slots.slice();
  return {
    width: WIDTH,
    input: (k) => given[k],
    output: (k) => wanted[k],
    run(count) {
      for (let i = 0; i < count; i++) {
        for (let k = 0; k < varying.length; k++) s[varying[k]] = given[k][i];
        runOperations(ops, 0, ops.length, args, 0, s, kernels);
        for (let k = 0; k < outputs.length; k++) wanted[k][i] = s[outputs[k]];
      }
    },
  };
}
