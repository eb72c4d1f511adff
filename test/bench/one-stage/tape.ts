// The one-stage bench as the product's compiled form: one segment per cell, run by its scalar evaluator.

import { isConstantNode, isFunctionNode, isOperatorNode, isParenthesisNode, isSymbolNode, parse } from 'mathjs';
import type { MathNode } from 'mathjs';
import { solveLines } from '../../../src/network/line-columns.ts';
import { LINE_LANES } from '../../../src/network/line-lanes.ts';
import { line, solveLine } from '../../../src/network/line-solve.ts';
import {
  assemble,
  createBuilder,
  createColumns,
  createSlots,
  planColumns,
  runAll,
} from '../../../src/program/index.ts';
import type { Builder, KernelTable, Segment } from '../../../src/program/index.ts';
import { sumOf } from './hand-columns.ts';
import { CELLS, FIXED, INPUT_NAMES, POINT_INPUTS, POINT_OUTPUTS, STEPS, SUMMED } from './inputs.ts';
import type { InputName } from './inputs.ts';

const KERNELS: KernelTable = [
  {
    name: 'line-point',
    run: (s, a, p) => {
      solveLine(s[a[p]], s[a[p + 1]], s[a[p + 2]], s[a[p + 3]], s[a[p + 4]], s[a[p + 5]]);
      s[a[p + 6]] = line[0];
      s[a[p + 7]] = line[1];
      s[a[p + 8]] = line[2];
      s[a[p + 9]] = line[3];
      s[a[p + 10]] = line[4];
    },
    columns: solveLines,
    lanes: {
      inputs: ['beta', 'lambda', 'A', 'r', 'b', 'R'],
      outputs: ['I', 'vov', 'vds', 'margin', 'region'],
      text: LINE_LANES,
    },
  },
];

/** The sheet as a program, and the slots of its cells. */
function compile() {
  const slotOf = new Map<string, number>(INPUT_NAMES.map((name, k) => [name, k]));
  const segments: Segment[] = [givenSegment()];
  let base = INPUT_NAMES.length;
  for (const step of STEPS) {
    const builder = createBuilder(KERNELS);
    const lookUp = (name: string) => slotOf.get(name) ?? builder.constant(FIXED[name as keyof typeof FIXED]);
    const [names, handles] =
      step === 'operating point'
        ? [POINT_OUTPUTS, builder.call('line-point', POINT_INPUTS.map(lookUp), line.length)]
        : [[step[0]], [lower(parse(step[1]), builder, lookUp)]];
    const { segment, slot } = builder.finish(base);
    segments.push(segment);
    names.forEach((name, k) => slotOf.set(name, slot(handles[k])));
    base += segment.size;
  }
  // Every sample runs the whole program: nothing here asks which segment feeds which.
  const program = assemble(
    segments,
    segments.map(() => []),
  );
  const slots = createSlots(program);
  const cells = CELLS.map((name) => slotOf.get(name)!);
  return { program, slots, cells };
}

type Inputs = Readonly<Record<InputName, Float64Array>>;

/** As `createHandLoop`, on a program. */
export function createTape(columns: Inputs) {
  const { program, slots, cells } = compile();
  const inputs = INPUT_NAMES.map((name) => columns[name]);
  const summed = SUMMED.map((k) => cells[k]);
  const row = new Float64Array(CELLS.length);
  const evaluate = (i: number): void => {
    for (let k = 0; k < inputs.length; k++) slots[k] = inputs[k][i];
    runAll(program, slots, KERNELS);
  };
  const run = (): number => {
    let sum = 0;
    for (let i = 0; i < columns.V_DD.length; i++) {
      evaluate(i);
      for (let k = 0; k < summed.length; k++) sum += slots[summed[k]];
    }
    return sum;
  };
  const runOne = (i: number): void => {
    evaluate(i);
    cells.forEach((slot, k) => (row[k] = slots[slot]));
  };
  return { row, runOne, run };
}

/** The inputs, constants of a program whoever sets them. */
function givenSegment(): Segment {
  const size = INPUT_NAMES.length;
  return {
    base: 0,
    size,
    visible: size,
    ops: new Int32Array(),
    args: new Int32Array(),
    constantSlots: Int32Array.from(INPUT_NAMES, (_, k) => k),
    constantValues: new Float64Array(size).fill(NaN),
  };
}

/** As `createHandColumns`, on a program: the cells by their places among `CELLS`. */
export function createColumnar(columns: Inputs, kept: readonly number[], options: { lanes: boolean }) {
  const { program, slots, cells } = compile();
  const inputs = INPUT_NAMES.map((name) => columns[name]);
  inputs.forEach((column, k) => (slots[k] = column[0]));
  runAll(program, slots, KERNELS);
  const plan = planColumns({
    program,
    slots,
    varying: inputs.map((_, k) => k),
    frozen: [],
    outputs: kept.map((k) => cells[k]),
  });
  const working = createColumns(plan, KERNELS, options);
  const outputs = kept.map((_, k) => working.output(k));
  inputs.forEach((column, k) => working.input(k).set(column));
  const summed = SUMMED.map((k) => outputs[kept.indexOf(k)]);
  return { outputs, run: () => (working.run(working.width), sumOf(summed)) };
}

const BINARY = { '+': 'add', '-': 'sub', '*': 'mul', '/': 'div' } as const;

/** Appends the operations of a formula; knows what the formulas of this bench use. */
function lower(node: MathNode, builder: Builder, lookUp: (name: string) => number): number {
  if (isConstantNode(node)) return builder.constant(node.value as number);
  if (isSymbolNode(node)) return lookUp(node.name);
  if (isParenthesisNode(node)) return lower(node.content, builder, lookUp);
  if (isOperatorNode(node)) {
    const [a, b] = node.args.map((operand) => lower(operand, builder, lookUp));
    return b === undefined ? builder.neg(a) : builder[BINARY[node.op as keyof typeof BINARY]](a, b);
  }
  if (isFunctionNode(node)) {
    const [a, b] = node.args.map((operand) => lower(operand, builder, lookUp));
    return builder.op(node.fn.name as 'min' | 'abs' | 'log10', a, b);
  }
  throw new Error(`The formulas of this bench hold no ${node.type}.`);
}
