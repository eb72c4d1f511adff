// The junction temperature at which a FET's own heat keeps it: T = T_A + R_thJA P(T).
//
// H(T) = T - T_A - R_thJA P(T) is not above 0 at T_A. It is scanned in equal steps from T_A up to a ceiling, and every
// step over which its sign changes holds a thermal root. A FET that starts cold warms up to the first of them,
// which is stable; where there is none below the ceiling it runs away.

import { solveBracketed } from '../numeric/index.ts';

/** Junction temperature in K above which no balance is looked for. */
export const THERMAL_CEILING = 600;

/** Steps of the scan: 4.7 K each from 25 °C. */
const SCAN_STEPS = 64;

/** How many thermal roots the last balance found below the ceiling. */
export const thermalRoots = new Int32Array(1);

/** Steps that are skipped at once where the power is known to be too small for a root in them. */
const CHUNK = 8;

/**
 * The cold-start junction temperature in K for a dissipation `power(T)` in W; NaN where the FET runs away or power is NaN.
 * `most(T)` is a power in W that is not exceeded at T or below; Infinity where nothing is known.
 */
export function balanceHeat(
  ambient: number,
  rth: number,
  power: (T: number) => number,
  most: (T: number) => number,
): number {
  const excess = (T: number): number => T - ambient - rth * power(T);
  thermalRoots[0] = 1;
  let before = excess(ambient);
  if (before === 0) return ambient;
  thermalRoots[0] = 0;
  if (!(ambient < THERMAL_CEILING)) return NaN;
  const step = (THERMAL_CEILING - ambient) / SCAN_STEPS;
  let first = NaN;
  for (let n = 1; n <= SCAN_STEPS; n++) {
    if (before > 0) {
      // H is above 0 at every step up to the end of the chunk: none of them has to be looked at.
      const last = n + CHUNK - 1 - ((n - 1) % CHUNK);
      if (n * step > rth * most(ambient + last * step)) {
        n = last;
        continue;
      }
    }
    const T = ambient + n * step;
    const here = excess(T);
    if (here > 0 !== before > 0) {
      thermalRoots[0]++;
      if (thermalRoots[0] === 1) first = solveBracketed(excess, T - step, T).value;
    }
    before = here;
  }
  return first;
}
