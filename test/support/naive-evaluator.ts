// A whole sheet, cell by cell, in the plainest way: each cell is worked out when it is asked for, units are carried
// along with every number, and nothing is kept between two texts. The oracle for the engine.
//
// What it knows: quantities, checks, parts by their usual routes, points, stages of one FET.

import { parseSheet, pathsOf } from '../../src/language/index.ts';
import type { CellTree, Expr, FieldTree, PathExpr, QuantityEntry, StageEntry } from '../../src/language/index.ts';
import { evaluate } from './naive-expression.ts';
import type { Resolve } from './naive-expression.ts';
import type { NaiveLeg } from './naive-network.ts';
import { naivePart } from './naive-part.ts';
import type { NaivePart } from './naive-part.ts';
import { pointResults, stageResults } from './naive-stage.ts';
import type { NaiveResults } from './naive-stage.ts';
import { Broken, KINDS, Waits, isKind, sameKinds, sure } from './naive-value.ts';
import type { NaiveKind, NaiveType, NaiveValue } from './naive-value.ts';

export interface NaiveCell {
  readonly status: 'sound' | 'broken' | 'waits';
  /** The cells of those it looks at that are broken or wait; where it waits it names one of them. */
  readonly waitsFor: ReadonlySet<string>;
  readonly value: NaiveValue | null;
  readonly offers: ReadonlyMap<string, NaiveValue>;
  readonly unsure: boolean;
}

interface Worked extends NaiveCell {
  readonly kind: CellTree['entry']['type'];
  /** null: the kind of its value, or what it offers, could not be settled. */
  readonly type: NaiveType | null;
  readonly settled: boolean;
  readonly part: NaivePart | null;
}

const REGION_NAMES = ['cutoff', 'ohmic', 'saturation'];
const CONSTANTS = new Map<string, NaiveValue>([
  ['pi', sure(KINDS.plain, Math.PI)],
  ['k_B', sure({ dimension: [1, 1, 1, -1, 0], scale: 'linear' }, 1.380649e-23)],
  ['q_e', sure({ dimension: [0, 1, 1, 0, 0], scale: 'linear' }, 1.602176634e-19)],
  ...REGION_NAMES.map((name, index): [string, NaiveValue] => [name, sure('region', index)]),
]);

/** What a stage offers, by the unit of each value; a point offers the first of the two lists. */
const DEVICE_VALUES: Readonly<Record<string, NaiveType>> = {
  I_D: KINDS.A,
  V_GS: KINDS.V,
  V_DS: KINDS.V,
  V_SB: KINDS.V,
  V_ov: KINDS.V,
  V_DSsat: KINDS.V,
  margin: KINDS.V,
  region: 'region',
  g_m: KINDS.S,
  g_ds: KINDS.S,
  g_mb: KINDS.S,
  r_o: KINDS.ohm,
  I_G: KINDS.A,
  C_gs: KINDS.F,
  C_gd: KINDS.F,
  P_D: KINDS.W,
  T_J: KINDS.degC,
  f_T: KINDS.Hz,
};
const STAGE_VALUES: Readonly<Record<string, NaiveType>> = {
  A_v: KINDS.plain,
  R_in: KINDS.ohm,
  R_out: KINDS.ohm,
  f_low: KINDS.Hz,
  f_high: KINDS.Hz,
  swing_up: KINDS.V,
  swing_down: KINDS.V,
  P_total: KINDS.W,
};

/** Evaluates the sheet `text`: every cell by its key, `R` or, where a name stands again, `R (2)`. */
export function evaluateNaively(text: string): ReadonlyMap<string, NaiveCell> {
  const { cells } = parseSheet(text);
  const first = new Map<string, CellTree>();
  for (const cell of cells) if (!first.has(cell.name.name)) first.set(cell.name.name, cell);
  const uses = new Map([...first].map(([name, cell]) => [name, usesOf(cell).filter((used) => first.has(used))]));
  const done = new Map<string, Worked>();
  const work = (name: string): Worked | null => {
    const tree = first.get(name);
    if (!tree) return null;
    if (!done.has(name)) done.set(name, isOnCircle(name, uses) ? NOTHING : workOut(tree, work));
    return done.get(name)!;
  };
  const found = new Map<string, NaiveCell>();
  const times = new Map<string, number>();
  for (const cell of cells) {
    const { name } = cell.name;
    times.set(name, (times.get(name) ?? 0) + 1);
    if (times.get(name) === 1) found.set(name, work(name)!);
    else found.set(`${name} (${times.get(name)})`, NOTHING);
  }
  return found;
}

const NOTHING: Worked = {
  status: 'broken',
  waitsFor: new Set(),
  value: null,
  offers: new Map(),
  unsure: false,
  kind: 'broken',
  type: null,
  settled: false,
  part: null,
};

function usesOf({ entry, fields }: CellTree): string[] {
  const found: (Expr | null)[] = [];
  if (entry.type === 'quantity') found.push(entry.value);
  if (entry.type === 'check') found.push(entry.condition);
  for (const { body } of fields) {
    if (body.type === 'quantity') found.push(body.value);
    if (body.type === 'driven') found.push(body.through);
    if (body.type !== 'legs') continue;
    for (const { element, place } of body.legs) found.push(element, place.type === 'expr' ? place.expr : null);
  }
  const names = found.flatMap((expr) => (expr ? pathsOf(expr).map((path) => path.names[0].name) : []));
  if (entry.type === 'point') names.push(entry.of.name, 'T_A');
  if (entry.type === 'stage') names.push(...entry.fets.map((fet) => fet.part.name), 'T_A');
  return names;
}

function isOnCircle(name: string, uses: ReadonlyMap<string, readonly string[]>): boolean {
  const reached = new Set(uses.get(name));
  for (const next of reached) for (const further of uses.get(next)!) reached.add(further);
  return reached.has(name);
}

/** What the cell in hand asks of its surroundings, and which cells it looked at. */
interface Hand {
  readonly tree: CellTree;
  readonly resolve: Resolve;
  look(name: string): Worked | null;
  /** Something is named that this kind of cell does not compute for the stage it is asked of. */
  missing(): void;
}

function workOut(tree: CellTree, work: (name: string) => Worked | null): Worked {
  const looked = new Set<string>();
  let isMissing = false;
  const look = (name: string): Worked | null => {
    looked.add(name);
    return work(name);
  };
  const hand: Hand = {
    tree,
    look,
    missing: () => void (isMissing = true),
    resolve: (path) => resolvePath(path, hand),
  };
  let result: Pick<Worked, 'type' | 'value' | 'offers' | 'part'> | null = null;
  let status: NaiveCell['status'] = 'sound';
  try {
    if (tree.entry.type === 'broken' || tree.fields.some((field) => field.body.type === 'broken')) throw new Broken();
    result = workEntry(hand);
  } catch (thrown) {
    if (thrown instanceof Broken) status = 'broken';
    else if (thrown instanceof Waits) status = 'waits';
    else throw thrown;
  }
  const sick = new Set([...looked].filter((name) => (work(name)?.status ?? 'sound') !== 'sound'));
  const settled = result !== null;
  if (status === 'sound' && sick.size > 0) status = 'waits';
  if (status === 'sound' && (isMissing || fails(result!))) status = 'broken';
  const near = result?.value?.unsure ?? false;
  return {
    status,
    waitsFor: status === 'waits' ? sick : new Set(),
    kind: tree.entry.type,
    type: result?.type ?? null,
    settled,
    part: result?.part ?? null,
    value: result?.value ?? null,
    offers: result?.offers ?? new Map(),
    unsure: near || [...looked].some((name) => work(name)?.unsure ?? false),
  };
}

/** Whether a settled cell came out as no number. */
function fails({ value, offers }: { value: NaiveValue | null; offers: ReadonlyMap<string, NaiveValue> }): boolean {
  if (value && Number.isNaN(value.value)) return true;
  // A point or stage without an operating point has no current; a part without a law has no number of its own.
  return [...offers.values()].some((offer) => Number.isNaN(offer.value));
}

function resolvePath(path: PathExpr, hand: Hand): NaiveValue {
  const [head, ...rest] = path.names.map((part) => part.name);
  if (rest.length === 0 && CONSTANTS.has(head)) return CONSTANTS.get(head)!;
  const cell = hand.look(head);
  if (!cell) throw new Broken(`no cell ${head}`);
  if (!cell.settled) throw new Waits(head);
  if (rest.length === 0) {
    if (!cell.value) throw new Broken(`${head} is no number`);
    return cell.status === 'sound' ? cell.value : { ...cell.value, value: null };
  }
  const offer = cell.offers.get(rest.join('.'));
  if (!offer) throw new Broken(`${head} does not offer ${rest.join('.')}`);
  if (Number.isNaN(offer.bound)) hand.missing();
  return cell.status === 'sound' && !Number.isNaN(offer.bound) ? offer : { ...offer, value: null, bound: 0 };
}

function workEntry(hand: Hand): Pick<Worked, 'type' | 'value' | 'offers' | 'part'> {
  const { entry, name } = hand.tree;
  const none = { type: null, value: null, offers: new Map<string, NaiveValue>(), part: null };
  switch (entry.type) {
    case 'quantity': {
      const value = quantityValue(entry, hand);
      if (name.name === 'T_A' && !(isKind(value.type) && sameKinds({ ...value.type, scale: 'linear' }, KINDS.K)))
        throw new Broken('T_A is a temperature');
      const freezing = name.name === 'T_A' && value.value !== null && !(value.value > 0);
      const type = name.name === 'T_A' ? KINDS.degC : value.type;
      return { ...none, type, value: freezing ? { ...value, type, value: NaN } : { ...value, type } };
    }
    case 'check': {
      const value = evaluate(entry.condition, hand.resolve);
      if (value.type !== 'condition') throw new Broken('a check is a condition');
      return { ...none, type: 'condition', value };
    }
    case 'part': {
      const part = naivePart(entry, hand.tree.fields, (body) => quantityValue(body, hand));
      return { ...none, offers: part.offers, part };
    }
    case 'point':
      return { ...none, offers: workPoint(hand) };
    case 'stage':
      return { ...none, offers: workStage(hand, entry) };
    default:
      throw new Error(`The naive evaluator has no ${entry.type} cells.`);
  }
}

/** The value of a quantity; where bounds stand alone, what the sheet takes for their nominal. */
function quantityValue(entry: QuantityEntry, { resolve }: Pick<Hand, 'resolve'>): NaiveValue {
  if (entry.value) {
    const value = evaluate(entry.value, resolve);
    const { as } = entry;
    if (as && isKind(value.type) && !sameKinds(as.unit.kind, value.type)) {
      const isKelvin = value.type.scale === 'celsius' && sameKinds(as.unit.kind, KINDS.K);
      if (!isKelvin) throw new Broken('a unit of another kind');
    }
    return value;
  }
  const { first, last } = entry.spread!.bounds!;
  if (!first || !last) return sure((first ?? last)!.kind, (first ?? last)!.value);
  if (!sameKinds(first.kind, last.kind)) throw new Broken('limits of different kinds');
  const product = first.value * last.value;
  const middle =
    first.kind.scale === 'linear' && product > 0
      ? Math.sign(first.value) * Math.sqrt(product)
      : (first.value + last.value) / 2;
  return sure(first.kind, middle);
}

function partOf(name: string, hand: Hand): { part: NaivePart; cell: Worked } {
  const cell = hand.look(name);
  if (!cell) throw new Broken(`no part ${name}`);
  if (!cell.settled) throw new Waits(name);
  if (!cell.part) throw new Broken(`${name} is no part`);
  return { part: cell.part, cell };
}

/** The ambient temperature in kelvin; null where T_A has no value. */
function ambient(hand: Hand): number | null {
  const cell = hand.look('T_A');
  if (!cell) return 298.15;
  if (!cell.settled) throw new Waits('T_A');
  return cell.status === 'sound' ? cell.value!.value : null;
}

function ofKind(value: NaiveValue, kind: NaiveKind): number | null {
  if (!sameKinds(value.type, kind)) throw new Broken('a value of another kind');
  return value.value;
}

/** Offers with kinds alone, for a cell that waits or has no operating point. */
function withoutNumbers(kinds: Readonly<Record<string, NaiveType>>, value: number | null): Map<string, NaiveValue> {
  return new Map(Object.entries(kinds).map(([name, type]) => [name, { type, value, bound: 0, unsure: false }]));
}

/** Numbers put into the offers; what has none is marked as missing by a bound that is NaN. */
function withNumbers(kinds: Readonly<Record<string, NaiveType>>, found: NaiveResults): Map<string, NaiveValue> {
  return new Map(
    Object.entries(kinds).map(([name, type]): [string, NaiveValue] => {
      const result = found.get(name);
      if (!result) return [name, { type, value: null, bound: NaN, unsure: false }];
      return [name, { type, value: result.value, bound: result.bound, unsure: type === 'region' && result.bound > 1 }];
    }),
  );
}

function workPoint(hand: Hand): Map<string, NaiveValue> {
  const { tree } = hand;
  if (tree.entry.type !== 'point') throw new Error('A point is wanted.');
  const { part } = partOf(tree.entry.of.name, hand);
  const given = new Map<string, number | null>();
  for (const field of tree.fields) {
    const [{ name }] = field.label;
    const kind = { V_GS: KINDS.V, V_DS: KINDS.V, V_SB: KINDS.V, I_D: KINDS.A }[name];
    if (!kind || given.has(name) || field.label.length > 1 || field.body.type !== 'quantity') throw new Broken('field');
    given.set(name, ofKind(quantityValue(field.body, hand), kind));
  }
  if (given.has('V_GS') === given.has('I_D') || !given.has('V_DS')) throw new Broken('fields of a point');
  const temperature = ambient(hand);
  if ([...given.values(), temperature, part.device].includes(null)) return withoutNumbers(DEVICE_VALUES, null);
  const held = given.has('V_GS') ? { vgs: given.get('V_GS')! } : { current: given.get('I_D')! };
  const found = pointResults(part.device!, held, given.get('V_DS')!, given.get('V_SB') ?? 0, temperature!);
  return found ? withNumbers(DEVICE_VALUES, found) : withoutNumbers(DEVICE_VALUES, NaN);
}

const TERMINALS = ['gate', 'drain', 'source', 'bulk'];
const SETTINGS = ['output', 'driven', 'midband'];

function workStage(hand: Hand, entry: StageEntry): Map<string, NaiveValue> {
  const { tree } = hand;
  if (entry.fets.length !== 1) throw new Error('The naive evaluator has stages of one FET.');
  const { part } = partOf(entry.fets[0].part.name, hand);
  const labelOf = (field: FieldTree): string => field.label.map(({ name }) => name).join('.');
  const nodes = tree.fields.map(labelOf).filter((label) => ![...TERMINALS, ...SETTINGS].includes(label));
  for (const node of nodes) if (hand.look(node) !== null) throw new Broken('a node named like a cell');
  const places = new Set([...TERMINALS, ...nodes]);
  const holes: null[] = [];
  const legs = tree.fields.flatMap((field) =>
    field.body.type === 'legs' ? field.body.legs.map((leg) => legOf(labelOf(field), leg, places, hand, holes)) : [],
  );
  let output: { plus: string; minus: string | null } | null = null;
  let driven: number | null = null;
  for (const { body } of tree.fields) {
    if (body.type === 'output') {
      const [plus, minus] = [body.plus, body.minus].map(
        (path) => path?.names.map(({ name }) => name).join('.') ?? null,
      );
      if (!places.has(plus!) || (minus && !places.has(minus))) throw new Broken('output');
      output = { plus: plus!, minus };
    }
    if (body.type === 'driven') driven = ofKind(evaluate(body.through, hand.resolve), KINDS.ohm);
  }
  const temperature = ambient(hand);
  const bulk = part.family === 'MOSFET' ? ['bulk'] : [];
  const placeKinds = Object.fromEntries(
    ['gate', 'drain', 'source', ...bulk, ...nodes].map((place) => [`V_${place}`, KINDS.V] as const),
  );
  const kinds = { ...DEVICE_VALUES, ...placeKinds, ...STAGE_VALUES };
  if (holes.length > 0 || temperature === null || !part.device) return withoutNumbers(kinds, null);
  const found = stageResults({ device: part.device, nodes, legs, output, driven, ambient: temperature });
  return found ? withNumbers(kinds, found) : withoutNumbers(kinds, NaN);
}

type SheetLeg = Extract<FieldTree['body'], { type: 'legs' }>['legs'][number];

/** A leg with its numbers; where one of them has no value a hole is noted. */
function legOf(from: string, leg: SheetLeg, places: ReadonlySet<string>, hand: Hand, holes: null[]): NaiveLeg {
  let element: NaiveLeg['element'] = null;
  if (leg.element) {
    const value = evaluate(leg.element, hand.resolve);
    const letters = { R: KINDS.ohm, C: KINDS.F, L: KINDS.H, I: KINDS.A } as const;
    const kind = (['R', 'C', 'L', 'I'] as const).find((letter) => sameKinds(letters[letter], value.type));
    if (!kind) throw new Broken('no element');
    if (value.value === null) holes.push(null);
    element = { kind, value: value.value ?? NaN };
  }
  if (leg.direction === 'from' && element?.kind !== 'I') throw new Broken('from without a current');
  return { from, element, reversed: leg.direction === 'from', to: farEnd(leg, places, hand, holes) };
}

function farEnd({ place }: SheetLeg, places: ReadonlySet<string>, hand: Hand, holes: null[]): NaiveLeg['to'] {
  if (place.type === 'signal' && !place.inverted) return 'signal';
  if (place.type !== 'expr') throw new Error('The naive evaluator has no differential drive.');
  const name = nameOf(place.expr);
  if (name !== null && places.has(name)) return { place: name };
  const volts = evaluate(place.expr, hand.resolve);
  const rail = ofKind(volts, KINDS.V);
  if (rail === null) holes.push(null);
  return { rail: rail ?? NaN, label: JSON.stringify(bare(place.expr)) };
}

function nameOf(expr: Expr): string | null {
  return expr.type === 'path' ? expr.names.map(({ name }) => name).join('.') : null;
}

/** An expression without its spans: two rails are one where they are the same expression. */
function bare(expr: unknown): unknown {
  if (Array.isArray(expr)) return expr.map(bare);
  if (typeof expr !== 'object' || expr === null) return expr;
  return Object.fromEntries(
    Object.entries(expr).flatMap(([key, value]) => (/[sS]pan$|^unit$/.test(key) ? [] : [[key, bare(value)]])),
  );
}
