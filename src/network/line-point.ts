// Kernel of the usual case: one FET of fixed beta and threshold in a resistive network, that is on a bias line
// and a load line. The true frame ends here: the lines are mirrored by the channel on the way in, the
// terminal voltages on the way out.

import type { Kernel } from './kernel.ts';
import { CURRENT, DRAIN_SOURCE, MARGIN, OVERDRIVE, REGION, line, solveLine } from './line-solve.ts';
import { NOT_A_NUMBER, SOLVED } from './point-status.ts';
import { deriveAt, onsetAt, slopes } from './small-signal-at.ts';

/** Results that every operating-point kernel gives, in this order. */
export const POINT_OUTPUTS = [
  'status',
  'I_D',
  'V_GS',
  'V_DS',
  'V_ov',
  'V_DSsat',
  'margin',
  'region',
  'g_m',
  'g_ds',
] as const;

/**
 * V_GS = V_GG - R_m I and V_DS = V_L - R_L I in the true frame (V, ohm), device in the n-channel frame, with r_s and
 * r_d in its leads. V_DS below 0 is solved with drain and source swapped. Where the status is not `SOLVED` all else is NaN.
 */
export const linePoint: Kernel = {
  inputs: ['channel', 'beta', 'V_TO', 'lambda', 'V_GG', 'R_m', 'V_L', 'R_L', 'r_s', 'r_d'],
  outputs: POINT_OUTPUTS,
  run(s, a, p) {
    const channel = s[a[p]];
    const beta = s[a[p + 1]];
    const vto = s[a[p + 2]];
    const lambda = s[a[p + 3]];
    const vgg = channel * s[a[p + 4]];
    const vl = channel * s[a[p + 6]];
    const RL = s[a[p + 7]];
    // R_m is a share of R_L in every resistive network; what lies outside is rounding.
    const Rm = Math.max(0, Math.min(s[a[p + 5]], RL));
    const rs = s[a[p + 8]];
    const rd = s[a[p + 9]];
    const o = p + 10;
    const R = RL + rs + rd;
    const sum = beta + vto + lambda + vgg + vl + Rm + R;
    if (!(beta > 0 && lambda >= 0 && RL >= 0 && rs >= 0 && rd >= 0 && sum - sum === 0)) {
      refuse(s, a, o, NOT_A_NUMBER, POINT_OUTPUTS.length);
      return;
    }
    const reversed = vl < 0;
    if (reversed) solveLine(beta, lambda, vgg - vl - vto, RL - Rm + rd, -vl, R);
    else solveLine(beta, lambda, vgg - vto, Rm + rs, vl, R);
    const vov = line[OVERDRIVE];
    const vds = line[DRAIN_SOURCE];
    const region = line[REGION];
    const I = reversed ? 0 - line[CURRENT] : line[CURRENT];
    deriveAt(beta, lambda, vov, vds, reversed, 0, rs, rd);
    s[a[o]] = SOLVED;
    s[a[o + 1]] = I;
    s[a[o + 2]] = channel * (vgg - Rm * I) + 0;
    s[a[o + 3]] = channel * ((reversed ? -vds : vds) + (rs + rd) * I) + 0;
    s[a[o + 4]] = vov;
    s[a[o + 5]] = onsetAt(region, vov, I, rs + rd);
    s[a[o + 6]] = line[MARGIN];
    s[a[o + 7]] = region;
    s[a[o + 8]] = slopes[0];
    s[a[o + 9]] = slopes[1];
  },
};

/** Writes a status and NaN into the `count - 1` results behind it: no value stands beside a status that is not `SOLVED`. */
export function refuse(s: Float64Array, a: Int32Array, o: number, status: number, count: number): void {
  s[a[o]] = status;
  for (let n = 1; n < count; n++) s[a[o + n]] = NaN;
}
