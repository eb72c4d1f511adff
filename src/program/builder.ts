// Builds one segment. Values are handles: the slot of another segment as it is, or a local number that
// becomes a slot when the segment's block has been allocated.
//
// Nothing is computed twice: an operation on operands that it had before answers with the handle it gave then, to
// the last bit the same number. Operands of a sum, a product and the like may change places.

import type { Emitter, Handle } from '../network/index.ts';
import { OP, STRIDE } from './operations.ts';
import type { OperationName } from './operations.ts';
import type { KernelTable, Segment } from './segment.ts';

/** Local handles count from here; slots of other segments lie below. */
const LOCAL = 0x40000000;

/** The name of each operation by its code. */
const NAMES = Object.keys(OP) as OperationName[];

/** Operations whose result is the same number when the operands change places. */
const SYMMETRIC: ReadonlySet<OperationName> = new Set(['add', 'mul', 'min', 'max', 'parallel', 'equal', 'and', 'or']);

/** Handles of either kind below this are told apart in the key of an operation. */
const KEYED = 2 ** 24;

export interface Builder extends Emitter {
  /** Calls any kernel of the table the builder was made with. */
  call(kernel: string, inputs: readonly Handle[], outputs: number): Handle[];
  /** A number with a slot to itself, which may be turned without touching another number of the same value. */
  input(x: number): Handle;
  /** One operation of `OP`; `b` is left out for those of one operand. */
  op(name: OperationName, a: Handle, b?: Handle): Handle;
  /** The same value in a slot of this segment: what a cell offers must change with its own segment. */
  own(handle: Handle): Handle;
  /**
   * Takes the code of another segment over: it reads what `placed` has in place of a slot, and puts its results there. What a
   * kernel gives for which `keeps` says so stays where it is.
   */
  inline(segment: Segment, placed: Map<number, Handle>, keeps: (kernel: number) => boolean): void;
  /** How many slots the segment needs. */
  size(): number;
  /**
   * The finished segment with its slots at `base`, and the slot of any handle in it. The handle `first`, where it
   * is local, gets the slot `base` itself, so that a cell's value stays in place when its formula changes. Others may
   * read `first` and what is `offered`, or every result where `offered` is left out.
   */
  finish(
    base: number,
    first?: Handle | null,
    offered?: readonly Handle[] | null,
  ): { segment: Segment; slot: (handle: Handle) => number };
}

/** A builder whose calls are looked up in `kernels`; a name that is not there throws. */
export function createBuilder(kernels: KernelTable): Builder {
  const ops: number[] = [];
  const args: number[] = [];
  const known = new Map<number, Handle>();
  const constants = new Map<number, Handle>(); // one NaN for all; -0 is not 0 and stands apart
  let negativeZero: Handle | null = null;
  const values: [handle: Handle, value: number][] = [];
  let count = 0;

  const local = (): Handle => LOCAL + count++;

  function newConstant(x: number): Handle {
    const handle = local();
    values.push([handle, x]);
    return handle;
  }

  function constant(x: number): Handle {
    if (Object.is(x, -0)) return (negativeZero ??= newConstant(x));
    let handle = constants.get(x);
    if (handle === undefined) constants.set(x, (handle = newConstant(x)));
    return handle;
  }

  function op(name: OperationName, a: Handle, b: Handle = a): Handle {
    const key = SYMMETRIC.has(name) && b < a ? keyOf(OP[name], b, a) : keyOf(OP[name], a, b);
    const present = key === null ? undefined : known.get(key);
    if (present !== undefined) return present;
    const target = local();
    if (key !== null) known.set(key, target);
    ops.push(OP[name], target, a, b);
    return target;
  }

  function call(kernel: string, inputs: readonly Handle[], outputs: number): Handle[] {
    const index = kernels.findIndex((k) => k.name === kernel);
    if (index < 0) throw new RangeError(`No kernel is called ${kernel}.`);
    return callAt(index, inputs, outputs);
  }

  function callAt(index: number, inputs: readonly Handle[], outputs: number): Handle[] {
    const results = Array.from({ length: outputs }, local);
    ops.push(OP.call, index, args.length, inputs.length + outputs);
    args.push(...inputs, ...results);
    return results;
  }

  /** The place of each local handle in the block: `first`, what is offered, the other results, the constants. */
  function places(first: Handle | null, offered: readonly Handle[] | null): { place: Int32Array; visible: number } {
    const place = new Int32Array(count).fill(-1);
    let next = 0;
    const put = (handle: Handle | null): void => {
      if (handle !== null && handle >= LOCAL && place[handle - LOCAL] < 0) place[handle - LOCAL] = next++;
    };
    const isConstant = new Set(values.map(([handle]) => handle));
    put(first);
    offered?.forEach(put);
    let visible = next;
    for (let i = 0; i < count; i++) if (!isConstant.has(LOCAL + i)) put(LOCAL + i);
    if (offered === null) visible = next;
    values.forEach(([handle]) => put(handle));
    return { place, visible };
  }

  return {
    constant,
    input: newConstant,
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
    inline(segment, placed, keeps) {
      const read = (slot: number): Handle => placed.get(slot) ?? slot;
      const known = new Set(segment.constantSlots);
      const isResult = (slot: number): boolean =>
        slot >= segment.base && slot < segment.base + segment.size && !known.has(slot);
      for (let i = 0; i < segment.ops.length; i += STRIDE) {
        const [code, target, a, b] = segment.ops.subarray(i, i + STRIDE);
        if (code !== OP.call) {
          placed.set(target, op(NAMES[code], read(a), read(b)));
          known.add(target);
          continue;
        }
        const list = Array.from(segment.args.subarray(a, a + b));
        const results = list.filter(isResult);
        for (const slot of results) known.add(slot);
        if (keeps(target)) continue;
        const inputs = list.filter((slot) => !results.includes(slot)).map(read);
        callAt(target, inputs, results.length).forEach((handle, n) => placed.set(results[n], handle));
      }
    },
    own: (handle) => (handle >= LOCAL ? handle : op('copy', handle)),
    size: () => count,
    finish(base, first = null, offered = null) {
      const { place, visible } = places(first, offered);
      const slot = (handle: Handle): number => (handle < LOCAL ? handle : base + place[handle - LOCAL]);
      const code = Int32Array.from(ops);
      for (let i = 0; i < code.length; i += STRIDE) {
        if (code[i] === OP.call) continue;
        for (let word = 1; word < STRIDE; word++) code[i + word] = slot(code[i + word]);
      }
      const segment: Segment = {
        base,
        size: count,
        visible,
        ops: code,
        args: Int32Array.from(args, slot),
        constantSlots: Int32Array.from(values, ([handle]) => slot(handle)),
        constantValues: Float64Array.from(values, ([, value]) => value),
      };
      return { segment, slot };
    },
  };
}

/** A number of its own for each operation on keyed handles: 5 bits of code, 24 for each handle. */
function keyOf(code: number, a: Handle, b: Handle): number | null {
  const [x, y] = [handleKey(a), handleKey(b)];
  return x < KEYED && y < KEYED ? (code * KEYED + x) * KEYED + y : null;
}

function handleKey(handle: Handle): number {
  return handle < LOCAL ? 2 * handle : 2 * (handle - LOCAL) + 1;
}
