// The threshold as a function of the voltage between source and bulk.
//
//     V_T = V_TO + gamma (sqrt(phi + V_SB) - sqrt(phi))
//
// Below V_SB = -phi/2, where the body diode has long begun to conduct, the tangent goes on, so that a
// solver on its way may pass there: value and slope stay continuous.
//
// Source: the threshold equation of the level-1 MOSFET model, as in A. S. Sedra and K. C. Smith,
// Microelectronic Circuits, "The body effect".

/** V_T in V in the n-channel frame; vto and vsb in V, gamma in V^0.5, phi in V and above 0. */
export function threshold(vto: number, gamma: number, phi: number, vsb: number): number {
  if (vsb >= -0.5 * phi) return vto + gamma * (Math.sqrt(phi + vsb) - Math.sqrt(phi));
  const edge = Math.sqrt(0.5 * phi);
  return vto + gamma * (edge + (vsb + 0.5 * phi) / (2 * edge) - Math.sqrt(phi));
}

/** dV_T/dV_SB, a plain number: g_mb is g_m times this. */
export function thresholdSlope(gamma: number, phi: number, vsb: number): number {
  return gamma / (2 * Math.sqrt(Math.max(phi + vsb, 0.5 * phi)));
}

/** g_mb = -dI_D/dV_SB at constant V_GS and V_DS, in S. */
export function bodyTransconductance(gm: number, gamma: number, phi: number, vsb: number): number {
  return gm * thresholdSlope(gamma, phi, vsb);
}
