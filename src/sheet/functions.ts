// The functions of the sheet language, as one table: name, arguments, what it computes.

import { DECIBEL, NOISE_VOLTAGE_DENSITY, PLAIN, VOLTAGE, FREQUENCY, SERIES, sameKind } from '../quantity/index.ts';
import type { SeriesName, ValueKind } from '../quantity/index.ts';
import { nearestNames } from '../language/index.ts';
import type { CallExpr, Expr } from '../language/index.ts';
import type { OperationName } from '../program/index.ts';
import { advice, constantNumber, sideBySide, squareRoot } from './arithmetic.ts';
import { compilePlain, compileQuantity } from './operand.ts';
import { preferredKernel } from './kernels.ts';
import type { EndName, Scope, Typed } from './scope.ts';
import { operandText } from './scope.ts';
import { stop } from './stop.ts';
import { isQuantity, sameType, typeName } from './value-type.ts';

interface SheetFunction {
  /** Least and largest number of arguments. */
  readonly arity: readonly [number, number];
  /** As it is written, for messages and completion: `round(x, digits)`. */
  readonly form: string;
  readonly sentence: string;
  readonly compile: (expr: CallExpr, scope: Scope) => Typed;
}

/** Every function by name. */
export const FUNCTIONS: ReadonlyMap<string, SheetFunction> = new Map<string, SheetFunction>([
  [
    'sqrt',
    entry([1, 1], 'sqrt(x)', 'Square root.', (e, s) => squareRoot(compileQuantity(e.args[0]!, s), e.args[0]!.span, s)),
  ],
  ['abs', entry([1, 1], 'abs(x)', 'Magnitude.', (e, s) => sameKindAs(e, s, 'abs'))],
  [
    'sign',
    entry([1, 1], 'sign(x)', '-1, 0 or 1.', (e, s) => ({ type: PLAIN, handle: sameKindAs(e, s, 'sign').handle })),
  ],
  ['min', entry([1, 32], 'min(a, b, ..)', 'The least of its arguments.', (e, s) => fold(e, s, 'min'))],
  ['max', entry([1, 32], 'max(a, b, ..)', 'The largest of its arguments.', (e, s) => fold(e, s, 'max'))],
  ...plain('exp', 'exp(x)', 'e to the power x.'),
  ...plain('ln', 'ln(x)', 'Natural logarithm.'),
  ...plain('log10', 'log10(x)', 'Logarithm to base 10.'),
  ...plain('sin', 'sin(x)', 'Sine; a bare number is in radians.'),
  ...plain('cos', 'cos(x)', 'Cosine; a bare number is in radians.'),
  ...plain('tan', 'tan(x)', 'Tangent; a bare number is in radians.'),
  ...plain('atan', 'atan(x)', 'Angle in radians whose tangent is x.'),
  ['hypot', entry([2, 2], 'hypot(a, b)', 'Square root of the sum of the squares.', (e, s) => fold(e, s, 'hypot'))],
  ['dB', entry([1, 1], 'dB(x)', '20 log10 of the magnitude of a ratio.', decibels)],
  ['par', entry([2, 32], 'par(a, b, ..)', 'Elements in parallel.', parallel)],
  ['round', entry([2, 2], 'round(x, digits)', 'Rounded to so many significant digits.', roundDigits)],
  ['if', entry([3, 3], 'if(condition, a, b)', 'a where the condition holds, else b.', choose)],
  [
    'nominal',
    entry([1, 1], 'nominal(x)', 'x with every input at its nominal value.', (e, s) => {
      const x = compileQuantity(e.args[0]!, s);
      return { type: x.type, handle: s.builder.call('nominal', [x.handle], 1)[0]! };
    }),
  ],
  ['low', entry([1, 1], 'low(x)', 'The least x over the declared set.', (e, s) => end('low', e, s))],
  ['high', entry([1, 1], 'high(x)', 'The largest x over the declared set.', (e, s) => end('high', e, s))],
  ...(Object.keys(SERIES) as SeriesName[]).flatMap(series),
  ...analysis('gain', 'gain(A, f)', 'Gain at a frequency.', [FREQUENCY], PLAIN),
  ...analysis('phase', 'phase(A, f)', 'Phase at a frequency, in radians.', [FREQUENCY], PLAIN),
  ...analysis('e_n', 'e_n(A, f)', 'Noise voltage density at the input.', [FREQUENCY], NOISE_VOLTAGE_DENSITY),
  ...analysis(
    'v_n',
    'v_n(A, f1, f2)',
    'Noise voltage at the output between two frequencies.',
    [FREQUENCY, FREQUENCY],
    VOLTAGE,
  ),
  ...analysis('NF', 'NF(A, f)', 'Noise figure.', [FREQUENCY], DECIBEL),
  ...analysis('HD2', 'HD2(A, amplitude)', 'Second harmonic against the fundamental.', [VOLTAGE], PLAIN),
  ...analysis('HD3', 'HD3(A, amplitude)', 'Third harmonic against the fundamental.', [VOLTAGE], PLAIN),
  ...analysis('THD', 'THD(A, amplitude)', 'All harmonics against the fundamental.', [VOLTAGE], PLAIN),
]);

/** Logarithms under names that do not tell their base, or tell it otherwise. */
const LOGARITHMS: ReadonlyMap<string, string> = new Map([
  ['log', ' Write ln for the natural logarithm, log10 for the decimal one.'],
  ['lg', ' Write log10 for the decimal logarithm.'],
  ['loge', ' Write ln for the natural logarithm.'],
]);

/** Compiles a call; stops when the function is unknown or its arguments do not fit. */
export function compileCall(expr: CallExpr, scope: Scope): Typed {
  const { name, span } = expr.name;
  const found = FUNCTIONS.get(name);
  if (!found) {
    const near = nearestNames(name, [...FUNCTIONS.keys()]);
    const hint = near.length > 0 ? ` Did you mean ${near.join(' or ')}?` : '';
    stop('unknown-function', `There is no function ${name}.${LOGARITHMS.get(name) ?? hint}`, span);
  }
  const [least, most] = found.arity;
  if (expr.args.length < least || expr.args.length > most) {
    const wanted = least === most ? `${least} argument${least === 1 ? '' : 's'}` : `${least} to ${most} arguments`;
    stop('argument-count', `${name} takes ${wanted} and has ${expr.args.length}. Write ${found.form}.`, expr.span);
  }
  return found.compile(expr, scope);
}

function entry(
  arity: readonly [number, number],
  form: string,
  sentence: string,
  compile: SheetFunction['compile'],
): SheetFunction {
  return { arity, form, sentence, compile };
}

function plain(name: OperationName, form: string, sentence: string): [string, SheetFunction][] {
  const compile: SheetFunction['compile'] = (e, s) => ({
    type: PLAIN,
    handle: s.builder.op(name, compilePlain(e.args[0]!, s, `The argument of ${name}`).handle),
  });
  return [[name, entry([1, 1], form, sentence, compile)]];
}

/** Compiles an argument that counts from a zero of its own: a point of the Celsius scale stops. */
function compileAmount(arg: Expr, name: string, scope: Scope): ReturnType<typeof compileQuantity> {
  const x = compileQuantity(arg, scope);
  if (x.type.scale === 'celsius') {
    stop(
      'function-of-temperature',
      `${operandText(scope, arg.span, 'This')} is a point of the temperature scale: ${name} takes an amount. Subtract another point first; the difference is in K.`,
      arg.span,
    );
  }
  return x;
}

function sameKindAs(expr: CallExpr, scope: Scope, op: OperationName): Typed {
  const x = compileAmount(expr.args[0]!, op, scope);
  return { type: x.type, handle: scope.builder.op(op, x.handle) };
}

function fold(expr: CallExpr, scope: Scope, op: OperationName): Typed {
  const args = expr.args.map((arg) => (op === 'hypot' ? compileAmount(arg, op, scope) : compileQuantity(arg, scope)));
  const first = args[0]!;
  let { handle } = first;
  for (let i = 1; i < args.length; i++) {
    const next = args[i]!;
    if (!sameKind(first.type, next.type)) {
      const a = operandText(scope, expr.args[0]!.span, 'the first');
      const b = operandText(scope, expr.args[i]!.span, 'the next');
      stop(
        'arguments-dimension',
        `${a} is ${typeName(first.type)} and ${b} is ${typeName(next.type)}: ${expr.name.name} takes values of one kind.${advice(a, first.type, b, next.type)}`,
        expr.args[i]!.span,
      );
    }
    handle = scope.builder.op(op, handle, next.handle);
  }
  return { type: first.type, handle };
}

function decibels(expr: CallExpr, scope: Scope): Typed {
  const ratio = compilePlain(expr.args[0]!, scope, 'The argument of dB');
  const { builder } = scope;
  return { type: DECIBEL, handle: builder.mul(builder.constant(20), builder.op('log10', builder.abs(ratio.handle))) };
}

function parallel(expr: CallExpr, scope: Scope): Typed {
  return sideBySide(
    expr.args.map((arg) => compileQuantity(arg, scope)),
    expr.args.map((arg) => arg.span),
    scope,
  );
}

function roundDigits(expr: CallExpr, scope: Scope): Typed {
  const x = compileAmount(expr.args[0]!, 'round', scope);
  const digits = constantNumber(expr.args[1]!);
  if (digits === null || !Number.isInteger(digits) || digits < 1 || digits > 15) {
    stop(
      'round-digits',
      `The number of significant digits is a whole number from 1 to 15, such as round(x, 3).`,
      expr.args[1]!.span,
    );
  }
  return { type: x.type, handle: scope.builder.call('round', [x.handle, scope.builder.constant(digits)], 1)[0]! };
}

function choose(expr: CallExpr, scope: Scope): Typed {
  const condition = scope.compile(expr.args[0]!);
  if (condition.type !== 'condition') {
    stop(
      'condition-expected',
      `if wants a condition first; ${operandText(scope, expr.args[0]!.span, 'this')} is ${typeName(condition.type)}. Write if(a > b, x, y).`,
      expr.args[0]!.span,
    );
  }
  const [a, b] = [scope.compile(expr.args[1]!), scope.compile(expr.args[2]!)];
  if (!sameType(a.type, b.type)) {
    const x = operandText(scope, expr.args[1]!.span, 'the first');
    const y = operandText(scope, expr.args[2]!.span, 'the second');
    const hint = isQuantity(a.type) && isQuantity(b.type) ? advice(x, a.type, y, b.type) : '';
    stop(
      'if-dimension',
      `${x} is ${typeName(a.type)} and ${y} is ${typeName(b.type)}: both branches of if are of one kind.${hint}`,
      expr.args[2]!.span,
    );
  }
  return { type: a.type, handle: scope.builder.call('select', [condition.handle, a.handle, b.handle], 1)[0]! };
}

function end(which: EndName, expr: CallExpr, scope: Scope): Typed {
  const x = compileQuantity(expr.args[0]!, scope);
  if (scope.end) return { type: x.type, handle: scope.end(which, x.handle) };
  scope.later(`The ${which} end of a value`, expr.span);
  return { type: x.type, handle: scope.builder.constant(NaN) };
}

function series(name: SeriesName): [string, SheetFunction][] {
  const make = (direction: 'nearest' | 'up' | 'down', sentence: string): [string, SheetFunction] => {
    const full = direction === 'nearest' ? name : `${name}_${direction}`;
    const compile: SheetFunction['compile'] = (e, s) => {
      const x = compileQuantity(e.args[0]!, s);
      if (x.type.scale !== 'linear') {
        stop(
          'series-kind',
          `A preferred value is that of an amount; ${operandText(s, e.args[0]!.span, 'this')} is ${typeName(x.type)}.`,
          e.args[0]!.span,
        );
      }
      return { type: x.type, handle: s.builder.call(preferredKernel(name, direction), [x.handle], 1)[0]! };
    };
    return [full, entry([1, 1], `${full}(x)`, sentence, compile)];
  };
  return [
    make('nearest', `The value of the ${name} series nearest by ratio.`),
    make('up', `The least value of the ${name} series that is not below x.`),
    make('down', `The largest value of the ${name} series that is not above x.`),
  ];
}

/** A function of a stage that later analyses compute; its arguments are checked all the same. */
function analysis(
  name: string,
  form: string,
  sentence: string,
  kinds: readonly ValueKind[],
  type: ValueKind,
): [string, SheetFunction][] {
  const compile: SheetFunction['compile'] = (e, s) => {
    const stage = e.args[0]!;
    if (stage.type !== 'path' || stage.names.length !== 1) {
      stop('stage-expected', `The first argument of ${name} is a stage. Write ${form}.`, stage.span);
    }
    s.stageOf(stage);
    kinds.forEach((kind, i) => {
      const arg = e.args[i + 1]!;
      const value = compileQuantity(arg, s);
      if (!sameKind(value.type, kind)) {
        stop(
          'argument-dimension',
          `${operandText(s, arg.span, 'This argument')} is ${typeName(value.type)}; ${name} takes ${typeName(kind)} here. Write ${form}.`,
          arg.span,
        );
      }
    });
    s.later(sentence.replace(/\.$/, ''), e.span);
    return { type, handle: s.builder.constant(NaN) };
  };
  return [[name, entry([kinds.length + 1, kinds.length + 1], form, sentence, compile)]];
}
