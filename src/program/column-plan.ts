// The plan by which many samples of a program are computed as columns: only what the wanted values need, equal operations
// once, what does not vary as a constant, and columns used again once nothing reads them any more. Plain data.

import { OP, STRIDE } from './operations.ts';
import type { Program } from './program.ts';

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

export interface ColumnPlan {
  /** Operations as in a program, on columns instead of slots. */
  readonly ops: Int32Array;
  readonly args: Int32Array;
  readonly columnCount: number;
  /** Columns that hold one number throughout. */
  readonly constantColumns: Int32Array;
  readonly constantValues: Float64Array;
  readonly inputColumns: Int32Array;
  readonly outputColumns: Int32Array;
}

/** One operation or call that is to be run for each sample; operands and results by the number of their value. */
interface Step {
  readonly code: number;
  readonly kernel: number;
  readonly inputs: readonly number[];
  readonly outputs: readonly number[];
}

/** Plans the columns of a request. */
export function planColumns(request: ColumnRequest): ColumnPlan {
  const { steps, values, inputs, outputs } = simplify(request);
  const live = liveSteps(steps, outputs);
  return allocate(live, values, inputs, outputs);
}

interface Simplified {
  readonly steps: readonly Step[];
  /** By value number: the constant it is, NaN included, or null for one that varies. */
  readonly values: readonly (number | null)[];
  readonly inputs: readonly number[];
  readonly outputs: readonly number[];
}

/** Numbers the values of a program so that equal ones have one number. */
function simplify({ program, slots, varying, frozen, outputs }: ColumnRequest): Simplified {
  const { ops, args, slotCount } = program;
  const values: (number | null)[] = [];
  const numberOf = new Int32Array(slotCount).fill(-1);
  const constants = new Map<string, number>();
  const constant = (x: number): number => {
    const key = Object.is(x, -0) ? '-0' : String(x);
    let found = constants.get(key);
    if (found === undefined) constants.set(key, (found = values.push(x) - 1));
    return found;
  };
  const inputs = Array.from(varying, (slot) => (numberOf[slot] = values.push(null) - 1));
  const given = new Set([...Array.from(varying), ...Array.from(frozen)]);
  const known = new Uint8Array(slotCount);
  for (const slot of program.constantSlots) known[slot] = 1;
  for (const slot of given) known[slot] = 1;
  const read = (slot: number): number => {
    if (numberOf[slot] < 0) numberOf[slot] = constant(slots[slot]);
    return numberOf[slot];
  };
  const steps: Step[] = [];
  const seen = new Map<string, readonly number[]>();
  const compute = (code: number, kernel: number, operands: readonly number[], targets: readonly number[]): void => {
    for (const slot of targets) known[slot] = 1;
    // Constant where no operand varies: the slots hold the result already.
    if (operands.every((operand) => values[operand] !== null)) return;
    const key = `${code} ${kernel} ${operands.join(' ')}`;
    let results = seen.get(key);
    if (results === undefined) {
      results = targets.map(() => values.push(null) - 1);
      seen.set(key, results);
      steps.push({ code, kernel, inputs: operands, outputs: results });
    }
    targets.forEach((slot, i) => {
      if (!given.has(slot)) numberOf[slot] = results[i];
    });
  };
  for (let i = 0; i < ops.length; i += STRIDE) {
    const [code, target, at, length] = ops.subarray(i, i + STRIDE);
    if (code !== OP.call) {
      if (code === OP.copy) {
        known[target] = 1;
        if (!given.has(target)) numberOf[target] = read(at);
      } else if (UNARY.has(code)) compute(code, -1, [read(at)], [target]);
      else compute(code, -1, [read(at), read(length)], [target]);
      continue;
    }
    const list = Array.from(args.subarray(at, at + length));
    const targets = list.filter((slot) => known[slot] === 0);
    const operands = list.filter((slot) => known[slot] !== 0);
    compute(code, target, operands.map(read), targets);
  }
  return { steps, values, inputs, outputs: Array.from(outputs, read) };
}

const UNARY: ReadonlySet<number> = new Set([
  OP.neg,
  OP.abs,
  OP.sqrt,
  OP.sign,
  OP.exp,
  OP.ln,
  OP.log10,
  OP.sin,
  OP.cos,
  OP.tan,
  OP.atan,
  OP.not,
]);

/** The steps on which a wanted value rests. */
function liveSteps(steps: readonly Step[], outputs: readonly number[]): Step[] {
  const needed = new Set(outputs);
  const live: Step[] = [];
  for (let i = steps.length - 1; i >= 0; i--) {
    const step = steps[i];
    if (!step.outputs.some((value) => needed.has(value))) continue;
    for (const value of step.inputs) needed.add(value);
    live.push(step);
  }
  return live.toReversed();
}

/** Gives each value a column; one that nothing reads any more hands its column on. */
function allocate(
  steps: readonly Step[],
  values: readonly (number | null)[],
  inputs: readonly number[],
  outputs: readonly number[],
): ColumnPlan {
  const lastRead = new Map<number, number>();
  steps.forEach((step, i) => {
    for (const value of step.outputs) lastRead.set(value, i);
    for (const value of step.inputs) lastRead.set(value, i);
  });
  const kept = new Set([...inputs, ...outputs]);
  const columnOf = new Map<number, number>();
  const free: number[] = [];
  let columnCount = 0;
  const constantColumns: number[] = [];
  const constantValues: number[] = [];
  const place = (value: number): number => {
    let column = columnOf.get(value);
    if (column !== undefined) return column;
    const x = values[value];
    if (x === null) column = free.pop() ?? columnCount++;
    else {
      column = columnCount++;
      constantColumns.push(column);
      constantValues.push(x);
    }
    columnOf.set(value, column);
    return column;
  };
  const inputColumns = inputs.map(place);
  // Results that others read later may not take the column of one that is still read: outputs are placed as they come.
  const ops: number[] = [];
  const args: number[] = [];
  steps.forEach((step, i) => {
    const from = step.inputs.map(place);
    const release = (released: readonly number[]): void => {
      for (const value of new Set(released)) {
        if (lastRead.get(value) === i && values[value] === null && !kept.has(value)) free.push(columnOf.get(value)!);
      }
    };
    // An operation may write where it reads; what a kernel writes first it might still read.
    if (step.code !== OP.call) release(step.inputs);
    const to = step.outputs.map(place);
    if (step.code === OP.call) {
      ops.push(OP.call, step.kernel, args.length, from.length + to.length);
      args.push(...from, ...to);
    } else ops.push(step.code, to[0], from[0], from[from.length - 1]);
    release(step.code === OP.call ? [...step.inputs, ...step.outputs] : step.outputs);
  });
  const outputColumns = outputs.map(place);
  return {
    ops: Int32Array.from(ops),
    args: Int32Array.from(args),
    columnCount,
    constantColumns: Int32Array.from(constantColumns),
    constantValues: Float64Array.from(constantValues),
    inputColumns: Int32Array.from(inputColumns),
    outputColumns: Int32Array.from(outputColumns),
  };
}
