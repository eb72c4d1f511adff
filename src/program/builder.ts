// Builds one segment. Values are handles: the slot of another segment as it is, or a local number that
// becomes a slot when the segment's block has been allocated.

import type { Emitter, Handle } from '../network/index.ts';
import { OP, STRIDE } from './operations.ts';
import type { OperationName } from './operations.ts';
import type { KernelTable, Segment } from './segment.ts';

/** Local handles count from here; slots of other segments lie below. */
const LOCAL = 0x40000000;

export interface Builder extends Emitter {
  /** One operation of `OP`; `b` is left out for those of one operand. */
  op(name: OperationName, a: Handle, b?: Handle): Handle;
  /** How many slots the segment needs. */
  size(): number;
  /** The finished segment with its slots at `base`, and the slot of any handle in it. */
  finish(base: number): { segment: Segment; slot: (handle: Handle) => number };
}

/** A builder whose calls are looked up in `kernels`; a name that is not there throws. */
export function createBuilder(kernels: KernelTable): Builder {
  const ops: number[] = [];
  const args: number[] = [];
  const constants = new Map<number, number>(); // value -> local index; -0 and NaN by their own keys below
  let negativeZero = -1;
  const values: [number, number][] = [];
  let count = 0;

  const local = (): Handle => LOCAL + count++;

  function constant(x: number): Handle {
    if (Object.is(x, -0)) {
      if (negativeZero < 0) {
        negativeZero = count;
        values.push([count++, x]);
      }
      return LOCAL + negativeZero;
    }
    let index = constants.get(x);
    if (index === undefined) {
      index = count++;
      constants.set(x, index);
      values.push([index, x]);
    }
    return LOCAL + index;
  }

  function op(name: OperationName, a: Handle, b: Handle = a): Handle {
    const target = local();
    ops.push(OP[name], target, a, b);
    return target;
  }

  function call(kernel: string, inputs: readonly Handle[], outputs: number): Handle[] {
    const index = kernels.findIndex((k) => k.name === kernel);
    if (index < 0) throw new RangeError(`No kernel is called ${kernel}.`);
    const results = Array.from({ length: outputs }, local);
    ops.push(OP.call, index, args.length, inputs.length + outputs);
    args.push(...inputs, ...results);
    return results;
  }

  return {
    constant,
    op,
    call,
    add: (a, b) => op('add', a, b),
    sub: (a, b) => op('sub', a, b),
    mul: (a, b) => op('mul', a, b),
    div: (a, b) => op('div', a, b),
    neg: (a) => op('neg', a),
    min: (a, b) => op('min', a, b),
    max: (a, b) => op('max', a, b),
    abs: (a) => op('abs', a),
    sqrt: (a) => op('sqrt', a),
    size: () => count,
    finish(base) {
      const slot = (handle: Handle): number => (handle >= LOCAL ? handle - LOCAL + base : handle);
      const code = new Int32Array(ops.length);
      for (let i = 0; i < ops.length; i += STRIDE) {
        const isCall = ops[i] === OP.call;
        code[i] = ops[i]!;
        code[i + 1] = isCall ? ops[i + 1]! : slot(ops[i + 1]!);
        code[i + 2] = isCall ? ops[i + 2]! : slot(ops[i + 2]!);
        code[i + 3] = isCall ? ops[i + 3]! : slot(ops[i + 3]!);
      }
      const segment: Segment = {
        base,
        size: count,
        ops: code,
        args: Int32Array.from(args, slot),
        constantSlots: Int32Array.from(values, ([index]) => base + index),
        constantValues: Float64Array.from(values, ([, value]) => value),
      };
      return { segment, slot };
    },
  };
}
