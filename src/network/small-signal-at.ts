// Derivatives of the drain current at a solved point, as they appear at the terminals of the FET.
//
// `vov` and `vds` >= 0 are in the conducting sense; where the channel conducts backwards the drain terminal
// acts as its source, and the derivatives are carried back to the terminals' own names:
//   forward   i =  f1 v_gs + f2 v_ds - f1 x v_sb
//   reversed  i = -f1 v_gs + (f1 (1 + x) + f2) v_ds + f1 x v_sb
// with f1, f2 the derivatives of f(vov, vds) and x = dV_T/dV_SB. Resistances inside the source and drain
// leads divide all three by 1 + (g_m + g_mb) r_s + g_ds (r_s + r_d).

/** Where `deriveAt` leaves g_m, g_ds, g_mb in siemens. */
export const slopes = new Float64Array(3);

/** Writes g_m, g_ds, g_mb of region 0 (cutoff), 1 (ohmic) or 2 (saturation) into `slopes`. */
export function deriveAt(
  beta: number,
  lambda: number,
  vov: number,
  vds: number,
  region: number,
  reversed: boolean,
  bodySlope: number,
  rs: number,
  rd: number,
): void {
  let f1 = 0;
  let f2 = 0;
  const stretch = 1 + lambda * vds;
  if (region === 2) {
    f1 = 2 * beta * vov * stretch;
    f2 = beta * vov * vov * lambda;
  } else if (region === 1) {
    f1 = 2 * beta * vds * stretch;
    f2 = beta * (2 * (vov - vds) * stretch + lambda * vds * (2 * vov - vds));
  }
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
