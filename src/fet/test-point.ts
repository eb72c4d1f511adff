// V_GS(off) and V_GS(th): a gate voltage at which a small test current flows, below where the square law
// holds.
//
// The interpolation between weak inversion and the square law,
//     I = I_s ln(1 + exp((V_GS - V_TO) / (2 n V_T)))^2,  I_s = 4 n^2 beta V_T^2,
// solved for the drive is V_GS - V_TO = 2 n V_T ln(exp(sqrt(I / I_s)) - 1). It tends to sqrt(I / beta)
// well above I_s.
//
// Where beta is not known but tied to V_TO by another line (I_DSS, I_on, R_DSon), the unknown is
// U = V_ref - V_TO with V_ref the gate voltage of that line. That line gives sqrt(I / beta) = S(U):
// proportional to U while it stands in saturation (U <= knee), sqrt(c (2 U - knee)) where it stands in
// the ohmic region. S is concave and ln(exp x - 1) is concave and rising, so
//     h(U) = U - (V_ref - V_test) - 2 n V_T ln(exp(S(U) / (2 n V_T)) - 1)
// is convex: two roots or none. The larger one is the device (it tends to the square law alone as n V_T
// tends to 0), and Newton's rule from its right falls onto it without ever passing it. Where there is no
// root the slope turns negative on the way, and the status says so.
//
// Source: C. C. Enz, F. Krummenacher and E. A. Vittoz, Analog Integrated Circuits and Signal Processing
// 8 (1995), interpolation function; here with V_TO as its threshold.

import { exp, expm1, ln, log1p } from '../numeric/index.ts';
import { thermalVoltage } from './constants.ts';

const CAP = 200;

/** 2 n V_T in V, the voltage in which drives around the threshold are counted; temperature in K. */
export function inversionUnit(n: number, temperature: number): number {
  return 2 * n * thermalVoltage(temperature);
}

/** V_GS - V_TO in V at which `current` flows; current in A and beta in A/V^2 above 0, unit = 2 n V_T. */
export function testPointDrive(current: number, beta: number, unit: number): number {
  return unit * lnExpm1(Math.sqrt(current / beta) / unit);
}

/**
 * U = V_ref - V_TO in V where the other line ties beta to U; NaN where there is none. `distance` is V_ref - V_test > 0;
 * sqrt(I_test / beta) is ratio U up to `knee`, sqrt(slope (2 U - knee)) beyond; unit is 2 n V_T.
 */
export function solveTiedDrive(distance: number, ratio: number, slope: number, knee: number, unit: number): number {
  let u = distance / (1 - ratio);
  if (!(ratio < 1 && u <= knee)) {
    if (knee === Infinity) return NaN;
    u = Math.max(distance + slope + Math.sqrt(Math.max(0, slope * (2 * distance + slope - knee))), knee);
  }
  for (let k = 0; k < CAP; k++) {
    const saturated = u <= knee;
    const root = saturated ? ratio * u : Math.sqrt(slope * (2 * u - knee));
    const x = root / unit;
    const excess = u - distance - unit * lnExpm1(x);
    const rise = 1 + (saturated ? ratio : slope / root) / expm1(-x);
    if (!(rise > 0)) return NaN;
    const next = u - excess / rise;
    if (!(next > 0)) return NaN;
    if (next >= u || u - next <= Number.EPSILON * u) return next;
    u = next;
  }
  return NaN;
}

/** ln(e^x - 1) for x > 0, without overflow. */
function lnExpm1(x: number): number {
  return x > 1 ? x + log1p(-exp(-x)) : ln(expm1(x));
}
