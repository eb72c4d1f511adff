// Runs one kernel on named inputs.

import type { Kernel } from '../../src/network/index.ts';

/** The results of a kernel by name. */
export function runKernel(kernel: Kernel, inputs: Readonly<Record<string, number>>): Record<string, number> {
  const names = [...kernel.inputs, ...kernel.outputs];
  const slots = new Float64Array(names.length).fill(NaN);
  kernel.inputs.forEach((name, index) => {
    const value = inputs[name];
    if (value === undefined) throw new Error(`runKernel: no ${name}`);
    slots[index] = value;
  });
  kernel.run(slots, Int32Array.from(names.keys()), 0);
  return Object.fromEntries(kernel.outputs.map((name, index) => [name, slots[kernel.inputs.length + index]]));
}
