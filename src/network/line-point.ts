// Kernel of the usual case: one FET of fixed beta and threshold in a resistive network, that is on a bias line
// and a load line. The true frame ends here: the lines are mirrored by the channel on the way in, the
// terminal voltages on the way out.

import type { Kernel } from './kernel.ts';
import { BLOCK, solveLines } from './line-columns.ts';
import { POINT_LANES } from './line-lanes.ts';
import { CURRENT, DRAIN_SOURCE, MARGIN, OVERDRIVE, REGION, line, solveLine } from './line-solve.ts';
import { NOT_A_NUMBER, SOLVED } from './point-status.ts';
import { deriveAt, onsetAt, slopes } from './small-signal-at.ts';

/** Results that every operating-point kernel gives, in this order. */
export const POINT_OUTPUTS = [
  'status',
  'I_D',
  'V_GS',
  'V_DS',
  'V_ov',
  'V_DSsat',
  'margin',
  'region',
  'g_m',
  'g_ds',
] as const;

/**
 * V_GS = V_GG - R_m I and V_DS = V_L - R_L I in the true frame (V, ohm), device in the n-channel frame, with r_s and
 * r_d in its leads. V_DS below 0 is solved with drain and source swapped. Where the status is not `SOLVED` all else is NaN.
 */
export const linePoint: Kernel = {
  inputs: ['channel', 'beta', 'V_TO', 'lambda', 'V_GG', 'R_m', 'V_L', 'R_L', 'r_s', 'r_d'],
  outputs: POINT_OUTPUTS,
  run(s, a, p) {
    const channel = s[a[p]];
    const beta = s[a[p + 1]];
    const vto = s[a[p + 2]];
    const lambda = s[a[p + 3]];
    const vgg = channel * s[a[p + 4]];
    const vl = channel * s[a[p + 6]];
    const RL = s[a[p + 7]];
    // R_m is a share of R_L in every resistive network; what lies outside is rounding.
    const Rm = Math.max(0, Math.min(s[a[p + 5]], RL));
    const rs = s[a[p + 8]];
    const rd = s[a[p + 9]];
    const o = p + 10;
    const R = RL + rs + rd;
    const sum = beta + vto + lambda + vgg + vl + Rm + R;
    if (!(beta > 0 && lambda >= 0 && RL >= 0 && rs >= 0 && rd >= 0 && sum - sum === 0)) {
      refuse(s, a, o, NOT_A_NUMBER, POINT_OUTPUTS.length);
      return;
    }
    const reversed = vl < 0;
    if (reversed) solveLine(beta, lambda, vgg - vl - vto, RL - Rm + rd, -vl, R);
    else solveLine(beta, lambda, vgg - vto, Rm + rs, vl, R);
    const vov = line[OVERDRIVE];
    const vds = line[DRAIN_SOURCE];
    const region = line[REGION];
    const I = reversed ? 0 - line[CURRENT] : line[CURRENT];
    deriveAt(beta, lambda, vov, vds, reversed, 0, rs, rd);
    s[a[o]] = SOLVED;
    s[a[o + 1]] = I;
    s[a[o + 2]] = channel * (vgg - Rm * I) + 0;
    s[a[o + 3]] = channel * ((reversed ? -vds : vds) + (rs + rd) * I) + 0;
    s[a[o + 4]] = vov;
    s[a[o + 5]] = onsetAt(region, vov, I, rs + rd);
    s[a[o + 6]] = line[MARGIN];
    s[a[o + 7]] = region;
    s[a[o + 8]] = slopes[0];
    s[a[o + 9]] = slopes[1];
  },
  columns(all, places, at, count) {
    for (let from = 0; from < count; from += BLOCK) {
      const size = Math.min(BLOCK, count - from);
      gatherLines(all, places, at, from, size);
      solveLines(lines, LINE_PLACES, 0, size);
      leavePoints(all, places, at, from, size);
    }
  },
  lanes: POINT_LANES,
};

/** A block of lines and their solutions, as `solveLines` takes them; whether each was refused or mirrored at the drain. */
const LINE_COLUMNS = 11;
const LINE_STRIDE = BLOCK + 8;
const lines = new Float64Array(LINE_COLUMNS * LINE_STRIDE);
const LINE_PLACES = Int32Array.from({ length: LINE_COLUMNS }, (_, k) => k * LINE_STRIDE);
const [FORWARD, REVERSED, REFUSED] = [0, 1, 2];
const senses = new Uint8Array(BLOCK);

function gatherLines(all: Float64Array, places: Int32Array, at: number, from: number, size: number): void {
  const [channels, betas, vtos, lambdas] = [places[at], places[at + 1], places[at + 2], places[at + 3]];
  const [vggs, rms, vls, loads] = [places[at + 4], places[at + 5], places[at + 6], places[at + 7]];
  const [rss, rds] = [places[at + 8], places[at + 9]];
  for (let n = 0; n < size; n++) {
    const i = from + n;
    const channel = all[channels + i];
    const beta = all[betas + i];
    const vto = all[vtos + i];
    const lambda = all[lambdas + i];
    const vgg = channel * all[vggs + i];
    const vl = channel * all[vls + i];
    const RL = all[loads + i];
    const Rm = Math.max(0, Math.min(all[rms + i], RL));
    const rs = all[rss + i];
    const rd = all[rds + i];
    const R = RL + rs + rd;
    const sum = beta + vto + lambda + vgg + vl + Rm + R;
    const sound = beta > 0 && lambda >= 0 && RL >= 0 && rs >= 0 && rd >= 0 && sum - sum === 0;
    const reversed = vl < 0;
    senses[n] = sound ? (reversed ? REVERSED : FORWARD) : REFUSED;
    lines[n] = beta;
    lines[n + LINE_STRIDE] = lambda;
    // A drive of NaN is solved in no time.
    lines[n + 2 * LINE_STRIDE] = sound ? (reversed ? vgg - vl - vto : vgg - vto) : NaN;
    lines[n + 3 * LINE_STRIDE] = reversed ? RL - Rm + rd : Rm + rs;
    lines[n + 4 * LINE_STRIDE] = reversed ? -vl : vl;
    lines[n + 5 * LINE_STRIDE] = R;
  }
}

function leavePoints(all: Float64Array, places: Int32Array, at: number, from: number, size: number): void {
  const [channels, vggs, rms, loads] = [places[at], places[at + 4], places[at + 5], places[at + 7]];
  const [rss, rds] = [places[at + 8], places[at + 9]];
  const o = at + 10;
  const [statuses, currents, gates, drains] = [places[o], places[o + 1], places[o + 2], places[o + 3]];
  const [drives, onsets, margins, regions] = [places[o + 4], places[o + 5], places[o + 6], places[o + 7]];
  const [gms, gdss] = [places[o + 8], places[o + 9]];
  for (let n = 0; n < size; n++) {
    const i = from + n;
    const sense = senses[n];
    if (sense === REFUSED) {
      all[statuses + i] = NOT_A_NUMBER;
      for (let k = 1; k < POINT_OUTPUTS.length; k++) all[places[o + k] + i] = NaN;
      continue;
    }
    const reversed = sense === REVERSED;
    const channel = all[channels + i];
    const rs = all[rss + i];
    const rd = all[rds + i];
    const solved = lines[n + 6 * LINE_STRIDE];
    const vov = lines[n + 7 * LINE_STRIDE];
    const vds = lines[n + 8 * LINE_STRIDE];
    const region = lines[n + 10 * LINE_STRIDE];
    const I = reversed ? 0 - solved : solved;
    const Rm = Math.max(0, Math.min(all[rms + i], all[loads + i]));
    deriveAt(lines[n], lines[n + LINE_STRIDE], vov, vds, reversed, 0, rs, rd);
    all[statuses + i] = SOLVED;
    all[currents + i] = I;
    all[gates + i] = channel * (channel * all[vggs + i] - Rm * I) + 0;
    all[drains + i] = channel * ((reversed ? -vds : vds) + (rs + rd) * I) + 0;
    all[drives + i] = vov;
    all[onsets + i] = onsetAt(region, vov, I, rs + rd);
    all[margins + i] = lines[n + 9 * LINE_STRIDE];
    all[regions + i] = region;
    all[gms + i] = slopes[0];
    all[gdss + i] = slopes[1];
  }
}

/** Writes a status and NaN into the `count - 1` results behind it: no value stands beside a status that is not `SOLVED`. */
export function refuse(s: Float64Array, a: Int32Array, o: number, status: number, count: number): void {
  s[a[o]] = status;
  for (let n = 1; n < count; n++) s[a[o + n]] = NaN;
}
