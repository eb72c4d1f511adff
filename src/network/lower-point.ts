// The operating point of one FET in its reduced network, as operations: the device at its temperature, the kernel
// of the path that the stage's shape asks for, and the values that follow from it.

import type { Emitter, Handle } from './emitter.ts';
import { FORCED_OUTPUTS } from './forced-point.ts';
import { GENERAL_OUTPUTS } from './general-point.ts';
import { POINT_OUTPUTS } from './line-point.ts';
import type { PlaceGraph } from './place-graph.ts';
import { componentsOf, lineResistances, restVoltages, terminalsOf } from './rest-network.ts';
import type { Terminals } from './rest-network.ts';
import type { Forcing } from './stage-faults.ts';
import type { BiasLines, StagePath } from './stage-lowering.ts';
import type { NetFet } from './stage-net.ts';
import { emit, minus, negate, plus, term, times } from './term.ts';
import type { Term } from './term.ts';

/** What the operating point gives the rest of the lowering. */
export interface SolvedPoint {
  readonly path: StagePath;
  readonly status: Handle;
  /** How many junction temperatures balance the heat; null where the FET does not heat itself. */
  readonly thermalRoots: Handle | null;
  /** The offered values of the FET itself, by name. */
  readonly values: ReadonlyMap<string, Handle>;
  /** Voltage of every class of places, V. */
  readonly voltages: readonly Term[];
  readonly lines: BiasLines | null;
  /** beta and V_TO at the junction temperature. */
  readonly beta: Handle;
  readonly vto: Handle;
  /** The threshold moves with the current, by body effect. */
  readonly bodyMoves: boolean;
  /** Heat of the gate leakage on its way from drain to gate, W. */
  readonly leakagePower: Term;
}

/** Emits the operating point of `fet` at the ambient temperature (K). */
export function solvePoint(e: Emitter, graph: PlaceGraph, fet: NetFet, ambient: Handle, forcing: Forcing): SolvedPoint {
  const { device } = fet;
  const at = terminalsOf(graph, fet);
  const datum = forcing ? at[forcing] : -1;
  const leaks = device.I_GSS !== null;
  const hasBody = device.gamma !== null;
  // With r_s in its lead the channel's own source leaves the bulk even where the two terminals are tied.
  const bodyMoves = hasBody && (at.bulk !== at.source || device.r_s !== null);
  const heats = device.R_thJA !== null;
  const path: StagePath = forcing ? 'forced' : hasBody || heats ? 'general' : 'line';
  const rest = restVoltages(e, graph, at, datum, leaks);
  const zero = e.constant(0);
  const channel = e.constant(fet.channel);
  const trueSense = (x: Term): Term => (fet.channel === 1 ? x : negate(x));

  const ambientLeakage =
    device.I_GSS === null || path !== 'line'
      ? null
      : term(e.call('gate-leakage', [device.I_GSS, device.doubling, device.T_nom, ambient], 1)[0]);
  const between = (x: number, y: number, volts: readonly Term[]): Term => minus(e, volts[x], volts[y]);
  /** Voltage between two classes at no channel current, with the leakage at the ambient temperature. */
  const idle = (x: number, y: number): Term =>
    plus(e, between(x, y, rest.atRest), times(e, trueSense(ambientLeakage), between(x, y, rest.perLeakage)));

  const thermal = [device.beta_exponent, device.tempco, device.T_nom, ambient, device.R_thJA ?? zero];
  const leads = [device.r_s ?? zero, device.r_d ?? zero];
  let out: Map<string, Handle>;
  let lines: BiasLines | null = null;
  if (forcing) {
    const current = forcedCurrent(e, graph, at, forcing, null);
    const held = (x: number, y: number): Term => plus(e, idle(x, y), times(e, current, between(x, y, rest.perChannel)));
    const island = componentsOf(graph).find(({ classes }) => classes.has(datum))!.classes;
    // Leakage that has no other way out of the island takes its share of the forced current.
    const takes = leaks && (forcing === 'drain') !== island.has(at.gate);
    const leaked = (x: number, y: number): Handle => {
      const own = between(x, y, rest.perLeakage);
      return emit(e, takes ? minus(e, own, between(x, y, rest.perChannel)) : own);
    };
    const moves = (x: number, y: number): Handle => e.constant((island.has(x) ? 1 : 0) - (island.has(y) ? 1 : 0));
    const results = e.call(
      'forced-point',
      [
        channel,
        device.beta,
        device.V_TO,
        device.lambda,
        emit(e, trueSense(current)),
        emit(e, held(at.gate, at.source)),
        moves(at.gate, at.source),
        emit(e, held(at.drain, at.source)),
        moves(at.drain, at.source),
        emit(e, held(at.source, at.bulk)),
        moves(at.source, at.bulk),
        ...leads,
        device.gamma ?? zero,
        device.phi,
        device.I_GSS ?? zero,
        device.doubling,
        e.constant(takes ? -1 : 0),
        leaked(at.gate, at.source),
        leaked(at.drain, at.source),
        leaked(at.source, at.bulk),
        ...thermal,
      ],
      FORCED_OUTPUTS.length,
    );
    out = named(FORCED_OUTPUTS, results);
  } else {
    const { R_m, R_L, R_b } = lineResistances(e, graph, at, componentsOf(graph), rest.perChannel);
    lines = {
      V_GG: emit(e, idle(at.gate, at.source)),
      R_m: emit(e, R_m),
      V_L: emit(e, idle(at.drain, at.source)),
      R_L: emit(e, R_L),
    };
    if (path === 'line') {
      const [beta, vto] = e.call(
        'device-at-temperature',
        [device.beta, device.beta_exponent, device.V_TO, device.tempco, device.T_nom, ambient],
        2,
      );
      const results = e.call(
        'line-point',
        [channel, beta, vto, device.lambda, lines.V_GG, lines.R_m, lines.V_L, lines.R_L, ...leads],
        POINT_OUTPUTS.length,
      );
      out = named(POINT_OUTPUTS, results);
      out.set('beta', beta);
      out.set('V_TO', vto);
      out.set('T_J', ambient);
      out.set('I_G', emit(e, ambientLeakage));
      const vsb = plus(e, idle(at.source, at.bulk), times(e, R_b, trueSense(term(out.get('I_D')!))));
      out.set('V_SB', emit(e, vsb));
      out.set('g_mb', zero);
    } else {
      const results = e.call(
        'general-point',
        [
          channel,
          device.beta,
          device.V_TO,
          device.lambda,
          lines.V_GG,
          lines.R_m,
          lines.V_L,
          lines.R_L,
          emit(e, idle(at.source, at.bulk)),
          emit(e, R_b),
          ...leads,
          device.gamma ?? zero,
          device.phi,
          device.I_GSS ?? zero,
          device.doubling,
          emit(e, between(at.gate, at.source, rest.perLeakage)),
          emit(e, between(at.drain, at.source, rest.perLeakage)),
          emit(e, between(at.source, at.bulk, rest.perLeakage)),
          ...thermal,
        ],
        GENERAL_OUTPUTS.length,
      );
      out = named(GENERAL_OUTPUTS, results);
    }
  }

  const current = trueSense(term(out.get('I_D')!));
  const leakage = leaks ? trueSense(term(out.get('I_G')!)) : null;
  const shift = out.has('P') ? term(out.get('P')!) : null;
  const island = shift ? componentsOf(graph).find(({ classes }) => classes.has(datum))!.classes : null;
  const voltages = rest.atRest.map((v0, c) => {
    const moved = plus(e, v0, times(e, current, rest.perChannel[c]));
    const leaked = plus(e, moved, times(e, leakage, rest.perLeakage[c]));
    return island?.has(c) ? plus(e, leaked, shift) : leaked;
  });
  const power = times(e, term(out.get('V_DS')!), current);
  const values = new Map<string, Handle>();
  for (const name of FET_VALUES) values.set(name, out.get(name)!);
  values.set('r_o', e.div(e.constant(1), out.get('g_ds')!));
  values.set('P_D', emit(e, power));
  return {
    path,
    status: out.get('status')!,
    thermalRoots: heats ? (out.get('thermal_roots') ?? null) : null,
    values,
    voltages,
    lines,
    beta: out.get('beta')!,
    vto: out.get('V_TO')!,
    bodyMoves,
    leakagePower: times(e, leakage, minus(e, voltages[at.drain], voltages[at.gate])),
  };
}

/** Values of the FET that every path gives by their offered names. */
const FET_VALUES = [
  'I_D',
  'V_GS',
  'V_DS',
  'V_SB',
  'V_ov',
  'V_DSsat',
  'margin',
  'region',
  'g_m',
  'g_ds',
  'g_mb',
  'I_G',
  'T_J',
];

function named(names: readonly string[], handles: readonly Handle[]): Map<string, Handle> {
  return new Map(names.map((name, index) => [name, handles[index]]));
}

/** The channel current (true frame) that the sources around the island of `forcing` leave no other way. */
export function forcedCurrent(
  e: Emitter,
  graph: PlaceGraph,
  at: Terminals,
  forcing: 'drain' | 'source',
  leakage: Term,
): Term {
  const island = componentsOf(graph).find(({ classes }) => classes.has(at[forcing]))!.classes;
  let into: Term = null;
  for (const { from, to, amps } of graph.drives) {
    if (island.has(to) && !island.has(from)) into = plus(e, into, term(amps));
    if (island.has(from) && !island.has(to)) into = minus(e, into, term(amps));
  }
  if (island.has(at.gate)) into = plus(e, into, leakage);
  if (forcing === 'drain') return minus(e, into, leakage);
  return negate(into);
}
