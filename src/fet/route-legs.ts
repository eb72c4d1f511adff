// The two halves of a route: a line that tells where the threshold is, and a line that tells how much
// current or conductance there is. Each reads its own slots into a small record of numbers, in the
// n-channel frame; pair-solution.ts puts the two together.
//
// A current at a stated V_DS is divided by 1 + lambda V_DS; V_DS is also the knee up to which the line
// stands in saturation. Where no V_DS is stated the current is taken at the edge of saturation.
//
// Lines are measured at the terminals. With resistance in the leads the channel of a line at the current
// I sees V_GS - I r_s and V_DS - I (r_s + r_d), and of g_fs at the terminals it has
// g_m = g_fs (1 + g_ds (r_s + r_d)) / (1 - g_fs r_s).

import { thermalVoltage } from './constants.ts';
import { LEADS, MISSING, NOT_POSITIVE, OK, SERIES_RESISTANCE, TOO_STEEP, WRONG_SIGN } from './route-status.ts';

/** Places in the record that the legs fill. */
export const POINT = 0; // gate voltage of the threshold line
export const TEST = 1; // its test current, NaN: the voltage is V_TO itself
export const BETA = 2; // beta where the other line gives it alone, else NaN
export const REFERENCE = 3; // gate voltage of the other line
export const CURRENT = 4; // U <= knee: beta = CURRENT / U^2, U = REFERENCE - V_TO
export const SLOPE = 5; // U > knee: beta = SLOPE / (2 U - knee)
export const KNEE = 6;
export const MUST_BE_OHMIC = 7; // 1: U <= knee is a fault
export const RECORD_LENGTH = 8;

/** Slots that every route reads before those of its legs. */
export const COMMON_INPUTS = ['channel', 'lambda', 'n', 'T_nom', 'r_s', 'r_d'] as const;

export interface Leg {
  readonly inputs: readonly string[];
  /** Field and conditions without which the leg is incomplete. */
  readonly needs: readonly string[];
  /** Fills its part of the record from the slots at `at`, those of the common inputs at `p`; returns a status. */
  readonly read: (s: Float64Array, a: Int32Array, p: number, at: number, record: Float64Array) => number;
}

const orZero = (x: number): number => (x !== x ? 0 : x);

/** Drop in V of a current across r_s, 0 where no current is stated. */
export function sourceDrop(s: Float64Array, a: Int32Array, p: number, current: number): number {
  return orZero(current) * orZero(s[a[p + 4]]);
}

/** V_DS in V of the channel itself in the n-channel frame; NaN where the line states none. */
function channelVds(s: Float64Array, a: Int32Array, p: number, vds: number, current: number): number {
  return s[a[p]] * vds - orZero(current) * (orZero(s[a[p + 4]]) + orZero(s[a[p + 5]]));
}

/** 1 + lambda V_DS of a line, 1 where none is stated; whether V_DS will do is checked by `vdsStatus`. */
export function lengthening(s: Float64Array, a: Int32Array, p: number, vds: number, current: number): number {
  return vds !== vds ? 1 : 1 + orZero(s[a[p + 1]]) * channelVds(s, a, p, vds, current);
}

/** V_DS of the channel, up to which the line stands in saturation; Infinity where none is stated. */
export function kneeOf(s: Float64Array, a: Int32Array, p: number, vds: number, current: number): number {
  return vds !== vds ? Infinity : channelVds(s, a, p, vds, current);
}

/** Whether a stated V_DS has the sign of the channel and leaves it something. */
export function vdsStatus(s: Float64Array, a: Int32Array, p: number, vds: number, current: number): number {
  if (vds !== vds) return OK;
  if (!(s[a[p]] * vds > 0)) return WRONG_SIGN;
  return channelVds(s, a, p, vds, current) > 0 ? OK : LEADS;
}

/** g_m in S of the channel at a current in saturation, from g_fs at the terminals; not positive where r_s leaves none. */
export function channelTransconductance(
  s: Float64Array,
  a: Int32Array,
  p: number,
  gfs: number,
  current: number,
  vds: number,
): number {
  const rs = orZero(s[a[p + 4]]);
  const gds = vds !== vds ? 0 : (orZero(s[a[p + 1]]) * current) / lengthening(s, a, p, vds, current);
  return (gfs * (1 + gds * (rs + orZero(s[a[p + 5]])))) / (1 - gfs * rs);
}

// ------------------------------------------------------------ where the threshold is

function knownThreshold(field: string, toFrame: (channel: number, value: number) => number, depletion: boolean): Leg {
  return {
    inputs: [field],
    needs: [field],
    read(s, a, p, at, record) {
      const value = toFrame(s[a[p]], s[a[at]]);
      record[POINT] = value;
      record[TEST] = NaN;
      if (value !== value) return MISSING;
      return depletion && !(value < 0) ? WRONG_SIGN : OK;
    },
  };
}

function testedThreshold(field: string, depletion: boolean): Leg {
  return {
    inputs: [field, `${field}@I_D`, `${field}@V_DS`],
    needs: [field],
    read(s, a, p, at, record) {
      const value = s[a[p]] * s[a[at]];
      const current = s[a[at + 1]];
      const vds = s[a[at + 2]];
      record[POINT] = value - sourceDrop(s, a, p, current);
      record[TEST] = current / lengthening(s, a, p, vds, current);
      if (value !== value) return MISSING;
      if (depletion && !(value < 0)) return WRONG_SIGN;
      if (current <= 0) return NOT_POSITIVE;
      const status = vdsStatus(s, a, p, vds, current);
      if (status !== OK) return status;
      return current === current && (s[a[p + 2]] !== s[a[p + 2]] || s[a[p + 3]] !== s[a[p + 3]]) ? MISSING : OK;
    },
  };
}

const mirrored = (channel: number, value: number): number => channel * value;

/** V_TO of a JFET: negative on the card of either channel. */
export const JFET_V_TO = knownThreshold('V_TO', (_, value) => value, true);
export const MOSFET_V_TO = knownThreshold('V_TO', mirrored, false);
export const V_P = knownThreshold('V_P', mirrored, true);
export const V_GSoff = testedThreshold('V_GSoff', true);
export const V_GSth = testedThreshold('V_GSth', false);

// ------------------------------------------------------------ how much there is

function noOther(record: Float64Array): void {
  record[BETA] = NaN;
  record[MUST_BE_OHMIC] = 0;
}

/** A drain current in saturation at a gate voltage: I_DSS at 0, I_on at a stated one. */
function currentLine(field: string, hasGate: boolean): Leg {
  return {
    inputs: hasGate ? [field, `${field}@V_DS`, `${field}@V_GS`] : [field, `${field}@V_DS`],
    needs: hasGate ? [field, `${field}@V_GS`] : [field],
    read(s, a, p, at, record) {
      noOther(record);
      const current = s[a[at]];
      const vds = s[a[at + 1]];
      const gate = hasGate ? s[a[p]] * s[a[at + 2]] : 0;
      const knee = kneeOf(s, a, p, vds, current);
      const edge = current / lengthening(s, a, p, vds, current);
      record[REFERENCE] = gate - sourceDrop(s, a, p, current);
      record[CURRENT] = edge;
      record[KNEE] = knee;
      record[SLOPE] = edge / knee;
      if (current !== current || gate !== gate) return MISSING;
      if (!(current > 0)) return NOT_POSITIVE;
      return vdsStatus(s, a, p, vds, current);
    },
  };
}

/** A constant of the law itself. */
function constantLine(
  field: string,
  inputs: readonly string[],
  betaOf: (s: Float64Array, a: Int32Array, at: number) => number,
): Leg {
  return {
    inputs,
    needs: [field],
    read(s, a, _p, at, record) {
      noOther(record);
      const beta = betaOf(s, a, at);
      record[BETA] = beta;
      if (beta !== beta) return MISSING;
      return beta > 0 ? OK : NOT_POSITIVE;
    },
  };
}

/** Resistance at a gate voltage and, where stated, a current; at V_GS = 0 where none is stated and `zeroGate`. */
function resistanceLine(zeroGate: boolean): Leg {
  return {
    inputs: ['R_DSon', 'R_DSon@V_GS', 'R_DSon@I_D'],
    needs: zeroGate ? ['R_DSon'] : ['R_DSon', 'R_DSon@V_GS'],
    read(s, a, p, at, record) {
      noOther(record);
      const resistance = s[a[at]];
      const stated = s[a[p]] * s[a[at + 1]];
      const gate = zeroGate ? orZero(stated) : stated;
      const current = orZero(s[a[at + 2]]);
      const channelOnly = resistance - orZero(s[a[p + 4]]) - orZero(s[a[p + 5]]);
      record[MUST_BE_OHMIC] = 1;
      record[REFERENCE] = gate - sourceDrop(s, a, p, current);
      record[KNEE] = current * channelOnly;
      record[SLOPE] = 1 / (channelOnly * (1 + orZero(s[a[p + 1]]) * record[KNEE]));
      record[CURRENT] = record[KNEE] * record[SLOPE];
      if (resistance !== resistance || gate !== gate) return MISSING;
      if (!(resistance > 0) || current < 0) return NOT_POSITIVE;
      return channelOnly > 0 ? OK : SERIES_RESISTANCE;
    },
  };
}

export const I_DSS = currentLine('I_DSS', false);
export const I_on = currentLine('I_on', true);
export const MOSFET_R_DSon = resistanceLine(false);
export const JFET_R_DSon = resistanceLine(true);
export const BETA_CARD = constantLine('beta', ['beta'], (s, a, at) => s[a[at]]);
export const K = constantLine('K', ['K'], (s, a, at) => s[a[at]]);
/** beta = (K_P / 2)(W / L), the ratio 1 unless both are given. */
export const K_P = constantLine('K_P', ['K_P', 'W', 'L'], (s, a, at) => {
  const ratio = s[a[at + 1]] / s[a[at + 2]];
  return 0.5 * s[a[at]] * (ratio !== ratio ? 1 : ratio);
});

/** beta = g_m^2 / (4 I_D), in saturation. */
export const G_FS: Leg = {
  inputs: ['g_fs', 'g_fs@I_D', 'g_fs@V_DS'],
  needs: ['g_fs', 'g_fs@I_D'],
  read(s, a, p, at, record) {
    noOther(record);
    const gfs = s[a[at]];
    const current = s[a[at + 1]];
    const vds = s[a[at + 2]];
    const gm = channelTransconductance(s, a, p, gfs, current, vds);
    record[BETA] = (gm * gm) / (4 * current * lengthening(s, a, p, vds, current));
    if (gfs !== gfs || current !== current) return MISSING;
    if (!(gfs > 0 && current > 0)) return NOT_POSITIVE;
    const status = vdsStatus(s, a, p, vds, current);
    if (status !== OK) return status;
    if (!(gm > 0 && gm < Infinity)) return LEADS;
    return gm * s[a[p + 2]] * thermalVoltage(s[a[p + 3]]) > current ? TOO_STEEP : OK;
  },
};
