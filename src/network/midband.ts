// Small signals of a one-FET stage at midband: gain, input and output resistance in closed form.
//
// The network gives, per volt of the test source, per ampere of channel current i (drain to source) and per ampere
// pushed into the output, the voltages that the FET sees; the FET gives i = g_m v_gs + g_ds v_ds - g_mb v_sb. So
//   i = (g_m a_gs + g_ds a_ds - g_mb a_sb) / (1 + g_m r_gs + g_ds r_ds + g_mb r_sb),
// whose denominator is never below 1 in the forward direction.
// Where drain or source is fed by nothing that carries a signal (an ideal current source, an inductor) no i can flow
// but what is pushed in there; then the voltage P of that island is the unknown:
//   P = (i - g_m c_gs - g_ds c_ds + g_mb c_sb) / (g_m alpha + g_ds delta - g_mb sigma).

import type { Emitter, Handle } from './emitter.ts';
import { solveNetwork } from './elimination.ts';
import type { Column } from './elimination.ts';
import { buildGraph } from './place-graph.ts';
import type { PlaceGraph } from './place-graph.ts';
import { componentsOf, lineResistances, terminalsOf } from './rest-network.ts';
import type { Component, Terminals } from './rest-network.ts';
import type { StageNet } from './stage-net.ts';
import { ONE, emit, minus, negate, over, plus, term, times } from './term.ts';
import type { Term } from './term.ts';

/** Slopes of the FET at its terminals, in siemens. */
export interface Slopes {
  readonly g_m: Term;
  readonly g_ds: Term;
  readonly g_mb: Term;
}

/** What the FET and the output see of an excitation: v_gs, v_ds, v_sb, v_out. */
export interface PortVoltages {
  readonly gs: Term;
  readonly ds: Term;
  readonly sb: Term;
  readonly out: Term;
}

/** The network of one graph around the FET. */
export interface MidbandNetwork {
  /** Per volt of the test source. */
  readonly perSignal: PortVoltages;
  /** Per ampere pushed into the output. */
  readonly perPush: PortVoltages;
  /** v_gs = - r_gs i, v_ds = - r_ds i, v_sb = + r_sb i, v_out = - r_out i; with an island, minus the move per volt of P. */
  readonly perCurrent: PortVoltages;
  /** The channel current that 1 A pushed into the output forces, where an island leaves no other way; else null. */
  readonly island: { readonly forced: Term } | null;
  /** The island holds the drain. */
  readonly atDrain: boolean;
  /** Voltages of all classes per volt of the test source, per ampere of i, and the classes that move with P. */
  readonly classes: {
    readonly perSignal: readonly Term[];
    readonly perCurrent: readonly Term[];
    readonly withP: ReadonlySet<number>;
  };
  readonly graph: PlaceGraph;
  readonly at: Terminals;
}

/** Why a stage has no small-signal values at midband, as a sentence; or its network, with the load and without. */
export function midbandNetworks(
  e: Emitter,
  net: StageNet,
): { readonly loaded: MidbandNetwork | string; readonly unloaded: MidbandNetwork | string } {
  const loaded = networkOf(e, net, buildGraph(net, { at: 'midband', withoutLoad: false }));
  const hangs = net.legs.some(({ from, to }) => from === 'load' && to.type !== 'node');
  const unloaded = hangs ? networkOf(e, net, buildGraph(net, { at: 'midband', withoutLoad: true })) : loaded;
  return { loaded, unloaded };
}

function networkOf(e: Emitter, net: StageNet, graph: PlaceGraph): MidbandNetwork | string {
  for (const holders of graph.holders) {
    const types = new Set(holders.map(({ type }) => type));
    if (types.has('inverted signal') || types.has('common')) return 'Differential drive is not computed yet.';
    if (types.has('signal') && types.size > 1) {
      const other = holders.find(({ type }) => type !== 'signal')!;
      return `signal is shorted to ${other.label} at midband. Put a resistor between them.`;
    }
  }
  const at = terminalsOf(graph, net.fets[0]);
  const components = componentsOf(graph);
  const homeOf = (c: number): Component | undefined => components.find(({ classes }) => classes.has(c));
  const isFree = (c: number): boolean => homeOf(c)?.anchored === false;
  if (isFree(at.drain) && isFree(at.source))
    return 'At midband neither drain nor source has a path for a signal current.';
  const island = isFree(at.drain) ? homeOf(at.drain)! : isFree(at.source) ? homeOf(at.source)! : null;
  const plusClass = net.output ? (graph.classOf.get(net.output.plus) ?? -1) : -1;
  const minusClass = net.output?.minus ? (graph.classOf.get(net.output.minus) ?? -1) : -1;
  const named: readonly (readonly [string, number])[] = [
    ['gate', at.gate],
    ['bulk', at.bulk],
    [net.output?.plus ?? '', plusClass],
    [net.output?.minus ?? '', minusClass],
  ];
  for (const [name, c] of named) {
    if (c >= 0 && isFree(c) && homeOf(c) !== island)
      return `At midband ${name} hangs on nothing that carries a signal.`;
  }

  const datum = island ? (isFree(at.drain) ? at.drain : at.source) : -1;
  const isHeld = (c: number): boolean => graph.holders[c].length > 0 || c === datum;
  const held = new Map<number, Term>();
  graph.holders.forEach((holders, c) => {
    if (holders.some(({ type }) => type === 'signal')) held.set(c, ONE);
  });
  const between = (from: number, to: number): Column => {
    const injected = new Map<number, Term>();
    if (from === to) return { held: new Map(), injected };
    if (from >= 0) injected.set(from, negate(ONE));
    if (to >= 0) injected.set(to, ONE);
    return { held: new Map(), injected };
  };
  const columns: Column[] = [{ held, injected: new Map() }, between(at.drain, at.source)];
  if (plusClass >= 0) columns.push(between(minusClass, plusClass));
  const [perSignal, perAmpere, pushed] = solveNetwork(e, graph.size, isHeld, graph.branches, columns);
  const volts = (column: readonly Term[]): PortVoltages => ({
    gs: minus(e, column[at.gate], column[at.source]),
    ds: minus(e, column[at.drain], column[at.source]),
    sb: minus(e, column[at.source], column[at.bulk]),
    out: minus(e, plusClass < 0 ? null : column[plusClass], minusClass < 0 ? null : column[minusClass]),
  });
  const none: PortVoltages = { gs: null, ds: null, sb: null, out: null };
  const withP = island?.classes ?? new Set<number>();
  const moves = (x: number, y: number): Term => {
    if (withP.has(x) === withP.has(y)) return null;
    return withP.has(x) ? ONE : negate(ONE);
  };
  let perCurrent: PortVoltages;
  if (island) {
    perCurrent = {
      gs: negate(moves(at.gate, at.source)),
      ds: negate(moves(at.drain, at.source)),
      sb: moves(at.source, at.bulk),
      out: negate(moves(plusClass, minusClass)),
    };
  } else {
    const { R_m, R_L, R_b } = lineResistances(e, graph, at, components, perAmpere);
    perCurrent = { gs: R_m, ds: R_L, sb: R_b, out: negate(volts(perAmpere).out) };
  }
  const push = pushed ? volts(pushed) : none;
  if (!island)
    return {
      perSignal: volts(perSignal),
      perPush: push,
      perCurrent,
      island: null,
      atDrain: false,
      classes: { perSignal, perCurrent: perAmpere, withP },
      graph,
      at,
    };
  // What is pushed into the island leaves through the channel: from the drain, or against it from the source.
  const pushedIn = moves(plusClass, minusClass);
  const forced = datum === at.drain ? pushedIn : negate(pushedIn);
  const forcedVolts = volts(perAmpere);
  const corrected: PortVoltages = {
    gs: plus(e, push.gs, times(e, forced, forcedVolts.gs)),
    ds: plus(e, push.ds, times(e, forced, forcedVolts.ds)),
    sb: plus(e, push.sb, times(e, forced, forcedVolts.sb)),
    out: plus(e, push.out, times(e, forced, forcedVolts.out)),
  };
  return {
    perSignal: volts(perSignal),
    perPush: corrected,
    perCurrent,
    island: { forced },
    atDrain: datum === at.drain,
    classes: { perSignal, perCurrent: perAmpere, withP },
    graph,
    at,
  };
}

/** What flows and moves where the network is excited by `v`: the channel current (or P, with an island) and the output. */
function respond(
  e: Emitter,
  { perCurrent, island, atDrain }: MidbandNetwork,
  slopes: Slopes,
  v: PortVoltages,
  forced: Term,
): { w: Term; out: Term } {
  const { g_m, g_ds, g_mb } = slopes;
  const asked = minus(e, plus(e, times(e, g_m, v.gs), times(e, g_ds, v.ds)), times(e, g_mb, v.sb));
  const load = plus(
    e,
    plus(e, times(e, g_m, perCurrent.gs), times(e, g_ds, perCurrent.ds)),
    times(e, g_mb, perCurrent.sb),
  );
  if (!island) {
    const w = over(e, asked, plus(e, ONE, load));
    return { w, out: minus(e, v.out, times(e, perCurrent.out, w)) };
  }
  // g_m (c - r P) .. = forced, so P = (asked - forced) / load. An island at the drain is loaded by -g_ds (and -g_m where
  // the gate moves with it), one at the source by g_m + g_ds: taken positive, so that the sign of an infinite P is right.
  const driven = minus(e, asked, forced);
  const w = atDrain ? quotient(e, negate(driven), negate(load)) : quotient(e, driven, load);
  return { w, out: minus(e, v.out, times(e, perCurrent.out, w)) };
}

/** A_v in V/V. */
export function gainOf(e: Emitter, network: MidbandNetwork, slopes: Slopes): Handle {
  return emit(e, respond(e, network, slopes, network.perSignal, null).out);
}

/** R_out in ohm, of the network without its load. */
export function outputResistance(e: Emitter, network: MidbandNetwork, slopes: Slopes): Handle {
  return emit(e, respond(e, network, slopes, network.perPush, network.island?.forced ?? null).out);
}

/** Whether the resistance `driven` is all that leads from the test source into the stage. */
export function isOnlyWayIn({ graph, at }: MidbandNetwork, driven: Handle): boolean {
  const source = sourceClass(graph);
  const legs = graph.branches.filter(({ a, b }) => a === source || b === source);
  return (
    legs.length === 1 && legs[0].ohms === driven && [at.gate, at.drain, at.source, at.bulk].every((c) => c !== source)
  );
}

function sourceClass(graph: PlaceGraph): number {
  return graph.holders.findIndex((holders) => holders.some(({ type }) => type === 'signal'));
}

/** R_in in ohm: what the test source sees, or behind its own resistor `driven`, the only way in; infinite where no current flows. */
export function inputResistance(e: Emitter, network: MidbandNetwork, slopes: Slopes, driven: Handle | null): Handle {
  const { graph, at, classes } = network;
  const source = sourceClass(graph);
  const legs = graph.branches.filter(({ a, b }) => a === source || b === source);
  const { w } = respond(e, network, slopes, network.perSignal, null);
  const voltageAt = (c: number): Term => {
    if (network.island) return classes.withP.has(c) ? plus(e, classes.perSignal[c], w) : classes.perSignal[c];
    return plus(e, classes.perSignal[c], times(e, classes.perCurrent[c], w));
  };
  const far = ({ a, b }: { a: number; b: number }): number => (a === source ? b : a);
  let conductance: Term = null;
  for (const leg of legs) {
    const across = minus(e, ONE, voltageAt(far(leg)));
    conductance = plus(e, conductance, over(e, across, term(leg.ohms)));
  }
  const channel = network.island ? null : w;
  if (at.drain === source) conductance = plus(e, conductance, channel);
  if (at.source === source) conductance = minus(e, conductance, channel);
  if (!conductance) return e.constant(Infinity);
  const [only] = legs;
  if (driven !== null) return emit(e, quotient(e, voltageAt(far(only)), conductance));
  const direct =
    legs.length === 1 && graph.holders[far(only)].length > 0 && at.drain !== source && at.source !== source;
  return emit(e, direct ? term(only.ohms) : quotient(e, ONE, conductance));
}

/** x / y, infinite where y is 0 at run time. */
function quotient(e: Emitter, x: Term, y: Term): Term {
  if (!x) return null;
  if (!y) return { handle: e.constant(Infinity), negative: x.negative };
  return term(e.call('ratio', [emit(e, x), emit(e, y)], 1)[0]);
}
