// Workings of the FET itself: threshold at temperature and back bias, the channel law at the solved voltages, the
// region test, the slopes. Shared by stages and points.

import { createDerivation } from './derivation.ts';
import type { Derivation, DerivationStep } from './derivation.ts';
import type { DeviceField, DeviceHandles } from './device-field.ts';
import type { Handle } from './emitter.ts';

/** The numbers of a solved FET. */
export interface SolvedFet {
  readonly channel: 1 | -1;
  readonly device: DeviceHandles;
  /** Value of a handle of the running program. */
  readonly read: (handle: Handle) => number;
  /** Value of an offered name. */
  readonly offered: (name: string) => number;
  /** Ambient temperature, K. */
  readonly ambient: number;
}

/** Names under which the FET's numbers stand in formulas. */
export interface LawNames {
  /** A device field; null where the part does not have it. */
  field(field: DeviceField): Handle | null;
  /** An offered value. */
  offered(name: string, unit: string): Handle;
  /** beta and threshold (true frame) at temperature and back bias. */
  readonly beta: Handle;
  readonly threshold: Handle;
}

const FIELD_UNITS: Partial<Record<DeviceField, string>> = {
  beta: 'A/V^2',
  V_TO: 'V',
  lambda: '1/V',
  gamma: 'V^0.5',
  phi: 'V',
  r_s: 'ohm',
  r_d: 'ohm',
  tempco: 'V/K',
  T_nom: 'K',
  R_thJA: 'K/W',
};

/** Writes how beta and the threshold came about, and answers with names for the FET's numbers. */
export function deriveDevice(d: Derivation, fet: SolvedFet): LawNames {
  const { e } = d;
  const { channel, device, read, offered } = fet;
  const field = (name: DeviceField): Handle | null => {
    const handle = device[name];
    if (handle === null) return null;
    const value = read(handle);
    // The true frame: a p-channel threshold and its drift have the other sign there.
    const flips = name === 'V_TO' || name === 'tempco';
    return e.leaf(name, flips ? channel * value : value, FIELD_UNITS[name] ?? '1');
  };
  const named = (name: string, unit: string): Handle => e.leaf(name, offered(name), unit);
  const T = offered('T_J');
  const nominal = read(device.T_nom);
  let beta = field('beta')!;
  let threshold = field('V_TO')!;
  if (device.R_thJA !== null && offered('P_D') !== 0) {
    const heated = e.add(e.leaf('T_A', fet.ambient, 'K'), e.mul(field('R_thJA')!, named('P_D', 'W')));
    d.conclude('T_J', 'K', heated, T, 'The junction temperature at which the heat balances.');
  }
  if (T !== nominal) {
    const [tj, tn] = [e.leaf('T_J', T, 'K'), field('T_nom')!];
    const exponent = read(device.beta_exponent);
    if (exponent !== 0) {
      const ratio = e.leaf('T_ratio', T / nominal, '1');
      d.state('T_ratio', '1', e.div(tj, tn), 'Junction temperature against the one at which the data hold.');
      beta = d.state(
        'beta_T',
        'A/V^2',
        e.mul(beta, e.power(ratio, exponent)),
        'The square-law constant at the junction temperature.',
      );
    }
    if (read(device.tempco) !== 0) {
      const moved = e.add(threshold, e.mul(field('tempco')!, e.sub(tj, tn)));
      threshold = d.state('V_TOT', 'V', moved, 'The threshold at the junction temperature.');
    }
  }
  if (device.gamma !== null && read(device.gamma) !== 0) {
    const phi = field('phi')!;
    const back = backVoltage(d, fet, { field, offered: named });
    const body = e.mul(field('gamma')!, e.sub(rootOfBack(d, phi, back).root, e.sqrt(phi)));
    threshold = d.state(
      'V_T',
      'V',
      channel > 0 ? e.add(threshold, body) : e.sub(threshold, body),
      'The threshold with the bulk where it is.',
    );
  }
  return { field, offered: named, beta, threshold };
}

/** V_ov and V_DS inside the leads, in the device's own sense, as formulas of the solved voltages. */
interface InnerVoltages {
  readonly overdrive: Handle;
  readonly drop: Handle;
  readonly reversed: boolean;
  /** I_D, and the resistance of both leads; null without any. */
  readonly current: Handle;
  readonly leads: Handle | null;
}

/** Writes V_ov, and V_DS inside the leads where those have resistance. */
function deriveInner(d: Derivation, fet: SolvedFet, names: LawNames): InnerVoltages {
  const { e } = d;
  const own = (x: Handle, y: Handle): Handle => (fet.channel > 0 ? e.sub(x, y) : e.sub(y, x));
  const reversed = fet.offered('V_DS') * fet.channel < 0;
  const [vgs, vds, current] = [names.offered('V_GS', 'V'), names.offered('V_DS', 'V'), names.offered('I_D', 'A')];
  const [rs, rd] = [names.field('r_s'), names.field('r_d')];
  let gate = vgs;
  let drop = fet.channel > 0 ? vds : e.neg(vds);
  const lead = (x: Handle | null): Handle | null => (x === null || e.value(x) === 0 ? null : x);
  const [ls, ld] = [lead(rs), lead(rd)];
  const leads = ls !== null && ld !== null ? e.add(ls, ld) : (ls ?? ld);
  if (leads !== null) {
    drop = d.state(
      'V_DSi',
      'V',
      e.sub(drop, e.mul(leads, current)),
      'Between the ends of the channel, inside the leads.',
    );
  } else if (fet.channel < 0) drop = d.state('V_SD', 'V', drop, '');
  if (ls !== null) {
    const fall = e.mul(ls, current);
    gate = d.state(
      'V_GSi',
      'V',
      fet.channel > 0 ? e.sub(vgs, fall) : e.add(vgs, fall),
      'At the channel end of the source lead.',
    );
  }
  let overdrive = own(gate, names.threshold);
  if (reversed) {
    overdrive = e.sub(overdrive, drop);
    drop = d.state(
      'V_y',
      'V',
      e.neg(drop),
      'Drain and source have changed places: the drain terminal acts as the source.',
    );
  }
  const sentence = 'The gate voltage beyond the threshold.';
  const value = fet.offered('V_ov');
  const tiny = Math.abs(value) <= 1e-6 * Math.abs(e.value(names.threshold));
  // V_ov near 0 is a difference of two near voltages: the program's own number is the better one.
  const shown = tiny ? e.leaf('V_ov', value, 'V') : d.conclude('V_ov', 'V', overdrive, value, sentence);
  if (tiny) d.confirm('V_ov', 'V', overdrive, value, sentence);
  return { overdrive: shown, drop, reversed, current, leads };
}

/** The law of the region at those voltages: the current as a formula. */
function lawFormula(d: Derivation, fet: SolvedFet, names: LawNames, inner: InnerVoltages): Handle {
  const { e } = d;
  const region = fet.offered('region');
  const lambda = names.field('lambda');
  const bare =
    region === 2
      ? e.mul(names.beta, e.power(inner.overdrive, 2))
      : e.mul(e.mul(names.beta, inner.drop), e.sub(e.mul(e.constant(2), inner.overdrive), inner.drop));
  const stretched =
    lambda === null || e.value(lambda) === 0 ? bare : e.mul(bare, e.add(e.constant(1), e.mul(lambda, inner.drop)));
  return inner.reversed ? e.neg(stretched) : stretched;
}

/** Writes V_DSsat, the margin and what they say of the region. */
export function deriveRegion(d: Derivation, fet: SolvedFet, inner: InnerVoltages): void {
  const { e } = d;
  const region = fet.offered('region');
  if (inner.leads === null) d.state('V_DSsat', 'V', inner.overdrive, 'Saturation begins where V_DS reaches V_ov.');
  else {
    const current = inner.reversed ? e.neg(inner.current) : inner.current;
    const onset = e.add(inner.overdrive, e.mul(inner.leads, current));
    d.conclude(
      'V_DSsat',
      'V',
      onset,
      fet.offered('V_DSsat'),
      'Saturation begins where the channel sees V_ov; the leads add their drop.',
    );
  }
  const onset = inner.leads === null ? e.leaf('V_DSsat', fet.offered('V_DSsat'), 'V') : inner.overdrive;
  const sentence =
    region === 2
      ? 'Not below zero: the channel is in current saturation, as assumed.'
      : 'Below zero: the channel is in its ohmic region, as assumed.';
  const margin = fet.offered('margin');
  const formula = e.sub(inner.drop, onset);
  const scale = Math.max(Math.abs(e.value(inner.drop)), Math.abs(e.value(onset)));
  // The margin is a difference: it is as exact as its terms.
  if (Math.abs(e.value(formula) - margin) <= 1e-12 * scale) d.state('margin', 'V', formula, sentence);
  else d.confirm('margin', 'V', formula, margin, sentence);
}

/** Writes g_m, g_ds, r_o and g_mb at the terminals. */
export function deriveSlopes(d: Derivation, fet: SolvedFet, names: LawNames, inner: InnerVoltages): void {
  const { e } = d;
  const { offered, device, read } = fet;
  if (inner.reversed) return;
  const region = offered('region');
  const lambda = names.field('lambda');
  const bends = lambda !== null && e.value(lambda) !== 0;
  const stretch = bends ? e.add(e.constant(1), e.mul(lambda, inner.drop)) : null;
  const stretched = (x: Handle): Handle => (stretch === null ? x : e.mul(x, stretch));
  const two = e.constant(2);
  const drive = region === 2 ? inner.overdrive : inner.drop;
  const gm = stretched(e.mul(e.mul(two, names.beta), drive));
  let gds: Handle | null = null;
  if (region === 1) {
    gds = stretched(e.mul(e.mul(two, names.beta), e.sub(inner.overdrive, inner.drop)));
    if (bends) {
      const bent = e.mul(e.mul(e.mul(names.beta, lambda), inner.drop), e.sub(e.mul(two, inner.overdrive), inner.drop));
      gds = e.add(gds, bent);
    }
  } else if (bends) gds = e.mul(e.mul(names.beta, lambda), e.power(inner.overdrive, 2));
  const zero = e.leaf('0 S', 0, 'S');
  const chi = bodySlope(d, fet, names);
  const gmb = chi === null ? null : e.mul(gm, chi);
  const rs = device.r_s === null ? 0 : read(device.r_s);
  const rd = device.r_d === null ? 0 : read(device.r_d);
  if (rs === 0 && rd === 0) {
    d.conclude('g_m', 'S', gm, offered('g_m'), 'The slope of the current with the gate voltage.');
    d.conclude('g_ds', 'S', gds ?? zero, offered('g_ds'), 'The slope of the current with the drain voltage.');
    if (chi !== null)
      d.conclude('g_mb', 'S', e.mul(names.offered('g_m', 'S'), chi), offered('g_mb'), 'The slope with the bulk.');
  } else {
    const gmi = d.state('g_mi', 'S', gm, 'The slope of the current with the gate voltage, inside the leads.');
    const gdsi =
      gds === null ? null : d.state('g_dsi', 'S', gds, 'The slope with the drain voltage, inside the leads.');
    const gmbi =
      gmb === null ? null : d.state('g_mbi', 'S', e.mul(gmi, chi!), 'The slope with the bulk, inside the leads.');
    let divisor = e.constant(1);
    const gate = gmbi === null ? gmi : e.add(gmi, gmbi);
    if (rs !== 0) divisor = e.add(divisor, e.mul(gate, names.field('r_s')!));
    const leads =
      rs === 0 ? names.field('r_d')! : rd === 0 ? names.field('r_s')! : e.add(names.field('r_s')!, names.field('r_d')!);
    if (gdsi !== null) divisor = e.add(divisor, e.mul(gdsi, leads));
    const q = d.state('q_lead', '1', divisor, 'What the resistances inside the leads divide the slopes by.');
    d.conclude('g_m', 'S', e.div(gmi, q), offered('g_m'), 'At the terminals.');
    d.conclude('g_ds', 'S', gdsi === null ? zero : e.div(gdsi, q), offered('g_ds'), 'At the terminals.');
    if (gmbi !== null) d.conclude('g_mb', 'S', e.div(gmbi, q), offered('g_mb'), 'At the terminals.');
  }
  if (offered('g_ds') > 0) {
    d.conclude(
      'r_o',
      'ohm',
      e.div(e.constant(1), names.offered('g_ds', 'S')),
      offered('r_o'),
      'The output resistance of the channel.',
    );
  }
}

/** dV_T/dV_SB as a formula; null without body effect. */
function bodySlope(d: Derivation, fet: SolvedFet, names: LawNames): Handle | null {
  const { e } = d;
  const { device, read } = fet;
  if (device.gamma === null || read(device.gamma) === 0) return null;
  const { root, tangent } = rootOfBack(d, names.field('phi')!, backVoltage(d, fet, names));
  return e.div(names.field('gamma')!, e.mul(e.constant(2), tangent ?? root));
}

/** Voltage of the end that acts as the source against the bulk, inside its lead, in the device's own sense. */
function backVoltage(d: Derivation, fet: SolvedFet, names: Pick<LawNames, 'field' | 'offered'>): Handle {
  const { e } = d;
  const reversed = fet.offered('V_DS') * fet.channel < 0;
  const bulk = names.offered('V_SB', 'V');
  const outside = reversed ? e.add(bulk, names.offered('V_DS', 'V')) : bulk;
  const own = fet.channel < 0 ? e.neg(outside) : outside;
  const lead = names.field(reversed ? 'r_d' : 'r_s');
  if (lead === null || e.value(lead) === 0) return own;
  const fall = e.mul(lead, names.offered('I_D', 'A'));
  return reversed ? e.sub(own, fall) : e.add(own, fall);
}

/** sqrt(phi + V_SB); below V_SB = -phi/2, where the body diode conducts, its tangent there, and the root it touches. */
function rootOfBack(d: Derivation, phi: Handle, back: Handle): { root: Handle; tangent: Handle | null } {
  const { e } = d;
  const two = e.constant(2);
  if (e.value(back) >= -0.5 * e.value(phi)) return { root: e.sqrt(e.add(phi, back)), tangent: null };
  const half = e.div(phi, two);
  const sentence = 'Beyond V_SB = -phi/2 the body diode conducts; from there on the root is replaced by its tangent.';
  const edge = d.state('root_edge', 'V^0.5', e.sqrt(half), sentence);
  return { root: e.add(edge, e.div(e.add(back, half), e.mul(two, edge))), tangent: edge };
}

/** The workings of a point: device, channel law against the current, region test, slopes, heat. */
export function derivePoint(fet: SolvedFet): readonly DerivationStep[] {
  const d = createDerivation();
  const names = deriveDevice(d, fet);
  deriveChannel(d, fet, names, 'by the law');
  return d.finish();
}

/** Writes V_ov, the law against the current, the region test and the slopes; in cutoff only that there is no current. */
export function deriveChannel(
  d: Derivation,
  fet: SolvedFet,
  names: LawNames,
  found: 'by the law' | 'numerically',
): void {
  const { e } = d;
  const inner = deriveInner(d, fet, names);
  if (fet.offered('region') === 0) {
    const zero = e.leaf('0 A', 0, 'A');
    d.state('I_D', 'A', zero, 'V_ov is not above zero: the channel is off.');
    return;
  }
  const formula = lawFormula(d, fet, names, inner);
  const region = fet.offered('region') === 2 ? 'The square law in saturation.' : 'The square law in the ohmic region.';
  if (found === 'by the law') d.conclude('I_D', 'A', formula, fet.offered('I_D'), region);
  else d.confirm('I_D', 'A', formula, fet.offered('I_D'), region);
  deriveRegion(d, fet, inner);
  deriveSlopes(d, fet, names, inner);
  const heat = e.mul(names.offered('V_DS', 'V'), names.offered('I_D', 'A'));
  d.conclude('P_D', 'W', fet.channel > 0 ? heat : e.neg(heat), fet.offered('P_D'), 'The heat in the FET.');
}
