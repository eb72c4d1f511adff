// The network of a one-FET stage at rest: what is wrong with it, and how every node voltage follows from the
// channel current I (true frame, drain to source) and the gate leakage I_G (out of the gate, drawn from the drain):
//   V = V0 + r I + q I_G for every class of places; V_GS = V_GG - R_m I, V_DS = V_L - R_L I, V_SB = V_SB0 + R_b I.
// R_m, R_L and R_b are taken with the source as reference wherever drain, gate or bulk hang together with it: then
// they too come without a subtraction, and 0 <= R_m <= R_L, 0 <= R_b <= R_L as the maximum principle has it.
// An island is a component without any path to a held class. One that holds the drain or the source alone and is
// fed by current sources forces the channel current; its voltages then count from that terminal.

import type { Emitter } from './emitter.ts';
import { solveNetwork } from './elimination.ts';
import type { Column } from './elimination.ts';
import { terminalName } from './place-graph.ts';
import type { PlaceGraph } from './place-graph.ts';
import type { NetFet } from './stage-net.ts';
import { ONE, minus, negate, plus, term } from './term.ts';
import type { Term } from './term.ts';

/** Classes of a FET's terminals. */
export interface Terminals {
  readonly gate: number;
  readonly drain: number;
  readonly source: number;
  readonly bulk: number;
}

/** A component of free classes that hangs together by resistors. */
export interface Component {
  readonly classes: ReadonlySet<number>;
  /** A resistor leads from it to a class that is held. */
  readonly anchored: boolean;
}

/** Node voltages by class: `atRest` in V, `perChannel` and `perLeakage` in ohm. */
interface RestVoltages {
  readonly atRest: readonly Term[];
  readonly perChannel: readonly Term[];
  readonly perLeakage: readonly Term[];
}

/** The resistances of the bias line, the load line and the source against the bulk. */
interface LineResistances {
  readonly R_m: Term;
  readonly R_L: Term;
  readonly R_b: Term;
}

/** The classes in which a FET's terminals lie; a JFET's bulk counts as its source. */
export function terminalsOf(graph: PlaceGraph, fet: NetFet): Terminals {
  const at = (terminal: string): number => graph.classOf.get(terminalName(fet, terminal))!;
  return {
    gate: at('gate'),
    drain: at('drain'),
    source: at('source'),
    bulk: fet.family === 'MOSFET' ? at('bulk') : at('source'),
  };
}

/** The components of the free classes, in order of their first class. */
export function componentsOf(graph: PlaceGraph): Component[] {
  const isHeld = (c: number): boolean => graph.holders[c].length > 0;
  const seen = new Set<number>();
  const components: Component[] = [];
  for (let first = 0; first < graph.size; first++) {
    if (isHeld(first) || seen.has(first)) continue;
    const classes = new Set([first]);
    let anchored = false;
    for (const c of classes) {
      for (const { a, b } of graph.branches) {
        if (a !== c && b !== c) continue;
        const other = a === c ? b : a;
        if (isHeld(other)) anchored = true;
        else classes.add(other);
      }
    }
    for (const c of classes) seen.add(c);
    components.push({ classes, anchored });
  }
  return components;
}

/** Voltages of all classes for rails and sources, 1 A of channel current, and 1 A of gate leakage; `datum` (or -1) counts as held at 0 V. */
export function restVoltages(
  e: Emitter,
  graph: PlaceGraph,
  at: Terminals,
  datum: number,
  leaks: boolean,
): RestVoltages {
  const held = new Map<number, Term>();
  graph.holders.forEach(([holder], c) => {
    if (holder) held.set(c, holder.volts === null ? null : term(holder.volts));
  });
  const driven = new Map<number, Term>();
  for (const { from, to, amps } of graph.drives) {
    driven.set(from, minus(e, driven.get(from) ?? null, term(amps)));
    driven.set(to, plus(e, driven.get(to) ?? null, term(amps)));
  }
  const columns: Column[] = [
    { held, injected: driven },
    { held: new Map(), injected: currentBetween(at.drain, at.source) },
  ];
  if (leaks) columns.push({ held: new Map(), injected: currentBetween(at.drain, at.gate) });
  const isHeld = (c: number): boolean => graph.holders[c].length > 0 || c === datum;
  const [atRest, perChannel, perLeakage] = solveNetwork(e, graph.size, isHeld, graph.branches, columns);
  return { atRest, perChannel, perLeakage: perLeakage ?? atRest.map(() => null) };
}

/** R_m, R_L, R_b of a stage whose drain and source both have a path to a held class. */
export function lineResistances(
  e: Emitter,
  graph: PlaceGraph,
  at: Terminals,
  components: readonly Component[],
  perChannel: readonly Term[],
): LineResistances {
  const home = components.find(({ classes }) => classes.has(at.source));
  const others = [at.drain, at.gate, at.bulk].filter((c) => c !== at.source);
  if (!home || !others.some((c) => home.classes.has(c))) {
    const against = (c: number): Term => (c === at.source ? null : minus(e, perChannel[at.source], perChannel[c]));
    return { R_m: against(at.gate), R_L: against(at.drain), R_b: against(at.bulk) };
  }
  // The held classes become one node, which is free, and the source is held instead.
  const ground = graph.size;
  const node = (c: number): number => (graph.holders[c].length > 0 ? ground : c);
  const injected = at.drain === at.source ? new Map<number, Term>() : new Map([[node(at.drain), ONE]]);
  const resistors = graph.branches.map(({ a, b, ohms }) => ({ a: node(a), b: node(b), ohms }));
  const [volts] = solveNetwork(e, graph.size + 1, (c) => c === at.source, resistors, [{ held: new Map(), injected }]);
  return { R_m: volts[node(at.gate)], R_L: volts[node(at.drain)], R_b: volts[node(at.bulk)] };
}

/** 1 A drawn from one class and given to another. */
function currentBetween(from: number, to: number): Map<number, Term> {
  if (from === to) return new Map();
  return new Map([
    [from, negate(ONE)],
    [to, ONE],
  ]);
}
