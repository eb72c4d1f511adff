// Running a kernel by the names of its slots, as a compiled sheet does by their numbers.

import type { NamedKernel } from '../../src/fet/index.ts';

/** The outputs by name; inputs that are not named are NaN, as a condition that no sheet states. */
export function call(kernel: NamedKernel, values: Readonly<Record<string, number>>): Record<string, number> {
  const names = [...kernel.inputs, ...kernel.outputs];
  // Slots in reverse order and between two guards: a kernel must go through its table of slots and stay within it.
  const slots = new Float64Array(names.length + 2).fill(-777);
  const table = Int32Array.from([0, ...names.map((_, k) => names.length - k), 0]);
  kernel.inputs.forEach((name, k) => {
    slots[table[k + 1]] = values[name] ?? NaN;
  });
  const before = slots.slice();
  kernel.run(slots, table, 1);
  for (const [k] of kernel.inputs.entries()) {
    if (!Object.is(slots[table[k + 1]], before[table[k + 1]])) throw new Error(`${kernel.inputs[k]} was written to`);
  }
  if (slots[0] !== -777 || slots[names.length + 1] !== -777) throw new Error('a slot outside was written to');
  return Object.fromEntries(kernel.outputs.map((name, k) => [name, slots[table[kernel.inputs.length + 1 + k]]]));
}
