// The one-stage bench written out by hand over many samples, one loop from the inputs to the results: the reference of
// the columnar forms.

import { point, solvePoint } from './hand.ts';
import { CELLS, FIXED, INPUT_NAMES, SUMMED } from './inputs.ts';
import type { InputName } from './inputs.ts';

type Columns = Readonly<Record<InputName, Float64Array>>;

interface HandColumns {
  /** A column for each cell that is kept. */
  readonly outputs: readonly Float64Array[];
  /** Computes them all; answers with the sum of the summed cells. */
  readonly run: () => number;
}

/** Every cell of every sample. */
export function createHandColumns(columns: Columns): HandColumns {
  const [vdd, r1, r2, rd, rs, idss, vp, lambdas] = INPUT_NAMES.map((name) => columns[name]);
  const { R_L, C_1, C_2, C_S } = FIXED;
  const count = vdd.length;
  const stride = count + 24;
  const all = new Float64Array(stride * CELLS.length);
  const outputs = CELLS.map((_, k) => all.subarray(k * stride, k * stride + count));
  const loop = (): void => {
    for (let i = 0; i < count; i++) {
      const V_DD = vdd[i];
      const R_1 = r1[i];
      const R_2 = r2[i];
      const R_D = rd[i];
      const R_S = rs[i];
      const I_DSS = idss[i];
      const V_P = vp[i];
      const lambda = lambdas[i];
      const R_12 = R_1 + R_2;
      const V_GG = (V_DD * R_2) / R_12;
      const R_in = (R_1 * R_2) / R_12;
      const beta = I_DSS / (V_P * V_P);
      const A = V_GG - V_P;
      const R_DS = R_D + R_S;
      solvePoint(beta, lambda, A, R_S, V_DD, R_DS);
      const I_D = point[0];
      const V_ov = point[1];
      const V_DS = point[2];
      const margin = V_DS - V_ov;
      const V_S = I_D * R_S;
      const I_div = V_DD / R_12;
      const V_ch = Math.min(V_ov, V_DS);
      const early = 1 + lambda * V_DS;
      const g_m = 2 * beta * V_ch * early;
      const g_ds = 2 * beta * (V_ov - V_ch) * early + lambda * beta * V_ch * (2 * V_ov - V_ch);
      const r_o = 1 / g_ds;
      const R_ac = (R_D * R_L) / (R_D + R_L);
      const A_v = -((g_m * (r_o * R_ac)) / (r_o + R_ac));
      const A_deg = -((g_m * R_ac) / (1 + g_m * R_S + (R_ac + R_S) / r_o));
      const R_out = (R_D * r_o) / (R_D + r_o);
      const r_deg = r_o + R_S * (1 + g_m * r_o);
      const R_src = R_S / (1 + g_m * R_S);
      const swing_up = I_D * R_ac;
      const g_m0 = -((2 * I_DSS) / V_P);
      all[i] = V_GG;
      all[i + stride] = R_in;
      all[i + 2 * stride] = beta;
      all[i + 3 * stride] = A;
      all[i + 4 * stride] = R_DS;
      all[i + 5 * stride] = I_D;
      all[i + 6 * stride] = V_ov;
      all[i + 7 * stride] = V_DS;
      all[i + 8 * stride] = margin;
      all[i + 9 * stride] = V_S;
      all[i + 10 * stride] = V_DD - I_D * R_D;
      all[i + 11 * stride] = V_GG - V_S;
      all[i + 12 * stride] = I_div;
      all[i + 13 * stride] = V_DS * I_D;
      all[i + 14 * stride] = I_D * I_D * R_D;
      all[i + 15 * stride] = I_D * I_D * R_S;
      all[i + 16 * stride] = V_DD * (I_D + I_div);
      all[i + 17 * stride] = V_ch;
      all[i + 18 * stride] = early;
      all[i + 19 * stride] = g_m;
      all[i + 20 * stride] = g_ds;
      all[i + 21 * stride] = r_o;
      all[i + 22 * stride] = R_ac;
      all[i + 23 * stride] = A_v;
      all[i + 24 * stride] = 20 * Math.log10(Math.abs(A_v));
      all[i + 25 * stride] = A_deg;
      all[i + 26 * stride] = 20 * Math.log10(Math.abs(A_deg));
      all[i + 27 * stride] = R_out;
      all[i + 28 * stride] = r_deg;
      all[i + 29 * stride] = (R_D * r_deg) / (R_D + r_deg);
      all[i + 30 * stride] = R_src;
      all[i + 31 * stride] = 1 / (2 * Math.PI * R_in * C_1);
      all[i + 32 * stride] = 1 / (2 * Math.PI * R_src * C_S);
      all[i + 33 * stride] = 1 / (2 * Math.PI * (R_out + R_L) * C_2);
      all[i + 34 * stride] = swing_up;
      all[i + 35 * stride] = Math.min(swing_up, margin);
      all[i + 36 * stride] = g_m0;
      all[i + 37 * stride] = g_m / g_m0;
      all[i + 38 * stride] = margin / V_DD;
    }
  };
  const summed = SUMMED.map((k) => outputs[k]);
  return { outputs, run: () => (loop(), sumOf(summed)) };
}

/** What the summed cells need, and nothing else. */
export function createHandSums(columns: Columns): HandColumns {
  const [vdd, r1, r2, rd, rs, idss, vp, lambdas] = INPUT_NAMES.map((name) => columns[name]);
  const { R_L } = FIXED;
  const count = vdd.length;
  const outputs = SUMMED.map(() => new Float64Array(count + 24).subarray(0, count));
  const [currents, margins, slopes, gains, powers, impedances] = outputs;
  const loop = (): void => {
    for (let i = 0; i < count; i++) {
      const V_DD = vdd[i];
      const R_2 = r2[i];
      const R_D = rd[i];
      const R_S = rs[i];
      const V_P = vp[i];
      const lambda = lambdas[i];
      const beta = idss[i] / (V_P * V_P);
      solvePoint(beta, lambda, (V_DD * R_2) / (r1[i] + R_2) - V_P, R_S, V_DD, R_D + R_S);
      const I_D = point[0];
      const V_ov = point[1];
      const V_DS = point[2];
      const V_ch = Math.min(V_ov, V_DS);
      const early = 1 + lambda * V_DS;
      const g_m = 2 * beta * V_ch * early;
      const r_o = 1 / (2 * beta * (V_ov - V_ch) * early + lambda * beta * V_ch * (2 * V_ov - V_ch));
      const R_ac = (R_D * R_L) / (R_D + R_L);
      currents[i] = I_D;
      margins[i] = V_DS - V_ov;
      slopes[i] = g_m;
      gains[i] = 20 * Math.log10(Math.abs((g_m * (r_o * R_ac)) / (r_o + R_ac)));
      powers[i] = V_DS * I_D;
      impedances[i] = (R_D * r_o) / (R_D + r_o);
    }
  };
  return { outputs, run: () => (loop(), sumOf(outputs)) };
}

/** The numbers of some columns together. */
export function sumOf(columns: readonly Float64Array[]): number {
  let sum = 0;
  for (const column of columns) for (let i = 0; i < column.length; i++) sum += column[i];
  return sum;
}
