// The operating point of one FET: the product's solver beside the closed form, which exists without channel-length
// modulation only, and beside a general bracketed solver.

import { CURRENT, line, solveLine } from '../../../src/network/line-solve.ts';
import { solveBracketed } from '../../../src/numeric/index.ts';
import { worstDifference } from '../agreement.ts';
import { compare, formatTimings } from '../compare.ts';

const PROBLEMS = 1024;

interface Problem {
  readonly beta: number;
  readonly A: number;
  readonly r: number;
  readonly b: number;
  readonly R: number;
}

/** Usual stages, lambda 0: about half of them saturated. */
function drawProblems(): Problem[] {
  let state = 1;
  const between = (low: number, high: number) => {
    state = (Math.imul(state, 1664525) + 1013904223) | 0;
    return low * (high / low) ** ((state >>> 0) / 2 ** 32);
  };
  return Array.from({ length: PROBLEMS }, () => {
    const r = between(100, 5000);
    return { beta: between(1e-4, 1e-2), A: between(1, 6), r, b: between(5, 30), R: r + between(300, 10000) };
  });
}

/** The root of the quadratic of the region, in the form that does not cancel. */
function currentInClosedForm({ beta, A, r, b, R }: Problem): number {
  const crossing = (b - A) / (R - r);
  const over = A - r * crossing;
  if (b > A && !(over > 0 && crossing < beta * over * over)) {
    const x = (2 * A) / (1 + Math.sqrt(1 + 4 * r * beta * A));
    return beta * x * x;
  }
  const k = r / R;
  const c = Math.max(0, A - k * b);
  const B = 1 + 2 * beta * R * c;
  const y = (2 * b) / (B + Math.sqrt(B * B + 4 * beta * R * (2 * k - 1) * b));
  return y > b / 2 ? beta * y * (2 * c + (2 * k - 1) * y) : (b - y) / R;
}

function currentByProduct({ beta, A, r, b, R }: Problem): number {
  solveLine(beta, 0, A, r, b, R);
  return line[CURRENT];
}

function currentByBracketing({ beta, A, r, b, R }: Problem): number {
  const excess = (I: number) => {
    const vov = A - r * I;
    const vds = b - R * I;
    if (vov <= 0) return I;
    return I - (vds >= vov ? beta * vov * vov : beta * vds * (2 * vov - vds));
  };
  return solveBracketed(excess, 0, Math.min(b / R, A / r)).value;
}

/** Times one solve after another. Throws where the solvers disagree. */
export function benchRoot(): string[] {
  const problems = drawProblems();
  const solvers = [currentByProduct, currentInClosedForm, currentByBracketing];
  const [product, ...others] = solvers.map((solve) => Float64Array.from(problems, solve));
  for (const other of others) {
    const worst = worstDifference(product, other);
    if (!(worst < 1e-9)) throw new Error(`A current differs by ${worst} between the solvers.`);
  }
  const sumOf = (solve: (problem: Problem) => number) => () => {
    let sum = 0;
    for (let i = 0; i < problems.length; i++) sum += solve(problems[i]);
    return sum;
  };
  const closed = compare(
    [
      { name: 'closed form', run: sumOf(currentInClosedForm) },
      { name: 'product', run: sumOf(currentByProduct), target: { atMost: 2.6 } },
    ],
    { units: PROBLEMS },
  );
  const bracketed = compare(
    [
      { name: 'product', run: sumOf(currentByProduct) },
      { name: 'general bracketed solver', run: sumOf(currentByBracketing), target: { atLeast: 2 } },
    ],
    { units: PROBLEMS },
  );
  return [
    formatTimings('Operating point without channel-length modulation', 'solve', closed),
    formatTimings('The same by bracketing the current', 'solve', bracketed),
  ];
}
