// The one-stage bench written out by hand, as fast as a loop in this language is: the reference of the ratios.

import { CELLS, FIXED, INPUT_NAMES, SUMMED } from './inputs.ts';
import type { InputName } from './inputs.ts';

type Columns = Readonly<Record<InputName, Float64Array>>;

/** I_D, V_ov, V_DS of the solve that ended last. */
export const point = new Float64Array(3);

/**
 * Operating point of V_ov = A - r I, V_DS = b - R I into `point`. The region comes first; then Newton's steps, kept in
 * their bracket, on V_ov when saturated and on V_DS when ohmic.
 */
export function solvePoint(beta: number, lambda: number, A: number, r: number, b: number, R: number): void {
  if (A <= 0) {
    point[0] = 0;
    point[1] = A;
    point[2] = b;
    return;
  }
  const crossing = (b - A) / (R - r);
  const over = A - r * crossing;
  if (b <= A || (over > 0 && crossing < beta * over * over * (1 + lambda * over))) solveOhmic(beta, lambda, A, r, b, R);
  else solveSaturated(beta, lambda, A, r, b, R);
}

function solveSaturated(beta: number, lambda: number, A: number, r: number, b: number, R: number): void {
  const K = beta * lambda * R;
  const early = beta * (1 + lambda * b);
  const q = r * early;
  let low = (2 * A) / (1 + Math.sqrt(1 + 4 * q * A));
  let high = A;
  let x = low;
  for (let step = 0; step < 100; step++) {
    const g = 1 / (1 + K * x * x);
    const h = x - A + q * x * x * g;
    if (h > 0) high = x;
    else low = x;
    let next = x - h / (1 + 2 * q * x * g * g);
    if (!(next >= low && next <= high)) next = (low + high) / 2;
    const done = Math.abs(next - x) <= 1e-10 * x;
    x = next;
    if (done) break;
  }
  const I = (early * x * x) / (1 + K * x * x);
  point[0] = I;
  point[1] = x;
  point[2] = Math.max(x, b - R * I);
}

function solveOhmic(beta: number, lambda: number, A: number, r: number, b: number, R: number): void {
  const k = r / R;
  const m = 2 * k - 1;
  const c = Math.max(0, A - k * b);
  const bR = beta * R;
  const B = 1 + 2 * bR * c;
  let low = 0;
  let high = Math.min(b, c / (1 - k));
  let y = Math.min(high, (2 * b) / (B + Math.sqrt(Math.max(0, B * B + 4 * bR * m * b))));
  for (let step = 0; step < 100; step++) {
    const g = 2 * c + m * y;
    const e = 1 + lambda * y;
    const h = y - b + bR * y * g * e;
    if (h > 0) high = y;
    else low = y;
    let next = y - h / (1 + bR * ((g + m * y) * e + lambda * y * g));
    if (!(next >= low && next <= high)) next = (low + high) / 2;
    const done = Math.abs(next - y) <= 1e-10 * y;
    y = next;
    if (done) break;
  }
  point[0] = 2 * y > b ? beta * y * (2 * c + m * y) * (1 + lambda * y) : (b - y) / R;
  point[1] = Math.max(y, c + k * y);
  point[2] = y;
}

/** Computes the cells of all samples, each sample into `row`; answers with the sums of the summed cells together. */
export function createHandLoop(columns: Columns): {
  row: Float64Array;
  runOne: (i: number) => void;
  run: () => number;
} {
  const [vdd, r1, r2, rd, rs, idss, vp, lambdas] = INPUT_NAMES.map((name) => columns[name]);
  const { R_L, C_1, C_2, C_S } = FIXED;
  const row = new Float64Array(CELLS.length);
  const runOne = (i: number): void => {
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
    row[0] = V_GG;
    row[1] = R_in;
    row[2] = beta;
    row[3] = A;
    row[4] = R_DS;
    row[5] = I_D;
    row[6] = V_ov;
    row[7] = V_DS;
    row[8] = margin;
    row[9] = V_S;
    row[10] = V_DD - I_D * R_D;
    row[11] = V_GG - V_S;
    row[12] = I_div;
    row[13] = V_DS * I_D;
    row[14] = I_D * I_D * R_D;
    row[15] = I_D * I_D * R_S;
    row[16] = V_DD * (I_D + I_div);
    row[17] = V_ch;
    row[18] = early;
    row[19] = g_m;
    row[20] = g_ds;
    row[21] = r_o;
    row[22] = R_ac;
    row[23] = A_v;
    row[24] = 20 * Math.log10(Math.abs(A_v));
    row[25] = A_deg;
    row[26] = 20 * Math.log10(Math.abs(A_deg));
    row[27] = R_out;
    row[28] = r_deg;
    row[29] = (R_D * r_deg) / (R_D + r_deg);
    row[30] = R_src;
    row[31] = 1 / (2 * Math.PI * R_in * C_1);
    row[32] = 1 / (2 * Math.PI * R_src * C_S);
    row[33] = 1 / (2 * Math.PI * (R_out + R_L) * C_2);
    row[34] = swing_up;
    row[35] = Math.min(swing_up, margin);
    row[36] = g_m0;
    row[37] = g_m / g_m0;
    row[38] = margin / V_DD;
  };
  const run = (): number => {
    let sum = 0;
    for (let i = 0; i < vdd.length; i++) {
      runOne(i);
      for (let k = 0; k < SUMMED.length; k++) sum += row[SUMMED[k]];
    }
    return sum;
  };
  return { row, runOne, run };
}
