// Loops over columns two numbers at a time, where the machine can: one WebAssembly module for all operations and all kernels
// with a text for lanes, put together once for a table of kernels. Its results are to the last bit those of the other loops,
// so that it does not matter who has it.

import { compileLanes } from './lane-language.ts';
import { assembleLanes } from './lane-module.ts';
import { LANE_LIBRARY, LANE_OPERATIONS } from './lane-operations.ts';
import { laneTables } from './lane-tables.ts';
import { OP } from './operations.ts';
import type { KernelTable } from './segment.ts';

/** Takes the addresses of columns in bytes, inputs first, and how many numbers are wanted of each. */
type LaneLoop = (...addresses: number[]) => void;

interface LaneMemory {
  /** The memory as numbers; columns may stand from number `free` on. */
  readonly all: Float64Array;
  readonly free: number;
  /** By code of an operation. */
  readonly operations: readonly (LaneLoop | undefined)[];
  /** By place in the table of kernels. */
  readonly kernels: readonly (LaneLoop | undefined)[];
}

const PAGE = 65536;
const modules = new WeakMap<KernelTable, WebAssembly.Module | null>();
const tables = laneTables();
const FREE = (tables.numbers.length + 7) & ~7;

/** A memory for so many numbers of columns with its loops; null where there is no WebAssembly or it knows no lanes. */
export function createLaneMemory(kernels: KernelTable, numbers: number): LaneMemory | null {
  const module = moduleFor(kernels);
  if (module === null) return null;
  try {
    const pages = Math.ceil(((FREE + numbers) * 8) / PAGE);
    const memory = new WebAssembly.Memory({ initial: pages, maximum: pages });
    const { exports } = new WebAssembly.Instance(module, { lanes: { memory } });
    const loops = exports as Record<string, LaneLoop>;
    const all = new Float64Array(memory.buffer);
    all.set(tables.numbers);
    const operations: LaneLoop[] = [];
    for (const [name] of LANE_OPERATIONS) operations[OP[name]] = loops[name];
    return { all, free: FREE, operations, kernels: kernels.map(({ name }) => loops[`kernel ${name}`]) };
  } catch {
    // No room for one more memory.
    return null;
  }
}

function moduleFor(kernels: KernelTable): WebAssembly.Module | null {
  let module = modules.get(kernels);
  if (module === undefined) modules.set(kernels, (module = compile(kernels)));
  return module;
}

function compile(kernels: KernelTable): WebAssembly.Module | null {
  if (typeof WebAssembly === 'undefined') return null;
  const places = Object.fromEntries(Object.entries(tables.places).map(([name, place]) => [name, 8 * place]));
  const texts = [
    ...LANE_OPERATIONS,
    ...kernels.flatMap(({ name, lanes }) => (lanes === undefined ? [] : [[`kernel ${name}`, lanes] as const])),
  ];
  const bytes = assembleLanes(texts.map(([name, lanes]) => ({ name, ...compileLanes(lanes, places, LANE_LIBRARY) })));
  try {
    return new WebAssembly.Module(bytes);
  } catch {
    return null;
  }
}
