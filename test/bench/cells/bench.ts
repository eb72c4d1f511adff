// Sheets of 1 000 and 10 000 small cells: all of them evaluated, and what one edit reaches.

import { createMemo, createRoot, createSignal } from 'solid-js/dist/solid.js';
import { createPropagation, createSlots, markDependents, propagate, runAll } from '../../../src/program/index.ts';
import { worstDifference } from '../agreement.ts';
import { compare, formatTimings } from '../compare.ts';
import type { Variant } from '../compare.ts';
import { createChain, createFans, createWeb } from './graph.ts';
import type { CellGraph } from './graph.ts';
import { createProgram } from './tape.ts';

/** Evaluates `graph` by a plain loop into `values`, whose inputs are in place. */
function evaluateByHand({ inputs, left, right, scale }: CellGraph, values: Float64Array): number {
  const cells = left.length;
  for (let k = 0; k < cells; k++) values[inputs + k] = values[left[k]] * scale[k] + values[right[k]] * 0.25;
  return values[inputs + cells - 1];
}

function createFullPass(graph: CellGraph): () => number {
  const { program, slotOf } = createProgram(graph);
  const slots = createSlots(program);
  const last = slotOf[slotOf.length - 1];
  return () => {
    runAll(program, slots, []);
    return slots[last];
  };
}

/** All cells, one after another, beside a plain loop over the same arithmetic. */
function benchFullPass(name: string, graph: CellGraph): string {
  const cells = graph.left.length;
  const values = new Float64Array(graph.inputs + cells).fill(1, 0, graph.inputs);
  const pass = createFullPass(graph);
  const worst = worstDifference(Float64Array.of(evaluateByHand(graph, values)), Float64Array.of(pass()));
  if (!(worst < 1e-12)) throw new Error(`The last cell of the ${name} differs by ${worst}.`);
  const timings = compare(
    [
      { name: 'loop by hand', run: () => evaluateByHand(graph, values) },
      { name: 'compiled form, scalar', run: pass, target: { atMost: 6 } },
    ],
    { units: cells },
  );
  return formatTimings(`${name} of ${cells} cells, all evaluated`, 'cell', timings);
}

/** Changes input `input` of `graph` and recomputes what it reaches. */
function createEdit(graph: CellGraph, input: number): () => number {
  const { program, slotOf } = createProgram(graph);
  const slots = createSlots(program);
  runAll(program, slots, []);
  const work = createPropagation(program);
  return () => {
    slots[slotOf[input]] = 3 - slots[slotOf[input]];
    markDependents(program, work, input);
    propagate(program, work, slots, []);
    return work.count;
  };
}

/** The same edit on a graph of signals, one memo per cell. */
function createSignalEdit({ inputs, left, right, scale }: CellGraph): () => number {
  return createRoot(() => {
    const [read, write] = createSignal(1);
    const readers: (() => number)[] = Array.from({ length: inputs }, () => read);
    left.forEach((source, k) => {
      const readLeft = readers[source];
      const readRight = readers[right[k]];
      readers.push(createMemo(() => readLeft() * scale[k] + readRight() * 0.25));
    });
    return () => {
      write(3 - read());
      return readers[readers.length - 1]();
    };
  });
}

function benchEdits(): string[] {
  const fans = createFans(10_000);
  const reached = [1, 101, 10_000];
  const edits = reached.map((count, input): Variant => {
    const run = createEdit(fans, input);
    if (Math.abs(run() - count) > 1) throw new Error(`The edit of input ${input} did not reach ${count} cells.`);
    return { name: `edit that reaches ${count}`, run, target: { atMost: [1 / 100, 1 / 30, 1.6][input] } };
  });
  const timings = compare([{ name: 'all evaluated', run: createFullPass(fans) }, ...edits]);
  const web = createWeb(10_000);
  const signals = compare(
    [
      { name: 'edit that reaches all of a web', run: createEdit(web, 0) },
      { name: 'the same with one signal per cell', run: createSignalEdit(web), target: { atLeast: 10 } },
    ],
    { rounds: 5, warmUps: 1 },
  );
  const webEdit = compare([
    { name: 'web, all evaluated', run: createFullPass(web) },
    { name: 'edit that reaches all of the web', run: createEdit(web, 0), target: { atMost: 1.6 } },
  ]);
  const chain = createChain(10_000);
  const headEdit = createEdit(chain, 0);
  if (headEdit() !== 10_000) throw new Error('The edit at the head of the chain did not reach its end.');
  const chainEdit = compare([
    { name: 'chain, all evaluated', run: createFullPass(chain) },
    { name: 'edit at the head of the chain', run: headEdit, target: { atMost: 1.6 } },
  ]);
  return [
    formatTimings('10 000 cells, one edit', 'edit', timings),
    formatTimings('10 000 cells, one edit, beside signals', 'edit', signals),
    formatTimings('A web of 10 000 cells, one edit', 'edit', webEdit),
    formatTimings('A chain 10 000 deep, one edit', 'edit', chainEdit),
    `  The edit reaches the end of the chain without recursion: met. One signal per cell: ${overflows(chain)}.`,
  ];
}

/** Whether the graph of signals gets through a chain. */
function overflows(chain: CellGraph): string {
  try {
    createSignalEdit(chain)();
    return 'gets through';
  } catch (thrown) {
    if (thrown instanceof RangeError) return 'stack overflow';
    throw thrown;
  }
}

export function benchCells(): string[] {
  const sizes = [1000, 10_000];
  return [
    ...sizes.map((cells) => benchFullPass('Chain', createChain(cells))),
    ...sizes.map((cells) => benchFullPass('Web', createWeb(cells))),
    ...benchEdits(),
  ];
}
