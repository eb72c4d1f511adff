// Kernel of a specimen held at a drain current and a drain to source voltage: what gate voltage that takes.
//
// Closed form: with the inner V_DS known, I = beta v^2 (1 + lambda V_DS) gives v = V_ov where that is not above
// V_DS, else the ohmic law, which is linear in V_ov, does.

import { betaAt, leakageAt, threshold, thresholdAt, thresholdSlope } from '../fet/index.ts';
import { GENERAL_OUTPUTS } from './general-point.ts';
import type { Kernel } from './kernel.ts';
import { refuse } from './line-point.ts';
import { CANNOT_CARRY, NOT_A_NUMBER, SOLVED } from './point-status.ts';
import { deriveAt, onsetAt, slopes } from './small-signal-at.ts';

/** I_D in A (device sense, with the sign of V_DS), V_DS and V_SB in V (true frame); T_J follows from V_DS I_D alone. */
export const currentPoint: Kernel = {
  inputs: [
    'channel',
    'beta',
    'V_TO',
    'lambda',
    'I_D',
    'V_DS',
    'V_SB',
    'r_s',
    'r_d',
    'gamma',
    'phi',
    'I_GSS',
    'doubling',
    'beta_exponent',
    'tempco',
    'T_nom',
    'T_A',
    'R_thJA',
  ],
  outputs: GENERAL_OUTPUTS,
  run(s, a, p) {
    const channel = s[a[p]];
    const lambda = s[a[p + 3]];
    const I = s[a[p + 4]];
    const vds = channel * s[a[p + 5]];
    const vsb = channel * s[a[p + 6]];
    const rs = s[a[p + 7]];
    const rd = s[a[p + 8]];
    const gamma = s[a[p + 9]];
    const phi = s[a[p + 10]];
    const nominal = s[a[p + 15]];
    const T = s[a[p + 16]] + s[a[p + 17]] * I * vds;
    const o = p + 18;
    const beta = T === nominal ? s[a[p + 1]] : betaAt(s[a[p + 1]], s[a[p + 13]], T, nominal);
    const vto = thresholdAt(s[a[p + 2]], s[a[p + 14]], T, nominal);
    const sum = beta + vto + lambda + I + vds + vsb + rs + rd + T + gamma;
    if (!(sum - sum === 0 && beta > 0 && lambda >= 0 && phi > 0 && gamma >= 0)) {
      refuse(s, a, o, NOT_A_NUMBER, GENERAL_OUTPUTS.length);
      return;
    }
    const reversed = vds < 0;
    const inner = vds - (rs + rd) * I;
    const y = Math.abs(inner);
    if (!(I !== 0 && I > 0 === inner > 0 && inner !== 0)) {
      refuse(s, a, o, CANNOT_CARRY, GENERAL_OUTPUTS.length);
      return;
    }
    const stretched = Math.abs(I) / (beta * (1 + lambda * y));
    const saturated = Math.sqrt(stretched);
    const vov = saturated <= y ? saturated : 0.5 * (stretched / y + y);
    const innerVsb = vsb + rs * I;
    const back = reversed ? innerVsb + inner : innerVsb;
    const vt = gamma === 0 ? vto : threshold(vto, gamma, phi, back);
    const slope = gamma === 0 ? 0 : thresholdSlope(gamma, phi, back);
    deriveAt(beta, lambda, vov, y, reversed, slope, rs, rd);
    s[a[o]] = SOLVED;
    s[a[o + 1]] = I;
    s[a[o + 2]] = channel * (vov + vt + (reversed ? inner : 0) + rs * I) + 0;
    s[a[o + 3]] = channel * vds + 0;
    s[a[o + 4]] = vov;
    s[a[o + 5]] = onsetAt(2, vov, I, rs + rd);
    s[a[o + 6]] = y - vov;
    s[a[o + 7]] = y < vov ? 1 : 2;
    s[a[o + 8]] = slopes[0];
    s[a[o + 9]] = slopes[1];
    s[a[o + 10]] = channel * vsb + 0;
    s[a[o + 11]] = slopes[2];
    s[a[o + 12]] = s[a[p + 11]] === 0 ? 0 : leakageAt(s[a[p + 11]], s[a[p + 12]], T, nominal);
    s[a[o + 13]] = T;
    s[a[o + 14]] = beta;
    s[a[o + 15]] = vto;
    s[a[o + 16]] = 1;
  },
};
