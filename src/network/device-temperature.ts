// Kernels that carry a device's constants from T_nom to a given temperature.

import { betaAt, leakageAt, thresholdAt } from '../fet/index.ts';
import type { Kernel } from './kernel.ts';

/** beta (A/V²) and V_TO (V) at the temperature T, both of them untouched at T_nom. */
export const deviceAtTemperature: Kernel = {
  inputs: ['beta', 'beta_exponent', 'V_TO', 'tempco', 'T_nom', 'T'],
  outputs: ['beta', 'V_TO'],
  run(s, a, p) {
    const nominal = s[a[p + 4]];
    const T = s[a[p + 5]];
    s[a[p + 6]] = T === nominal ? s[a[p]] : betaAt(s[a[p]], s[a[p + 1]], T, nominal);
    s[a[p + 7]] = thresholdAt(s[a[p + 2]], s[a[p + 3]], T, nominal);
  },
  lanes: `
    mobility = power(T / T_nom, beta_exponent)
    beta_out = select(T == T_nom, beta, beta * mobility)
    V_TO_out = V_TO + tempco * (T - T_nom)`,
};

/** Gate leakage (A) at the temperature T. */
export const gateLeakage: Kernel = {
  inputs: ['I_GSS', 'doubling', 'T_nom', 'T'],
  outputs: ['I_G'],
  run(s, a, p) {
    const nominal = s[a[p + 2]];
    const T = s[a[p + 3]];
    s[a[p + 4]] = T === nominal ? s[a[p]] : leakageAt(s[a[p]], s[a[p + 1]], T, nominal);
  },
  lanes: `
    growth = power(2, (T - T_nom) / doubling)
    I_G = select(T == T_nom, I_GSS, I_GSS * growth)`,
};
