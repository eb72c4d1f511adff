// The square law: drain current of an n-channel FET and its exact derivatives.
//
//     cutoff       V_ov <= 0             I_D = 0
//     ohmic        0 <= V_DS < V_ov      I_D = beta V_DS (2 V_ov - V_DS) (1 + lambda V_DS)
//     saturation   V_DS >= V_ov          I_D = beta V_ov^2 (1 + lambda V_DS)
//
// Both conducting regions are one formula in w = min(V_DS, V_ov), the part of V_DS that still bends the
// channel: I_D = beta w (2 V_ov - w) (1 + lambda V_DS). With V_DS < 0 drain and source change places:
// the drive is V_GD - V_T = V_ov - V_DS, the current flows backwards. I_D and its first derivatives are
// continuous over every border, V_DS = 0 included.
//
// Arguments: beta in A/V^2, lambda in 1/V, vov = V_GS - V_T and vds in V, all in the n-channel frame.
//
// Source: H. Shichman and D. A. Hodges, "Modeling and simulation of insulated-gate field-effect
// transistor switching circuits", IEEE J. Solid-State Circuits SC-3 (1968).

/** Region codes as they stand in a slot: the channel is off, bends with V_DS, or is pinched off. */
export const CUTOFF = 0;
export const OHMIC = 1;
export const SATURATION = 2;

/** Drain current in A, negative when V_DS is. */
export function channelCurrent(beta: number, lambda: number, vov: number, vds: number): number {
  // 0 - x and not -x: a channel that is off carries 0, not -0.
  return vds < 0 ? 0 - forwardCurrent(beta, lambda, vov - vds, -vds) : forwardCurrent(beta, lambda, vov, vds);
}

/** g_m = dI_D/dV_GS at constant V_DS, in S; negative when V_DS is. */
export function transconductance(beta: number, lambda: number, vov: number, vds: number): number {
  return vds < 0 ? 0 - forwardDriveSlope(beta, lambda, vov - vds, -vds) : forwardDriveSlope(beta, lambda, vov, vds);
}

/** g_ds = dI_D/dV_DS at constant V_GS, in S. */
export function outputConductance(beta: number, lambda: number, vov: number, vds: number): number {
  if (!(vds < 0)) return forwardOutputSlope(beta, lambda, vov, vds);
  const drive = vov - vds;
  return forwardDriveSlope(beta, lambda, drive, -vds) + forwardOutputSlope(beta, lambda, drive, -vds);
}

/** CUTOFF, OHMIC or SATURATION, of the swapped device when V_DS < 0. */
export function channelRegion(vov: number, vds: number): number {
  const drive = vds < 0 ? vov - vds : vov;
  if (drive <= 0) return CUTOFF;
  return Math.abs(vds) < drive ? OHMIC : SATURATION;
}

/** V_DS - V_DSsat in V, of the swapped device when V_DS < 0; in cutoff the drive: negative everywhere but in saturation. */
export function saturationMargin(vov: number, vds: number): number {
  const drive = vds < 0 ? vov - vds : vov;
  return drive <= 0 ? drive : Math.abs(vds) - drive;
}

function forwardCurrent(beta: number, lambda: number, vov: number, vds: number): number {
  if (vov <= 0) return 0;
  const w = Math.min(vds, vov);
  return beta * w * (2 * vov - w) * (1 + lambda * vds);
}

function forwardDriveSlope(beta: number, lambda: number, vov: number, vds: number): number {
  return vov <= 0 ? 0 : 2 * beta * Math.min(vds, vov) * (1 + lambda * vds);
}

function forwardOutputSlope(beta: number, lambda: number, vov: number, vds: number): number {
  if (vov <= 0) return 0;
  const w = Math.min(vds, vov);
  return beta * (2 * (vov - w) * (1 + lambda * vds) + w * (2 * vov - w) * lambda);
}
