// Finding what a path names: a constant, a region, a cell's value, a value that a cell offers.

import { nearestNames } from '../language/index.ts';
import type { Expr, Line, Message, PathExpr, Span } from '../language/index.ts';
import { REGIONS } from '../network/index.ts';
import type { Builder } from '../program/index.ts';
import { PLAIN, TEMPERATURE_POINT, linearKind } from '../quantity/index.ts';
import { DEFAULT_AMBIENT } from './ambient.ts';
import type { Interface } from './interface.ts';
import type { CellKind, ValueType } from './model.ts';
import { compileExpression } from './expression.ts';
import type { Restating, Setting } from './restate.ts';
import type { Scope, Typed } from './scope.ts';
import { stop } from './stop.ts';
import { isOwnState } from './workings.ts';

/** Thrown while compiling when a cell that is used has no settled type; caught where the cell is compiled. */
export class Waiting extends Error {
  constructor(readonly cell: string) {
    super(cell);
  }
}

interface Lookup {
  look(name: string): Interface | null;
  names(): readonly string[];
  later(message: Message): void;
  readonly end?: Scope['end'];
  /** For values in another state. */
  readonly restating?: Restating;
  /** What a part of the expression is known to be already. */
  readonly known?: (expr: Expr) => Typed | null;
  /** Told of each part that no other place can compute again: ends, choices, values in another state. */
  readonly keep?: (expr: Expr, typed: Typed) => void;
  /** Stops where a path names no input. */
  readonly checkInput?: (path: PathExpr) => void;
}

/** Constants of the language: exact SI values since 2019 (Boltzmann constant, elementary charge). */
const CONSTANTS: ReadonlyMap<string, { type: ValueType; value: number }> = new Map([
  ['pi', { type: PLAIN, value: Math.PI }],
  ['k_B', { type: linearKind([1, 1, 1, -1, 0]), value: 1.380649e-23 }],
  ['q_e', { type: linearKind([0, 1, 1, 0, 0]), value: 1.602176634e-19 }],
]);

/** A scope for expressions of one line. */
export function createScope(builder: Builder, line: Pick<Line, 'text'>, lookup: Lookup): Scope {
  const later = (what: string, span: Span): void =>
    lookup.later({ code: 'not-computed-yet', text: `${what} is not computed yet.`, span });
  const { restating } = lookup;
  const inState = (settings: readonly Setting[]): Scope => ({
    ...plain,
    resolve(path) {
      const resolved = plain.resolve(path);
      return settings.length === 0 ? resolved : restating!.restate(path, resolved, settings);
    },
    restated: restating
      ? (path, handle) => {
          const setting = restating.setting(path, handle);
          if (setting === null) lookup.checkInput?.(path);
          return setting === null ? inState(settings) : inState([...settings, setting]);
        }
      : null,
  });
  const plain: Omit<Scope, 'restated'> = {
    builder,
    text: line.text,
    compile(expr) {
      const known = lookup.known?.(expr);
      if (known) return known;
      const compiled = compileExpression(expr, this as Scope);
      if (isOwnState(expr)) lookup.keep?.(expr, compiled);
      return compiled;
    },
    later,
    end: lookup.end ?? null,
    resolve: (path) => resolve(path, builder, line.text, lookup),
    stageOf(path) {
      const { name, span } = path.names[0]!;
      const cell = find(path, line.text, lookup);
      if (cell.kind !== 'stage')
        stop('stage-expected', `${name} is ${kindName(cell.kind)}; a stage is wanted here.`, span);
      return name;
    },
  };
  return inState([]);
}

/** "a stage", "a quantity", with its article. */
export function kindName(kind: CellKind): string {
  switch (kind) {
    case 'another':
    case 'inverse':
      return `an ${kind === 'another' ? 'other piece' : 'inverse cell'}`;
    case 'broken':
      return 'a broken line';
    default:
      return `a ${kind}`;
  }
}

function resolve(path: PathExpr, builder: Builder, text: string, lookup: Lookup): Typed {
  const [first, ...rest] = path.names;
  if (rest.length === 0) {
    const constant = CONSTANTS.get(first!.name);
    if (constant) return { type: constant.type, handle: builder.constant(constant.value) };
    const region = (REGIONS as readonly string[]).indexOf(first!.name);
    if (region >= 0) return { type: 'region', handle: builder.constant(region) };
    if (first!.name === 'T_A' && !lookup.look('T_A'))
      return { type: TEMPERATURE_POINT, handle: builder.constant(DEFAULT_AMBIENT) };
  }
  const cell = find(path, text, lookup);
  if (rest.length === 0) {
    if (cell.type !== null) return { type: cell.type, handle: cell.slot };
    const example = cell.offers.keys().next().value;
    stop(
      'value-not-named',
      `${first!.name} is ${kindName(cell.kind)}, not a number.${example ? ` Name one of its values, such as ${first!.name}.${example}.` : ''}`,
      path.span,
    );
  }
  const name = rest.map((part) => part.name).join('.');
  const offer = cell.offers.get(name);
  if (!offer) {
    const span = { start: rest[0]!.span.start, end: rest[rest.length - 1]!.span.end };
    if (cell.offers.size === 0)
      stop('offers-nothing', `${first!.name} is ${kindName(cell.kind)} and offers no further values.`, span);
    const near = nearestNames(name, [...cell.offers.keys()]);
    const hint =
      near.length > 0
        ? ` Did you mean ${near.join(' or ')}?`
        : ` It offers ${[...cell.offers.keys()].slice(0, 6).join(', ')} and others.`;
    stop('unknown-value', `${first!.name} offers no value ${name}.${hint}`, span);
  }
  if (offer.slot < 0) {
    const reason = offer.missing?.text ?? 'It is not computed yet.';
    const text = `${first!.name}.${name} has no value here. ${reason}`;
    lookup.later({ code: offer.missing?.code ?? 'not-computed-yet', text, span: path.span });
    return { type: offer.type, handle: builder.constant(NaN) };
  }
  return { type: offer.type, handle: offer.slot };
}

function find(path: PathExpr, text: string, lookup: Lookup): Interface {
  const { name, span } = path.names[0]!;
  const cell = lookup.look(name);
  if (!cell) {
    stop('unknown-name', `There is no cell ${name}.${hintFor(name, text.slice(0, span.start), lookup)}`, span);
  }
  if (!cell.settled) throw new Waiting(name);
  return cell;
}

/** What other books and other cases call a region. */
const REGION_WORDS: ReadonlyMap<string, string> = new Map([
  ...REGIONS.map((region) => [region, region] as const),
  ['off', 'cutoff'],
  ['triode', 'ohmic'],
  ['linear', 'ohmic'],
  ['active', 'saturation'],
  ['saturated', 'saturation'],
]);

/** What was probably meant by a name that no cell bears; `before` is the line up to it. */
function hintFor(name: string, before: string, lookup: Lookup): string {
  const region = REGION_WORDS.get(name.toLowerCase());
  if (region) return ` The regions are ${REGIONS.join(', ')}; ${name} is written ${region}.`;
  if (/\/\/\s*$/.test(before)) return ` If it is a remark, write ; ${name}.`;
  const near = nearestNames(name, lookup.names());
  return near.length > 0 ? ` Did you mean ${near.join(' or ')}?` : '';
}
