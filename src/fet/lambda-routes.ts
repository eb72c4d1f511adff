// Channel-length modulation from an output conductance.
//
// In saturation I_D = I_0 (1 + lambda V_DS) and g_os = lambda I_0, so lambda = g_os / (I_D - g_os V_DS)
// with I_D at that V_DS. g_os without a current means at V_GS = 0, where the current is I_DSS at its
// own V_DS.

import type { NamedKernel } from './kernel.ts';
import { MISSING, NOT_POSITIVE, OK, OUTPUT_CONDUCTANCE, WRONG_SIGN } from './route-status.ts';

const OUTPUTS = ['lambda', 'status'] as const;

function kernel(current: string, vds: string): NamedKernel {
  return {
    inputs: ['channel', 'g_os', current, vds],
    outputs: OUTPUTS,
    run(s, a, p) {
      const gos = s[a[p + 1]];
      const drain = s[a[p + 2]];
      const stated = s[a[p + 3]];
      const forward = stated !== stated ? 0 : s[a[p]] * stated;
      const edge = drain - gos * forward;
      let status = OK;
      if (gos !== gos || drain !== drain) status = MISSING;
      else if (gos < 0 || !(drain > 0)) status = NOT_POSITIVE;
      else if (forward < 0) status = WRONG_SIGN;
      else if (!(edge > 0)) status = OUTPUT_CONDUCTANCE;
      s[a[p + 4]] = status === OK ? gos / edge : NaN;
      s[a[p + 5]] = status;
    },
  };
}

interface LambdaRoute extends NamedKernel {
  readonly id: string;
  /** Names that must be given. */
  readonly needs: readonly string[];
}

/** lambda in 1/V from g_os, the first whose `needs` are given; V_DS is taken as 0 where it is not stated. */
export const LAMBDA_ROUTES: readonly LambdaRoute[] = [
  { id: 'lambda from g_os at I_D', needs: ['g_os', 'g_os@I_D'], ...kernel('g_os@I_D', 'g_os@V_DS') },
  { id: 'lambda from g_os at I_DSS', needs: ['g_os', 'I_DSS'], ...kernel('I_DSS', 'I_DSS@V_DS') },
];
