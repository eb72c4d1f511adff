// Which of some slots the others depend on, from the code alone.

import { OP, STRIDE } from './operations.ts';
import type { Program } from './program.ts';

/** A row of `words` words for each slot; bit k of a row says that the slot depends on the k-th source. */
interface Reach {
  readonly words: number;
  readonly bits: Int32Array;
}

/** Follows the sources through a program. What stands in a frozen slot depends on nothing. */
export function reachOf(program: Program, sources: readonly number[], frozen: ReadonlySet<number>): Reach {
  const { ops, args, slotCount } = program;
  const words = Math.max(1, (sources.length + 31) >> 5);
  const bits = new Int32Array(slotCount * words);
  const settled = new Set([...sources, ...frozen]);
  sources.forEach((slot, k) => (bits[slot * words + (k >> 5)] |= 1 << (k & 31)));
  // What a call writes are those of its slots that nothing has written before.
  const known = new Uint8Array(slotCount);
  for (const slot of program.constantSlots) known[slot] = 1;
  const gathered = new Int32Array(words);
  const gather = (slot: number): void => {
    for (let w = 0; w < words; w++) gathered[w] |= bits[slot * words + w];
  };
  const write = (slot: number): void => {
    known[slot] = 1;
    if (settled.has(slot)) return;
    for (let w = 0; w < words; w++) bits[slot * words + w] = gathered[w];
  };
  for (let i = 0; i < ops.length; i += STRIDE) {
    gathered.fill(0);
    if (ops[i] !== OP.call) {
      gather(ops[i + 2]);
      gather(ops[i + 3]);
      write(ops[i + 1]);
      continue;
    }
    const end = ops[i + 2] + ops[i + 3];
    for (let at = ops[i + 2]; at < end; at++) if (known[args[at]] !== 0) gather(args[at]);
    for (let at = ops[i + 2]; at < end; at++) if (known[args[at]] === 0) write(args[at]);
  }
  return { words, bits };
}

/** Whether the slot depends on source k. */
export function reaches({ words, bits }: Reach, k: number, slot: number): boolean {
  return ((bits[slot * words + (k >> 5)] >> (k & 31)) & 1) === 1;
}

/** The results of the calls of some kernels: their last slots. */
export function resultsOf({ ops, args }: Program, isWanted: (kernel: number) => boolean): number[] {
  const found: number[] = [];
  for (let i = 0; i < ops.length; i += STRIDE) {
    if (ops[i] === OP.call && isWanted(ops[i + 1])) found.push(args[ops[i + 2] + ops[i + 3] - 1]);
  }
  return found;
}
