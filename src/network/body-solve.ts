// The line solve for a FET whose threshold moves with its own current, because its bulk is away from its source.
//
// With the threshold held at t the line solve gives I(t), which falls as t rises; the threshold that this current
// asks for, V_T(vsb + rb I(t)), falls with it. So G(t) = t - V_T(vsb + rb I(t)) has a slope of at least 1 and one
// root, between V_T at no current and V_T at the current which that would give: Newton, kept inside the bracket,
// with a bisection where a step has not halved G.

import { threshold, thresholdSlope } from '../fet/index.ts';
import { CURRENT, DRAIN_SOURCE, OVERDRIVE, line, solveLine } from './line-solve.ts';
import { deriveAt, slopes } from './small-signal-at.ts';

/** Solves into `line` with the threshold that the source-bulk voltage vsb + rb I asks for (gamma 0: vto); answers with dV_T/dV_SB there. */
export function solveWithBody(
  beta: number,
  lambda: number,
  vto: number,
  gamma: number,
  phi: number,
  vgs: number,
  r: number,
  b: number,
  R: number,
  vsb: number,
  rb: number,
): number {
  if (gamma === 0) {
    solveLine(beta, lambda, vgs - vto, r, b, R);
    return 0;
  }
  let low = threshold(vto, gamma, phi, vsb);
  solveLine(beta, lambda, vgs - low, r, b, R);
  let high = threshold(vto, gamma, phi, vsb + rb * line[CURRENT]);
  let t = high;
  let before = Infinity;
  for (let steps = 0; steps < 100 && high > low; steps++) {
    solveLine(beta, lambda, vgs - t, r, b, R);
    const back = vsb + rb * line[CURRENT];
    const g = t - threshold(vto, gamma, phi, back);
    if (g > 0) high = t;
    else low = t;
    deriveAt(beta, lambda, line[OVERDRIVE], line[DRAIN_SOURCE], false, 0, 0, 0);
    const fall = slopes[0] / (1 + slopes[0] * r + slopes[1] * R);
    let next = t - g / (1 + rb * fall * thresholdSlope(gamma, phi, back));
    // Where the slope changes much between the ends Newton may step from one to the other and back.
    const stuck = Math.abs(g) > 0.5 * before && Math.abs(g) > 2 ** -40 * (Math.abs(t) + gamma);
    if (stuck || !(next >= low && next <= high)) next = low + 0.5 * (high - low);
    before = Math.abs(g);
    const moved = Math.abs(next - t);
    t = next;
    if (moved <= 2 ** -51 * (Math.abs(t) + gamma)) break;
  }
  solveLine(beta, lambda, vgs - t, r, b, R);
  return thresholdSlope(gamma, phi, vsb + rb * line[CURRENT]);
}
