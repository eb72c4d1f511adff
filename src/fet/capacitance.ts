// Capacitances of the junctions and the gate.
//
//     C(V) = C0 / (1 - V/PB)^M,  V the forward voltage of the junction; beyond PB/2 its tangent goes on
//
// A JFET's C_GS and C_GD follow the law with V_GS and V_GD, a MOSFET's C_DS with -V_DS. A MOSFET's
// C_GS is constant; its C_GD follows the law with V_GD, which is rough. A JFET's C_DS is constant.
//
// Source: the depletion-capacitance equation of the standard diode and JFET models (C_J0, PB, M, FC = 0.5).

import { pow } from '../numeric/index.ts';

/** C(V) / C0, a plain number; v in V in the n-channel frame, positive where the junction is forward; pb in V. */
export function junctionRatio(v: number, pb: number, m: number): number {
  if (v <= 0.5 * pb) return pow(1 - v / pb, -m);
  return pow(2, m) * (1 + m * ((2 * v) / pb - 1));
}

/** Capacitance in F at the forward voltage v, from that at 0 V. */
export function junctionCapacitance(zeroBias: number, v: number, pb: number, m: number): number {
  return zeroBias * junctionRatio(v, pb, m);
}

/** Which capacitance follows the junction law, by family; the others are constant. */
export const JUNCTION_LAW = {
  JFET: { C_GS: true, C_GD: true, C_DS: false },
  MOSFET: { C_GS: false, C_GD: true, C_DS: true },
} as const;
