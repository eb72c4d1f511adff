// A WebAssembly module of loops over columns, two pairs of numbers at a time, put together from bytes.
//
// Each function takes the addresses of its columns in bytes, inputs first, and then how many numbers they hold. It may
// write up to three numbers beyond the count. The memory is the caller's. One pair waits for nothing while the other is
// being divided or looked up: an eighth to a fifth faster than pair by pair.

/** Codes of instructions that stand alone; those of the lanes follow the byte `LANES`. */
const LANES = 0xfd;
/** Pairs of numbers of one turn of a loop. */
export const PAIRS = 2;
const I32 = 0x7f;
const V128 = 0x7b;

const MAGIC = [0, 0x61, 0x73, 0x6d, 1, 0, 0, 0];
const EIGHTFOLD = [0x41, 3, 0x74];
const BLOCK_AND_LOOP = [0x02, 0x40, 0x03, 0x40];
const LEAVE_UNLESS_LESS = [0x4e, 0x0d, 1];
const NEXT_PAIRS = [0x41, 16 * PAIRS, 0x6a];
const REPEAT_AND_END = [0x0c, 0, 0x0b, 0x0b, 0x0b];

/** A loop over columns: what is done with two numbers of each. */
interface LaneFunction {
  readonly name: string;
  readonly inputs: number;
  readonly outputs: number;
  /** Locals of the type v128: each variable has one for each pair, the columns first. */
  readonly locals: number;
  /** Instructions from the locals of the inputs to those of the outputs. */
  readonly body: readonly number[];
}

/**
 * Where the locals of vectors begin in a function of so many columns: behind the addresses, the count and the offset, at a
 * multiple of the pairs.
 */
export function firstVector(columns: number): number {
  return PAIRS * Math.ceil((columns + 2) / PAIRS);
}

/** The module as bytes; it exports each function by its name and takes the memory `lanes.memory`. */
export function assembleLanes(functions: readonly LaneFunction[]): Uint8Array<ArrayBuffer> {
  const widths = [...new Set(functions.map(({ inputs, outputs }) => inputs + outputs))];
  const types = widths.map((width) => [0x60, ...vector(Array.from({ length: width + 1 }, () => [I32])), 0]);
  const memory = [...text('lanes'), ...text('memory'), 2, 0, 1];
  const exported = functions.map(({ name }, k) => [...text(name), 0, ...unsigned(k)]);
  return joined([
    MAGIC,
    section(1, vector(types)),
    section(2, vector([memory])),
    section(3, vector(functions.map(({ inputs, outputs }) => unsigned(widths.indexOf(inputs + outputs))))),
    section(7, vector(exported)),
    section(10, vector(functions.map(codeOf))),
  ]);
}

function codeOf({ inputs, outputs, locals, body }: LaneFunction): Uint8Array {
  const columns = inputs + outputs;
  const count = columns;
  const offset = columns + 1;
  const first = firstVector(columns);
  const pairs = Array.from({ length: PAIRS }, (_, pair) => pair);
  const address = (k: number): number[] => [...get(k), ...get(offset), 0x6a];
  const loads = Array.from({ length: inputs }, (_, k) =>
    pairs.map((pair) => [...address(k), ...lane(0x00), 3, 16 * pair, ...set(first + PAIRS * k + pair)]),
  );
  const stores = Array.from({ length: outputs }, (_, n) => {
    const k = inputs + n;
    return pairs.map((pair) => [...address(k), ...get(first + PAIRS * k + pair), ...lane(0x0b), 3, 16 * pair]);
  });
  const types = [
    [first - columns - 1, I32],
    [...unsigned(locals), V128],
  ];
  const code = joined([
    vector(types),
    [...get(count), ...EIGHTFOLD, ...set(count)],
    BLOCK_AND_LOOP,
    [...get(offset), ...get(count), ...LEAVE_UNLESS_LESS],
    ...loads.flat(),
    body,
    ...stores.flat(),
    [...get(offset), ...NEXT_PAIRS, ...set(offset)],
    REPEAT_AND_END,
  ]);
  return joined([unsigned(code.length), code]);
}

type Bytes = readonly number[] | Uint8Array;

/** Bodies are long: they are copied as blocks. */
function joined(pieces: readonly Bytes[]): Uint8Array<ArrayBuffer> {
  const all = new Uint8Array(pieces.reduce((length, piece) => length + piece.length, 0));
  let at = 0;
  for (const piece of pieces) {
    all.set(piece, at);
    at += piece.length;
  }
  return all;
}

/** An instruction of the lanes. */
export function lane(code: number): readonly number[] {
  return (INSTRUCTIONS[code] ??= [LANES, ...unsigned(code)]);
}

const INSTRUCTIONS: number[][] = [];

export function get(local: number): readonly number[] {
  return (GETS[local] ??= [0x20, ...unsigned(local)]);
}

export function set(local: number): readonly number[] {
  return (SETS[local] ??= [0x21, ...unsigned(local)]);
}

const GETS: number[][] = [];
const SETS: number[][] = [];

/** Both lanes hold x. */
export function constant(x: number): readonly number[] {
  const found = VALUES.get(x);
  if (found !== undefined && x !== 0) return found;
  const view = new DataView(new ArrayBuffer(16));
  view.setFloat64(0, x, true);
  view.setFloat64(8, x, true);
  const instruction = [...lane(0x0c), ...new Uint8Array(view.buffer)];
  VALUES.set(x, instruction);
  return instruction;
}

const VALUES = new Map<number, number[]>();

function section(id: number, content: Bytes): Uint8Array {
  return joined([[id], unsigned(content.length), content]);
}

function vector(items: readonly Bytes[]): Uint8Array {
  return joined([unsigned(items.length), ...items]);
}

function text(name: string): number[] {
  const bytes = Array.from(name, (letter) => letter.charCodeAt(0));
  return [...unsigned(bytes.length), ...bytes];
}

/** LEB128. */
export function unsigned(x: number): number[] {
  return x < 0x80 ? [x] : [(x & 0x7f) | 0x80, ...unsigned(x >>> 7)];
}
