// A FET's law from readings of one specimen: least squares with a loss that lets readings far off count less, over all
// regions at once, with the standard errors of its constants.
//
// Loss and weights: P. J. Huber, "Robust estimation of a location parameter", Ann. Math. Stat. 35 (1964); the constant
// keeps 95 % efficiency where errors are normal. Covariance of the estimate: P. J. Huber, "Robust Statistics" (1981), section 7.6.

import { CUTOFF, channelRegion } from '../fet/index.ts';
import { doubts } from './doubts.ts';
import { BETA, EXPONENT, LAMBDA, V_TO } from './law.ts';
import type { LawFit } from './law-fit.ts';
import { createFitter, inverseOf } from './least-squares.ts';
import type { Fitter } from './least-squares.ts';
import { mirrored } from './points.ts';
import type { Points } from './points.ts';
import { startingValues } from './starting-values.ts';
import { unusable } from './unusable.ts';
import type { FitFault } from './unusable.ts';

interface FitOptions {
  readonly channel: 1 | -1;
  /** The square law, or the exponent of V_ov as well, from 1.5 to 2.5. */
  readonly exponent: 'square' | 'free';
  /** Fitted, or known, in 1/V. */
  readonly lambda: 'fit' | number;
  /** Readings far off count less (`robust`), or all alike. */
  readonly loss?: 'robust' | 'plain';
}

/** Range of a free exponent. */
const EXPONENTS = { low: 1.5, high: 2.5 };
/** Huber's constant, in standard deviations, and the factor from the median of magnitudes to one. */
const HUBER = 1.345;
const MAD_TO_SD = 1.482602218505602;
/** Rounds of weighing, and the share of the largest reading below which scatter is rounding. */
const ROUNDS = 50;
const ROUNDING = 1e-10;
const WEIGHTS_SETTLED = 1e-6;

/** Fits the law to readings; the fault says in words why there is none. */
export function fitLaw(points: Points, options: FitOptions): LawFit | FitFault {
  const { channel, lambda, loss = 'robust' } = options;
  const framed = mirrored(points, channel);
  const known = lambda === 'fit' ? null : lambda;
  const fault = unusable(framed, channel);
  if (fault) return fault;
  const fitter = createFitter(framed);
  const weights = new Float64Array(framed.I_D.length).fill(1);
  const asksLambda = known === null && hasDifferentVoltages(framed);
  const first = best(fitter, framed, known ?? 0, asksLambda ? [BETA, V_TO, LAMBDA] : [BETA, V_TO], weights);
  if (first === null) return NO_LAW;
  // A channel is never longer at a higher voltage: what comes out below 0 is scatter.
  let isSeen = asksLambda && first[LAMBDA]! > 0;
  let free = isSeen ? [BETA, V_TO, LAMBDA] : [BETA, V_TO];
  let law: Float64Array = isSeen ? first : (best(fitter, framed, known ?? 0, free, weights) ?? first);
  if (!isSeen) law[LAMBDA] = known ?? 0;
  if (options.exponent === 'free') {
    free = [...free, EXPONENT];
    law = withExponent(fitter, law, free, weights);
    if (isAtBorder(law)) free = free.filter((k) => k !== EXPONENT);
  }
  if (loss === 'robust') weigh(fitter, framed, law, free, weights);
  // With the exponent free, or with outliers counting less, it may come out below 0 once more.
  if (isSeen && law[LAMBDA]! < 0) {
    isSeen = false;
    law[LAMBDA] = 0;
    free = free.filter((k) => k !== LAMBDA);
    fitter.fit(law, free, weights);
    if (loss === 'robust') weigh(fitter, framed, law, free, weights);
  }
  const covariance = inverseOf(fitter.normal(law, free, new Float64Array(weights.length).fill(1)), free.length);
  if (covariance === null) return NO_LAW;
  const residuals = fitter.residuals(law);
  const codes = framed.V_GS.map((vgs, i) => channelRegion(vgs - law[V_TO]!, framed.V_DS[i]!));
  const spread = variance(residuals, weights, codes, free.length);
  const size = free.length;
  const error = (k: number): number | null => {
    const at = free.indexOf(k);
    return at < 0 ? null : Math.sqrt(spread * covariance[at * size + at]!);
  };
  const rms = rootMeanSquare(residuals);
  const fit: Omit<LawFit, 'flags'> = {
    channel,
    beta: law[BETA]!,
    V_TO: channel * law[V_TO]!,
    lambda: law[LAMBDA]!,
    exponent: law[EXPONENT]!,
    errors: {
      beta: law[BETA]! * error(BETA)!,
      V_TO: error(V_TO)!,
      lambda: error(LAMBDA),
      exponent: error(EXPONENT),
    },
    correlation: covariance[1]! / Math.sqrt(covariance[0]! * covariance[size + 1]!),
    rms,
    relative: rms / rootMeanSquare(framed.I_D),
    residuals,
    regions: Array.from(codes, (code) => REGION_WORDS[code]!),
  };
  const bent = options.exponent === 'square' ? bestExponent(fitter, law, free, weights) : null;
  return {
    ...fit,
    flags: doubts(fit, {
      points: framed,
      weights,
      bent,
      isLambdaAsked: known === null,
      isLambdaSeen: isSeen,
      isAtBorder: options.exponent === 'free' && isAtBorder(law),
    }),
  };
}

const REGION_WORDS = ['cutoff', 'ohmic', 'saturation'];
const NO_LAW: FitFault = {
  code: 'one-place',
  text: 'All readings that conduct stand at one V_GS in saturation: beta and V_TO cannot be told apart. Add readings at other gate voltages.',
};

function isAtBorder(law: Float64Array): boolean {
  return law[EXPONENT]! <= EXPONENTS.low || law[EXPONENT]! >= EXPONENTS.high;
}

/** Whether lambda shows at all: readings at two different drain voltages. */
function hasDifferentVoltages({ V_DS, I_D }: Points): boolean {
  const at = V_DS.filter((_, i) => I_D[i] !== 0);
  return at.length > 3 && Math.max(...at) - Math.min(...at) > 1e-6 * Math.max(...at.map(Math.abs));
}

/** The best fit from every start; null where nothing tells the constants apart. */
function best(
  fitter: Fitter,
  points: Points,
  lambda: number,
  free: readonly number[],
  weights: Float64Array,
): Float64Array | null {
  let found: { law: Float64Array; cost: number } | null = null;
  for (const law of startingValues(points, lambda)) {
    fitter.fit(law, free, weights);
    const cost = fitter.cost(law, weights);
    if (inverseOf(fitter.normal(law, free, weights), free.length) === null) continue;
    if (found === null || cost < found.cost) found = { law, cost };
  }
  return found?.law ?? null;
}

/** The law with its exponent fitted within its range. */
function withExponent(fitter: Fitter, law: Float64Array, free: readonly number[], weights: Float64Array): Float64Array {
  const bent = law.slice();
  fitter.fit(bent, free, weights);
  const n = bent[EXPONENT]!;
  if (n > EXPONENTS.low && n < EXPONENTS.high) return bent;
  const held = law.slice();
  held[EXPONENT] = n <= EXPONENTS.low ? EXPONENTS.low : EXPONENTS.high;
  fitter.fit(
    held,
    free.filter((k) => k !== EXPONENT),
    weights,
  );
  return held;
}

/** What a free exponent would make of it: the exponent, its standard error, and how much of the squares it leaves. */
function bestExponent(fitter: Fitter, law: Float64Array, free: readonly number[], weights: Float64Array) {
  const bent = withExponent(fitter, law, [...free, EXPONENT], weights);
  return { exponent: bent[EXPONENT]!, left: fitter.cost(bent, weights) / (fitter.cost(law, weights) || 1) };
}

/** Weighs and fits in turn until the weights stand. */
function weigh(
  fitter: Fitter,
  points: Points,
  law: Float64Array,
  free: readonly number[],
  weights: Float64Array,
): void {
  const most = points.I_D.reduce((largest, current) => Math.max(largest, Math.abs(current)), 0);
  for (let round = 0; round < ROUNDS; round++) {
    const sizes = fitter.residuals(law).map(Math.abs);
    // As many of the least residuals as there are constants are small because these were fitted to them.
    const judging = sizes.toSorted().subarray(Math.min(free.length, sizes.length - 1));
    const scale = Math.max(MAD_TO_SD * middle(judging), ROUNDING * most);
    let moved = 0;
    for (let i = 0; i < weights.length; i++) {
      const weight = sizes[i]! <= HUBER * scale ? 1 : (HUBER * scale) / sizes[i]!;
      moved = Math.max(moved, Math.abs(weight - weights[i]!));
      weights[i] = weight;
    }
    if (moved < WEIGHTS_SETTLED) return;
    fitter.fit(law, free, weights);
  }
}

/** The variance that stands before the inverse of the normal matrix, A²; NaN where there are no more readings than constants. */
function variance(residuals: Float64Array, weights: Float64Array, codes: Float64Array, size: number): number {
  // A reading below the threshold has no slope along any constant: it says nothing of the scatter of those that have.
  let [count, squares, inner] = [0, 0, 0];
  for (let i = 0; i < residuals.length; i++) {
    if (codes[i] === CUTOFF) continue;
    count++;
    const pulled = weights[i]! * residuals[i]!;
    squares += pulled * pulled;
    if (weights[i] === 1) inner++;
  }
  if (count <= size) return NaN;
  const share = inner / count;
  const correction = 1 + (size / count) * ((1 - share) / share);
  return (correction * correction * squares) / ((count - size) * share * share);
}

function rootMeanSquare(values: Float64Array): number {
  return Math.sqrt(values.reduce((sum, value) => sum + value * value, 0) / values.length);
}

/** The median; 0 of nothing. */
function middle(values: Float64Array): number {
  if (values.length === 0) return 0;
  const sorted = values.toSorted();
  const half = sorted.length >> 1;
  return sorted.length % 2 === 1 ? sorted[half]! : (sorted[half - 1]! + sorted[half]!) / 2;
}
