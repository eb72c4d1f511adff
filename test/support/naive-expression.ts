// Expressions, evaluated by walking the tree with units carried along. Written from the language's own rules, with
// the host's Math functions; nothing is compiled, nothing is kept.

import type { BinaryExpr, CallExpr, Expr, PathExpr } from '../../src/language/index.ts';
import { PUBLISHED } from '../quantity/published-series.ts';
import { Broken, KINDS, isKind, lift, liftStep, linear, sameKinds, sure } from './naive-value.ts';
import type { NaiveKind, NaiveType, NaiveValue } from './naive-value.ts';

export type Resolve = (path: PathExpr) => NaiveValue;

/** Rounding of a few library functions: some last digits. */
const LIBRARY = 4e-15;

export function evaluate(expr: Expr, resolve: Resolve): NaiveValue {
  switch (expr.type) {
    case 'number':
      return sure(expr.kind, expr.value);
    case 'path':
      return resolve(expr);
    case 'group':
      return evaluate(expr.inner, resolve);
    case 'call':
      return call(expr, resolve);
    case 'within':
      return within(expr, resolve);
    case 'with':
      throw new Error('The naive evaluator has no other states.');
    case 'unary': {
      const operand = evaluate(expr.operand, resolve);
      if (expr.operator === 'not') {
        if (operand.type !== 'condition') throw new Broken('not');
        return lift('condition', (x) => 1 - x, [operand]);
      }
      const kind = quantity(operand);
      if (expr.operator === '√') return root(operand, kind);
      if (kind.scale === 'celsius') throw new Broken('sign of a temperature');
      return expr.operator === '-' ? lift(kind, (x) => -x, [operand]) : operand;
    }
    case 'binary':
      return binary(expr, resolve);
  }
}

function quantity(value: NaiveValue): NaiveKind {
  if (!isKind(value.type)) throw new Broken('a quantity is wanted');
  return value.type;
}

/** The dimension that counts in products: a temperature point as its kelvin; a level stops. */
function amount(kind: NaiveKind): readonly number[] {
  if (kind.scale === 'decibel') throw new Broken('a level in a product');
  return kind.dimension;
}

/** What has no zero of its own has no magnitude, sign or digits. */
function zeroed(kind: NaiveKind): void {
  if (kind.scale === 'celsius') throw new Broken('a point of the temperature scale');
}

function root(operand: NaiveValue, kind: NaiveKind): NaiveValue {
  return lift(linear(...amount(kind).map((n) => n / 2)), Math.sqrt, [operand]);
}

function binary(expr: BinaryExpr, resolve: Resolve): NaiveValue {
  const { operator } = expr;
  if (operator === '^') return power(expr, resolve);
  const a = evaluate(expr.left, resolve);
  const b = evaluate(expr.right, resolve);
  switch (operator) {
    case 'and':
    case 'or': {
      if (a.type !== 'condition' || b.type !== 'condition') throw new Broken(`${operator} of what is no condition`);
      return lift('condition', (x, y) => (operator === 'and' ? x * y : x + y - x * y), [a, b]);
    }
    case '=':
    case '<':
    case '>':
    case '<=':
    case '>=':
      return compare(operator, a, b);
    case '+':
    case '-':
      return lift(sumKind(operator, quantity(a), quantity(b)), (x, y) => (operator === '+' ? x + y : x - y), [a, b]);
    case '*': {
      const [p, q] = [amount(quantity(a)), amount(quantity(b))];
      return lift(linear(...p.map((n, i) => n + q[i])), (x, y) => x * y, [a, b]);
    }
    case '/': {
      const [p, q] = [amount(quantity(a)), amount(quantity(b))];
      return lift(linear(...p.map((n, i) => n - q[i])), (x, y) => x / y, [a, b]);
    }
    case '||':
      return parallel([a, b]);
  }
}

function sumKind(operator: '+' | '-', a: NaiveKind, b: NaiveKind): NaiveKind {
  const points = [a, b].filter((kind) => kind.scale === 'celsius').length;
  if (points === 2 && operator === '-') return KINDS.K;
  if (points === 1) {
    const [point, other] = a.scale === 'celsius' ? [a, b] : [b, a];
    if (sameKinds(other, KINDS.K) && (a === point || operator === '+')) return point;
  }
  if (points === 0 && sameKinds(a, b)) return a;
  throw new Broken('a sum of different things');
}

function parallel(operands: readonly NaiveValue[]): NaiveValue {
  const kind = quantity(operands[0]);
  if (operands.some((operand) => !sameKinds(quantity(operand), kind))) throw new Broken('unlike elements in parallel');
  if ([KINDS.ohm, KINDS.H].some((known) => sameKinds(known, kind))) {
    const lifted = lift(kind, (...x) => 1 / x.reduce((sum, r) => sum + 1 / r, 0), operands, LIBRARY);
    // Of an element and its negative side by side, infinity has no sign.
    let sum = 0;
    const cancels = operands.some(({ value }, i) => (sum += 1 / (value ?? NaN)) === 0 && i > 0);
    return cancels ? { ...lifted, unsure: true } : lifted;
  }
  if ([KINDS.S, KINDS.F].some((known) => sameKinds(known, kind)))
    return lift(kind, (...x) => x.reduce((sum, g) => sum + g, 0), operands);
  throw new Broken('no elements');
}

function power(expr: BinaryExpr, resolve: Resolve): NaiveValue {
  const base = evaluate(expr.left, resolve);
  const exponent = evaluate(expr.right, resolve);
  const kind = quantity(base);
  if (!sameKinds(quantity(exponent), KINDS.plain)) throw new Broken('an exponent with a unit');
  const pow = (x: number, y: number): number => x ** y;
  if (sameKinds(kind, KINDS.plain)) return lift(KINDS.plain, pow, [base, exponent], LIBRARY);
  const dimension = amount(kind);
  const known = ratio(expr.right);
  if (known === null) throw new Broken('a computed exponent on a dimension');
  return lift(linear(...dimension.map((n) => n * known)), pow, [base, exponent], LIBRARY);
}

/** A number, or a ratio of numbers, that is written out; else null. */
function ratio(expr: Expr): number | null {
  if (expr.type === 'number') return expr.unit === null ? expr.value : null;
  if (expr.type === 'group') return ratio(expr.inner);
  if (expr.type === 'unary' && expr.operator !== 'not' && expr.operator !== '√') {
    const x = ratio(expr.operand);
    return x === null ? null : expr.operator === '-' ? -x : x;
  }
  if (expr.type !== 'binary' || expr.operator !== '/') return null;
  const [a, b] = [ratio(expr.left), ratio(expr.right)];
  return a === null || b === null ? null : a / b;
}

function compare(operator: '=' | '<' | '>' | '<=' | '>=', a: NaiveValue, b: NaiveValue): NaiveValue {
  if (a.type === 'region' && b.type === 'region') {
    if (operator !== '=') throw new Broken('regions have no order');
    return lift('condition', (x, y) => Number(x === y), [a, b]);
  }
  if (!sameKinds(quantity(a), quantity(b))) throw new Broken('unlike things compared');
  const holds = { '<': less, '>': more, '<=': atMost, '>=': atLeast };
  if (operator === '=') throw new Broken('computed numbers compared by =');
  return liftStep('condition', withNumbers(holds[operator]), [a, b]);
}

const less = (x: number, y: number): boolean => x < y;
const more = (x: number, y: number): boolean => x > y;
const atMost = (x: number, y: number): boolean => x <= y;
const atLeast = (x: number, y: number): boolean => x >= y;

/** A comparison with what is no number is no condition. */
function withNumbers(holds: (...x: number[]) => boolean): (...x: number[]) => number {
  return (...x) => (x.some(Number.isNaN) ? NaN : Number(holds(...x)));
}

function within(expr: Extract<Expr, { type: 'within' }>, resolve: Resolve): NaiveValue {
  const all = [expr.value, expr.low, expr.high].map((part) => evaluate(part, resolve));
  const kind = quantity(all[0]);
  if (all.some((one) => !sameKinds(quantity(one), kind))) throw new Broken('unlike things compared');
  const inside = (x: number, p: number, q: number): boolean => x >= Math.min(p, q) && x <= Math.max(p, q);
  return liftStep('condition', withNumbers(inside), all);
}

const PLAIN_FUNCTIONS: Readonly<Record<string, (x: number) => number>> = {
  exp: Math.exp,
  ln: Math.log,
  log10: Math.log10,
  sin: Math.sin,
  cos: Math.cos,
  tan: Math.tan,
  atan: Math.atan,
};

function call({ name: { name }, args }: CallExpr, resolve: Resolve): NaiveValue {
  const wanted = (count: number): void => {
    if (args.length !== count) throw new Broken('number of arguments');
  };
  const all = (): NaiveValue[] => args.map((arg) => evaluate(arg, resolve));
  const single = (): { x: NaiveValue; kind: NaiveKind } => {
    wanted(1);
    const x = evaluate(args[0], resolve);
    return { x, kind: quantity(x) };
  };
  const alike = (values: readonly NaiveValue[]): NaiveKind => {
    const kind = quantity(values[0]);
    if (values.some((value) => !sameKinds(quantity(value), kind))) throw new Broken('unlike arguments');
    return kind;
  };
  const plain = PLAIN_FUNCTIONS[name];
  if (plain) {
    const { x, kind } = single();
    if (!sameKinds(kind, KINDS.plain)) throw new Broken('a plain number is wanted');
    return lift(KINDS.plain, plain, [x], LIBRARY);
  }
  const series = /^(E\d+)(?:_(up|down))?$/.exec(name);
  if (series && PUBLISHED[series[1]]) {
    const { x, kind } = single();
    if (kind.scale !== 'linear') throw new Broken('no amount');
    return liftStep(kind, (y) => preferred(PUBLISHED[series[1]], y, series[2] ?? 'nearest'), [x]);
  }
  switch (name) {
    case 'sqrt': {
      const { x, kind } = single();
      return root(x, kind);
    }
    case 'abs': {
      const { x, kind } = single();
      zeroed(kind);
      return lift(kind, Math.abs, [x]);
    }
    case 'sign': {
      const { x, kind } = single();
      zeroed(kind);
      return liftStep(KINDS.plain, Math.sign, [x]);
    }
    case 'nominal': {
      const { x, kind } = single();
      return { ...x, type: kind };
    }
    case 'min':
    case 'max': {
      if (args.length === 0) throw new Broken('number of arguments');
      const values = all();
      return lift(alike(values), name === 'min' ? Math.min : Math.max, values);
    }
    case 'hypot': {
      wanted(2);
      const values = all();
      zeroed(quantity(values[0]));
      return lift(alike(values), Math.hypot, values, LIBRARY);
    }
    case 'dB': {
      const { x, kind } = single();
      if (!sameKinds(kind, KINDS.plain)) throw new Broken('a plain number is wanted');
      return lift(KINDS.dB, (y) => 20 * Math.log10(Math.abs(y)), [x], LIBRARY);
    }
    case 'par': {
      if (args.length < 2) throw new Broken('number of arguments');
      return parallel(all());
    }
    case 'round': {
      wanted(2);
      const x = evaluate(args[0], resolve);
      zeroed(quantity(x));
      const digits = ratio(args[1]);
      if (digits === null || !Number.isInteger(digits) || digits < 1 || digits > 15) throw new Broken('digits');
      return liftStep(quantity(x), (y) => (Number.isFinite(y) ? Number(y.toPrecision(digits)) : y), [x]);
    }
    case 'if': {
      wanted(3);
      const [condition, a, b] = all();
      if (condition.type !== 'condition' || !sameKinds(a.type, b.type)) throw new Broken('if');
      return choose(condition, a, b);
    }
    default:
      throw new Broken(`no function ${name}`);
  }
}

function choose(condition: NaiveValue, a: NaiveValue, b: NaiveValue): NaiveValue {
  const type: NaiveType = a.type;
  if ([condition, a, b].some(({ value }) => value === null)) return { type, value: null, bound: 0, unsure: false };
  if (Number.isNaN(condition.value!)) return { ...condition, type };
  const chosen = condition.value === 1 ? a : b;
  return { ...chosen, type, unsure: chosen.unsure || condition.unsure };
}

/** The preferred value by looking at every one of them in the decades around x. */
function preferred(table: string, x: number, direction: string): number {
  if (!(x > 0 && x < Infinity)) return NaN;
  const decade = Math.floor(Math.log10(x));
  const digits = table.split(' ');
  const values = [-1, 0, 1].flatMap((k) => digits.map((value) => Number(`${value}e${decade + k + 1 - value.length}`)));
  const near = 1 + 5e-13;
  if (direction === 'up') return Math.min(...values.filter((value) => value * near >= x));
  if (direction === 'down') return Math.max(...values.filter((value) => value <= x * near));
  const distance = (value: number): number => Math.abs(Math.log(value / x));
  return values.reduce((best, value) => (distance(value) < distance(best) ? value : best));
}
