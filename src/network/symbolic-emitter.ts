// An emitter whose values are formulas in the sheet's own expression language, each with its number: run through
// the same lowering as a program, it writes out what that program computes.
//
// Sums of reciprocals under a reciprocal, and a times b / (a + b), are written as `a || b`. Where a formula would grow
// beyond READABLE characters, its compound parts get names of their own first.

import { pow } from '../numeric/index.ts';
import type { Emitter, Handle } from './emitter.ts';

/** An operand of a step. */
export interface Operand {
  readonly name: string;
  readonly value: number;
  /** SI unit text: V, A, ohm, S, A/V^2, 1/V, V^0.5, K, K/W, 1. */
  readonly unit: string;
}

/** One formula with what stands in for its names. */
interface Formula {
  readonly text: string;
  readonly operands: readonly Operand[];
  readonly value: number;
}

/** How tightly a text binds; resistors in parallel get parentheses in a product, though the grammar would not need them. */
const [SUM, PARALLEL, PRODUCT, SIGNED, ATOM] = [1, 2, 3, 4, 5];

/** Length of a formula, in characters, beyond which its parts are named; parts shorter than the second stay. */
const READABLE = 64;
const SHORT = 12;

/** Volts and amperes in a unit, for naming parts. */
const DIMENSIONS: Readonly<Record<string, readonly [number, number]>> = {
  V: [1, 0],
  A: [0, 1],
  ohm: [1, -1],
  S: [-1, 1],
  W: [1, 1],
  '1': [0, 0],
};
const PART_LETTERS: Readonly<Record<string, string>> = { V: 'V', A: 'I', ohm: 'R', S: 'G', W: 'P', '1': 'k' };

interface Node {
  readonly text: string;
  /** Exponents of volt and ampere; null where the unit has others. */
  readonly dimension: readonly [number, number] | null;
  readonly binds: number;
  readonly value: number;
  readonly operands: ReadonlyMap<string, Operand>;
  /** The node is 1 over this one. */
  readonly reciprocalOf?: Handle;
  /** The node is a sum of reciprocals of these. */
  readonly reciprocals?: readonly Handle[];
  /** The node is the sum of these two. */
  readonly sumOf?: readonly [Handle, Handle];
  /** The node is part / (part + other). */
  readonly shareOf?: { readonly part: Handle; readonly other: Handle };
}

export interface SymbolicEmitter extends Emitter {
  /** A named value, or a literal of the sheet language (`15 V`, `4k7`). */
  leaf(text: string, value: number, unit: string): Handle;
  /** x^n, n a number. */
  power(x: Handle, n: number): Handle;
  formula(handle: Handle): Formula;
  value(handle: Handle): number;
  /** The handle is a name or a number already. */
  isLeaf(handle: Handle): boolean;
}

/** An emitter of formulas; `onPart` hears of every part that gets a name, in order. */
export function createSymbolicEmitter(onPart: (name: string, formula: Formula, unit: string) => void): SymbolicEmitter {
  const nodes: Node[] = [];
  const known = new Map<string, Handle>();
  const add = (node: Node): Handle => {
    const present = known.get(node.text);
    if (present !== undefined && nodes[present].value === node.value) return present;
    const handle = nodes.push(node) - 1;
    known.set(node.text, handle);
    return handle;
  };
  const wrapped = (handle: Handle, least: number): string => {
    const { text, binds } = nodes[handle];
    return binds >= least ? text : `(${text})`;
  };
  const merged = (...handles: readonly Handle[]): ReadonlyMap<string, Operand> =>
    new Map(handles.flatMap((handle) => [...nodes[handle].operands]));
  const parts = new Map<Handle, Handle>();
  const counts = new Map<string, number>();
  /** A compound formula under a name of its own; one that has no plain unit stays. */
  const part = (handle: Handle): Handle => {
    const { text, binds, dimension } = nodes[handle];
    if (binds === ATOM || text.length < SHORT || !dimension) return handle;
    const unit = unitOf(dimension);
    if (unit === null) return handle;
    const present = parts.get(handle);
    if (present !== undefined) return present;
    const letter = PART_LETTERS[unit];
    const count = (counts.get(letter) ?? 0) + 1;
    counts.set(letter, count);
    onPart(`${letter}_part${count}`, emitter.formula(handle), unit);
    const named = emitter.leaf(`${letter}_part${count}`, nodes[handle].value, unit);
    parts.set(handle, named);
    return named;
  };
  /** a and b as they are, or under names where what they make would be too long. */
  const readable = (a: Handle, b: Handle): [Handle, Handle] =>
    nodes[a].text.length + nodes[b].text.length > READABLE ? [part(a), part(b)] : [a, b];
  const binary = (
    a: Handle,
    b: Handle,
    text: string,
    binds: number,
    value: number,
    dimension: Node['dimension'],
    more: Partial<Node> = {},
  ): Handle => add({ text, binds, value, dimension, operands: merged(a, b), ...more });
  const call = (name: string, value: number, ...args: Handle[]): Handle =>
    add({
      text: `${name}(${args.map((arg) => nodes[arg].text).join(', ')})`,
      binds: ATOM,
      value,
      dimension: name === 'sqrt' ? halved(nodes[args[0]].dimension) : nodes[args[0]].dimension,
      operands: merged(...args),
    });
  const v = (handle: Handle): number => nodes[handle].value;

  const emitter: SymbolicEmitter = {
    leaf(text, value, unit) {
      const isName = /^[A-Za-z_\u0370-\u03ff]/.test(text);
      const operands = new Map(isName ? [[text, { name: text, value, unit }]] : []);
      return add({
        text,
        binds: text.startsWith('-') ? SUM : ATOM,
        value,
        dimension: DIMENSIONS[unit] ?? null,
        operands,
      });
    },
    power(x, n) {
      const exponent = n < 0 ? `(${n})` : String(n);
      return add({
        text: `${wrapped(x, ATOM)}^${exponent}`,
        binds: SIGNED,
        value: n === 2 ? v(x) * v(x) : pow(v(x), n),
        dimension: n === 2 ? combined(nodes[x].dimension, nodes[x].dimension, 1) : null,
        operands: nodes[x].operands,
      });
    },
    formula(handle) {
      const { text, operands, value } = nodes[handle];
      return { text, operands: [...operands.values()], value };
    },
    value: v,
    isLeaf: (handle) => nodes[handle].binds === ATOM && !nodes[handle].text.includes('('),
    constant: (x) =>
      add({ text: String(x), binds: x < 0 ? SUM : ATOM, value: x, dimension: [0, 0], operands: new Map() }),
    add(first, second) {
      const [a, b] = readable(first, second);
      const lists = [a, b].map((handle) => reciprocalsOf(nodes[handle]));
      const reciprocals = lists.every((list) => list.length > 0) ? lists.flat() : undefined;
      const text = `${wrapped(a, SUM)} + ${wrapped(b, PRODUCT)}`;
      return binary(a, b, text, SUM, v(a) + v(b), nodes[a].dimension, { reciprocals, sumOf: [a, b] });
    },
    sub(first, second) {
      const [a, b] = readable(first, second);
      return binary(a, b, `${wrapped(a, SUM)} - ${wrapped(b, PRODUCT)}`, SUM, v(a) - v(b), nodes[a].dimension);
    },
    mul(first, second) {
      const [a, b] = readable(first, second);
      const value = v(a) * v(b);
      const dimension = combined(nodes[a].dimension, nodes[b].dimension, 1);
      for (const [x, y] of [
        [a, b],
        [b, a],
      ]) {
        const share = nodes[y].shareOf;
        if (share?.other !== x) continue;
        const text = `${wrapped(x, SIGNED)} || ${wrapped(share.part, SIGNED)}`;
        return binary(x, y, text, PARALLEL, value, dimension);
      }
      return binary(a, b, `${wrapped(a, PRODUCT)} * ${wrapped(b, SIGNED)}`, PRODUCT, value, dimension);
    },
    div(first, second) {
      if (first === second) return emitter.constant(1);
      const isOne = nodes[first].text === '1';
      const below = nodes[second];
      const value = v(first) / v(second);
      const dimension = combined(nodes[first].dimension, below.dimension, -1);
      if (isOne && below.reciprocalOf !== undefined) return below.reciprocalOf;
      if (isOne && below.reciprocals) {
        const text = below.reciprocals.map((handle) => wrapped(handle, SIGNED)).join(' || ');
        return binary(second, second, text, PARALLEL, value, dimension);
      }
      const [a, b] = readable(first, second);
      const sum = nodes[b].sumOf;
      const other = sum && (sum[0] === a ? sum[1] : sum[1] === a ? sum[0] : undefined);
      const shareOf = other === undefined ? undefined : { part: a, other };
      const text = `${wrapped(a, PRODUCT)} / ${wrapped(b, SIGNED)}`;
      return binary(a, b, text, PRODUCT, value, dimension, { reciprocalOf: isOne ? b : undefined, shareOf });
    },
    neg: (a) =>
      add({
        text: `-${wrapped(a, ATOM)}`,
        binds: SUM,
        value: -v(a),
        dimension: nodes[a].dimension,
        operands: merged(a),
      }),
    min: (a, b) => call('min', Math.min(v(a), v(b)), a, b),
    max: (a, b) => call('max', Math.max(v(a), v(b)), a, b),
    abs: (a) => call('abs', Math.abs(v(a)), a),
    sqrt: (a) => call('sqrt', Math.sqrt(v(a)), a),
    call(kernel, inputs) {
      if (kernel !== 'ratio') throw new Error(`symbolic emitter: ${kernel} has no formula`);
      return [emitter.div(inputs[0], inputs[1])];
    },
  };
  return emitter;
}

function reciprocalsOf(node: Node): readonly Handle[] {
  if (node.reciprocals) return node.reciprocals;
  return node.reciprocalOf === undefined ? [] : [node.reciprocalOf];
}

function combined(a: Node['dimension'], b: Node['dimension'], sign: 1 | -1): Node['dimension'] {
  return a && b && [a[0] + sign * b[0], a[1] + sign * b[1]];
}

function halved(a: Node['dimension']): Node['dimension'] {
  return a && [a[0] / 2, a[1] / 2];
}

function unitOf([volts, amperes]: readonly [number, number]): string | null {
  return (
    Object.keys(DIMENSIONS).find((unit) => DIMENSIONS[unit][0] === volts && DIMENSIONS[unit][1] === amperes) ?? null
  );
}
