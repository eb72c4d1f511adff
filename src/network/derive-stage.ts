// The workings of a stage: what its legs amount to, the operating point with the root that was taken and the one that
// was not, the region test, slopes, gain and resistances.

import { createDerivation } from './derivation.ts';
import type { Derivation, DerivationStep } from './derivation.ts';
import { deriveChannel, deriveDevice, deriveRegion, deriveSlopes } from './derive-law.ts';
import type { LawNames, SolvedFet } from './derive-law.ts';
import { deriveMidband } from './derive-midband.ts';
import type { Emitter, Handle } from './emitter.ts';
import { forcedCurrent } from './lower-point.ts';
import { buildGraph } from './place-graph.ts';
import { componentsOf, lineResistances, restVoltages, terminalsOf } from './rest-network.ts';
import { shareEmitter } from './sharing-emitter.ts';
import { restFaults } from './stage-faults.ts';
import type { StageLowering } from './stage-lowering.ts';
import type { NetLeg, PlaceRef, StageNet } from './stage-net.ts';
import { emit, minus, negate, plus, term, times } from './term.ts';
import type { Term } from './term.ts';

/** Names under which the reduced network stands in the workings. */
interface BiasNames {
  readonly V_GG: Handle;
  readonly V_L: Handle;
  /** null where there is none. */
  readonly R_m: Handle | null;
  readonly R_L: Handle | null;
}

/** The workings of a solved stage (status 0); `read` gives the value of a handle of the program it was lowered into. */
export function deriveStage(
  net: StageNet,
  lowering: StageLowering,
  read: (handle: Handle) => number,
): readonly DerivationStep[] {
  const [fet] = net.fets;
  const d = createDerivation();
  const shown = translateNet(net, d, read);
  const offered = (name: string): number => {
    const handle = lowering.values.get(name);
    return handle === undefined ? NaN : read(handle);
  };
  const solved: SolvedFet = { channel: fet.channel, device: fet.device, read, offered, ambient: read(net.ambient) };
  const e = shareEmitter(d.e);
  const graph = buildGraph(shown, { at: 'rest', withoutLoad: false });
  const { forcing } = restFaults(shown, graph);
  const at = terminalsOf(graph, fet);
  const leaks = fet.device.I_GSS !== null;
  const rest = restVoltages(e, graph, at, forcing ? at[forcing] : -1, leaks);
  const trueSense = (x: Term): Term => (fet.channel === 1 ? x : negate(x));
  const leakage = leaks ? trueSense(term(d.e.leaf('I_G', offered('I_G'), 'A'))) : null;
  const idle = (x: number, y: number): Term => {
    const between = (volts: readonly Term[]): Term => minus(e, volts[x], volts[y]);
    return plus(e, between(rest.atRest), times(e, leakage, between(rest.perLeakage)));
  };

  if (forcing) {
    const names = deriveDevice(d, solved);
    const current = trueSense(forcedCurrent(e, graph, at, forcing, leakage));
    d.conclude(
      'I_D',
      'A',
      emit(e, current),
      offered('I_D'),
      `The current source at the ${forcing} leaves no other way: it sets the current.`,
    );
    deriveForced(d, solved, names);
  } else {
    const lines = lineResistances(e, graph, at, componentsOf(graph), rest.perChannel);
    const bias: BiasNames = {
      V_GG: d.state(
        'V_GG',
        'V',
        voltage(d, emit(e, idle(at.gate, at.source))),
        'Gate to source without channel current: where the bias line begins.',
      ),
      R_m: resistance(
        d,
        e,
        'R_m',
        lines.R_m,
        'Resistance of the bias line: by it the current takes gate voltage away.',
      ),
      V_L: d.state(
        'V_L',
        'V',
        voltage(d, emit(e, idle(at.drain, at.source))),
        'Drain to source without channel current: where the load line begins.',
      ),
      R_L: resistance(d, e, 'R_L', lines.R_L, 'Resistance of the load line.'),
    };
    const names = deriveDevice(d, solved);
    derivePointOnLines(d, solved, names, bias, lowering.path);
  }
  const current = trueSense(term(d.e.leaf('I_D', offered('I_D'), 'A')));
  for (const terminal of ['gate', 'source', 'drain'] as const) {
    const c = at[terminal];
    const moved = plus(e, rest.atRest[c], times(e, current, rest.perChannel[c]));
    const total = plus(e, moved, times(e, leakage, rest.perLeakage[c]));
    if (!total || forcing) continue;
    d.conclude(
      `V_${terminal}`,
      'V',
      emit(e, total),
      offered(`V_${terminal}`),
      `Voltage of the ${terminal} against 0 V.`,
    );
  }
  deriveMidband(d, e, shown, solved, lowering);
  return d.finish();
}

/** The net with formulas in the place of values: an element or a rail that is a name or a literal stands as it is written. */
function translateNet(net: StageNet, d: Derivation, read: (handle: Handle) => number): StageNet {
  const taken = new Map<string, number>();
  const leafFor = (label: string, fallback: string, value: number, unit: string): Handle => {
    if (isLiteral(label) || isPath(label)) return d.e.leaf(label, value, unit);
    const count = (taken.get(fallback) ?? 0) + 1;
    taken.set(fallback, count);
    return d.e.leaf(count === 1 ? fallback : `${fallback}${count}`, value, unit);
  };
  const legs = net.legs.map((leg): NetLeg => {
    const { element, to } = leg;
    const place = leg.from.replaceAll('.', '_');
    const far: PlaceRef =
      to.type === 'rail'
        ? {
            ...to,
            volts:
              to.volts === null || /^[+-]?0 ?V$/.test(to.label)
                ? null
                : leafFor(to.label, `V_${place}_rail`, read(to.volts), 'V'),
          }
        : to;
    if (!element) return { ...leg, to: far };
    const { letter, unit } = ELEMENT_NAMES[element.kind];
    const value = leafFor(element.label, `${letter}_${place}`, read(element.value), unit);
    return { ...leg, element: { ...element, value }, to: far };
  });
  const driven =
    net.driven === null
      ? null
      : (legs.find((_, index) => net.legs[index].element?.value === net.driven)?.element?.value ?? null);
  const fallback = net.driven !== null && driven === null ? d.e.leaf('R_driven', read(net.driven), 'ohm') : driven;
  return { ...net, legs, driven: fallback };
}

const ELEMENT_NAMES = {
  resistor: { letter: 'R', unit: 'ohm' },
  capacitor: { letter: 'C', unit: 'F' },
  inductor: { letter: 'L', unit: 'H' },
  source: { letter: 'I', unit: 'A' },
} as const;

/** One number with a unit, or a code such as 4k7. */
function isLiteral(label: string): boolean {
  return /^-?\d+(\.\d+)? [A-Za-zµΩ]+$/.test(label) || /^\d+[RkMGpnu]\d*$/.test(label);
}

function isPath(label: string): boolean {
  return /^[A-Za-z\u0370-\u03ff][A-Za-z0-9_\u0370-\u03ff]*(\.[A-Za-z\u0370-\u03ff][A-Za-z0-9_\u0370-\u03ff]*)*$/.test(
    label,
  );
}

/** A structural 0 is 0 V, so that the formula has a dimension. */
function voltage(d: Derivation, handle: Handle): Handle {
  return d.e.formula(handle).text === '0' ? d.e.leaf('0 V', 0, 'V') : handle;
}

function resistance(d: Derivation, e: Emitter, name: string, x: Term, sentence: string): Handle | null {
  return x ? d.state(name, 'ohm', emit(e, x), sentence) : null;
}

/** V = V0 - R I in the true frame. */
function onLine(d: Derivation, channel: 1 | -1, open: Handle, R: Handle | null, current: Handle): Handle {
  if (R === null) return open;
  const drop = d.e.mul(R, current);
  return channel > 0 ? d.e.sub(open, drop) : d.e.add(open, drop);
}

function derivePointOnLines(
  d: Derivation,
  fet: SolvedFet,
  names: LawNames,
  bias: BiasNames,
  path: StageLowering['path'],
): void {
  const { e } = d;
  const { channel, offered, device, read } = fet;
  const region = offered('region');
  const bare = (field: 'lambda' | 'r_s' | 'r_d'): boolean => device[field] === null || read(device[field]) === 0;
  const simple = path === 'line' && bare('r_s') && bare('r_d') && offered('V_DS') * channel >= 0;
  const current = e.leaf('I_D', offered('I_D'), 'A');
  const lines = (): void => {
    d.conclude(
      'V_GS',
      'V',
      onLine(d, channel, bias.V_GG, bias.R_m, current),
      offered('V_GS'),
      'The bias line at that current.',
    );
    d.conclude(
      'V_DS',
      'V',
      onLine(d, channel, bias.V_L, bias.R_L, current),
      offered('V_DS'),
      'The load line at that current.',
    );
  };
  if (region === 0 || (simple && region === 2 && bare('lambda'))) {
    const open = channel > 0 ? e.sub(bias.V_GG, names.threshold) : e.sub(names.threshold, bias.V_GG);
    const drive = d.state('V_A', 'V', open, 'Overdrive that the bias line would give without current.');
    if (region === 0) {
      d.state('I_D', 'A', e.leaf('0 A', 0, 'A'), 'V_A is not above zero: the channel is off.');
      lines();
      return;
    }
    const overdrive = saturatedRoot(d, fet, names, bias, drive);
    d.conclude('I_D', 'A', e.mul(names.beta, e.power(overdrive, 2)), offered('I_D'), 'The square law in saturation.');
    lines();
    const drop =
      channel > 0
        ? e.leaf('V_DS', offered('V_DS'), 'V')
        : d.state('V_SD', 'V', e.neg(e.leaf('V_DS', offered('V_DS'), 'V')), '');
    const inner = { overdrive, drop, reversed: false, current, leads: null };
    deriveRegion(d, fet, inner);
    deriveSlopes(d, fet, names, inner);
    d.conclude('P_D', 'W', e.mul(drop, current), offered('P_D'), 'The heat in the FET.');
    return;
  }
  lines();
  deriveChannel(d, fet, names, 'numerically');
}

/** beta R_m V_ov^2 + V_ov - V_A = 0: both roots, the one above the threshold taken. */
function saturatedRoot(d: Derivation, fet: SolvedFet, names: LawNames, bias: BiasNames, drive: Handle): Handle {
  const { e } = d;
  if (bias.R_m === null)
    return d.conclude(
      'V_ov',
      'V',
      drive,
      fet.offered('V_ov'),
      'No resistance lies in the bias line, so nothing of it is taken away.',
    );
  const product = e.mul(e.mul(e.mul(e.constant(4), names.beta), bias.R_m), drive);
  const root = d.state(
    'root',
    '1',
    e.sqrt(e.add(e.constant(1), product)),
    'Bias line and square law meet where beta R_m V_ov² + V_ov - V_A = 0.',
  );
  const taken = e.div(e.mul(e.constant(2), drive), e.add(e.constant(1), root));
  const overdrive = d.conclude('V_ov', 'V', taken, fet.offered('V_ov'), 'The root above the threshold.');
  const other = e.div(e.neg(e.add(e.constant(1), root)), e.mul(e.mul(e.constant(2), names.beta), bias.R_m));
  d.state('V_ov2', 'V', other, 'The other root lies below the threshold, where the channel is off. It is rejected.');
  return overdrive;
}

function deriveForced(d: Derivation, fet: SolvedFet, names: LawNames): void {
  const { e } = d;
  const { offered, device, read, channel } = fet;
  const bare = (field: 'lambda' | 'r_s' | 'r_d'): boolean => device[field] === null || read(device[field]) === 0;
  const closed =
    offered('region') === 2 && bare('lambda') && bare('r_s') && bare('r_d') && offered('V_DS') * channel > 0;
  if (!closed) {
    deriveChannel(d, fet, names, 'numerically');
    return;
  }
  const current = e.leaf('I_D', offered('I_D'), 'A');
  const root = e.sqrt(e.div(current, names.beta));
  const overdrive = d.conclude(
    'V_ov',
    'V',
    root,
    offered('V_ov'),
    'The overdrive at which the square law in saturation gives that current.',
  );
  const gate = channel > 0 ? e.add(names.threshold, overdrive) : e.sub(names.threshold, overdrive);
  d.conclude('V_GS', 'V', gate, offered('V_GS'), 'The gate voltage that it takes.');
  const drop =
    channel > 0
      ? e.leaf('V_DS', offered('V_DS'), 'V')
      : d.state('V_SD', 'V', e.neg(e.leaf('V_DS', offered('V_DS'), 'V')), '');
  const inner = { overdrive, drop, reversed: false, current, leads: null };
  deriveRegion(d, fet, inner);
  deriveSlopes(d, fet, names, inner);
  d.conclude('P_D', 'W', e.mul(drop, current), offered('P_D'), 'The heat in the FET.');
}
