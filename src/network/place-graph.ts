// A stage as a graph, at rest or at midband: places that are one piece of wire become one class, and between the
// classes lie resistors and current sources. At rest an inductor is a wire and a capacitor is nothing; at midband
// a capacitor of 1 nF and more is a wire, and all else that stores energy, and every current source, is nothing.

import type { Handle } from './emitter.ts';
import type { NetLeg, PlaceRef, StageNet } from './stage-net.ts';

/** Capacitors from this nominal value on (F) are shorts at midband. */
export const MIDBAND_SHORT = 1e-9;

/** What holds a class at a voltage: a rail, the test source or another drive. */
interface Holder {
  readonly type: 'rail' | 'signal' | 'inverted signal' | 'common';
  /** Voltage at rest; null is 0 V. */
  readonly volts: Handle | null;
  readonly label: string;
  /** The leg that brought it to the class. */
  readonly leg: number;
}

/** A resistor between two classes. */
interface Branch {
  readonly a: number;
  readonly b: number;
  readonly ohms: Handle;
  readonly leg: NetLeg;
}

/** An ideal current from one class to another. */
interface Drive {
  readonly from: number;
  readonly to: number;
  readonly amps: Handle;
  readonly leg: NetLeg;
}

export interface PlaceGraph {
  readonly size: number;
  /** Class of a named place; undefined where there is no such place. */
  readonly classOf: ReadonlyMap<string, number>;
  /** Names of the places of each class, for messages. */
  readonly names: readonly (readonly string[])[];
  /** What holds each class; empty where its voltage is unknown. */
  readonly holders: readonly (readonly Holder[])[];
  readonly branches: readonly Branch[];
  readonly drives: readonly Drive[];
}

interface GraphOptions {
  readonly at: 'rest' | 'midband';
  /** Leaves out what the line of `load` hangs between it and a rail; what ties it to the stage stays. */
  readonly withoutLoad: boolean;
}

/** The name of a FET's terminal as a place: `gate`, or `Qa.gate`. */
export function terminalName(fet: { readonly name: string | null }, terminal: string): string {
  return fet.name === null ? terminal : `${fet.name}.${terminal}`;
}

/** Builds the graph of a stage; every terminal and named node is a place of it, whether anything hangs there or not. */
export function buildGraph(net: StageNet, options: GraphOptions): PlaceGraph {
  const parents: number[] = [];
  const places = new Map<string, number>();
  const holderAt = new Map<number, Holder>();
  const fresh = (): number => parents.push(parents.length) - 1;
  const find = (n: number): number => {
    while (parents[n] !== n) n = parents[n] = parents[parents[n]];
    return n;
  };
  const place = (name: string): number => {
    const known = places.get(name);
    if (known !== undefined) return known;
    const made = fresh();
    places.set(name, made);
    return made;
  };
  const held = new Map<string, number>();
  const hold = (ref: Exclude<PlaceRef, { type: 'node' }>, leg: number): number => {
    const holder = holderOf(ref, leg);
    // One rail may be written twice: the same value, or the same words.
    const keys = [`${holder.type} ${holder.volts ?? ''}`, `${holder.type} "${holder.label}"`];
    const known = held.get(keys[0]) ?? held.get(keys[1]);
    if (known !== undefined) return known;
    const made = fresh();
    for (const key of keys) held.set(key, made);
    holderAt.set(made, holder);
    return made;
  };

  for (const fet of net.fets) {
    const bulk = fet.family === 'MOSFET' ? ['bulk'] : [];
    for (const terminal of ['gate', 'drain', 'source', ...bulk]) place(terminalName(fet, terminal));
  }
  for (const name of net.nodes) place(name);

  const open: { leg: NetLeg; a: number; b: number }[] = [];
  const bulks = new Set(net.fets.map((fet) => terminalName(fet, 'bulk')));
  const bulkTied = new Set<string>();
  for (const leg of net.legs) {
    if (options.withoutLoad && leg.from === 'load' && leg.to.type !== 'node') continue;
    const a = place(leg.from);
    const b = leg.to.type === 'node' ? place(leg.to.name) : hold(leg.to, leg.leg);
    if (bulks.has(leg.from)) bulkTied.add(leg.from);
    if (leg.to.type === 'node' && bulks.has(leg.to.name)) bulkTied.add(leg.to.name);
    if (isWire(leg, options.at)) parents[find(a)] = find(b);
    else open.push({ leg, a, b });
  }
  for (const fet of net.fets) {
    const bulk = terminalName(fet, 'bulk');
    if (fet.family === 'MOSFET' && !bulkTied.has(bulk))
      parents[find(place(bulk))] = find(place(terminalName(fet, 'source')));
  }

  const numberOf = new Map<number, number>();
  const classAt = (n: number): number => {
    const root = find(n);
    if (!numberOf.has(root)) numberOf.set(root, numberOf.size);
    return numberOf.get(root)!;
  };
  const classOf = new Map<string, number>();
  for (const [name, n] of places) classOf.set(name, classAt(n));
  const heldClasses = [...holderAt].map(([n, holder]) => [classAt(n), holder] as const);
  const branches: Branch[] = [];
  const drives: Drive[] = [];
  for (const { leg, a, b } of open) {
    const [ca, cb] = [classAt(a), classAt(b)];
    if (ca === cb) continue;
    if (leg.element?.kind === 'resistor') branches.push({ a: ca, b: cb, ohms: leg.element.value, leg });
    if (leg.element?.kind === 'source' && options.at === 'rest') {
      drives.push({ from: leg.reversed ? cb : ca, to: leg.reversed ? ca : cb, amps: leg.element.value, leg });
    }
  }
  const names: string[][] = Array.from({ length: numberOf.size }, () => []);
  for (const [name, c] of classOf) names[c].push(name);
  const holders: Holder[][] = Array.from({ length: numberOf.size }, () => []);
  for (const [c, holder] of heldClasses) holders[c].push(holder);
  return { size: numberOf.size, classOf, names, holders, branches, drives };
}

function isWire(leg: NetLeg, at: 'rest' | 'midband'): boolean {
  if (!leg.element) return true;
  if (at === 'rest') return leg.element.kind === 'inductor';
  return leg.element.kind === 'capacitor' && leg.element.nominal >= MIDBAND_SHORT;
}

function holderOf(ref: Exclude<PlaceRef, { type: 'node' }>, leg: number): Holder {
  if (ref.type === 'rail') return { type: 'rail', volts: ref.volts, label: ref.label, leg };
  if (ref.type === 'common') return { type: 'common', volts: null, label: 'common', leg };
  if (ref.inverted) return { type: 'inverted signal', volts: null, label: '-signal', leg };
  return { type: 'signal', volts: null, label: 'signal', leg };
}
