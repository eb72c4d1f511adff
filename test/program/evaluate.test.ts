// Each operation by its name, on ordinary and awkward numbers: the evaluator writes its codes as plain numbers.

import { describe, expect, it } from 'vitest';
import { atan, cos, exp, hypot, ln, log10, pow, sin, tan } from '../../src/numeric/index.ts';
import { createBuilder, runOperations } from '../../src/program/index.ts';
import type { KernelTable, OperationName } from '../../src/program/index.ts';

const MEANING: Readonly<Record<OperationName, (a: number, b: number) => number>> = {
  copy: (a) => a,
  add: (a, b) => a + b,
  sub: (a, b) => a - b,
  mul: (a, b) => a * b,
  div: (a, b) => a / b,
  neg: (a) => -a,
  abs: Math.abs,
  sqrt: Math.sqrt,
  min: Math.min,
  max: Math.max,
  parallel: (a, b) => {
    if (Math.max(a, b) === Infinity) return Math.min(a, b);
    return Math.min(a, b) === 0 ? 0 : (a * b) / (a + b);
  },
  sign: Math.sign,
  exp,
  ln,
  log10,
  sin,
  cos,
  tan,
  atan,
  hypot,
  pow,
  less: (a, b) => Number(a < b),
  lessOrEqual: (a, b) => Number(a <= b),
  equal: (a, b) => Number(a === b),
  and: (a, b) => Number(a === 1 && b === 1),
  or: (a, b) => Number(a === 1 || b === 1),
  not: (a) => Number(a === 0),
};

const ANY = [0, -0, 0.5, 1, -1, 3.25, -700, 1e-300, 1e300, Infinity, -Infinity, NaN];
const RESISTANCES = [0, 1e-3, 50, 4700, 1e300, Infinity];
const CONDITIONS = [0, 1];

function operandsOf(name: OperationName): readonly number[] {
  if (name === 'parallel') return RESISTANCES;
  return name === 'and' || name === 'or' || name === 'not' ? CONDITIONS : ANY;
}

describe('the operation', () => {
  it.each(Object.keys(MEANING) as OperationName[])('%s does what it is called', (name) => {
    const builder = createBuilder([]);
    const result = builder.op(name, 0, 1);
    const { segment, slot } = builder.finish(2, result);
    const slots = new Float64Array(3);
    for (const a of operandsOf(name)) {
      for (const b of operandsOf(name)) {
        slots.set([a, b, 99]);
        runOperations(segment.ops, 0, segment.ops.length, segment.args, 0, slots, []);
        expect(slots[slot(result)], `${name} of ${a} and ${b}`).toBe(MEANING[name](a, b));
      }
    }
  });
});

describe('a call', () => {
  it('finds its slots behind the offset it is run with', () => {
    const table: KernelTable = [
      { name: 'other', run: () => expect.unreachable() },
      { name: 'double', run: (s, a, p) => (s[a[p + 1]] = 2 * s[a[p]]) },
    ];
    const builder = createBuilder(table);
    const [result] = builder.call('double', [0], 1);
    const { segment, slot } = builder.finish(1, result);
    const slots = Float64Array.of(21, NaN);
    runOperations(segment.ops, 0, segment.ops.length, Int32Array.of(7, 7, 7, ...segment.args), 3, slots, table);
    expect(slots[slot(result)]).toBe(42);
  });
});
