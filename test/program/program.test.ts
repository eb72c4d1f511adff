// The compiled form against plain recursion over the same random graphs.

import { expect, it } from 'vitest';
import {
  assemble,
  createBuilder,
  createPropagation,
  createSlots,
  markDependents,
  propagate,
  runAll,
} from '../../src/program/index.ts';
import type { Builder, KernelTable, Program, Segment } from '../../src/program/index.ts';
import { createDraw } from '../support/counter-random.ts';

/** A sheet of `n` cells: cell 0..inputs-1 are numbers, each later one is a*b + c of up to three earlier cells. */
function randomCells(n: number, inputs: number, seed: number): { program: Program; reads: number[][] } {
  const random = createDraw(seed);
  const segments: Segment[] = [];
  const reads: number[][] = [];
  let top = 0;
  for (let k = 0; k < n; k++) {
    const builder = createBuilder([]);
    const from = k < inputs ? [] : [0, 1, 2].map(() => Math.floor(random() * k));
    const slotOf = (cell: number): number => segments[cell].base;
    const value =
      k < inputs
        ? builder.constant(random() * 2 - 1)
        : builder.add(builder.mul(slotOf(from[0]), slotOf(from[1])), slotOf(from[2]));
    const { segment } = builder.finish(top, value);
    top += segment.size;
    segments.push(segment);
    reads.push(from);
  }
  const feeds: number[][] = segments.map(() => []);
  reads.forEach((from, k) => new Set(from).forEach((u) => feeds[u].push(k)));
  return { program: assemble(segments, feeds), reads };
}

/** The same values by recursion without any of the program's machinery. */
function naive(program: Program, slots: Float64Array, reads: readonly number[][]): number[] {
  const values: number[] = [];
  reads.forEach((from, k) => {
    values.push(from.length === 0 ? slots[program.slotStart[k]] : values[from[0]] * values[from[1]] + values[from[2]]);
  });
  return values;
}

it('a full pass gives what plain evaluation of the same formulas gives', () => {
  for (let seed = 1; seed <= 20; seed++) {
    const { program, reads } = randomCells(200, 10, seed);
    const slots = createSlots(program);
    runAll(program, slots, []);
    const expected = naive(program, slots, reads);
    expect(Array.from(program.slotStart, (slot) => slots[slot])).toEqual(expected);
  }
});

it('an edit recomputes what it reaches and nothing else, to the last bit', () => {
  for (let seed = 1; seed <= 20; seed++) {
    const random = createDraw(seed + 1000);
    const { program, reads } = randomCells(300, 12, seed);
    const slots = createSlots(program);
    runAll(program, slots, []);
    const work = createPropagation(program);
    for (let edit = 0; edit < 20; edit++) {
      const input = Math.floor(random() * 12);
      slots[program.slotStart[input]] = random() * 2 - 1;
      markDependents(program, work, input);
      propagate(program, work, slots, []);
      const expected = naive(program, slots, reads);
      expect(Array.from(program.slotStart, (slot) => slots[slot])).toEqual(expected);
      const reached = new Set([input]);
      reads.forEach((from, k) => {
        if (from.some((u) => reached.has(u))) reached.add(k);
      });
      for (let i = 0; i < work.count; i++) expect(reached.has(work.changed[i])).toBe(true);
    }
  }
});

it('an edit that changes no value stops where it stands', () => {
  const zero = createBuilder([]);
  const { segment: a } = zero.finish(0, zero.constant(3));
  const square = createBuilder([]);
  const { segment: b } = square.finish(a.size, square.mul(0, 0));
  const plus = createBuilder([]);
  const { segment: c } = plus.finish(a.size + b.size, plus.add(b.base, b.base));
  const program = assemble([a, b, c], [[1], [2], []]);
  const slots = createSlots(program);
  runAll(program, slots, []);
  const work = createPropagation(program);
  slots[0] = -3;
  markDependents(program, work, 0);
  propagate(program, work, slots, []);
  expect(work.count).toBe(0);
  expect(slots[c.base]).toBe(18);
});

it('a chain of ten thousand cells is evaluated without recursion', () => {
  const segments: Segment[] = [];
  for (let k = 0; k < 10_000; k++) {
    const builder = createBuilder([]);
    const value = k === 0 ? builder.constant(1) : builder.add(segments[k - 1].base, builder.constant(1));
    segments.push(builder.finish(2 * k, value).segment);
  }
  const program = assemble(
    segments,
    segments.map((_, k) => (k + 1 < segments.length ? [k + 1] : [])),
  );
  const slots = createSlots(program);
  runAll(program, slots, []);
  expect(slots[segments[9999].base]).toBe(10_000);
  const work = createPropagation(program);
  slots[0] = 5;
  markDependents(program, work, 0);
  propagate(program, work, slots, []);
  expect(slots[segments[9999].base]).toBe(10_004);
  expect(work.count).toBe(9_999);
});

/** Joins cells given as functions of a builder and the slots of the cells before them; every cell reads what `reads` says. */
function joinCells(
  kernels: KernelTable,
  cells: readonly { reads: readonly number[]; build: (b: Builder, slots: readonly number[]) => number }[],
): Program {
  const segments: Segment[] = [];
  let top = 0;
  for (const { build } of cells) {
    const builder = createBuilder(kernels);
    const value = build(
      builder,
      segments.map(({ base }) => base),
    );
    const { segment } = builder.finish(top, value, []);
    top += segment.size;
    segments.push(segment);
  }
  const feeds = cells.map((_, k) => cells.flatMap(({ reads }, d) => (reads.includes(k) ? [d] : [])));
  return assemble(segments, feeds);
}

/** Sets cell 0 and answers with the cells whose values changed. */
function edit(program: Program, slots: Float64Array, kernels: KernelTable, value: number): number[] {
  const work = createPropagation(program);
  slots[program.slotStart[0]] = value;
  markDependents(program, work, 0);
  propagate(program, work, slots, kernels);
  expect(work.dirty.every((word) => word === 0)).toBe(true);
  return [...work.changed.subarray(0, work.count)];
}

it('zero and negative zero are two values for an edit', () => {
  const program = joinCells(
    [],
    [
      { reads: [], build: (b) => b.constant(0) },
      { reads: [0], build: (b, [a]) => b.op('copy', a) },
      { reads: [1], build: (b, [, a]) => b.div(b.constant(1), a) },
    ],
  );
  const slots = createSlots(program);
  runAll(program, slots, []);
  expect(edit(program, slots, [], -0)).toEqual([1, 2]);
  expect(slots[program.slotStart[2]]).toBe(-Infinity);
});

it('what stays NaN has not changed', () => {
  const program = joinCells(
    [],
    [
      { reads: [], build: (b) => b.constant(-1) },
      { reads: [0], build: (b, [a]) => b.sqrt(a) },
      { reads: [1], build: (b, [, a]) => b.neg(a) },
    ],
  );
  const slots = createSlots(program);
  runAll(program, slots, []);
  expect(edit(program, slots, [], -2)).toEqual([]);
  expect(edit(program, slots, [], 4)).toEqual([1, 2]);
});

it('a kernel runs only when something that its cell reads has changed', () => {
  const runs: number[] = [];
  const kernels: KernelTable = [
    {
      name: 'counted',
      run(s, a, p) {
        runs.push(s[a[p]]);
        s[a[p + 1]] = s[a[p]] + 1;
      },
    },
  ];
  const program = joinCells(kernels, [
    { reads: [], build: (b) => b.constant(3) },
    { reads: [0], build: (b, [a]) => b.min(a, b.constant(5)) },
    { reads: [1], build: (b, [, a]) => b.call('counted', [a], 1)[0] },
    { reads: [2], build: (b, [, , a]) => b.call('counted', [a], 1)[0] },
    { reads: [3], build: (b, [, , , a]) => b.neg(a) },
  ]);
  const slots = createSlots(program);
  runAll(program, slots, kernels);
  expect(runs.splice(0)).toEqual([3, 4]);
  expect(edit(program, slots, kernels, 7)).toEqual([1, 2, 3, 4]);
  expect(runs.splice(0)).toEqual([5, 6]);
  expect(edit(program, slots, kernels, 8)).toEqual([]);
  expect(runs).toEqual([]);
  expect(slots[program.slotStart[4]]).toBe(-7);
});

it('a further value that others read counts as a change', () => {
  const source = createBuilder([]);
  const input = source.finish(0, source.constant(1));
  const two = createBuilder([]);
  const square = two.mul(0, 0);
  const sign = two.op('sign', 0);
  const both = two.finish(input.segment.size, square, [sign]);
  const user = createBuilder([]);
  const last = user.finish(both.segment.base + both.segment.size, user.neg(both.slot(sign)));
  const program = assemble([input.segment, both.segment, last.segment], [[1], [2], []]);
  const slots = createSlots(program);
  runAll(program, slots, []);
  expect(edit(program, slots, [], -1)).toEqual([1, 2]);
  expect(slots[last.segment.base]).toBe(1);
});
