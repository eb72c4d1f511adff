// The junction temperature at which a FET's own heat keeps it: T = T_A + R_thJA P(T).
//
// H(T) = T - T_A - R_thJA P(T) is not above 0 at T_A. It is scanned in equal steps from T_A up to a ceiling, and every
// step over which its sign changes holds a thermal root. A FET that starts cold warms up to the first of them,
// which is stable; where there is none below the ceiling it runs away.

import { solveBracketed } from '../numeric/index.ts';

/** Junction temperature in K above which no balance is looked for. */
export const THERMAL_CEILING = 600;

/** Steps of the scan: 4.7 K each from 25 °C. */
export const SCAN_STEPS = 64;

/** How many thermal roots the last balance found below the ceiling. */
export const thermalRoots = new Int32Array(1);

/** Steps that are skipped at once where the power is known to be too small for a root in them. */
export const CHUNK = 8;

/** Above 1 by more than rounding. */
export const ROUNDING = 1 + 1e-9;

/**
 * The cold-start junction temperature in K for a dissipation `power(T)` in W; NaN where the FET runs away or power is NaN.
 * `staysBelow(T, watts)` says whether the power is known to stay below `watts` at T and below it.
 */
export function balanceHeat(
  ambient: number,
  rth: number,
  power: (T: number) => number,
  staysBelow: (T: number, watts: number) => boolean,
): number {
  balance[AMBIENT] = ambient;
  balance[RTH] = rth;
  powerAt = power;
  thermalRoots[0] = 1;
  let before = ambient - ambient - rth * power(ambient);
  if (before === 0) return ambient;
  thermalRoots[0] = 0;
  if (!(ambient < THERMAL_CEILING)) return NaN;
  const step = (THERMAL_CEILING - ambient) / SCAN_STEPS;
  let first = NaN;
  balance[FROM] = ambient;
  for (let n = 1; n <= SCAN_STEPS; n++) {
    if (before > 0) {
      // H is above 0 at every step up to the end of the chunk: none of them has to be looked at.
      const last = n + CHUNK - 1 - ((n - 1) % CHUNK);
      if (staysBelow(ambient + last * step, (n * step) / rth)) {
        n = last;
        balance[FROM] = NaN;
        continue;
      }
    }
    const T = ambient + n * step;
    const here = T - ambient - rth * power(T);
    balance[TO] = T;
    balance[EXCESS_FROM] = before;
    balance[EXCESS_TO] = here;
    if (here > 0 !== before > 0) {
      thermalRoots[0]++;
      if (thermalRoots[0] === 1) first = solveBracketed(excess, T - step, T).value;
    }
    before = here;
    balance[FROM] = T;
  }
  return first;
}

/** The balance in hand, and the ends of its step with the excess there, with which the search for a root begins. */
const balance = new Float64Array(6);
const [AMBIENT, RTH, FROM, TO, EXCESS_FROM, EXCESS_TO] = [0, 1, 2, 3, 4, 5];
let powerAt: (T: number) => number;

function excess(T: number): number {
  if (T === balance[FROM]) return balance[EXCESS_FROM];
  if (T === balance[TO]) return balance[EXCESS_TO];
  return T - balance[AMBIENT] - balance[RTH] * powerAt(T);
}
