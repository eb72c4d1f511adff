// Compiles one cell: from its tree to a segment of the program, an interface for its users, and what
// the readings need. What the user wrote wrongly comes back as a fault, never as an exception.

import type { CellTree, Expr, Line, Message } from '../language/index.ts';
import { createBuilder } from '../program/index.ts';
import type { Segment } from '../program/index.ts';
import type { Handle } from '../network/index.ts';
import { DEFAULT_AMBIENT } from './ambient.ts';
import type { AskedSlots, CompiledCell } from './compiled-cell.ts';
import { CELL_KINDS } from './cell-kinds.ts';
import type { Course } from './course.ts';
import type { AskDraft, CellContext, Draft, Placed } from './draft.ts';
import { EMPTY_DRAFT } from './draft.ts';
import type { Interface, Offer } from './interface.ts';
import { KERNELS } from './kernels.ts';
import { checkInput } from './input-of.ts';
import type { ValueType } from './model.ts';
import { Waiting, createScope } from './resolve.ts';
import { createRestating } from './restate.ts';
import type { Restating } from './restate.ts';
import type { EndName, Typed } from './scope.ts';
import { Stop } from './stop.ts';

interface Surroundings {
  look(name: string): Interface | null;
  /** The same array as long as the names are the same. */
  names(): readonly string[];
  treeOf(name: string): CellTree | null;
  /** The same array as long as the inputs have the same names. */
  inputs(): readonly string[];
  has(name: string): boolean;
  /** The present value of an expression, computed on the side. */
  now(
    expr: Expr,
    line: Line,
    known: (expr: Expr) => { type: ValueType; value: number } | null,
  ): { type: ValueType; value: number };
  /** A slot as it stands. */
  read(slot: number): number;
  /** The compiled cells, for values in another state. */
  course(): Course;
  /** Whether ends of values can be computed. */
  readonly hasEnds: boolean;
  /** A block of slots for the cell: its present one where that is wide enough. */
  allocate(size: number): number;
}

/** Compiles the cell that `tree` describes. */
export function compileCell(tree: CellTree, surroundings: Surroundings): CompiledCell {
  const builder = createBuilder(KERNELS);
  const seen = new Map<string, Interface | null>();
  const presence = new Map<string, boolean>();
  const copied = new Map<string, CellTree | null>();
  const ends: { which: EndName; of: Handle; into: Handle }[] = [];
  let proposedFrom: readonly string[] | null = null;
  let proposedInputs: readonly string[] | null = null;
  let restsOnValues = false;
  let later: Placed | null = null;
  const names = (): readonly string[] => (proposedFrom = surroundings.names());
  const look = (name: string): Interface | null => {
    const found = surroundings.look(name);
    seen.set(name, found);
    return found;
  };
  const end = (which: EndName, of: Handle): Handle => {
    const own = builder.own(of);
    const present = ends.find((each) => each.which === which && each.of === own);
    if (present) return present.into;
    const into = builder.input(NaN);
    ends.push({ which, of: own, into });
    return into;
  };
  const kept = new Map<Expr, Typed>();
  let place: ((handle: Handle) => number) | null = null;
  const restating = createRestating(builder, surroundings.course);
  const note = (message: Message, line: Line): void => {
    later ??= { message, line };
  };
  const context: CellContext = {
    tree,
    builder,
    look,
    names,
    inputs: () => (proposedInputs = surroundings.inputs()),
    has(name) {
      presence.set(name, surroundings.has(name));
      return presence.get(name)!;
    },
    treeOf(name) {
      copied.set(name, surroundings.treeOf(name));
      return copied.get(name)!;
    },
    now(expr, line) {
      restsOnValues = true;
      const known = (part: Expr): { type: ValueType; value: number } | null => {
        const own = kept.get(part);
        return own && place ? { type: own.type, value: surroundings.read(place(own.handle)) } : null;
      };
      return known(expr) ?? surroundings.now(expr, line, known);
    },
    scope: (line) =>
      createScope(builder, line, {
        look,
        names,
        later: (message) => note(message, line),
        restating,
        keep: (expr, typed) => kept.set(expr, typed),
        checkInput: (path) => checkInput(path, context),
        ...(surroundings.hasEnds ? { end } : {}),
      }),
    later: (what, span, line) => note({ code: 'not-computed-yet', text: `${what} is not computed yet.`, span }, line),
    ambient() {
      const cell = look('T_A');
      if (cell && !cell.settled) throw new Waiting('T_A');
      return cell && cell.type !== null ? cell.slot : builder.constant(DEFAULT_AMBIENT);
    },
  };

  let draft = EMPTY_DRAFT;
  let fault: Placed | null = brokenPart(tree);
  let waitsFor: string | null = null;
  if (!fault) {
    try {
      draft = CELL_KINDS[tree.entry.type as keyof typeof CELL_KINDS](context);
    } catch (thrown) {
      if (thrown instanceof Stop) fault = { message: thrown.fault, line: thrown.line ?? tree.line };
      else if (thrown instanceof Waiting) waitsFor = thrown.cell;
      else throw thrown;
    }
  }
  if (restating.taken().size > 0) draft = { ...draft, verify: inEveryState(draft.verify, restating, tree) };
  const failed = fault !== null || waitsFor !== null;
  const value = failed || draft.value === null ? null : builder.own(draft.value);
  const offers = draft.offers.map((offer) => ({
    ...offer,
    handle: failed || offer.handle === null ? null : builder.own(offer.handle),
  }));
  const { segment, slot } = failed
    ? emptySegment()
    : builder.finish(surroundings.allocate(builder.size()), value, readByOthers(offers, draft.extra));
  place = slot;
  const cellInterface: Interface = {
    kind: tree.entry.type,
    type: draft.type,
    slot: value === null ? -1 : slot(value),
    offers: new Map(
      offers.map((offer): [string, Offer] => [
        offer.name,
        {
          type: offer.type,
          slot: offer.handle === null ? -1 : slot(offer.handle),
          missing: offer.missing,
          isInput: offer.isInput ?? false,
        },
      ]),
    ),
    extra: draft.extra && relocate(draft.extra, slot),
    bench: draft.bench?.measured ?? null,
    isInput: draft.isInput,
    toleranced: draft.spread !== null,
    settled: !failed,
  };
  return {
    draft,
    segment,
    slot,
    interface: cellInterface,
    fault,
    later,
    waitsFor,
    seen,
    proposedFrom,
    proposedInputs,
    presence,
    copied,
    ends: failed ? [] : ends.map(({ which, of, into }) => ({ which, of: slot(of), into: slot(into) })),
    asks: failed || draft.asks === null ? null : askedSlots(draft.asks, slot),
    taken: restating.taken(),
    restsOnValues,
    shape: draft.shape?.() ?? null,
  };
}

/** What is wrong in another state of the sheet is said of the cell that looks there, before what comes of it. */
function inEveryState(verify: Draft['verify'], restating: Restating, { line, entry }: CellTree): Draft['verify'] {
  return (read) => {
    const fault = restating.fault(read);
    if (!fault) return verify?.(read) ?? null;
    const { code, text } = fault.message;
    return { line, message: { code, text: `In the state that is asked for: ${text}`, span: entry.span } };
  };
}

/** A broken entry, or the first broken field, breaks the whole cell. */
function brokenPart(tree: CellTree): Placed | null {
  if (tree.entry.type === 'broken') return { message: tree.entry.message, line: tree.line };
  for (const field of tree.fields)
    if (field.body.type === 'broken') return { message: field.body.message, line: field.line };
  return null;
}

/** Every handle that users of the cell may read beside its value. */
function readByOthers(offers: readonly { readonly handle: Handle | null }[], extra: Draft['extra']): Handle[] {
  const device = extra ? [...Object.values(extra.device), ...Object.values(extra.limits)] : [];
  return [...offers.map(({ handle }) => handle), ...device].filter((handle) => handle !== null);
}

function emptySegment(): { segment: Segment; slot: (handle: Handle) => number } {
  const none = new Int32Array(0);
  const segment = {
    base: 0,
    size: 0,
    visible: 0,
    ops: none,
    args: none,
    constantSlots: none,
    constantValues: new Float64Array(0),
  };
  return { segment, slot: (handle) => handle };
}

function askedSlots(asks: AskDraft, slot: (handle: Handle) => number): AskedSlots {
  const { cell, each } = asks;
  const [input, residual, low, high, held, answer] = (
    ['input', 'residual', 'low', 'high', 'held', 'answer'] as const
  ).map((name) => slot(asks[name]));
  return { cell, each, input: input!, residual: residual!, low: low!, high: high!, held: held!, answer: answer! };
}

function relocate(extra: NonNullable<Interface['extra']>, slot: (handle: Handle) => number): Interface['extra'] {
  const at = <T extends object>(handles: T): T =>
    Object.fromEntries(
      Object.entries(handles).map(([name, handle]) => [name, handle === null ? null : slot(handle as Handle)]),
    ) as T;
  return { ...extra, device: at(extra.device), limits: at(extra.limits) };
}
