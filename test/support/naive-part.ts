// A part from its lines: signs, the first complete route to beta and V_TO, and the law in the trade's conventions.
// Test conditions are met by bisection on V_TO alone, with beta as the other line gives it.

import type { FieldTree, PartEntry, QuantityEntry } from '../../src/language/index.ts';
import { deepestRoot, testDrive } from './naive-device.ts';
import type { NaiveDevice } from './naive-device.ts';
import { Broken, KINDS, sameKinds, sure } from './naive-value.ts';
import type { NaiveKind, NaiveValue } from './naive-value.ts';

export interface NaivePart {
  readonly family: 'JFET' | 'MOSFET';
  /** null where a number it needs has no value. */
  readonly device: NaiveDevice | null;
  readonly offers: ReadonlyMap<string, NaiveValue>;
}

type Sign = '+' | '-' | '0+' | 'any';
interface FieldRule {
  readonly kind: NaiveKind;
  /** Of an n-channel part; mirrored on a p-channel part where `mirrors`. */
  readonly sign: Sign;
  readonly mirrors?: true;
  readonly only?: 'JFET' | 'MOSFET';
}

const FIELDS: Readonly<Record<string, FieldRule>> = {
  I_DSS: { kind: KINDS.A, sign: '+' },
  V_P: { kind: KINDS.V, sign: '-', mirrors: true },
  V_GSoff: { kind: KINDS.V, sign: '-', mirrors: true },
  V_GSth: { kind: KINDS.V, sign: '+', mirrors: true, only: 'MOSFET' },
  beta: { kind: KINDS['A/V^2'], sign: '+', only: 'JFET' },
  K: { kind: KINDS['A/V^2'], sign: '+', only: 'MOSFET' },
  K_P: { kind: KINDS['A/V^2'], sign: '+', only: 'MOSFET' },
  W: { kind: KINDS.m, sign: '+', only: 'MOSFET' },
  L: { kind: KINDS.m, sign: '+', only: 'MOSFET' },
  g_fs0: { kind: KINDS.S, sign: '+' },
  g_fs: { kind: KINDS.S, sign: '+' },
  I_on: { kind: KINDS.A, sign: '+', only: 'MOSFET' },
  lambda: { kind: KINDS['/V'], sign: '0+' },
  g_os: { kind: KINDS.S, sign: '0+' },
  gamma: { kind: KINDS['V^0.5'], sign: '0+', only: 'MOSFET' },
  phi: { kind: KINDS.V, sign: '+', only: 'MOSFET' },
  r_s: { kind: KINDS.ohm, sign: '0+' },
  r_d: { kind: KINDS.ohm, sign: '0+' },
  I_GSS: { kind: KINDS.A, sign: '0+' },
  doubling: { kind: KINDS.K, sign: '+' },
  C_GS: { kind: KINDS.F, sign: '0+' },
  C_GD: { kind: KINDS.F, sign: '0+' },
  tempco: { kind: KINDS['V/K'], sign: 'any' },
  beta_exponent: { kind: KINDS.plain, sign: 'any' },
  T_nom: { kind: KINDS.degC, sign: '+' },
  R_thJA: { kind: KINDS['K/W'], sign: '+' },
};

interface Given {
  readonly value: number | null;
  readonly at: ReadonlyMap<string, number>;
}

/** Works a part out; `valueOf` evaluates a field. */
export function naivePart(
  entry: PartEntry,
  fields: readonly FieldTree[],
  valueOf: (body: QuantityEntry) => NaiveValue,
): NaivePart {
  const { family } = entry;
  const channel = entry.channel === 'n' ? 1 : -1;
  const given = new Map<string, Given>();
  const offers = new Map<string, NaiveValue>();
  let wrongSign = false;
  for (const field of fields) {
    const name = field.label.map((part) => part.name).join('.');
    const isCard = name === 'V_TO';
    const rule = isCard ? thresholdRule(family) : FIELDS[name];
    const { body } = field;
    if (!rule || (rule.only && rule.only !== family) || given.has(name) || body.type !== 'quantity')
      throw new Broken(`field ${name}`);
    const value = valueOf(body);
    if (!sameKinds(value.type, rule.kind)) throw new Broken(`kind of ${name}`);
    const at = new Map(body.conditions.map((condition) => [condition.name.name, condition.literal.value]));
    given.set(name, { value: value.value, at });
    offers.set(name, value);
    const ends = [body.spread?.bounds?.first, body.spread?.bounds?.last].flatMap((end) => (end ? [end.value] : []));
    const numbers = value.value === null ? [] : [value.value, ...ends];
    if (numbers.some((number) => !hasSign(rule, channel, number))) wrongSign = true;
  }
  const route = firstRoute(family, given);
  if (!route) throw new Broken('no complete route');
  const empty = [...given.values()].some(({ value }) => value === null);
  const law = empty || wrongSign ? null : settle(family, channel, route, given);
  const number = (name: string, otherwise: number): number => given.get(name)?.value ?? otherwise;
  const hasNumbers = law !== null && Number.isFinite(law.beta) && Number.isFinite(law.vto);
  const device: NaiveDevice | null = hasNumbers
    ? {
        channel,
        family,
        ...law,
        gamma: number('gamma', 0),
        phi: number('phi', 0.6),
        rs: number('r_s', 0),
        rd: number('r_d', 0),
        igss: number('I_GSS', 0),
        doubling: number('doubling', 10),
        tempco: number('tempco', family === 'JFET' ? -2.2e-3 : -2e-3),
        betaExponent: number('beta_exponent', family === 'JFET' ? -2.1 : -1.5),
        tnom: number('T_nom', 298.15),
        rth: number('R_thJA', 0),
        cgs: given.get('C_GS')?.value ?? null,
        cgd: given.get('C_GD')?.value ?? null,
        pb: 0.8,
        m: 0.5,
      }
    : null;
  const unknown = empty ? null : NaN;
  const forms = lawForms(family, channel, law ?? { beta: NaN, vto: NaN, lambda: NaN }, given);
  for (const [name, { type, value }] of Object.entries(forms)) {
    if (offers.has(name)) continue;
    const settled = hasNumbers ? value : unknown;
    offers.set(name, sure(type, settled, settled === null ? 0 : 1e-9 * Math.abs(settled) || 0));
  }
  return { family, device, offers };
}

function thresholdRule(family: 'JFET' | 'MOSFET'): FieldRule {
  return { kind: KINDS.V, sign: family === 'JFET' ? '-' : 'any' };
}

function hasSign({ sign, mirrors }: FieldRule, channel: 1 | -1, value: number): boolean {
  if (!Number.isFinite(value)) return false;
  const seen = mirrors ? channel * value : value;
  if (sign === '+') return seen > 0;
  if (sign === '-') return seen < 0;
  return sign === 'any' || seen >= 0;
}

/** The routes of this evaluator, in the order of the design: what tells the threshold, what tells the constant. */
function firstRoute(family: 'JFET' | 'MOSFET', given: ReadonlyMap<string, Given>): readonly [string, string] | null {
  const jfet: readonly (readonly [string, string])[] = [
    ['V_P', 'I_DSS'],
    ['V_GSoff', 'I_DSS'],
    ['V_TO', 'beta'],
    ['I_DSS', 'beta'],
    ['I_DSS', 'g_fs0'],
    ['V_P', 'g_fs'],
    ['V_GSoff', 'g_fs'],
  ];
  const mosfet = ['V_TO', 'V_GSth'].flatMap((threshold) =>
    ['K', 'K_P', 'I_on', 'g_fs'].map((gain) => [threshold, gain] as const),
  );
  const all = family === 'JFET' ? jfet : [...jfet.slice(0, 2), ...mosfet];
  const needs: Readonly<Record<string, string>> = { I_on: 'V_GS', g_fs: 'I_D' };
  const isThere = (name: string): boolean =>
    given.has(name) && (needs[name] === undefined || given.get(name)!.at.has(needs[name]));
  return all.find(([threshold, gain]) => isThere(threshold) && isThere(gain)) ?? null;
}

function settle(
  family: 'JFET' | 'MOSFET',
  channel: 1 | -1,
  [threshold, gain]: readonly [string, string],
  given: ReadonlyMap<string, Given>,
): { beta: number; vto: number; lambda: number } {
  const value = (name: string): number => given.get(name)!.value!;
  const at = (name: string, condition: string): number | undefined => given.get(name)!.at.get(condition);
  const lambda = slopeOf(channel, given);
  const rs = given.get('r_s')?.value ?? 0;
  const leads = rs + (given.get('r_d')?.value ?? 0);
  /** 1 + lambda V_DS of the channel of a line at its current, 1 where it states no V_DS. */
  const lift = (name: string, current: number): number => {
    const vds = at(name, 'V_DS');
    return vds === undefined ? 1 : 1 + lambda * (channel * vds - current * leads);
  };
  /** beta of a current in saturation at a gate voltage, both at the terminals. */
  const betaOfCurrent = (name: string, gate: number, vto: number): number => {
    const drive = gate - value(name) * rs - vto;
    return drive > 0 ? value(name) / lift(name, value(name)) / drive ** 2 : NaN;
  };
  /** beta as the gain line gives it, V_TO known. */
  const betaAt = (vto: number): number => {
    switch (gain) {
      case 'I_DSS':
        return betaOfCurrent('I_DSS', 0, vto);
      case 'I_on':
        return betaOfCurrent('I_on', channel * at('I_on', 'V_GS')!, vto);
      case 'g_fs': {
        const current = at('g_fs', 'I_D')!;
        const gds = at('g_fs', 'V_DS') === undefined ? 0 : (lambda * current) / lift('g_fs', current);
        const gm = (value('g_fs') * (1 + gds * leads)) / (1 - value('g_fs') * rs);
        return gm > 0 ? gm ** 2 / (4 * current * lift('g_fs', current)) : NaN;
      }
      case 'g_fs0':
        return betaOfCurrent('I_DSS', 0, vto);
      case 'K_P':
        return (value('K_P') / 2) * (given.has('W') && given.has('L') ? value('W') / value('L') : 1);
      default:
        return value(gain);
    }
  };
  const n = family === 'JFET' ? 1.1 : 1.4;
  const tnom = given.get('T_nom')?.value ?? 298.15;
  let vto: number;
  if (gain === 'g_fs0') {
    // g_fs0 at the edge of saturation, where its own current flows, falls as the channel pinches off later.
    const excess = (x: number): number => {
      const beta = betaAt(x);
      return value('g_fs0') - seenAtTerminals(2 * beta * (-x - zeroGateCurrent(beta, x, rs) * rs), rs);
    };
    vto = -deepestRoot((x) => excess(-x), 100, 100 - value('I_DSS') * rs);
  } else if (threshold === 'I_DSS') {
    const current = value('I_DSS');
    vto = -current * rs - Math.sqrt(current / lift('I_DSS', current) / betaAt(NaN));
  } else if (threshold === 'V_TO') vto = family === 'JFET' ? value('V_TO') : channel * value('V_TO');
  else {
    const stated = channel * value(threshold);
    const current = at(threshold, 'I_D');
    if (current === undefined) vto = stated;
    else {
      // V_GS at the test current, as a function of V_TO: what is stated is met where it passes it first from far below.
      const excess = (x: number): number =>
        x + current * rs + testDrive(current / lift(threshold, current), betaAt(x), n, tnom) - stated;
      vto = deepestRoot(excess, gain === 'I_DSS' ? -value('I_DSS') * rs : stated + 2, 10 + 3 * Math.abs(stated));
    }
  }
  return { beta: betaAt(vto), vto, lambda };
}

/** Drain current at V_GS = 0 at the edge of saturation, r_s in the source lead. */
function zeroGateCurrent(beta: number, vto: number, rs: number): number {
  let current = vto < 0 ? beta * vto * vto : 0;
  if (rs === 0) return current;
  for (let low = 0, high = current, k = 0; k < 200; k++) {
    current = (low + high) / 2;
    if (beta * Math.max(0, -vto - current * rs) ** 2 > current) low = current;
    else high = current;
  }
  return current;
}

function seenAtTerminals(gm: number, rs: number): number {
  return gm / (1 + gm * rs);
}

function slopeOf(channel: 1 | -1, given: ReadonlyMap<string, Given>): number {
  const lambda = given.get('lambda');
  if (lambda) return lambda.value!;
  const slope = given.get('g_os');
  if (!slope) return 0;
  const current = slope.at.get('I_D');
  if (current === undefined) throw new Broken('g_os without its current');
  const edge = current - slope.value! * channel * (slope.at.get('V_DS') ?? 0);
  return edge > 0 ? slope.value! / edge : NaN;
}

function lawForms(
  family: 'JFET' | 'MOSFET',
  channel: 1 | -1,
  { beta, vto, lambda }: { beta: number; vto: number; lambda: number },
  given: ReadonlyMap<string, Given>,
): Record<string, { type: NaiveKind; value: number }> {
  const rs = given.get('r_s')?.value ?? 0;
  const leads = rs + (given.get('r_d')?.value ?? 0);
  const atZero = zeroGateCurrent(beta, vto, rs);
  if (family === 'JFET')
    return {
      beta: { type: KINDS['A/V^2'], value: beta },
      V_TO: { type: KINDS.V, value: vto },
      I_DSS: { type: KINDS.A, value: atZero },
      V_P: { type: KINDS.V, value: channel * vto },
      g_fs0: { type: KINDS.S, value: seenAtTerminals(2 * beta * (Math.abs(vto) - atZero * rs), rs) },
      R_DSon: { type: KINDS.ohm, value: leads + 1 / (2 * beta * Math.abs(vto)) },
      lambda: { type: KINDS['/V'], value: lambda },
    };
  const ratio = (given.get('W')?.value ?? 1) / (given.get('L')?.value ?? 1);
  return {
    K: { type: KINDS['A/V^2'], value: beta },
    K_P: { type: KINDS['A/V^2'], value: (2 * beta) / ratio },
    V_TO: { type: KINDS.V, value: channel * vto },
    I_DSS: { type: KINDS.A, value: atZero },
    lambda: { type: KINDS['/V'], value: lambda },
  };
}
