// An emitter that computes at once: a handle is the index of its value.

import { KERNELS } from '../../src/network/index.ts';
import type { Emitter, Handle } from '../../src/network/index.ts';

export interface DirectEmitter extends Emitter {
  /** A value from outside, which no operation knows to be constant. */
  input(value: number): Handle;
  value(handle: Handle): number;
  /** Operations so far: `+`, `*`, `line-point`, .. */
  readonly operations: readonly string[];
}

export function createDirectEmitter(): DirectEmitter {
  const values: number[] = [];
  const constants = new Map<number, Handle>();
  const operations: string[] = [];
  const put = (value: number): Handle => values.push(value) - 1;
  const op = (name: string, value: number): Handle => {
    operations.push(name);
    return put(value);
  };
  return {
    operations,
    input: put,
    value: (handle) => values[handle],
    constant(x) {
      const known = constants.get(x);
      if (known !== undefined) return known;
      const made = put(x);
      constants.set(x, made);
      return made;
    },
    add: (a, b) => op('+', values[a] + values[b]),
    sub: (a, b) => op('-', values[a] - values[b]),
    mul: (a, b) => op('*', values[a] * values[b]),
    div: (a, b) => op('/', values[a] / values[b]),
    neg: (a) => op('neg', -values[a]),
    min: (a, b) => op('min', Math.min(values[a], values[b])),
    max: (a, b) => op('max', Math.max(values[a], values[b])),
    abs: (a) => op('abs', Math.abs(values[a])),
    sqrt: (a) => op('sqrt', Math.sqrt(values[a])),
    call(kernel, inputs, outputs) {
      operations.push(kernel);
      const { run, inputs: names, outputs: results } = KERNELS[kernel];
      if (names.length !== inputs.length || results.length !== outputs) throw new Error(`${kernel}: wrong count`);
      const slots = new Float64Array(inputs.length + outputs).fill(NaN);
      inputs.forEach((handle, index) => (slots[index] = values[handle]));
      run(slots, Int32Array.from(slots.keys()), 0);
      return Array.from({ length: outputs }, (_, index) => put(slots[inputs.length + index]));
    },
  };
}
