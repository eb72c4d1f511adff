// What the lowering of a stage writes to: a straight list of operations on values that are known only
// when the program runs. The compiled program implements it; nothing here looks at a number.

import type { KernelName } from './kernels.ts';

/** A value known when the program runs. */
export type Handle = number;

/** Appends one operation per call and answers with the handle of its result. */
export interface Emitter {
  constant(x: number): Handle;
  add(a: Handle, b: Handle): Handle;
  sub(a: Handle, b: Handle): Handle;
  mul(a: Handle, b: Handle): Handle;
  div(a: Handle, b: Handle): Handle;
  neg(a: Handle): Handle;
  min(a: Handle, b: Handle): Handle;
  max(a: Handle, b: Handle): Handle;
  abs(a: Handle): Handle;
  sqrt(a: Handle): Handle;
  /** A multi-result operation of the table of kernels; inputs and results in the order of the kernel's lists. */
  call(kernel: KernelName, inputs: readonly Handle[], outputs: number): Handle[];
}
