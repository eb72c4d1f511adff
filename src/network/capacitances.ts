// Kernel of the gate capacitances at an operating point.

import { JUNCTION_LAW, junctionCapacitance } from '../fet/index.ts';
import type { Kernel } from './kernel.ts';

/** C_gs and C_gd (F) from those at 0 V; V_GS and V_DS in the true frame; a MOSFET's C_GS does not move. */
export const jfetCapacitances: Kernel = capacitancesOf('JFET');
export const mosfetCapacitances: Kernel = capacitancesOf('MOSFET');

function capacitancesOf(family: 'JFET' | 'MOSFET'): Kernel {
  const moves = JUNCTION_LAW[family];
  return {
    inputs: ['channel', 'C_GS', 'C_GD', 'PB', 'M', 'V_GS', 'V_DS'],
    outputs: ['C_gs', 'C_gd'],
    run(s, a, p) {
      const channel = s[a[p]];
      const pb = s[a[p + 3]];
      const m = s[a[p + 4]];
      const vgs = channel * s[a[p + 5]];
      const vgd = vgs - channel * s[a[p + 6]];
      s[a[p + 7]] = moves.C_GS ? junctionCapacitance(s[a[p + 1]], vgs, pb, m) : s[a[p + 1]];
      s[a[p + 8]] = moves.C_GD ? junctionCapacitance(s[a[p + 2]], vgd, pb, m) : s[a[p + 2]];
    },
    lanes: `
      vgs = channel * V_GS
      vgd = vgs - channel * V_DS
      ${moves.C_GS ? junctionLanes('C_gs', 'C_GS', 'vgs') : 'C_gs = C_GS'}
      ${moves.C_GD ? junctionLanes('C_gd', 'C_GD', 'vgd') : 'C_gd = C_GD'}`,
  };
}

/** `junctionCapacitance` of the capacitance at 0 V and the forward voltage by their names. */
function junctionLanes(result: string, zeroBias: string, v: string): string {
  return `
      depletion = power(1 - ${v} / PB, -M)
      tangent = power(2, M)
      tangent = tangent * (1 + M * (2 * ${v} / PB - 1))
      ${result} = ${zeroBias} * select(${v} <= 0.5 * PB, depletion, tangent)`;
}
