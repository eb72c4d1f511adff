// A quantity cell, and the fields of parts and points, which are written alike: one value with or
// without spread.

import { CAPACITANCE, TEMPERATURE_DIFFERENCE, sameKind } from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import type { Expr, Line, Literal, QuantityEntry } from '../../language/index.ts';
import type { Handle } from '../../network/index.ts';
import { ambientCautions, ambientFault, checkAmbientKind, kelvinAsPoint } from '../ambient.ts';
import { diagnose } from '../diagnose.ts';
import { drawsOf } from '../compiled-quantity.ts';
import type { CompiledQuantity, QuantityDraw } from '../compiled-quantity.ts';
import { EMPTY_DRAFT, NO_SPREAD } from '../draft.ts';
import type { CellContext, Draft, Read } from '../draft.ts';
import { limitSignCautions, limitSignFault } from '../limit-sign.ts';
import type { DeclaredSpread } from '../model.ts';
import { stop } from '../stop.ts';
import { conditionCautions } from '../test-conditions.ts';
import { isQuantity, typeName } from '../value-type.ts';
import { expressionStep } from '../workings.ts';

/** Compiles value and spread of an entry, with `kindOf` their kinds as this place reads them; stops where limits do not fit the value. */
export function compileQuantityEntry(
  entry: QuantityEntry,
  line: Line,
  context: CellContext,
  kindOf: (kind: ValueKind) => ValueKind = (kind) => kind,
): CompiledQuantity {
  const scope = context.scope(line);
  if (entry.value === null) {
    const { kind, value } = standIn(entry, line, kindOf);
    checkUnit(entry, kind);
    const handle = context.builder.input(value);
    return {
      type: kind,
      handle,
      draw: { handle, form: 'value' },
      spread: declared(entry, handle, kind, line, kindOf),
      isInput: true,
      chosen: true,
      fromZero: false,
    };
  }
  const { type: written, handle: formula } = scope.compile(entry.value);
  const type = isQuantity(written) ? kindOf(written) : written;
  const isInput = isNumber(entry.value);
  const handle = isInput && isQuantity(type) ? context.builder.input(numberOf(entry.value)) : formula;
  if (isQuantity(type)) checkUnit(entry, type);
  else if (entry.spread)
    stop('spread-of-word', `A spread belongs to a number; this is ${typeName(type)}.`, entry.spread.span);
  const spread = entry.spread && isQuantity(type) ? declared(entry, handle, type, line, kindOf) : null;
  const draw = spread && drawOf(entry, handle, isInput, context);
  return {
    type,
    handle: draw ? drawnHandle(handle, draw, context) : handle,
    draw,
    spread,
    isInput,
    chosen: false,
    fromZero: false,
  };
}

/** Where the draws of an entry with a value enter. */
function drawOf(entry: QuantityEntry, value: Handle, isInput: boolean, { builder }: CellContext): QuantityDraw {
  if (isInput) return { handle: value, form: 'value' };
  return isRelative(entry.spread!.tolerance)
    ? { handle: builder.input(1), form: 'factor' }
    : { handle: builder.input(0), form: 'addend' };
}

/** The value of an entry with its draw in it; at the nominal to the last bit the formula's own. */
function drawnHandle(value: Handle, draw: QuantityDraw, { builder }: CellContext): Handle {
  switch (draw.form) {
    case 'value':
      return value;
    case 'factor':
      return builder.mul(value, draw.handle);
    case 'addend':
      return builder.add(value, draw.handle);
  }
}

function isRelative(tolerance: Literal | null): boolean {
  return tolerance?.unit?.symbol === '%' || tolerance?.unit?.symbol === 'ppm';
}

/** The same quantity with its open low end at 0, for what is never below it; nothing else is changed. */
export function heldAtZero(quantity: CompiledQuantity, entry: QuantityEntry): CompiledQuantity {
  const { spread } = quantity;
  const bounds = entry.spread?.bounds;
  if (!spread || !bounds?.last || bounds.first || bounds.last.value < 0) return quantity;
  return { ...quantity, fromZero: true, spread: (read) => ({ ...spread(read), low: 0 }) };
}

/** What is said of an open low end that is 0 by nature. */
export function fromZeroText(name: string): string {
  return `${name}: no lower limit is given; 0 is taken, below which it cannot lie.`;
}

/** Compiles a quantity cell. */
export function compileQuantityCell(context: CellContext): Draft {
  const { tree } = context;
  const entry = tree.entry as QuantityEntry;
  const isAmbient = tree.name.name === 'T_A';
  const written = compileQuantityEntry(entry, tree.line, context, isAmbient ? kelvinAsPoint : undefined);
  const compiled = withNature(written, tree.name.name, entry);
  const as = entry.as?.unit ?? null;
  if (isAmbient) checkAmbientKind(compiled.type, entry, tree.line);
  return {
    ...EMPTY_DRAFT,
    type: compiled.type,
    value: compiled.handle,
    isInput: compiled.isInput,
    spread: compiled.spread,
    drawn: { ...NO_SPREAD, draws: drawsOf('', compiled, tree.line) },
    assumptions: [
      ...(compiled.chosen ? [`${tree.name.name}: no nominal is given; ${standInText(entry)} stands in.`] : []),
      ...(compiled.fromZero ? [fromZeroText(tree.name.name)] : []),
    ],
    verify: (read) => {
      const value = read(compiled.handle);
      if (Number.isNaN(value)) return { line: tree.line, message: diagnose(entry.value!, context, tree.line) };
      const spread = compiled.spread?.(read) ?? null;
      if (isAmbient) return ambientFault(value, spread, entry, tree.line);
      return spread && isQuantity(compiled.type)
        ? limitSignFault(tree.name.name, compiled.type, spread, entry, tree.line)
        : null;
    },
    cautions: (read) => {
      const spread = compiled.spread?.(read) ?? null;
      const texts = [
        ...conditionCautions(entry),
        ...(isAmbient ? ambientCautions(read(compiled.handle), spread) : []),
        ...(spread && isQuantity(compiled.type) ? limitSignCautions(tree.name.name, compiled.type, spread, entry) : []),
      ];
      return texts.map((text) => ({ text, line: tree.line }));
    },
    workings: (read) =>
      entry.value === null || isNumber(entry.value)
        ? []
        : [expressionStep(tree.name.name, entry.value, tree.line, compiled.type, read(compiled.handle), as, context)],
  };
}

/** What a cell's name or kind says of its spread: T_A changes in use, a capacitance is never negative. */
function withNature(quantity: CompiledQuantity, name: string, entry: QuantityEntry): CompiledQuantity {
  const { type, spread } = quantity;
  if (name === 'T_A' && spread) return { ...quantity, spread: (read) => ({ ...spread(read), service: true }) };
  return isQuantity(type) && sameKind(type, CAPACITANCE) ? heldAtZero(quantity, entry) : quantity;
}

/** What stands in for a nominal that is not given. */
export function standInText(entry: QuantityEntry): string {
  const { first, last } = entry.spread!.bounds!;
  if (!first || !last) return 'its one limit';
  return first.value * last.value <= 0 || first.kind.scale !== 'linear'
    ? 'the middle of its limits'
    : 'the geometric mean of its limits';
}

/** Whether an entry is one number, or limits alone: an input. */
export function isInputEntry(entry: QuantityEntry): boolean {
  return entry.value === null || isNumber(entry.value);
}

/** Whether an expression is one number, with or without a sign. */
function isNumber(expr: Expr): boolean {
  return (
    expr.type === 'number' ||
    (expr.type === 'unary' && expr.operator !== 'not' && expr.operator !== '√' && isNumber(expr.operand))
  );
}

/** The nominal that stands in where limits alone are given: their geometric mean in magnitude, their middle where signs differ, the one where there is one. */
function standIn(
  entry: QuantityEntry,
  line: Line,
  kindOf: (kind: ValueKind) => ValueKind,
): { kind: ValueKind; value: number } {
  const { first, last } = entry.spread!.bounds!;
  if (first && last) {
    if (!sameKind(kindOf(first.kind), kindOf(last.kind))) {
      stop(
        'limits-differ',
        `${text(line, first)} is ${typeName(first.kind)} and ${text(line, last)} is ${typeName(last.kind)}: both limits are of one kind.`,
        last.span,
      );
    }
    const product = first.value * last.value;
    const middle = (first.value + last.value) / 2;
    const kind = kindOf(first.kind);
    const useMiddle = product <= 0 || kind.scale !== 'linear';
    return { kind, value: useMiddle ? middle : Math.sign(first.value) * Math.sqrt(product) };
  }
  const only = (first ?? last)!;
  return { kind: kindOf(only.kind), value: only.value };
}

function declared(
  entry: QuantityEntry,
  nominal: Handle,
  kind: ValueKind,
  line: Line,
  kindOf: (kind: ValueKind) => ValueKind,
): (read: Read) => DeclaredSpread {
  const spread = entry.spread!;
  const common = {
    law: spread.law ?? 'uniform',
    service: spread.service,
    nominalChosen: entry.value === null,
  } as const;
  if (spread.tolerance) {
    const { tolerance } = spread;
    const relative = isRelative(tolerance);
    const wanted = kind.scale === 'celsius' ? TEMPERATURE_DIFFERENCE : kind;
    if (relative ? kind.scale !== 'linear' : !sameKind(tolerance.kind, wanted)) {
      stop(
        'tolerance-dimension',
        `The value is ${typeName(kind)} and its tolerance ${text(line, tolerance)} is ${typeName(tolerance.kind)}. Write it in the unit of the value${kind.scale === 'linear' ? ' or in %' : ''}.`,
        tolerance.span,
      );
    }
    if (tolerance.value < 0)
      stop('tolerance-sign', `A tolerance is not negative: it reaches to both sides.`, tolerance.span);
    return (read) => {
      const middle = read(nominal);
      const half = relative ? Math.abs(middle) * tolerance.value : tolerance.value;
      return { ...common, form: 'tolerance', low: middle - half, nominal: middle, high: middle + half };
    };
  }
  const { first, last } = spread.bounds!;
  for (const limit of [first, last]) {
    if (limit && !sameKind(kindOf(limit.kind), kind)) {
      stop(
        'limit-dimension',
        `The value is ${typeName(kind)} and its limit ${text(line, limit)} is ${typeName(limit.kind)}. Both are of one kind.`,
        limit.span,
      );
    }
  }
  if (entry.value !== null && isNumber(entry.value)) {
    const x = numberOf(entry.value);
    const { low, high } = openEnds(first, last, x);
    if (x < (low ?? -Infinity) || x > (high ?? Infinity)) {
      stop(
        'nominal-outside',
        `The nominal value lies outside its own limits ${line.text.slice(spread.bounds!.span.start, spread.bounds!.span.end)}.`,
        entry.value.span,
      );
    }
  }
  return (read) => {
    const middle = read(nominal);
    const ends = openEnds(first, last, middle);
    return { ...common, form: 'limits', ...ends, nominal: middle };
  };
}

/**
 * Limits in order of value. With one end open, `5 mA ..` leaves the high end open and `.. 1 nA` the low one. For negative
 * values magnitude counts, as data sheets print them, unless the nominal then lies outside.
 */
function openEnds(
  first: Literal | null,
  last: Literal | null,
  nominal: number,
): { low: number | null; high: number | null } {
  if (first && last) return { low: Math.min(first.value, last.value), high: Math.max(first.value, last.value) };
  const only = (first ?? last)!.value;
  const isLeast = first !== null;
  // Of a negative value -4 V .. means at least 4 V in magnitude; with -2 V before it, no lower than -4 V.
  const byMagnitude = nominal < 0 && (isLeast ? nominal <= only : nominal >= only);
  return isLeast !== byMagnitude ? { low: only, high: null } : { low: null, high: only };
}

function numberOf(expr: Expr): number {
  if (expr.type === 'number') return expr.value;
  if (expr.type !== 'unary') throw new Error('Not a number.');
  return expr.operator === '-' ? -numberOf(expr.operand) : numberOf(expr.operand);
}

function checkUnit(entry: QuantityEntry, kind: ValueKind): void {
  if (!entry.as) return;
  const { unit, span } = entry.as;
  const pointInKelvin = kind.scale === 'celsius' && sameKind(unit.kind, TEMPERATURE_DIFFERENCE);
  if (sameKind(unit.kind, kind) || pointInKelvin) return;
  stop(
    'unit-dimension',
    `The value is ${typeName(kind)}, and ${unit.text} measures ${typeName(unit.kind)}. Choose a unit of its own kind.`,
    span,
  );
}

function text(line: Line, literal: Literal): string {
  return line.text.slice(literal.span.start, literal.span.end);
}
