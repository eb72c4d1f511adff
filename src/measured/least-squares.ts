// Weighted least squares of the law over readings, by the method of Levenberg and Marquardt.
//
// Source: D. W. Marquardt, "An algorithm for least-squares estimation of nonlinear parameters", J. SIAM 11 (1963).

import { exp, ln } from '../numeric/index.ts';
import { BETA, CONSTANTS, fillCurrents, fillSlopes, LAMBDA, V_TO } from './law.ts';
import type { Points } from './points.ts';

/** Steps at most, and the share of a constant below which a step is none. */
const STEPS = 200;
const SETTLED = 1e-15;
/** How strongly steps are held back at first, and beyond which no step helps any more. */
const DAMPING = { first: 1e-3, least: 1e-15, most: 1e12 };

export interface Fitter {
  /** Moves the constants to the least sum of weighted squares; only those named are free. */
  fit(law: Float64Array, free: readonly number[], weights: Float64Array): void;
  /** The sum of the weighted squares of the residuals, in A². */
  cost(law: Float64Array, weights: Float64Array): number;
  /** Readings less law, in A. */
  residuals(law: Float64Array): Float64Array;
  /** The sums of products of slopes over all readings, `free` rows by `free` columns, along ln beta and the constants themselves. */
  normal(law: Float64Array, free: readonly number[], weights: Float64Array): Float64Array;
}

/** Prepares fits to these readings (n-channel frame); its arrays are its own. */
export function createFitter(points: Points): Fitter {
  const count = points.I_D.length;
  const currents = new Float64Array(count);
  const slopes = new Float64Array(count * CONSTANTS);
  const trial = new Float64Array(CONSTANTS);

  function cost(law: Float64Array, weights: Float64Array): number {
    fillCurrents(law, points, currents);
    let sum = 0;
    for (let i = 0; i < count; i++) {
      const off = points.I_D[i]! - currents[i]!;
      sum += weights[i]! * off * off;
    }
    return sum;
  }

  function normal(law: Float64Array, free: readonly number[], weights: Float64Array): Float64Array {
    const size = free.length;
    const sums = new Float64Array(size * size);
    fillSlopes(law, points, slopes);
    for (let i = 0; i < count; i++) {
      for (let a = 0; a < size; a++) {
        const slope = weights[i]! * slopes[i * CONSTANTS + free[a]!]!;
        for (let b = 0; b <= a; b++) sums[a * size + b] += slope * slopes[i * CONSTANTS + free[b]!]!;
      }
    }
    for (let a = 0; a < size; a++) for (let b = a + 1; b < size; b++) sums[a * size + b] = sums[b * size + a]!;
    return sums;
  }

  function pull(free: readonly number[], weights: Float64Array): Float64Array {
    const sums = new Float64Array(free.length);
    for (let i = 0; i < count; i++) {
      const off = weights[i]! * (points.I_D[i]! - currents[i]!);
      for (let a = 0; a < free.length; a++) sums[a] += off * slopes[i * CONSTANTS + free[a]!]!;
    }
    return sums;
  }

  return {
    cost,
    normal,
    residuals(law) {
      fillCurrents(law, points, currents);
      return points.I_D.map((current, i) => current - currents[i]!);
    },
    fit(law, free, weights) {
      let damping = DAMPING.first;
      let present = cost(law, weights);
      for (let n = 0; n < STEPS && damping < DAMPING.most; n++) {
        const sums = normal(law, free, weights);
        // Both walks of the law are of the same constants: the pull is that at their present values.
        fillCurrents(law, points, currents);
        const pulls = pull(free, weights);
        let isSettled = false;
        for (; damping < DAMPING.most; damping *= 10) {
          const step = dampedStep(sums, pulls, damping);
          if (step === null) continue;
          trial.set(law);
          free.forEach((k, a) => (trial[k] = k === BETA ? exp(ln(law[k]!) + step[a]!) : law[k]! + step[a]!));
          const next = isAllowed(trial) ? cost(trial, weights) : NaN;
          if (!(next <= present)) continue;
          isSettled = free.every((k) => Math.abs(trial[k]! - law[k]!) <= SETTLED * Math.max(Math.abs(law[k]!), 1e-3));
          law.set(trial);
          present = next;
          damping = Math.max(DAMPING.least, damping / 10);
          break;
        }
        if (isSettled) return;
      }
    },
  };

  function isAllowed(law: Float64Array): boolean {
    const widest = points.V_DS.reduce((most, vds) => Math.max(most, Math.abs(vds)), 0);
    return law[BETA]! > 0 && law[BETA]! < Infinity && Number.isFinite(law[V_TO]!) && 1 + law[LAMBDA]! * widest > 0;
  }
}

/** (N + damping diag N) step = pull; null where that cannot be solved. */
function dampedStep(sums: Float64Array, pulls: Float64Array, damping: number): Float64Array | null {
  const size = pulls.length;
  const damped = sums.slice();
  for (let a = 0; a < size; a++) damped[a * size + a]! *= 1 + damping;
  const factor = cholesky(damped, size);
  return factor && solveCholesky(factor, pulls);
}

/** The inverse of a symmetric matrix, `size` by `size`; null where it has none to working precision. */
export function inverseOf(sums: Float64Array, size: number): Float64Array | null {
  // Scaled to a unit diagonal, so that constants of different units are weighed alike.
  const scale = Array.from({ length: size }, (_, a) => Math.sqrt(sums[a * size + a]!));
  if (scale.some((each) => !(each > 0))) return null;
  const scaled = sums.map((sum, at) => sum / (scale[Math.floor(at / size)]! * scale[at % size]!));
  const factor = cholesky(scaled, size);
  if (factor === null) return null;
  const inverse = new Float64Array(size * size);
  for (let a = 0; a < size; a++) {
    const unit = new Float64Array(size);
    unit[a] = 1;
    solveCholesky(factor, unit).forEach((value, b) => (inverse[b * size + a] = value / (scale[a]! * scale[b]!)));
  }
  return inverse;
}

/** A pivot below this share of its diagonal is rounding. */
const PIVOT = 1e-13;

function cholesky(matrix: Float64Array, size: number): Float64Array | null {
  const factor = new Float64Array(size * size);
  for (let a = 0; a < size; a++) {
    for (let b = 0; b <= a; b++) {
      let sum = matrix[a * size + b]!;
      for (let k = 0; k < b; k++) sum -= factor[a * size + k]! * factor[b * size + k]!;
      if (a === b) {
        if (!(sum > PIVOT * matrix[a * size + a]!)) return null;
        factor[a * size + a] = Math.sqrt(sum);
      } else factor[a * size + b] = sum / factor[b * size + b]!;
    }
  }
  return factor;
}

function solveCholesky(factor: Float64Array, right: Float64Array): Float64Array {
  const size = right.length;
  const x = right.slice();
  for (let a = 0; a < size; a++) {
    for (let k = 0; k < a; k++) x[a]! -= factor[a * size + k]! * x[k]!;
    x[a]! /= factor[a * size + a]!;
  }
  for (let a = size - 1; a >= 0; a--) {
    for (let k = a + 1; k < size; k++) x[a]! -= factor[k * size + a]! * x[k]!;
    x[a]! /= factor[a * size + a]!;
  }
  return x;
}
