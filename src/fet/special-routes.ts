// The routes that are not a threshold line with a gain line: I_DSS with beta, I_DSS with g_fs0, and
// R_DSon lines alone.

import type { NamedKernel } from './kernel.ts';
import { PAIR_OUTPUTS, writePair } from './pair-solution.ts';
import {
  COMMON_INPUTS,
  CURRENT,
  I_DSS,
  KNEE,
  RECORD_LENGTH,
  REFERENCE,
  channelTransconductance,
  kneeOf,
  lengthening,
  sourceDrop,
  vdsStatus,
} from './route-legs.ts';
import { LEADS, LINES_DISAGREE, MISSING, NOT_POSITIVE, NOT_SATURATED, OK, SERIES_RESISTANCE } from './route-status.ts';

const RECORD = new Float64Array(RECORD_LENGTH);
const FIRST = COMMON_INPUTS.length;
/** R_0 of lines without any comes out this far below 0 at most, as a part of R. */
const ROUNDING = 1e-9;
/** Times that a number is put in again at most. */
const CAP = 60;
const orZero = (x: number): number => (x !== x ? 0 : x);

/** |V_ov| = sqrt(I_DSS / beta); where I_DSS stands in the ohmic region, I_DSS = beta V_DS (2 V_ov - V_DS). */
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
    const drive = root <= knee ? root : (square / knee + knee) / 2;
    writePair(s, a, p + FIRST + 3, beta, RECORD[REFERENCE] - drive, status);
  },
};

/**
 * g_m = 2 beta V_ov (1 + lambda V_DS) of g_fs0 beside I_DSS = beta V_ov^2 (1 + lambda V_DS), both at V_GS = 0 in saturation. At
 * another V_DS than that of I_DSS another current flows, and with r_s another V_ov stands: its current is put in again until it
 * stays, which without lambda or r_s it does at once.
 */
export const G_FS0_AND_I_DSS: NamedKernel = {
  inputs: [...COMMON_INPUTS, ...I_DSS.inputs, 'g_fs0', 'g_fs0@V_DS'],
  outputs: PAIR_OUTPUTS,
  run(s, a, p) {
    const drain = s[a[p + FIRST]];
    const stated = s[a[p + FIRST + 2]];
    const vds = s[a[p + FIRST + 3]];
    let status = I_DSS.read(s, a, p, p + FIRST, RECORD);
    const edge = RECORD[CURRENT];
    let current = drain;
    let drive = NaN;
    let knee = NaN;
    for (let k = 0; k < CAP; k++) {
      const lift = lengthening(s, a, p, vds, current);
      const gm = channelTransconductance(s, a, p, stated, current, vds);
      const further = sourceDrop(s, a, p, drain - current);
      // gm drive^2 = c (drive + further)
      const c = 2 * edge * lift;
      drive = (c + Math.sqrt(c * c + 4 * gm * c * further)) / (2 * gm);
      const ratio = (drive + further) / drive;
      const next = edge * ratio * ratio * lift;
      knee = kneeOf(s, a, p, vds, current);
      if (Math.abs(next - current) <= 2 * Number.EPSILON * current) break;
      current = next;
    }
    if (stated !== stated) status = MISSING;
    else if (status === OK && !(stated > 0)) status = NOT_POSITIVE;
    if (status === OK) status = vdsStatus(s, a, p, vds, current);
    if (status === OK && !(drive > 0 && drive < Infinity)) status = LEADS;
    if (status === OK && drive > Math.min(RECORD[KNEE], knee)) status = NOT_SATURATED;
    writePair(s, a, p + FIRST + 4, edge / (drive * drive), RECORD[REFERENCE] - drive, status);
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

/** V_DS of the channel of a line whose leads have `series`, in V in the n-channel frame. */
function lineVds(s: Float64Array, a: Int32Array, at: number, series: number): number {
  return orZero(s[a[at + 2]]) * (s[a[at]] - series);
}

/** V_GS - V_DS / 2 of the channel, the drive its conductance is proportional to but for V_TO. */
function meanGate(s: Float64Array, a: Int32Array, p: number, at: number, series: number): number {
  return s[a[p]] * s[a[at + 1]] - sourceDrop(s, a, p, s[a[at + 2]]) - 0.5 * lineVds(s, a, at, series);
}

/** Resistance of the channel of a line, in ohm, as it would be without lambda. */
function channelPart(s: Float64Array, a: Int32Array, p: number, at: number, series: number): number {
  return (s[a[at]] - series) * (1 + orZero(s[a[p + 1]]) * lineVds(s, a, at, series));
}

/** Whether the channel of a line is ohmic: V_DS below the drive. */
function isOhmic(s: Float64Array, a: Int32Array, p: number, at: number, vto: number, series: number): boolean {
  const drive = s[a[p]] * s[a[at + 1]] - sourceDrop(s, a, p, s[a[at + 2]]) - vto;
  return drive > lineVds(s, a, at, series);
}

/** 1 / (R - R_0) = 2 beta (z - V_TO), z = V_GS - V_DS / 2: a straight line through two points. */
export const TWO_R_DSON: NamedKernel = {
  inputs: [...COMMON_INPUTS, ...lineInputs(2)],
  outputs: PAIR_OUTPUTS,
  run(s, a, p) {
    const at = p + FIRST;
    const series = orZero(s[a[p + 4]]) + orZero(s[a[p + 5]]);
    const r1 = channelPart(s, a, p, at, series);
    const r2 = channelPart(s, a, p, at + 3, series);
    const z1 = meanGate(s, a, p, at, series);
    const z2 = meanGate(s, a, p, at + 3, series);
    // (1/r2 - 1/r1) / (z2 - z1), with one subtraction.
    const beta = (r1 - r2) / (2 * r1 * r2 * (z2 - z1));
    const vto = (r1 * z1 - r2 * z2) / (r1 - r2);
    let status = checkLines(s, a, at, 2);
    if (status === OK && !(r1 > 0 && r2 > 0)) status = SERIES_RESISTANCE;
    if (status === OK) status = lineStatus(s, a, p, at, 2, beta, vto, series);
    writePair(s, a, at + 6, beta, vto, status);
  },
};

/** beta, V_TO and R_0 of three lines. */
const THREE = new Float64Array(3);

/**
 * (z - V_TO)(R - R_0) = 1 / (2 beta): a hyperbola through three points, linear in R_0 and V_TO when two points are subtracted.
 * At a stated current z and, with lambda, R - R_0 hold R_0 themselves: what comes out is put in again, by the secant rule,
 * until it stays.
 */
export const THREE_R_DSON: NamedKernel = {
  inputs: [...COMMON_INPUTS, ...lineInputs(3)],
  outputs: [...PAIR_OUTPUTS, 'R_0'],
  run(s, a, p) {
    const at = p + FIRST;
    const largest = Math.max(s[a[at]], s[a[at + 3]], s[a[at + 6]]);
    let x = 0;
    hyperbola(s, a, p, at, x);
    let excess = THREE[2] - x;
    let step = excess;
    for (let k = 0; k < CAP && Math.abs(step) > Number.EPSILON * largest; k++) {
      const before = excess;
      x += step;
      hyperbola(s, a, p, at, x);
      excess = THREE[2] - x;
      step *= excess / (before - excess);
    }
    const [beta, vto, series] = THREE;
    let status = checkLines(s, a, at, 3);
    if (status === OK && !(Math.abs(excess) <= ROUNDING * largest && series >= -ROUNDING * largest))
      status = LINES_DISAGREE;
    for (let k = 0; k < 3; k++) if (status === OK && !(s[a[at + 3 * k]] > series)) status = LINES_DISAGREE;
    if (status === OK) status = lineStatus(s, a, p, at, 3, beta, vto, series);
    writePair(s, a, at + 9, beta, vto, status);
    s[a[at + 12]] = status === OK ? Math.max(0, series) : NaN;
  },
};

/** The hyperbola through three lines, z and R taken with `series` in the leads, into THREE. */
function hyperbola(s: Float64Array, a: Int32Array, p: number, at: number, series: number): void {
  const z1 = meanGate(s, a, p, at, series);
  const z2 = meanGate(s, a, p, at + 3, series);
  const z3 = meanGate(s, a, p, at + 6, series);
  const r1 = series + channelPart(s, a, p, at, series);
  const r2 = series + channelPart(s, a, p, at + 3, series);
  const r3 = series + channelPart(s, a, p, at + 6, series);
  // Measured from the third point: (z - z3)(R - r3) = (z - z3) R_0' + (R - r3) V', R_0' = R_0 - r3, V' = V_TO - z3.
  const za = z1 - z3;
  const zb = z2 - z3;
  const ra = r1 - r3;
  const rb = r2 - r3;
  const determinant = za * rb - zb * ra;
  const fitted = (ra * rb * (za - zb)) / determinant;
  const threshold = (za * zb * (rb - ra)) / determinant;
  THREE[0] = 1 / (2 * threshold * fitted);
  THREE[1] = z3 + threshold;
  THREE[2] = r3 + fitted;
}

function lineStatus(
  s: Float64Array,
  a: Int32Array,
  p: number,
  at: number,
  count: number,
  beta: number,
  vto: number,
  series: number,
): number {
  if (!(beta > 0 && beta < Infinity && Math.abs(vto) < Infinity)) return LINES_DISAGREE;
  for (let k = 0; k < count; k++) if (!isOhmic(s, a, p, at + 3 * k, vto, series)) return LINES_DISAGREE;
  return OK;
}
