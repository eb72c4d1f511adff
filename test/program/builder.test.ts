// The builder: what it shares, where it puts things, and that sharing changes no digit.

import { describe, expect, it } from 'vitest';
import { createBuilder, runOperations } from '../../src/program/index.ts';
import type { Builder, KernelTable, OperationName, Segment } from '../../src/program/index.ts';
import { createDraw } from '../support/counter-random.ts';

const KERNELS: KernelTable = [
  {
    name: 'sum and difference',
    run(s, a, p) {
      s[a[p + 2]] = s[a[p]] + s[a[p + 1]];
      s[a[p + 3]] = s[a[p]] - s[a[p + 1]];
    },
  },
];

/** Runs a segment behind the given slots of others. */
function run(segment: Segment, others: readonly number[] = []): Float64Array {
  const slots = new Float64Array(segment.base + segment.size).fill(NaN);
  slots.set(others);
  segment.constantSlots.forEach((slot, i) => (slots[slot] = segment.constantValues[i]));
  runOperations(segment.ops, 0, segment.ops.length, segment.args, 0, slots, KERNELS);
  return slots;
}

describe('what is computed twice', () => {
  it('is computed once: the same operation on the same operands has the same handle', () => {
    const builder = createBuilder([]);
    const size = builder.size();
    const first = builder.sub(3, 4);
    expect(builder.sub(3, 4)).toBe(first);
    expect(builder.abs(first)).toBe(builder.op('abs', first));
    expect(builder.size()).toBe(size + 2);
  });

  it('may have its operands in either order only where that is the same number', () => {
    const both: OperationName[] = ['add', 'mul', 'min', 'max', 'parallel', 'equal', 'and', 'or'];
    const ordered: OperationName[] = ['sub', 'div', 'pow', 'hypot', 'less', 'lessOrEqual'];
    const builder = createBuilder([]);
    for (const name of both) expect(builder.op(name, 1, 2)).toBe(builder.op(name, 2, 1));
    for (const name of ordered) expect(builder.op(name, 1, 2)).not.toBe(builder.op(name, 2, 1));
  });

  it('is told apart where only a slot and a local handle have the same number', () => {
    const builder = createBuilder([]);
    const local = builder.constant(7);
    expect(builder.neg(local)).not.toBe(builder.neg(0));
  });

  it.each(Array.from({ length: 30 }, (_, n) => n + 1))(
    'has the value of plain evaluation to the last bit, seed %i',
    (seed) => {
      const { builder, known, again } = drawOperations(seed);
      const size = builder.size();
      for (const repeat of again) expect(repeat()).toBe(true);
      expect(builder.size()).toBe(size);
      const { segment, slot } = builder.finish(OTHERS.length);
      const slots = run(segment, OTHERS);
      for (const { handle, value } of known) expect(slots[slot(handle)]).toBe(value);
    },
  );

  it('is not shared between calls, whose kernels may be anything', () => {
    const builder = createBuilder(KERNELS);
    const once = builder.call('sum and difference', [0, 1], 2);
    expect(builder.call('sum and difference', [0, 1], 2)).not.toEqual(once);
  });
});

const BINARY = ['add', 'sub', 'mul', 'div', 'min', 'max', 'parallel'] as const;
const AWKWARD = [0, -0, NaN, Infinity, -Infinity, 1, -2.5, 1e300];

function plain(name: (typeof BINARY)[number], a: number, b: number): number {
  if (name === 'add') return a + b;
  if (name === 'sub') return a - b;
  if (name === 'mul') return a * b;
  if (name === 'div') return a / b;
  if (name === 'min') return Math.min(a, b);
  if (name === 'max') return Math.max(a, b);
  if (a === Infinity) return b;
  if (b === Infinity) return a;
  return a === 0 || b === 0 ? 0 : (a * b) / (a + b);
}

const OTHERS = [2, -0, 3.5];

/** Random operations on the results of earlier ones: values by plain evaluation, and each operation to be done again. */
function drawOperations(seed: number) {
  const draw = createDraw(seed);
  const pick = <T>(list: readonly T[]): T => list[Math.floor(draw() * list.length)];
  const builder = createBuilder([]);
  const known = OTHERS.map((value, slot) => ({ handle: slot, value }));
  for (const value of AWKWARD) known.push({ handle: builder.constant(value), value });
  const again: (() => boolean)[] = [];
  for (let n = 0; n < 120; n++) {
    const name = pick(BINARY);
    const [a, b] = [pick(known), pick(known)];
    const handle = builder.op(name, a.handle, b.handle);
    known.push({ handle, value: plain(name, a.value, b.value) });
    again.push(() => builder.op(name, a.handle, b.handle) === handle);
  }
  return { builder, known, again };
}

describe('constants', () => {
  const constantsOf = (build: (builder: Builder) => void): number[] => {
    const builder = createBuilder([]);
    build(builder);
    return [...builder.finish(0).segment.constantValues];
  };

  it('are kept once each', () => {
    const builder = createBuilder([]);
    expect(builder.constant(4.7)).toBe(builder.constant(4.7));
    expect(builder.constant(NaN)).toBe(builder.constant(NaN));
    expect(builder.constant(-0)).toBe(builder.constant(-0));
  });

  it('keep the sign of zero', () => {
    expect(constantsOf((b) => [0, -0, 0].forEach(b.constant))).toEqual([0, -0]);
    const builder = createBuilder([]);
    const quotients = [0, -0].map((zero) => builder.div(builder.constant(1), builder.constant(zero)));
    const { segment, slot } = builder.finish(0);
    const slots = run(segment);
    expect(quotients.map((handle) => slots[slot(handle)])).toEqual([Infinity, -Infinity]);
  });

  it('may be NaN', () => {
    expect(constantsOf((b) => [NaN, 1, NaN].forEach(b.constant))).toEqual([NaN, 1]);
  });
});

describe('a finished segment', () => {
  /** Slots 0..9 belong to others; a value, a call and two constants. */
  function build(first: 'none' | 'sum' | 'product' | 'constant') {
    const builder = createBuilder(KERNELS);
    const two = builder.constant(2);
    const product = builder.mul(0, two);
    const [sum, difference] = builder.call('sum and difference', [product, builder.constant(5)], 2);
    const chosen = { none: null, sum, product, constant: two }[first];
    return { handles: [two, product, sum, difference], chosen, ...builder.finish(10, chosen) };
  }

  it('computes the same whatever stands first, and each handle keeps its value', () => {
    for (const first of ['none', 'sum', 'product', 'constant'] as const) {
      const { segment, slot, handles } = build(first);
      const slots = run(segment, [3]);
      expect(handles.map((handle) => slots[slot(handle)])).toEqual([2, 6, 11, 1]);
      expect(new Set(handles.map(slot)).size).toBe(4);
      for (const handle of handles) {
        expect(slot(handle)).toBeGreaterThanOrEqual(10);
        expect(slot(handle)).toBeLessThan(10 + segment.size);
      }
    }
  });

  it('has the value that is to stand first at its base, results before constants', () => {
    for (const first of ['sum', 'product', 'constant'] as const) {
      const { slot, chosen } = build(first);
      expect(slot(chosen!)).toBe(10);
    }
    const { segment } = build('sum');
    expect([...segment.constantSlots]).toEqual([13, 14]);
    expect(segment.visible).toBe(3);
  });

  it('leaves the slots of others as they are', () => {
    const { slot } = build('sum');
    expect([0, 3, 9].map(slot)).toEqual([0, 3, 9]);
  });

  it('lets others read what is offered and nothing else, where that is said', () => {
    const builder = createBuilder([]);
    const step = builder.mul(0, 0);
    const value = builder.add(step, builder.constant(1));
    const further = builder.neg(value);
    const { segment, slot } = builder.finish(4, value, [further, value, 2]);
    expect([slot(value), slot(further), slot(step)]).toEqual([4, 5, 6]);
    expect(segment.visible).toBe(2);
  });

  it('copies a value of another segment once to own it, and its own not at all', () => {
    const builder = createBuilder([]);
    const copy = builder.own(3);
    expect(copy).not.toBe(3);
    expect(builder.own(3)).toBe(copy);
    expect(builder.own(copy)).toBe(copy);
    const { segment, slot } = builder.finish(5, copy);
    expect(run(segment, [0, 0, 0, 42])[slot(copy)]).toBe(42);
  });

  it('refuses a kernel that is not in the table', () => {
    expect(() => createBuilder(KERNELS).call('product', [0, 1], 1)).toThrow(RangeError);
  });
});
