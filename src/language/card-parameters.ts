// The parameters of level-1 model cards of JFETs and MOSFETs: what they are in a sheet, or what they would have meant.
//
// Source of names and meanings: the level-1 JFET and MOSFET models as Shichman and Hodges gave them and as textbooks list
// them, e.g. P. Antognetti, G. Massobrio, "Semiconductor Device Modeling" (1988); from memory.

import {
  CAPACITANCE,
  LENGTH,
  PLAIN,
  RECIPROCAL_VOLTAGE,
  RESISTANCE,
  ROOT_VOLTAGE,
  SQUARE_LAW_CONSTANT,
  TEMPERATURE_POINT,
  VOLTAGE,
  VOLTAGE_TEMPERATURE_COEFFICIENT,
} from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';

/** A parameter that a part has as well. */
interface TakenParameter {
  readonly field: string;
  readonly kind: ValueKind;
  /** What a 0 is: there is none of it, which a part says by leaving the row out; a number as others; or nothing that can be. */
  readonly zero: 'none' | 'number' | 'refused';
}

/** 0 degC in K: cards give temperatures in degC. */
export const ZERO_CELSIUS = 273.15;

const BOTH = {
  VTO: { field: 'V_TO', kind: VOLTAGE, zero: 'number' },
  LAMBDA: { field: 'lambda', kind: RECIPROCAL_VOLTAGE, zero: 'number' },
  RS: { field: 'r_s', kind: RESISTANCE, zero: 'none' },
  RD: { field: 'r_d', kind: RESISTANCE, zero: 'none' },
  PB: { field: 'PB', kind: VOLTAGE, zero: 'refused' },
  TNOM: { field: 'T_nom', kind: TEMPERATURE_POINT, zero: 'number' },
} as const;

/** By family, in the order in which the lines are written. */
export const TAKEN: Readonly<Record<'JFET' | 'MOSFET', Readonly<Record<string, TakenParameter>>>> = {
  JFET: {
    BETA: { field: 'beta', kind: SQUARE_LAW_CONSTANT, zero: 'refused' },
    ...BOTH,
    CGS: { field: 'C_GS', kind: CAPACITANCE, zero: 'none' },
    CGD: { field: 'C_GD', kind: CAPACITANCE, zero: 'none' },
    M: { field: 'M', kind: PLAIN, zero: 'number' },
    VTOTC: { field: 'tempco', kind: VOLTAGE_TEMPERATURE_COEFFICIENT, zero: 'number' },
  },
  MOSFET: {
    KP: { field: 'K_P', kind: SQUARE_LAW_CONSTANT, zero: 'refused' },
    W: { field: 'W', kind: LENGTH, zero: 'refused' },
    L: { field: 'L', kind: LENGTH, zero: 'refused' },
    ...BOTH,
    GAMMA: { field: 'gamma', kind: ROOT_VOLTAGE, zero: 'none' },
    PHI: { field: 'phi', kind: VOLTAGE, zero: 'refused' },
    CBD: { field: 'C_DS', kind: CAPACITANCE, zero: 'none' },
    MJ: { field: 'M', kind: PLAIN, zero: 'number' },
  },
};

/** What a law cannot do without. */
export const NEEDED = { JFET: ['BETA', 'VTO'], MOSFET: ['KP', 'VTO'] } as const;

/** What a parameter would have meant that no part has. */
export const UNTAKEN: Readonly<Record<string, string>> = {
  IS: 'saturation current of the gate junction or of the bulk diodes; leakage is I_GSS of a data sheet',
  ISR: 'recombination current of the gate junction',
  N: 'emission coefficient of a junction',
  NR: 'emission coefficient of the recombination current',
  XTI: 'temperature exponent of a saturation current',
  EG: 'energy gap',
  ALPHA: 'ionisation coefficient: gate current growing at high V_DG',
  VK: 'ionisation voltage',
  B: 'doping tail parameter',
  FC: 'where the junction law goes on as a straight line; a part has 0.5',
  KF: 'coefficient of flicker noise; a part has f_corner at a current, or e_n at two frequencies',
  AF: 'exponent of flicker noise',
  NLEV: 'choice of the noise equation',
  GDSNOI: 'coefficient of channel noise',
  BETATCE: 'exponential change of BETA with temperature in %/K; a part has beta_exponent, a power of T',
  TRS: 'temperature coefficient of RS',
  TRD: 'temperature coefficient of RD',
  RSH: 'sheet resistance of the leads',
  RG: 'resistance of the gate',
  RB: 'resistance of the bulk',
  RDS: 'resistance between drain and source',
  CGSO: 'gate overlap per metre of width; a part has C_GS, or C_iss and C_rss',
  CGDO: 'gate overlap per metre of width; a part has C_GD, or C_rss',
  CGBO: 'gate to bulk overlap per metre of length',
  CBS: 'bulk to source capacitance',
  CJ: 'bottom capacitance of the bulk junctions per area',
  CJSW: 'side capacitance of the bulk junctions per length',
  MJSW: 'grading of the side capacitance',
  JS: 'saturation current of the bulk junctions per area',
  TOX: 'thickness of the oxide: KP comes of it where it is not given',
  UO: 'mobility: KP comes of it where it is not given',
  NSUB: 'doping of the bulk: VTO, GAMMA and PHI come of it where they are not given',
  NSS: 'surface states: VTO comes of them where it is not given',
  NFS: 'fast surface states, weak inversion',
  TPG: 'material of the gate: VTO comes of it where it is not given',
  XJ: 'depth of the junctions',
  LD: 'lateral diffusion, which shortens L',
  WD: 'lateral diffusion, which narrows W',
  UCRIT: 'field at which the mobility falls',
  UEXP: 'exponent of the falling mobility',
  VMAX: 'saturation of the drift velocity',
  NEFF: 'factor on the charge of the bulk',
  DELTA: 'effect of a narrow width on the threshold',
  THETA: 'modulation of the mobility',
  ETA: 'static feedback on the threshold',
  KAPPA: 'field factor of the saturation',
};
