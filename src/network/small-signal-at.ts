// Derivatives of the drain current at a solved point, as they appear at the terminals of the FET.
//
// `vov` and `vds` >= 0 are in the conducting sense; where the channel conducts backwards the drain terminal
// acts as its source, and the derivatives are carried back to the terminals' own names:
//   forward   i =  f1 v_gs + f2 v_ds - f1 x v_sb
//   reversed  i = -f1 v_gs + (f1 (1 + x) + f2) v_ds + f1 x v_sb
// with f1, f2 the derivatives of f(vov, vds) and x = dV_T/dV_SB. Resistances inside the source and drain
// leads divide all three by 1 + (g_m + g_mb) r_s + g_ds (r_s + r_d).

import { outputConductance, transconductance } from '../fet/index.ts';

/**
 * V_DS at the terminals from which the channel is saturated, in the device's own sense: V_ov and what the leads drop,
 * so that V_DS less this is the margin. In cutoff no V_DS saturates it: infinite.
 */
export function onsetAt(region: number, vov: number, current: number, leads: number): number {
  return region === 0 ? Infinity : vov + leads * Math.abs(current);
}

/** Where `deriveAt` leaves g_m, g_ds, g_mb in siemens. */
export const slopes = new Float64Array(3);

/** Writes g_m, g_ds, g_mb at the terminals into `slopes`; `bodySlope` is dV_T/dV_SB. */
export function deriveAt(
  beta: number,
  lambda: number,
  vov: number,
  vds: number,
  reversed: boolean,
  bodySlope: number,
  rs: number,
  rd: number,
): void {
  const f1 = transconductance(beta, lambda, vov, vds);
  const f2 = outputConductance(beta, lambda, vov, vds);
  let gm = f1;
  let gds = f2;
  let gmb = f1 * bodySlope;
  if (reversed) {
    gds = f1 + gmb + f2;
    gm = 0 - f1;
    gmb = 0 - gmb;
  }
  const q = 1 + (gm + gmb) * rs + gds * (rs + rd);
  slopes[0] = gm / q;
  slopes[1] = gds / q;
  slopes[2] = gmb / q;
}
