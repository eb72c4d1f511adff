// The law that is fitted, in the n-channel frame, and its slopes along its constants:
//
//     I_D = beta (V_ov^n - (V_ov - w)^n) (1 + lambda V_DS),   w = min(V_DS, V_ov)
//
// With n = 2 this is the square law of the channel, both regions in one formula; with another exponent saturation
// follows V_ov^n and meets the ohmic region at the same place, without a step or a bend. Below the threshold it is 0.
// Source of n = 2: H. Shichman and D. A. Hodges, IEEE J. Solid-State Circuits SC-3 (1968).

import { ln, pow } from '../numeric/index.ts';
import type { Points } from './points.ts';

/** Places of the constants in their array: ln beta (A/V^n), V_TO (V), lambda (1/V), exponent n. */
export const BETA = 0;
export const V_TO = 1;
export const LAMBDA = 2;
export const EXPONENT = 3;
export const CONSTANTS = 4;

/** Fills in the current of every reading, in A; `law` has beta itself in the place of its logarithm. */
export function fillCurrents(law: Float64Array, { V_GS, V_DS }: Points, currents: Float64Array): void {
  const [beta, threshold, lambda, n] = [law[BETA]!, law[V_TO]!, law[LAMBDA]!, law[EXPONENT]!];
  for (let i = 0; i < currents.length; i++) {
    const vds = V_DS[i]!;
    const drive = V_GS[i]! - threshold;
    // Reversed: source and drain change places.
    const forward = vds < 0 ? drive - vds : drive;
    const size = Math.abs(vds);
    if (!(forward > 0)) {
      currents[i] = 0;
      continue;
    }
    const rest = Math.max(0, forward - size);
    const current = beta * (power(forward, n) - power(rest, n)) * (1 + lambda * size);
    currents[i] = vds < 0 ? -current : current;
  }
}

/** Fills in the slopes of every current along ln beta, V_TO, lambda and n, four numbers a reading. */
export function fillSlopes(law: Float64Array, { V_GS, V_DS }: Points, slopes: Float64Array): void {
  const [beta, threshold, lambda, n] = [law[BETA]!, law[V_TO]!, law[LAMBDA]!, law[EXPONENT]!];
  for (let i = 0; i < V_GS.length; i++) {
    const vds = V_DS[i]!;
    const drive = V_GS[i]! - threshold;
    const forward = vds < 0 ? drive - vds : drive;
    const size = Math.abs(vds);
    const sign = vds < 0 ? -1 : 1;
    const at = i * CONSTANTS;
    if (!(forward > 0)) {
      slopes.fill(0, at, at + CONSTANTS);
      continue;
    }
    const rest = Math.max(0, forward - size);
    const shape = power(forward, n) - power(rest, n);
    const modulation = sign * beta * (1 + lambda * size);
    slopes[at + BETA] = modulation * shape;
    slopes[at + V_TO] = -modulation * n * (power(forward, n - 1) - power(rest, n - 1));
    slopes[at + LAMBDA] = sign * beta * shape * size;
    slopes[at + EXPONENT] = modulation * (logPower(forward, n) - logPower(rest, n));
  }
}

function power(base: number, n: number): number {
  if (n === 2) return base * base;
  if (n === 1) return base;
  return base === 0 ? 0 : pow(base, n);
}

function logPower(base: number, n: number): number {
  return base === 0 ? 0 : power(base, n) * ln(base);
}
