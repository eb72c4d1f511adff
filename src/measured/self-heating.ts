// How warm a specimen became while it was measured.

import type { Points } from './points.ts';

/** The largest rise of the junction over ambient in K, had each reading been held until it settled, P R_thJA; and at which reading. */
export function selfHeating({ V_DS, I_D }: Points, R_thJA: number): { readonly worst: number; readonly index: number } {
  let [worst, index] = [0, 0];
  for (let i = 0; i < I_D.length; i++) {
    const rise = Math.abs(V_DS[i]! * I_D[i]!) * R_thJA;
    if (rise > worst) [worst, index] = [rise, i];
  }
  return { worst, index };
}
