// Kernel of the swing: the largest peaks at the output before the FET leaves saturation or a JFET's gate conducts.
//
// Along the a.c. load line, with v_s the test source and w the change of the channel current (the exact square law,
// not its slope):
//   V_ov = V_ov0 + a_gs v_s - r_gs w,  V_DS = V_DS0 + a_ds v_s - r_ds w,  v_out = a_out v_s - r_out w.
//   cutoff           w = -I: linear
//   onset of ohmic   V_ov = V_DS = y with I + w = beta y^2 (1 + lambda y): v_s eliminated, a cubic in y
//   gate conduction  V_GS = 0.5 V with I + w = beta v^2 (1 + lambda V_DS), v the overdrive there: linear
// Where no signal current can flow (`fixed`) w is minus the voltage of the island and the current stays I.
// With body effect V_T moves along the line, and the limit is found by solving the point at each v_s instead.

import { threshold, thresholdSlope } from '../fet/index.ts';
import { solveBracketed } from '../numeric/index.ts';
import { solveWithBody } from './body-solve.ts';
import type { Kernel } from './kernel.ts';
import { CURRENT, MARGIN, REGION, line } from './line-solve.ts';

/** Forward gate voltage in V at which a JFET's gate is taken to conduct. */
export const GATE_CONDUCTS = 0.5;

const [NONE, CUTOFF, OHMIC, GATE] = [0, 1, 2, 3];

const INPUTS = [
  'channel',
  'beta',
  'V_TO',
  'lambda',
  'gamma',
  'phi',
  'gate_limit',
  'fixed',
  'I_D',
  'V_GS',
  'V_DS',
  'V_SB',
  'a_gs',
  'a_ds',
  'a_sb',
  'a_out',
  'r_gs',
  'r_ds',
  'r_sb',
  'r_out',
  'r_s',
  'r_d',
] as const;

/** The call in hand, voltages inside the leads and in the n-channel frame, the leads' resistances in r_gs, r_ds, r_sb. */
const given = new Float64Array(INPUTS.length);
const [BETA, VTO, LAMBDA, GAMMA, PHI, LIMIT, FIXED, I, VGS, VDS, VSB] = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11];
const [AGS, ADS, ASB, AOUT, RGS, RDS, RSB, ROUT, RS, RD] = [12, 13, 14, 15, 16, 17, 18, 19, 20, 21];

/**
 * What has been found so far, in the n-channel frame: the nearest limit on either side, how far the source goes for it
 * (V), and what it is. `rise` is the sign of the gain: which way of the source leads up.
 */
const found = { up: 0, down: 0, upDrive: 0, downDrive: 0, upLimit: 0, downLimit: 0, rise: 0 };

/**
 * Peaks in V, both counted positive, infinite where nothing limits them; their limits by the codes of `SWING_LIMIT`.
 * Voltages and a_out, r_out in the true frame; `gate_limit` in V (n-channel frame), infinite for a MOSFET.
 */
export const swing: Kernel = {
  inputs: INPUTS,
  outputs: ['swing_up', 'swing_down', 'limit_up', 'limit_down'],
  run(s, a, p) {
    for (let n = 0; n < INPUTS.length; n++) given[n] = s[a[p + n]];
    const channel = given[0];
    const leads = given[RS] + given[RD];
    const current = given[I];
    given[VGS] = channel * given[VGS] - given[RS] * current;
    given[VDS] = channel * given[VDS] - leads * current;
    given[VSB] = channel * given[VSB] + given[RS] * current;
    if (given[FIXED] === 0) {
      given[RGS] += given[RS];
      given[RDS] += leads;
      given[RSB] += given[RS];
    }
    if (given[VDS] < 0) changePlaces();
    found.up = Infinity;
    found.down = Infinity;
    found.upDrive = Infinity;
    found.downDrive = Infinity;
    found.upLimit = NONE;
    found.downLimit = NONE;
    search();
    const o = p + INPUTS.length;
    s[a[o]] = channel > 0 ? found.up : found.down;
    s[a[o + 1]] = channel > 0 ? found.down : found.up;
    s[a[o + 2]] = channel > 0 ? found.upLimit : found.downLimit;
    s[a[o + 3]] = channel > 0 ? found.downLimit : found.upLimit;
  },
};

function search(): void {
  const vt = given[GAMMA] === 0 ? given[VTO] : threshold(given[VTO], given[GAMMA], given[PHI], given[VSB]);
  const vov = given[VGS] - vt;
  const beyond = vov <= 0 ? CUTOFF : given[VDS] <= vov ? OHMIC : given[VGS] >= given[LIMIT] ? GATE : NONE;
  if (beyond !== NONE || vov !== vov || given[VDS] !== given[VDS]) {
    const nothing = vov === vov && given[VDS] === given[VDS] ? 0 : NaN;
    found.up = nothing;
    found.down = nothing;
    found.upLimit = beyond;
    found.downLimit = beyond;
    return;
  }
  if (given[AGS] === 0 && given[ADS] === 0) return;
  found.rise = riseAt(vov);
  if (given[GAMMA] !== 0 && given[FIXED] === 0 && (given[ASB] !== 0 || given[RSB] !== 0)) {
    searchWithBody(1);
    searchWithBody(-1);
  } else if (given[FIXED] === 0) searchLoadLine(vov);
  else searchFixedCurrent(vov);
}

/** The drain terminal acts as the source: the same line seen from there, with w counted the other way. */
function changePlaces(): void {
  given[VGS] -= given[VDS];
  given[VSB] += given[VDS];
  given[VDS] = -given[VDS];
  given[I] = -given[I];
  given[AGS] -= given[ADS];
  given[ASB] += given[ADS];
  given[ADS] = -given[ADS];
  given[RGS] = given[RDS] - given[RGS];
  given[RSB] = given[RDS] - given[RSB];
  given[ROUT] = -given[ROUT];
}

/** The sign of the gain at rest; 0 where the output does not move. */
function riseAt(vov: number): number {
  const stretch = 1 + given[LAMBDA] * given[VDS];
  const gm = 2 * given[BETA] * vov * stretch;
  const gds = given[BETA] * vov * vov * given[LAMBDA];
  const body = given[GAMMA] === 0 ? 0 : gm * thresholdSlope(given[GAMMA], given[PHI], given[VSB]);
  const asked = gm * given[AGS] + gds * given[ADS] - body * given[ASB];
  const load = gm * given[RGS] + gds * given[RDS] + body * given[RSB];
  return Math.sign(given[AOUT] - (given[ROUT] * asked) / (1 + load));
}

/** Takes a limit at a source of `vs` with the output at `out`, if it is the nearest on its side. */
function meet(vs: number, out: number, limit: number): void {
  // With the current fixed the output says which side it is: the source may not have to move at all.
  const side = given[FIXED] === 0 ? vs * found.rise : out;
  const drive = given[FIXED] === 0 ? Math.abs(vs) : Math.abs(out);
  if (side >= 0 && drive < found.upDrive) {
    found.up = Math.max(0, out);
    found.upDrive = drive;
    found.upLimit = limit;
  }
  if (side <= 0 && drive < found.downDrive) {
    found.down = Math.max(0, -out);
    found.downDrive = drive;
    found.downLimit = limit;
  }
}

function meetLine(vs: number, w: number, limit: number): void {
  meet(vs, given[AOUT] * vs - given[ROUT] * w, limit);
}

function searchLoadLine(vov: number): void {
  const current = given[I];
  const ags = given[AGS];
  const ads = given[ADS];
  const rgs = given[RGS];
  const rds = given[RDS];
  if (ags !== 0) meetLine(-(vov + rgs * current) / ags, -current, CUTOFF);

  const beta = given[BETA];
  const lambda = given[LAMBDA];
  const twist = ads * rgs - ags * rds;
  onset[0] = ads * vov - ags * given[VDS] + twist * current;
  onset[1] = ags - ads;
  onset[2] = -twist * beta;
  onset[3] = -twist * beta * lambda;
  meetOnsets(vov);

  const open = given[LIMIT] - (given[VGS] - vov);
  if (open > 0 && open < Infinity && ags !== 0) {
    const full = beta * open * open;
    const level = given[VDS] + (ads / ags) * (given[LIMIT] - given[VGS]);
    const slope = (ads * rgs) / ags - rds;
    const w = (full * (1 + lambda * level) - current) / (1 - full * lambda * slope);
    meetLine((given[LIMIT] - given[VGS] + rgs * w) / ags, w, GATE);
  }
}

/** v_s at which V_ov or V_DS, whichever the source moves more, is y. */
function onsetDrive(y: number, w: number, vov: number): number {
  if (Math.abs(given[AGS]) >= Math.abs(given[ADS])) return (y - vov + given[RGS] * w) / given[AGS];
  return (y - given[VDS] + given[RDS] * w) / given[ADS];
}

/** The current cannot change: each limit is a pair of terminal voltages, and the source and the island reach it together. */
function searchFixedCurrent(vov: number): void {
  const { 1: beta, 3: lambda, 8: current } = given;
  const square = current / beta;
  const high = Math.sqrt(square);
  const root = solveBracketed((y) => y * y * (1 + lambda * y) - square, 0, high).value;
  reach(root - vov, root - given[VDS], OHMIC);
  const open = given[LIMIT] - (given[VGS] - vov);
  if (open > 0 && open < Infinity && lambda > 0) {
    const vds = (square / (open * open) - 1) / lambda;
    if (vds >= open) reach(given[LIMIT] - given[VGS], vds - given[VDS], GATE);
  }
}

function reach(dvgs: number, dvds: number, limit: number): void {
  const twist = given[ADS] * given[RGS] - given[AGS] * given[RDS];
  if (twist === 0) return;
  const vs = (given[RGS] * dvds - given[RDS] * dvgs) / twist;
  const w = (given[AGS] * dvds - given[ADS] * dvgs) / twist;
  meetLine(vs, w, limit);
}

/** The cubic of the onset of the ohmic region, by rising powers of y. */
const onset = new Float64Array(4);

function onsetAt(y: number): number {
  return onset[0] + y * (onset[1] + y * (onset[2] + y * onset[3]));
}

/** Meets the limit at every root y > 0 of the cubic. */
function meetOnsets(vov: number): void {
  const [c0, c1, c2, c3] = [onset[0], onset[1], onset[2], onset[3]];
  // Beyond Cauchy's bound there is no root; between the turning points there is one where the signs differ.
  const lead = c3 !== 0 ? c3 : c2 !== 0 ? c2 : c1;
  if (lead === 0) return;
  const bound = 1 + Math.max(Math.abs(c0), Math.abs(c1), Math.abs(c2)) / Math.abs(lead);
  if (!(bound < Infinity)) return;
  findTurns(c1, 2 * c2, 3 * c3);
  let low = 0;
  for (let n = 0; n <= turns.length; n++) {
    const high = n < turns.length ? turns[n] : bound;
    if (n < turns.length && !(high > 0 && high < bound)) continue;
    const before = onsetAt(low);
    const after = onsetAt(high);
    if (before === 0 ? low > 0 : after !== 0 && before > 0 !== after > 0) {
      const y = before === 0 ? low : solveBracketed(onsetAt, low, high).value;
      const w = given[BETA] * y * y * (1 + given[LAMBDA] * y) - given[I];
      meetLine(onsetDrive(y, w, vov), w, OHMIC);
    }
    low = high;
  }
}

/** The real roots of the quadratic that `findTurns` saw last, ascending; NaN where there are fewer. */
const turns = new Float64Array(2);

function findTurns(c: number, b: number, a: number): void {
  turns.fill(NaN);
  if (a === 0) {
    if (b !== 0) turns[0] = -c / b;
    return;
  }
  const inside = b * b - 4 * a * c;
  if (!(inside > 0)) return;
  const q = -0.5 * (b + (b < 0 ? -1 : 1) * Math.sqrt(inside));
  if (q === 0) return;
  turns[0] = Math.min(q / a, c / q);
  turns[1] = Math.max(q / a, c / q);
}

/** Follows the source in one direction to the first limit, solving the whole point at each step. */
function searchWithBody(direction: number): void {
  let low = 0;
  let high = 2 ** -7;
  while (headroomAt(direction * high) > 0) {
    if (high > 2 ** 14) return;
    low = high;
    high *= 1.25;
  }
  const vs = direction * solveBracketed((x) => headroomAt(direction * x), low, high).value;
  headroomAt(vs);
  const limit = line[REGION] === 0 ? CUTOFF : line[MARGIN] <= gateRoom ? OHMIC : GATE;
  const cutoff = line[CURRENT] <= 1e-9 * given[I];
  meetLine(vs, line[CURRENT] - given[I], cutoff ? CUTOFF : limit);
}

/** Room to gate conduction at the last point, in V. */
let gateRoom = 0;

/** How far, in V, the point at a source of v_s is from the nearest limit; negative beyond it. */
function headroomAt(vs: number): number {
  const current = given[I];
  const vgs = given[VGS] + given[AGS] * vs + given[RGS] * current;
  const vds = given[VDS] + given[ADS] * vs + given[RDS] * current;
  const vsb = given[VSB] + given[ASB] * vs - given[RSB] * current;
  if (vds < 0) {
    line[CURRENT] = 0;
    line[MARGIN] = vds;
    line[REGION] = 1;
    return vds;
  }
  solveWithBody(
    given[BETA],
    given[LAMBDA],
    given[VTO],
    given[GAMMA],
    given[PHI],
    vgs,
    given[RGS],
    vds,
    given[RDS],
    vsb,
    given[RSB],
  );
  gateRoom = given[LIMIT] - (vgs - given[RGS] * line[CURRENT]);
  const margin = line[REGION] === 0 ? line[1] : Math.min(line[MARGIN], line[1]);
  return Math.min(margin, gateRoom);
}
