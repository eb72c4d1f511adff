// Kernel of a FET on a bias line and a load line whose threshold moves with the current (a bulk away from the
// source), whose constants move with its own heat, or both.
//
// Body effect is body-solve.ts. Heat is the outer loop, see thermal-balance.ts; leakage follows the junction
// temperature and moves both lines.

import { betaAt, leakageAt, thresholdAt } from '../fet/index.ts';
import { solveWithBody } from './body-solve.ts';
import { GENERAL_LANES } from './general-lanes.ts';
import type { Kernel } from './kernel.ts';
import { POINT_OUTPUTS, refuse } from './line-point.ts';
import { CURRENT, DRAIN_SOURCE, MARGIN, OVERDRIVE, REGION, givenLine, line, solveGivenLine } from './line-solve.ts';
import { NOT_A_NUMBER, RUNAWAY, SOLVED } from './point-status.ts';
import { deriveAt, onsetAt, slopes } from './small-signal-at.ts';
import { ROUNDING, balanceHeat, thermalRoots } from './thermal-balance.ts';

/** Results of the kernels for body effect and heat; V_SB in the true frame, V_TO at T_J in the n-channel frame. */
export const GENERAL_OUTPUTS = [
  ...POINT_OUTPUTS,
  'V_SB',
  'g_mb',
  'I_G',
  'T_J',
  'beta',
  'V_TO',
  'thermal_roots',
] as const;

const INPUTS = [
  'channel',
  'beta',
  'V_TO',
  'lambda',
  'V_GG',
  'R_m',
  'V_L',
  'R_L',
  'V_SB0',
  'R_b',
  'r_s',
  'r_d',
  'gamma',
  'phi',
  'I_GSS',
  'doubling',
  'q_gs',
  'q_ds',
  'q_sb',
  'beta_exponent',
  'tempco',
  'T_nom',
  'T_A',
  'R_thJA',
] as const;

/** The inputs of the call in hand, in the n-channel frame. */
const given = new Float64Array(INPUTS.length);
const [BETA, VTO, LAMBDA, VGG, RM, VL, RL, VSB, RB, RS, RD, GAMMA, PHI] = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13];
const [IGSS, DOUBLING, QGS, QDS, QSB, EXPONENT, TEMPCO, TNOM, TA, RTH] = [14, 15, 16, 17, 18, 19, 20, 21, 22, 23];

/** What `solveAt` leaves beside `line`. */
const at = { temperature: NaN, reversed: false, beta: 0, vto: 0, leakage: 0, vsb: 0, slope: 0, current: 0, vds: 0 };

/**
 * The operating point on V_GS = V_GG - R_m I + q_gs I_G, V_DS = V_L - R_L I + q_ds I_G, V_SB = V_SB0 + R_b I + q_sb I_G
 * (true frame: V, ohm), with body effect (gamma 0: none) and, at R_thJA above 0, at the temperature of its own heat.
 */
export const generalPoint: Kernel = {
  inputs: INPUTS,
  outputs: GENERAL_OUTPUTS,
  run(s, a, p) {
    let sum = 0;
    for (let n = 0; n < INPUTS.length; n++) {
      given[n] = s[a[p + n]];
      sum += given[n];
    }
    const o = p + INPUTS.length;
    const channel = given[0];
    const sound =
      sum - sum === 0 &&
      given[BETA] > 0 &&
      given[LAMBDA] >= 0 &&
      given[RL] >= 0 &&
      given[RS] >= 0 &&
      given[RD] >= 0 &&
      given[PHI] > 0 &&
      given[RTH] >= 0 &&
      given[TA] > 0 &&
      given[TNOM] > 0;
    if (!sound) {
      refuse(s, a, o, NOT_A_NUMBER, GENERAL_OUTPUTS.length);
      return;
    }
    given[VGG] *= channel;
    given[VL] *= channel;
    given[VSB] *= channel;
    given[RM] = Math.max(0, Math.min(given[RM], given[RL]));
    given[RB] = Math.max(0, Math.min(given[RB], given[RL]));
    thermalRoots[0] = 1;
    at.temperature = NaN;
    const T = given[RTH] > 0 ? balanceHeat(given[TA], given[RTH], powerAt, staysBelow) : given[TA];
    if (T !== T) {
      refuse(s, a, o, RUNAWAY, GENERAL_OUTPUTS.length);
      return;
    }
    solveAt(T);
    const I = at.current;
    const vov = line[OVERDRIVE];
    const region = line[REGION];
    deriveAt(at.beta, given[LAMBDA], vov, line[DRAIN_SOURCE], at.reversed, at.slope, given[RS], given[RD]);
    s[a[o]] = SOLVED;
    s[a[o + 1]] = I;
    s[a[o + 2]] = channel * (given[VGG] - given[RM] * I + given[QGS] * at.leakage) + 0;
    s[a[o + 3]] = channel * at.vds + 0;
    s[a[o + 4]] = vov;
    s[a[o + 5]] = onsetAt(region, vov, I, given[RS] + given[RD]);
    s[a[o + 6]] = line[MARGIN];
    s[a[o + 7]] = region;
    s[a[o + 8]] = slopes[0];
    s[a[o + 9]] = slopes[1];
    s[a[o + 10]] = channel * at.vsb + 0;
    s[a[o + 11]] = slopes[2];
    s[a[o + 12]] = at.leakage;
    s[a[o + 13]] = T;
    s[a[o + 14]] = at.beta;
    s[a[o + 15]] = at.vto;
    s[a[o + 16]] = thermalRoots[0];
  },
  lanes: GENERAL_LANES,
  zeroInLanes: 'gamma',
};

function powerAt(T: number): number {
  solveAt(T);
  return at.vds * at.current;
}

/**
 * Whether the FET is known to dissipate less than this up to T: a network of R_L delivers V² / (4 R_L) at most, and leakage
 * grows with T. A leakage rounded up to a power of two mostly tells, and costs next to nothing.
 */
function staysBelow(T: number, watts: number): boolean {
  if (given[IGSS] === 0) return deliveredBelow(0, watts);
  const doublings = Math.max(0, Math.ceil((T - given[TNOM]) / given[DOUBLING]));
  if (doublings < 31 && deliveredBelow(given[IGSS] * (1 << doublings), watts)) return true;
  return deliveredBelow(leakageAt(given[IGSS], given[DOUBLING], T, given[TNOM]), watts);
}

function deliveredBelow(leakage: number, watts: number): boolean {
  const volts = Math.abs(given[VL]) + Math.abs(given[QDS] * leakage);
  return ROUNDING * volts * volts < 4 * given[RL] * watts;
}

/** The point at junction temperature T: `line` in the conducting sense, `at` in the n-channel frame. */
function solveAt(T: number): void {
  if (T === at.temperature) return;
  at.temperature = T;
  const lambda = given[LAMBDA];
  const rs = given[RS];
  const rd = given[RD];
  const leakage = given[IGSS] === 0 ? 0 : leakageAt(given[IGSS], given[DOUBLING], T, given[TNOM]);
  const beta = T === given[TNOM] ? given[BETA] : betaAt(given[BETA], given[EXPONENT], T, given[TNOM]);
  const vto = thresholdAt(given[VTO], given[TEMPCO], T, given[TNOM]);
  const vgs = given[VGG] + given[QGS] * leakage;
  const vds = given[VL] + given[QDS] * leakage;
  const vsb = given[VSB] + given[QSB] * leakage;
  const load = given[RL];
  const R = load + rs + rd;
  const reversed = vds < 0;
  const gamma = given[GAMMA];
  const phi = given[PHI];
  const Rm = given[RM];
  const Rb = given[RB];
  if (gamma === 0) {
    at.slope = 0;
    givenLine[0] = beta;
    givenLine[1] = lambda;
    givenLine[2] = reversed ? vgs - vds - vto : vgs - vto;
    givenLine[3] = reversed ? load - Rm + rd : Rm + rs;
    givenLine[4] = reversed ? -vds : vds;
    givenLine[5] = R;
    solveGivenLine();
  } else
    at.slope = reversed
      ? solveWithBody(beta, lambda, vto, gamma, phi, vgs - vds, load - Rm + rd, -vds, R, vsb + vds, load - Rb + rd)
      : solveWithBody(beta, lambda, vto, gamma, phi, vgs, Rm + rs, vds, R, vsb, Rb + rs);
  at.reversed = reversed;
  at.beta = beta;
  at.vto = vto;
  at.leakage = leakage;
  at.current = reversed ? 0 - line[CURRENT] : line[CURRENT];
  at.vds = (reversed ? 0 - line[DRAIN_SOURCE] : line[DRAIN_SOURCE]) + (rs + rd) * at.current;
  at.vsb = vsb + Rb * at.current;
}
