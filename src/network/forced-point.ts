// Kernel of a FET whose channel current is forced by an ideal current source: the island on the drain or the source
// has no other way for it, and the island's voltage P is what adjusts itself.
//
// With y = V_DS inside the leads, V_GS = c + alpha y, where alpha is 1 when the gate stays outside the island of the
// source or inside that of the drain, else 0. f(c + alpha y - V_T, y) rises with y, so a bracket that is doubled until
// f passes the current holds the one root. A reversed current swaps drain and source: alpha becomes 1 - alpha.

import { betaAt, channelCurrent, leakageAt, threshold, thresholdAt, thresholdSlope } from '../fet/index.ts';
import { solveBracketed } from '../numeric/index.ts';
import { GENERAL_OUTPUTS } from './general-point.ts';
import type { Kernel } from './kernel.ts';
import { refuse } from './line-point.ts';
import { CANNOT_CARRY, LEFT_OPEN, NOT_A_NUMBER, RUNAWAY, SOLVED } from './point-status.ts';
import { deriveAt, onsetAt, slopes } from './small-signal-at.ts';
import { balanceHeat, thermalRoots } from './thermal-balance.ts';

const unknownPower = (): boolean => false;

/** Drain to source voltage in V up to which a forced current is tried; no discrete FET of this trade stands more. */
const FORCED_CEILING = 1000;

const INPUTS = [
  'channel',
  'beta',
  'V_TO',
  'lambda',
  'I_D0',
  'V_GS0',
  'alpha',
  'V_DS0',
  'delta',
  'V_SB0',
  'sigma',
  'r_s',
  'r_d',
  'gamma',
  'phi',
  'I_GSS',
  'doubling',
  'k_i',
  'q_gs',
  'q_ds',
  'q_sb',
  'beta_exponent',
  'tempco',
  'T_nom',
  'T_A',
  'R_thJA',
] as const;

/** Results of the kernel: those of the general one, and the voltage P of the island. */
export const FORCED_OUTPUTS = [...GENERAL_OUTPUTS, 'P'] as const;

const given = new Float64Array(INPUTS.length);
const [CHANNEL, BETA, VTO, LAMBDA, CURRENT, VGS, ALPHA, VDS, DELTA, VSB, SIGMA] = [0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10];
const [RS, RD, GAMMA, PHI, IGSS, DOUBLING, KI, QGS, QDS, QSB] = [11, 12, 13, 14, 15, 16, 17, 18, 19, 20];
const [EXPONENT, TEMPCO, TNOM, TA, RTH] = [21, 22, 23, 24, 25];

/**
 * The point in hand: constants, leakage and forced current at its temperature, the terminal voltages at P = 0, and y, the
 * conducting-sense V_DS inside the leads.
 */
const at = {
  beta: 0,
  vto: 0,
  leakage: 0,
  current: 0,
  vgs: 0,
  vds: 0,
  vsb: 0,
  y: 0,
  open: 0,
  alpha: 0,
  back: 0,
  sigma: 0,
  target: 0,
};

/**
 * The operating point where I_D = I_D0 + k_i I_G (A, device sense) is forced. True-frame voltages stand at P = 0
 * (V_GS0, V_DS0, V_SB0 in V, and q_gs, q_ds, q_sb in ohm per ampere of I_G, the leakage at T_J) and move with the island's
 * voltage by alpha, delta, sigma (each -1, 0 or 1). The last result is P in V.
 */
export const forcedPoint: Kernel = {
  inputs: INPUTS,
  outputs: FORCED_OUTPUTS,
  run(s, a, p) {
    const count = FORCED_OUTPUTS.length;
    let sum = 0;
    for (let n = 0; n < INPUTS.length; n++) {
      given[n] = s[a[p + n]];
      sum += given[n];
    }
    const o = p + INPUTS.length;
    const sound = sum - sum === 0 && given[BETA] > 0 && given[LAMBDA] >= 0 && given[RS] >= 0 && given[RD] >= 0;
    if (!sound || !(given[PHI] > 0 && given[RTH] >= 0 && given[TA] > 0 && given[TNOM] > 0)) {
      refuse(s, a, o, NOT_A_NUMBER, count);
      return;
    }
    const channel = given[CHANNEL];
    if (given[CURRENT] === 0 && (given[KI] === 0 || given[IGSS] === 0)) {
      refuse(s, a, o, LEFT_OPEN, count);
      return;
    }
    given[VGS] *= channel;
    given[VDS] *= channel;
    given[VSB] *= channel;
    thermalRoots[0] = 1;
    const T = given[RTH] > 0 ? balanceHeat(given[TA], given[RTH], powerAt, unknownPower) : given[TA];
    if (T !== T || !solveAt(T)) {
      solveAt(T === T ? T : given[TA]);
      refuse(s, a, o, at.y === at.y ? RUNAWAY : CANNOT_CARRY, count);
      return;
    }
    const lambda = given[LAMBDA];
    const I = at.current;
    const reversed = I < 0;
    const back = at.back + at.sigma * at.y;
    const vov = at.open + at.alpha * at.y - threshold(at.vto, given[GAMMA], given[PHI], back);
    deriveAt(
      at.beta,
      lambda,
      vov,
      at.y,
      reversed,
      thresholdSlope(given[GAMMA], given[PHI], back),
      given[RS],
      given[RD],
    );
    const vds = outerVds();
    const potential = (vds - at.vds) * given[DELTA];
    s[a[o]] = SOLVED;
    s[a[o + 1]] = I;
    s[a[o + 2]] = channel * (at.vgs + given[ALPHA] * potential) + 0;
    s[a[o + 3]] = channel * vds + 0;
    s[a[o + 4]] = vov;
    s[a[o + 5]] = onsetAt(2, vov, I, given[RS] + given[RD]);
    s[a[o + 6]] = at.y - vov;
    s[a[o + 7]] = at.y < vov ? 1 : 2;
    s[a[o + 8]] = slopes[0];
    s[a[o + 9]] = slopes[1];
    s[a[o + 10]] = channel * (at.vsb + given[SIGMA] * potential) + 0;
    s[a[o + 11]] = slopes[2];
    s[a[o + 12]] = at.leakage;
    s[a[o + 13]] = T;
    s[a[o + 14]] = at.beta;
    s[a[o + 15]] = at.vto;
    s[a[o + 16]] = thermalRoots[0];
    s[a[o + 17]] = channel * potential + 0;
  },
};

function powerAt(T: number): number {
  return solveAt(T) ? outerVds() * at.current : NaN;
}

function outerVds(): number {
  return (at.current < 0 ? -at.y : at.y) + (given[RS] + given[RD]) * at.current;
}

/** Finds `at.y` at junction temperature T; false, with y NaN, where no voltage up to the ceiling carries the current. */
function solveAt(T: number): boolean {
  const leakage = given[IGSS] === 0 ? 0 : leakageAt(given[IGSS], given[DOUBLING], T, given[TNOM]);
  const I = given[CURRENT] + given[KI] * leakage;
  at.leakage = leakage;
  at.current = I;
  at.vgs = given[VGS] + given[QGS] * leakage;
  at.vds = given[VDS] + given[QDS] * leakage;
  at.vsb = given[VSB] + given[QSB] * leakage;
  const delta = given[DELTA];
  // Voltages inside the leads at V_DS = 0 inside them, and how they move as it rises.
  const b = at.vds - (given[RS] + given[RD]) * I;
  const alpha = given[ALPHA] * delta;
  const sigma = given[SIGMA] * delta;
  const reversed = I < 0;
  at.beta = T === given[TNOM] ? given[BETA] : betaAt(given[BETA], given[EXPONENT], T, given[TNOM]);
  at.vto = thresholdAt(given[VTO], given[TEMPCO], T, given[TNOM]);
  at.open = at.vgs - given[RS] * I - alpha * b;
  at.back = at.vsb + given[RS] * I - sigma * b;
  at.alpha = reversed ? 1 - alpha : alpha;
  at.sigma = reversed ? -1 - sigma : sigma;
  at.target = Math.abs(I);
  at.y = NaN;
  let high = 1;
  while (shortfall(high) < 0) {
    if (high >= FORCED_CEILING) return false;
    high = Math.min(2 * high, FORCED_CEILING);
  }
  const low = high > 1 ? Math.min(high / 2, FORCED_CEILING / 2) : 0;
  const root = solveBracketed(shortfall, shortfall(low) <= 0 ? low : 0, high);
  if (root.status === 'solved') at.y = root.value;
  return root.status === 'solved';
}

/** What the channel carries beyond the forced current at an inner V_DS of y. */
function shortfall(y: number): number {
  const vov = at.open + at.alpha * y - threshold(at.vto, given[GAMMA], given[PHI], at.back + at.sigma * y);
  return channelCurrent(at.beta, given[LAMBDA], vov, y) - at.target;
}
