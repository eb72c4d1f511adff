// A stage of one FET, from its legs to straight-line operations and one root solve.
//
// Order: faults of the legs and the graph; the network at rest reduced to what the channel sees; the device at the
// ambient temperature; the operating point by the kernel of its path; node voltages and powers; small signals and
// swing from the network at midband. Everything is emitted once for all builds: which path is taken follows from
// the shape of the stage and from nominal values, never from a number of the running program.

import type { Emitter, Handle } from './emitter.ts';
import { lowerCapacitances } from './lower-capacitances.ts';
import { MIDBAND_SHORT, buildGraph, terminalName } from './place-graph.ts';
import type { PlaceGraph } from './place-graph.ts';
import { gainOf, inputResistance, isOnlyWayIn, midbandNetworks, outputResistance } from './midband.ts';
import type { MidbandNetwork, Slopes } from './midband.ts';
import { OFFERED_VALUES } from './offered-values.ts';
import { solvePoint } from './lower-point.ts';
import type { SolvedPoint } from './lower-point.ts';
import { shareEmitter } from './sharing-emitter.ts';
import { legFaults, restFaults } from './stage-faults.ts';
import type { MidbandPorts, StageLowering } from './stage-lowering.ts';
import type { NetFet, StageFault, StageNet } from './stage-net.ts';
import { GATE_CONDUCTS } from './swing.ts';
import { emit, minus, plus, term, times } from './term.ts';
import type { Term } from './term.ts';

/** Lowers a stage; where it has faults nothing of it is computed. */
export function lowerStage(net: StageNet, emitter: Emitter): StageLowering {
  const e = shareEmitter(emitter);
  const zero = e.constant(0);
  const early = legFaults(net);
  if (early.length > 0) return broken(net, early);
  const graph = buildGraph(withoutZeroRails(net, zero), { at: 'rest', withoutLoad: false });
  const { faults, forcing } = restFaults(net, graph);
  if (faults.length > 0) return broken(net, faults);

  const [fet] = net.fets;
  const point = solvePoint(e, graph, fet, net.ambient, forcing);
  const values = new Map<string, Handle>(point.values);
  for (const [name, c] of graph.classOf) values.set(placeValueName(name), emit(e, point.voltages[c]));
  for (const terminal of ['gate', 'drain', 'source', 'bulk']) {
    const c = graph.classOf.get(terminalName(fet, terminal));
    if (c !== undefined) values.set(`V_${terminal}`, emit(e, point.voltages[c]));
  }
  values.set('P_total', emit(e, totalPower(e, graph, point)));
  const absent = lowerCapacitances(e, fet, values);
  const small = lowerSmallSignals(e, net, fet, point, values, absent);
  for (const { name, later } of OFFERED_VALUES) if (later) absent.set(name, `${name} is not computed yet.`);
  return {
    values,
    absent,
    faults: [],
    path: point.path,
    status: point.status,
    thermalRoots: point.thermalRoots,
    swingLimits: small.swingLimits,
    lines: point.lines,
    ports: small.ports,
    midband: midbandLists(net),
  };
}

/** `V_out`, and `Qa.V_gate` for the terminal of a named FET. */
function placeValueName(place: string): string {
  const dot = place.indexOf('.');
  return dot < 0 ? `V_${place}` : `${place.slice(0, dot)}.V_${place.slice(dot + 1)}`;
}

function broken(net: StageNet, faults: readonly StageFault[]): StageLowering {
  return {
    values: new Map(),
    absent: new Map(),
    faults,
    path: 'line',
    status: null,
    thermalRoots: null,
    swingLimits: null,
    lines: null,
    ports: null,
    midband: midbandLists(net),
  };
}

/** Rails that are known to be 0 V, so that nothing is emitted for them. */
function withoutZeroRails(net: StageNet, zero: Handle): StageNet {
  const legs = net.legs.map((leg) =>
    leg.to.type === 'rail' && leg.to.volts === zero ? { ...leg, to: { ...leg.to, volts: null } } : leg,
  );
  return { ...net, legs };
}

/** Capacitors taken as shorts at midband, and all that is taken as open. */
function midbandLists(net: StageNet): StageLowering['midband'] {
  const shorted: string[] = [];
  const open: string[] = [];
  for (const { element } of net.legs) {
    if (element?.kind === 'capacitor') (element.nominal >= MIDBAND_SHORT ? shorted : open).push(element.label);
    if (element?.kind === 'inductor') open.push(element.label);
  }
  return { shorted, open };
}

/**
 * What rails and sources deliver: all that resistors, FET and gate leakage turn into heat, and what a current source
 * takes up (a sink made of transistors turns it into heat as well).
 */
function totalPower(e: Emitter, graph: PlaceGraph, point: SolvedPoint): Term {
  let total: Term = term(point.values.get('P_D')!);
  for (const { a, b, ohms } of graph.branches) {
    const drop = minus(e, point.voltages[a], point.voltages[b]);
    if (!drop?.handle) continue;
    total = plus(e, total, term(e.div(e.mul(drop.handle, drop.handle), ohms)));
  }
  for (const { from, to, amps } of graph.drives) {
    const taken = times(e, minus(e, point.voltages[from], point.voltages[to]), term(amps));
    if (taken) total = plus(e, total, term(e.max(e.constant(0), emit(e, taken))));
  }
  return plus(e, total, point.leakagePower);
}

function lowerSmallSignals(
  e: Emitter,
  net: StageNet,
  fet: NetFet,
  point: SolvedPoint,
  values: Map<string, Handle>,
  absent: Map<string, string>,
): { ports: MidbandPorts | null; swingLimits: StageLowering['swingLimits'] } {
  const { loaded, unloaded } = midbandNetworks(e, net);
  const slopes: Slopes = {
    g_m: term(values.get('g_m')!),
    g_ds: term(values.get('g_ds')!),
    g_mb: fet.device.gamma === null ? null : term(values.get('g_mb')!),
  };
  const refuse = (names: readonly string[], why: string): void => names.forEach((name) => absent.set(name, why));
  if (!net.output)
    refuse(['A_v', 'R_out', 'swing_up', 'swing_down'], 'No output is named. Add a line such as output: drain.');
  if (typeof loaded === 'string') {
    refuse(['A_v', 'R_in', 'R_out', 'swing_up', 'swing_down'], loaded);
    return { ports: null, swingLimits: null };
  }
  const driven = loaded.graph.holders.some((holders) => holders.some(({ type }) => type === 'signal'));
  if (net.output) {
    if (typeof unloaded === 'string') refuse(['R_out'], unloaded);
    else values.set('R_out', outputResistance(e, unloaded, slopes));
  }
  if (!driven) {
    const why = 'Nothing drives this stage. Lead a leg to signal, such as gate: 100 nF to signal.';
    refuse(['R_in', ...(net.output ? ['A_v', 'swing_up', 'swing_down'] : [])], why);
    return { ports: null, swingLimits: null };
  }
  if (net.driven !== null && !isOnlyWayIn(loaded, net.driven)) {
    refuse(
      ['R_in'],
      'R_in counts behind the resistor that driven: through names, and that is not the only way from signal into the stage. Name the one resistor that leads to signal.',
    );
  } else values.set('R_in', inputResistance(e, loaded, slopes, net.driven));
  const ports = portsOf(e, loaded);
  if (!net.output) return { ports, swingLimits: null };
  values.set('A_v', gainOf(e, loaded, slopes));
  if ([loaded.perSignal.gs, loaded.perSignal.ds, loaded.perSignal.sb].every((volts) => volts === null)) {
    refuse(['swing_up', 'swing_down'], 'The signal does not reach the FET, so it drives the output nowhere.');
    return { ports, swingLimits: null };
  }
  if (ports.currentFixed && point.bodyMoves) {
    refuse(
      ['swing_up', 'swing_down'],
      'The swing of a FET with body effect on an ideal current source is not computed yet.',
    );
    return { ports, swingLimits: null };
  }
  return { ports, swingLimits: lowerSwing(e, fet, point, ports, values) };
}

function portsOf(e: Emitter, { perSignal, perCurrent, island }: MidbandNetwork): MidbandPorts {
  return {
    a_gs: emit(e, perSignal.gs),
    a_ds: emit(e, perSignal.ds),
    a_sb: emit(e, perSignal.sb),
    a_out: emit(e, perSignal.out),
    r_gs: emit(e, perCurrent.gs),
    r_ds: emit(e, perCurrent.ds),
    r_sb: emit(e, perCurrent.sb),
    r_out: emit(e, perCurrent.out),
    currentFixed: island !== null,
  };
}

function lowerSwing(
  e: Emitter,
  fet: NetFet,
  point: SolvedPoint,
  ports: MidbandPorts,
  values: Map<string, Handle>,
): { up: Handle; down: Handle } {
  const { device } = fet;
  const none = e.constant(0);
  const [up, down, upLimit, downLimit] = e.call(
    'swing',
    [
      e.constant(fet.channel),
      point.beta,
      point.vto,
      device.lambda,
      point.bodyMoves ? device.gamma! : none,
      device.phi,
      e.constant(fet.family === 'JFET' ? GATE_CONDUCTS : Infinity),
      e.constant(ports.currentFixed ? 1 : 0),
      values.get('I_D')!,
      values.get('V_GS')!,
      values.get('V_DS')!,
      values.get('V_SB')!,
      ports.a_gs,
      ports.a_ds,
      ports.a_sb,
      ports.a_out,
      ports.r_gs,
      ports.r_ds,
      ports.r_sb,
      ports.r_out,
      device.r_s ?? none,
      device.r_d ?? none,
    ],
    4,
  );
  values.set('swing_up', up);
  values.set('swing_down', down);
  return { up: upLimit, down: downLimit };
}
