// Judges an answer of the line solve by the defining equation in 32 digits: F(I) = I - f(A - r I, b - R I)
// is increasing, so I is right to 1e-12 exactly when F changes sign between I (1 - 1e-12) and I (1 + 1e-12).

import { CURRENT, DRAIN_SOURCE, MARGIN, OVERDRIVE, REGION, line, solveLine } from '../../src/network/line-solve.ts';
import { createDraw } from './counter-random.ts';
import { addTwofold, mulTwofold, subTwofold, twofold } from './double-double.ts';
import type { Twofold } from './double-double.ts';

export interface LineCase {
  readonly beta: number;
  readonly lambda: number;
  readonly A: number;
  readonly r: number;
  readonly b: number;
  readonly R: number;
}

/** Solves one case; null when it is right, else what is wrong with it. */
export function judgeLine(c: LineCase): string | null {
  const steps = solveLine(c.beta, c.lambda, c.A, c.r, c.b, c.R);
  const [I, vov, vds, margin, region] = [
    line[CURRENT],
    line[OVERDRIVE],
    line[DRAIN_SOURCE],
    line[MARGIN],
    line[REGION],
  ];
  if (![I, vov, vds, margin].every(Number.isFinite)) return `not finite: ${I}, ${vov}, ${vds}, ${margin}`;
  if (steps > 60) return `${steps} steps`;
  if (!(c.A > 0)) return I === 0 && region === 0 && vds === c.b && vov === c.A ? null : 'cutoff not seen';
  if (region === 0) return 'cutoff claimed';
  if (region === 2 ? !(margin >= 0) : !(margin <= 0)) return `margin ${margin} in region ${region}`;
  const below = excess(c, twofold(I * (1 - 1e-12)));
  const above = excess(c, twofold(I * (1 + 1e-12)));
  if (!(below[0] <= 0 && above[0] >= 0)) return `I ${I} is off by more than 1e-12`;
  if (region === 1 && c.R > 0 && !changesSign((y) => ohmicExcess(c, y), vds, c.R * c.b)) return `V_DS ${vds} is off`;
  if (region === 2 && c.r > 0 && !changesSign((x) => saturatedExcess(c, x), vov, c.r * c.A))
    return `V_ov ${vov} is off`;
  // The other voltage follows from I; it may move by what the last digits of A and b move it.
  const exact = root(c, I);
  const exactVov = subTwofold(twofold(c.A), mulTwofold(twofold(c.r), exact))[0];
  const exactVds = subTwofold(twofold(c.b), mulTwofold(twofold(c.R), exact))[0];
  const slack = 2 ** -50 * Math.max(c.A, c.b);
  if (region === 1 && Math.abs(vov - exactVov) > Math.max(1e-6 * exactVov, slack))
    return `V_ov ${vov}, not ${exactVov}`;
  if (region === 2 && Math.abs(vds - exactVds) > Math.max(1e-6 * exactVds, slack))
    return `V_DS ${vds}, not ${exactVds}`;
  return null;
}

/** `count` random extremes from `seed`; the failures in words (none when all are right). */
export function judgeRandomLines(seed: number, count: number): string[] {
  const draw = createDraw(seed);
  const faults: string[] = [];
  for (let n = 0; n < count; n++) {
    const R = logarithmic(draw(), 1, 2e8);
    const feedback = draw() < 0.25;
    const share = draw();
    const c: LineCase = {
      R,
      r: feedback ? R : R * share * share,
      beta: logarithmic(draw(), 1e-6, 1),
      lambda: draw() < 0.1 ? 0 : 0.2 * draw(),
      A: -10 + 50 * draw(),
      b: logarithmic(draw(), 1e-3, 1e3),
    };
    const fault = judgeLine(c);
    if (fault) faults.push(`${fault}: ${JSON.stringify(c)} (seed ${seed}, case ${n})`);
  }
  return faults;
}

/** All combinations of special values: zeros, tiny and huge ones, r = R, A = b; the failures and how many were tried. */
export function judgeSpecialLines(): { faults: string[]; count: number } {
  const volts = [0, 1e-12, 1e-6, 1e-3, 0.1, 0.5, 1, 1 + 2 ** -52, 2, 10, 100, 1e3, 1e6, 1e12];
  const ohms = [0, 1e-12, 1e-3, 1, 50, 1e3, 1e6, 1e9, 1e12];
  const shares = [0, 1e-12, 1e-3, 0.25, 0.5, 0.5 + 2 ** -53, 0.75, 1 - 2 ** -53, 1];
  const faults: string[] = [];
  let count = 0;
  for (const R of ohms) {
    for (const share of shares) {
      for (const beta of [1e-12, 1e-6, 1e-3, 1, 1e3, 1e12]) {
        for (const lambda of [0, 1e-12, 1e-3, 0.1, 1, 10]) {
          for (const A of volts) {
            for (const b of volts) {
              count++;
              const c = { beta, lambda, A, r: share * R, b, R };
              const fault = judgeLine(c);
              if (fault) faults.push(`${fault}: ${JSON.stringify(c)}`);
            }
          }
        }
      }
    }
  }
  return { faults, count };
}

function excess(c: LineCase, I: Twofold): Twofold {
  const vov = subTwofold(twofold(c.A), mulTwofold(twofold(c.r), I));
  const vds = subTwofold(twofold(c.b), mulTwofold(twofold(c.R), I));
  if (vov[0] <= 0) return I;
  const stretch = vds[0] > 0 ? addTwofold(twofold(1), mulTwofold(twofold(c.lambda), vds)) : twofold(1);
  const saturated = subTwofold(vds, vov)[0] >= 0;
  const square = saturated ? mulTwofold(vov, vov) : mulTwofold(vds, subTwofold(addTwofold(vov, vov), vds));
  return subTwofold(I, mulTwofold(twofold(c.beta), mulTwofold(square, stretch)));
}

/** Whether an increasing residual changes sign within 1e-6 of a voltage, or is below the last digits of its largest term. */
function changesSign(f: (z: Twofold) => Twofold, z: number, scale: number): boolean {
  const slack = 2 ** -50 * scale;
  return f(twofold(z * (1 - 1e-6)))[0] <= slack && f(twofold(z * (1 + 1e-6)))[0] >= -slack;
}

/** R (y - b + R f) with V_DS = y, I = (b - y) / R: increasing in y. */
function ohmicExcess(c: LineCase, y: Twofold): Twofold {
  const [R, r] = [twofold(c.R), twofold(c.r)];
  const drop = subTwofold(twofold(c.b), y);
  const scaledVov = subTwofold(mulTwofold(R, twofold(c.A)), mulTwofold(r, drop));
  const scaledY = mulTwofold(R, y);
  const saturated = scaledY[0] >= scaledVov[0];
  const square = saturated
    ? mulTwofold(scaledVov, scaledVov)
    : mulTwofold(scaledY, subTwofold(addTwofold(scaledVov, scaledVov), scaledY));
  const stretch = addTwofold(twofold(1), mulTwofold(twofold(c.lambda), y));
  return subTwofold(mulTwofold(twofold(c.beta), mulTwofold(square, stretch)), mulTwofold(R, drop));
}

/** r (x - A + r f) with V_ov = x, I = (A - x) / r: increasing in x. */
function saturatedExcess(c: LineCase, x: Twofold): Twofold {
  const r = twofold(c.r);
  const drop = subTwofold(twofold(c.A), x);
  const scaledVds = subTwofold(mulTwofold(r, twofold(c.b)), mulTwofold(twofold(c.R), drop));
  const stretch = addTwofold(mulTwofold(r, r), mulTwofold(twofold(c.lambda), mulTwofold(r, scaledVds)));
  return subTwofold(mulTwofold(twofold(c.beta), mulTwofold(mulTwofold(x, x), stretch)), mulTwofold(r, drop));
}

/**
 * The root of F in 32 digits, enclosed from 1e-12 to each side of I down to 2^-90 of it: secant and halving in turn,
 * and after each a look at the point that far on towards the root.
 */
function root(c: LineCase, I: number): Twofold {
  const close = 2 ** -90 * I;
  let low = twofold(I * (1 - 1e-12));
  let high = twofold(I * (1 + 1e-12));
  let below = excess(c, low)[0];
  let above = excess(c, high)[0];
  let secant = false;
  for (let n = 0; n < 200 && below < 0 && above > 0; n++) {
    const width = subTwofold(high, low)[0];
    if (width <= 2 * close) break;
    secant = !secant;
    const middle = addTwofold(low, twofold(secant ? width * (-below / (above - below)) : width / 2));
    const f = excess(c, middle)[0];
    const beyond = addTwofold(middle, twofold(f < 0 ? close : -close));
    const g = excess(c, beyond)[0];
    if (f < 0) {
      [low, below] = [middle, f];
      if (g >= 0) [high, above] = [beyond, g];
    } else {
      [high, above] = [middle, f];
      if (g <= 0) [low, below] = [beyond, g];
    }
  }
  return above === 0 ? high : low;
}

function logarithmic(u: number, low: number, high: number): number {
  return Math.exp(Math.log(low) + u * Math.log(high / low));
}
