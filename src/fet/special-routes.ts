// The routes that are not a threshold line with a gain line: I_DSS with beta, I_DSS with g_fs0, and
// R_DSon lines alone.

import type { NamedKernel } from './kernel.ts';
import { PAIR_OUTPUTS, writePair } from './pair-solution.ts';
import { COMMON_INPUTS, CURRENT, I_DSS, KNEE, RECORD_LENGTH } from './route-legs.ts';
import {
  LINES_DISAGREE,
  MISSING,
  NOT_POSITIVE,
  NOT_SATURATED,
  OK,
  SERIES_RESISTANCE,
  WRONG_SIGN,
} from './route-status.ts';

const RECORD = new Float64Array(RECORD_LENGTH);
const FIRST = COMMON_INPUTS.length;
/** R_0 of lines without any comes out this far below 0 at most, as a part of R. */
const ROUNDING = 1e-9;
const orZero = (x: number): number => (x !== x ? 0 : x);

/** |V_TO| = sqrt(I_DSS / beta); where I_DSS stands in the ohmic region, I_DSS = beta V_DS (2 |V_TO| - V_DS). */
export const I_DSS_AND_BETA: NamedKernel = {
  inputs: [...COMMON_INPUTS, ...I_DSS.inputs, 'beta'],
  outputs: PAIR_OUTPUTS,
  run(s, a, p) {
    const beta = s[a[p + FIRST + 2]];
    let status = I_DSS.read(s, a, p, p + FIRST, RECORD);
    if (beta !== beta) status = MISSING;
    else if (status === OK && !(beta > 0)) status = NOT_POSITIVE;
    const square = RECORD[CURRENT] / beta;
    const root = Math.sqrt(square);
    const knee = RECORD[KNEE];
    writePair(s, a, p + FIRST + 3, beta, root <= knee ? -root : -(square / knee + knee) / 2, status);
  },
};

/** g_fs0 = 2 I_DSS / |V_TO|, both at V_GS = 0 in saturation: beta = g_fs0^2 / (4 I_DSS). */
export const G_FS0_AND_I_DSS: NamedKernel = {
  inputs: [...COMMON_INPUTS, ...I_DSS.inputs, 'g_fs0', 'g_fs0@V_DS'],
  outputs: PAIR_OUTPUTS,
  run(s, a, p) {
    const stated = s[a[p + FIRST + 2]];
    const vds = s[a[p + FIRST + 3]];
    const forward = vds !== vds ? Infinity : s[a[p]] * vds;
    const gfs = vds !== vds ? stated : stated / (1 + orZero(s[a[p + 1]]) * forward);
    let status = I_DSS.read(s, a, p, p + FIRST, RECORD);
    const current = RECORD[CURRENT];
    const drive = (2 * current) / gfs;
    if (stated !== stated) status = MISSING;
    else if (status === OK && !(stated > 0)) status = NOT_POSITIVE;
    else if (status === OK && !(forward > 0)) status = WRONG_SIGN;
    else if (status === OK && drive > Math.min(RECORD[KNEE], forward)) status = NOT_SATURATED;
    writePair(s, a, p + FIRST + 4, (gfs * gfs) / (4 * current), -drive, status);
  },
};

const LINE_FIELDS = ['R_DSon', 'R_DSon2', 'R_DSon3'];
const lineInputs = (count: number): string[] =>
  LINE_FIELDS.slice(0, count).flatMap((field) => [field, `${field}@V_GS`, `${field}@I_D`]);

/** The status of `count` R_DSon lines by themselves. */
function checkLines(s: Float64Array, a: Int32Array, at: number, count: number): number {
  for (let k = 0; k < count; k++) {
    const resistance = s[a[at + 3 * k]];
    const gate = s[a[at + 3 * k + 1]];
    if (resistance !== resistance || gate !== gate) return MISSING;
    if (!(resistance > 0) || s[a[at + 3 * k + 2]] < 0) return NOT_POSITIVE;
  }
  return OK;
}

/** V_GS - V_DS / 2 of a line in the n-channel frame, the drive its conductance is proportional to but for V_TO. */
function meanGate(s: Float64Array, a: Int32Array, p: number, at: number): number {
  return s[a[p]] * s[a[at + 1]] - 0.5 * orZero(s[a[at + 2]]) * s[a[at]];
}

/** Whether the channel of a line is ohmic, given V_TO: V_DS below the drive. */
function isOhmic(s: Float64Array, a: Int32Array, p: number, at: number, vto: number): boolean {
  return s[a[p]] * s[a[at + 1]] - vto > orZero(s[a[at + 2]]) * s[a[at]];
}

/** 1 / (R - R_0) = 2 beta (z - V_TO), z = V_GS - V_DS / 2: a straight line through two points. */
export const TWO_R_DSON: NamedKernel = {
  inputs: [...COMMON_INPUTS, ...lineInputs(2)],
  outputs: PAIR_OUTPUTS,
  run(s, a, p) {
    const at = p + FIRST;
    const series = orZero(s[a[p + 4]]) + orZero(s[a[p + 5]]);
    const r1 = s[a[at]] - series;
    const r2 = s[a[at + 3]] - series;
    const z1 = meanGate(s, a, p, at);
    const z2 = meanGate(s, a, p, at + 3);
    // (1/r2 - 1/r1) / (z2 - z1), with one subtraction.
    const beta = (r1 - r2) / (2 * r1 * r2 * (z2 - z1));
    const vto = (r1 * z1 - r2 * z2) / (r1 - r2);
    let status = checkLines(s, a, at, 2);
    if (status === OK && !(r1 > 0 && r2 > 0)) status = SERIES_RESISTANCE;
    if (status === OK) status = lineStatus(s, a, p, at, 2, beta, vto);
    writePair(s, a, at + 6, beta, vto, status);
  },
};

/** (z - V_TO)(R - R_0) = 1 / (2 beta): a hyperbola through three points, linear in R_0 and V_TO when two points are subtracted. */
export const THREE_R_DSON: NamedKernel = {
  inputs: [...COMMON_INPUTS, ...lineInputs(3)],
  outputs: [...PAIR_OUTPUTS, 'R_0'],
  run(s, a, p) {
    const at = p + FIRST;
    const r1 = s[a[at]];
    const r2 = s[a[at + 3]];
    const r3 = s[a[at + 6]];
    const z1 = meanGate(s, a, p, at);
    const z2 = meanGate(s, a, p, at + 3);
    const z3 = meanGate(s, a, p, at + 6);
    // Measured from the third point: (z - z3)(R - r3) = (z - z3) R_0' + (R - r3) V', R_0' = R_0 - r3, V' = V_TO - z3.
    const za = z1 - z3;
    const zb = z2 - z3;
    const ra = r1 - r3;
    const rb = r2 - r3;
    const determinant = za * rb - zb * ra;
    const series = r3 + (ra * rb * (za - zb)) / determinant;
    const vto = z3 + (za * zb * (rb - ra)) / determinant;
    const beta = 1 / (2 * (z3 - vto) * (r3 - series));
    let status = checkLines(s, a, at, 3);
    if (status === OK && !(series >= -ROUNDING * r3 && r1 > series && r2 > series && r3 > series))
      status = LINES_DISAGREE;
    if (status === OK) status = lineStatus(s, a, p, at, 3, beta, vto);
    writePair(s, a, at + 9, beta, vto, status);
    s[a[at + 12]] = status === OK ? Math.max(0, series) : NaN;
  },
};

function lineStatus(
  s: Float64Array,
  a: Int32Array,
  p: number,
  at: number,
  count: number,
  beta: number,
  vto: number,
): number {
  if (!(beta > 0 && beta < Infinity && Math.abs(vto) < Infinity)) return LINES_DISAGREE;
  for (let k = 0; k < count; k++) if (!isOhmic(s, a, p, at + 3 * k, vto)) return LINES_DISAGREE;
  return OK;
}
