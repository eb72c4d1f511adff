// One FET on a bias line and a load line, n-channel frame, fixed beta and threshold:
//
//   V_ov = A - r I,  V_DS = b - R I,  I = f(V_ov, V_DS),  0 <= r <= R (any resistive network), b >= 0.
//
// F(I) = I - f(A - r I, b - R I) is strictly increasing and has one root in [0, min(b/R, A/r)]. The region is
// settled first: the load line crosses V_DS = V_ov once, and the sign of F there says on which side the root
// lies. Then one residual H is solved for an unknown that keeps its digits, V_ov in saturation and V_DS in the
// ohmic region (I and b - R I lose theirs). On its bracket H has a slope of at least 1, so |H| bounds the
// distance to the root. Newton's steps are kept inside the bracket; one that leaves it becomes a bisection.
// H stays unexpanded: the expanded cubic has the same root but subtracts large terms.
//
// With K = beta lambda R, u = beta (1 + lambda b), k = r/R, c = A - k b:
//   saturation  H(x) = x - A + r u x^2 / (1 + K x^2)              on [2A / (1 + sqrt(1 + 4 r u A)), A]
//               H(x) = x - A + r beta x^2 (1 + lambda (b - A/k + x/k))     where k > 1/2
//   ohmic       H(y) = y - b + beta R y (2c + (2k - 1) y)(1 + lambda y)   on [0, min(b, c / (1 - k))]
//
// Rejected: iteration in I (digits), the closed cubic (1 wrong of 1000 on extremes), a fixed number of steps.

/** Where `solveLine` leaves its answer: allocated once, read at once. */
export const line = new Float64Array(5);
export const CURRENT = 0;
export const OVERDRIVE = 1;
export const DRAIN_SOURCE = 2;
/** V_DS - V_ov while the channel conducts (its sign agrees with the region), V_ov in cutoff. */
export const MARGIN = 3;
/** 0 cutoff, 1 ohmic, 2 saturation. */
export const REGION = 4;

/**
 * The problem on its way to the function of its region: beta, lambda, A, r, b, R. As arguments, numbers are boxed wherever a call is not inlined,
 * and those functions are too long for that: a solve took a third longer.
 */
export const givenLine = new Float64Array(6);

/** Steps after which the bracket is as narrow as it can get; the fixed sets of tests need at most 16. */
export const STEP_CAP = 200;

/** A step of Newton's below this share is the last one: the error squares, so what remains is below rounding. */
export const SETTLED = 2e-9;

/** |H| below this share of its largest term is rounding. */
export const NOISE = 2 ** -51;

/**
 * Solves the operating point for `beta` > 0 (A/V²), `lambda` >= 0 (1/V), `A` and `b` >= 0 in volts and
 * 0 <= `r` <= `R` in ohms, into `line`. Answers with the number of steps.
 * Source: bracket and unknowns derived from the maximum principle of resistive networks, see the head.
 */
export function solveLine(beta: number, lambda: number, A: number, r: number, b: number, R: number): number {
  givenLine[0] = beta;
  givenLine[1] = lambda;
  givenLine[2] = A;
  givenLine[3] = r;
  givenLine[4] = b;
  givenLine[5] = R;
  return solveGivenLine();
}

/** As `solveLine`, of what stands in `givenLine`. */
export function solveGivenLine(): number {
  const A = givenLine[2];
  const b = givenLine[4];
  if (!(A > 0)) return leave(0, A, b, A, 0, 0);
  if (isOhmic(givenLine[0], givenLine[1], A, givenLine[3], b, givenLine[5])) return solveOhmicLine();
  return solveSaturated();
}

/** Whether the root lies in the ohmic region, for `A` above 0. */
export function isOhmic(beta: number, lambda: number, A: number, r: number, b: number, R: number): boolean {
  if (b < A) return true;
  const crossing = (b - A) / (R - r);
  const overdrive = A - r * crossing;
  return overdrive > 0 && crossing < beta * overdrive * overdrive * (1 + lambda * overdrive);
}

/** The root of what stands in `givenLine`, its region being saturation. */
export function solveSaturated(): number {
  const beta = givenLine[0];
  const lambda = givenLine[1];
  const A = givenLine[2];
  const r = givenLine[3];
  const b = givenLine[4];
  const R = givenLine[5];
  if (2 * r > R && lambda > 0) return solveFedBack();
  const u = beta * (1 + lambda * b);
  const ru = r * u;
  let low = (2 * A) / (1 + Math.sqrt(1 + 4 * ru * A));
  // Without lambda the equation is a quadratic, and `low` its root.
  if (lambda === 0) return leaveSaturated(beta * low * low, low, b, R, 0);
  const K = beta * lambda * R;
  const floor = NOISE * A;
  let high = A;
  let x = low;
  let steps = 0;
  while (steps < STEP_CAP) {
    steps++;
    const d = 1 + K * x * x;
    const hd = (x - A) * d + ru * x * x;
    if (Math.abs(hd) <= floor * d) break;
    if (hd > 0) high = x;
    else low = x;
    let next = x - (d * hd) / (d * d + 2 * ru * x);
    let settled = SETTLED;
    if (!(next >= low && next <= high)) {
      next = low + 0.5 * (high - low);
      settled = NOISE;
    }
    const moved = Math.abs(next - x);
    x = next;
    if (moved <= settled * x) break;
  }
  return leaveSaturated((u * x * x) / (1 + K * x * x), x, b, R, steps);
}

function leaveSaturated(I: number, vov: number, b: number, R: number, steps: number): number {
  const vds = Math.max(vov, b - R * I);
  return leave(I, vov, vds, vds - vov, 2, steps);
}

/** Saturation where most of the load line is also bias line (a diode connection has r = R): there b - R I has no digits left. */
function solveFedBack(): number {
  const beta = givenLine[0];
  const lambda = givenLine[1];
  const A = givenLine[2];
  const r = givenLine[3];
  const b = givenLine[4];
  const R = givenLine[5];
  const k = r / R;
  const d = b - A - (A * (R - r)) / r; // V_DS = d + x / k
  const rb = r * beta;
  const floor = NOISE * A;
  let low = (2 * A) / (1 + Math.sqrt(1 + 4 * rb * (1 + lambda * b) * A));
  let high = Math.max(low, (2 * A) / (1 + Math.sqrt(1 + 4 * rb * (1 + lambda * Math.max(0, d)) * A)));
  let x = high;
  let steps = 0;
  while (steps < STEP_CAP) {
    steps++;
    const vds = Math.max(0, d + x / k);
    const e = 1 + lambda * vds;
    const h = x - A + rb * x * x * e;
    if (Math.abs(h) <= floor) break;
    if (h > 0) high = x;
    else low = x;
    let next = x - h / (1 + rb * x * (2 * e + (vds > 0 ? (lambda * x) / k : 0)));
    let settled = SETTLED;
    if (!(next >= low && next <= high)) {
      next = low + 0.5 * (high - low);
      settled = NOISE;
    }
    const moved = Math.abs(next - x);
    x = next;
    if (moved <= settled * x) break;
  }
  const vds = Math.max(x, d + x / k);
  return leave(beta * x * x * (1 + lambda * vds), x, vds, vds - x, 2, steps);
}

/** The root of what stands in `givenLine`, its region being the ohmic one. */
export function solveOhmicLine(): number {
  const beta = givenLine[0];
  const lambda = givenLine[1];
  const A = givenLine[2];
  const r = givenLine[3];
  const b = givenLine[4];
  const R = givenLine[5];
  if (!(R > 0)) return ohmicAt(beta, lambda, A, b);
  const k = r / R;
  const j = (R - r) / R; // 1 - k without its rounding
  const m = 2 * k - 1;
  const c = Math.max(0, k > 0.5 ? A - b + j * b : A - k * b);
  const bR = beta * R;
  const B = 1 + 2 * bR * c;
  const discriminant = B * B + 4 * bR * m * b;
  let y = (2 * b) / (B + Math.sqrt(Math.max(0, discriminant)));
  let steps = 0;
  // Without lambda the equation is a quadratic, and y its root unless the discriminant has lost digits.
  if (lambda > 0 || 4 * discriminant < B * B) {
    const floor = NOISE * b;
    let low = 0;
    let high = j > 0 ? Math.min(b, c / j) : b;
    if (!(y <= high)) y = high;
    while (steps < STEP_CAP) {
      steps++;
      const g = 2 * c + m * y;
      const e = 1 + lambda * y;
      const h = y - b + bR * y * g * e;
      if (Math.abs(h) <= floor) break;
      if (h > 0) high = y;
      else low = y;
      let next = y - h / (1 + bR * ((g + m * y) * e + lambda * y * g));
      let settled = SETTLED;
      if (!(next >= low && next <= high)) {
        next = low + 0.5 * (high - low);
        settled = NOISE;
      }
      const moved = Math.abs(next - y);
      y = next;
      if (moved <= settled * y) break;
    }
  }
  const vov = Math.max(y, c + k * y);
  const I = 2 * y > b ? beta * y * (2 * c + m * y) * (1 + lambda * y) : (b - y) / R;
  return leave(I, vov, y, Math.min(0, j * y - c), 1, steps);
}

/** Both terminals held by ideal voltages: no equation remains. */
function ohmicAt(beta: number, lambda: number, A: number, b: number): number {
  return leave(beta * b * (2 * A - b) * (1 + lambda * b), A, b, b - A, 1, 0);
}

function leave(I: number, vov: number, vds: number, margin: number, region: number, steps: number): number {
  line[CURRENT] = I;
  line[OVERDRIVE] = vov;
  line[DRAIN_SOURCE] = vds;
  line[MARGIN] = margin;
  line[REGION] = region;
  return steps;
}
