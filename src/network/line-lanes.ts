// The line solve in the language of lanes, see line-solve.ts for the equations: every region is solved for the lanes that
// lie in it and left out where there are none. Sums are taken in the order of the scalar solve.

import { NOISE, SETTLED, STEP_CAP } from './line-solve.ts';
import { NOT_A_NUMBER, SOLVED } from './point-status.ts';

/** One step of Newton's at `next`, kept inside the bracket, for the lanes that are `busy`; h has the sign of the residual. */
const STEP = `
      high = select(busy & h > 0, x, high)
      low = select(busy & !(h > 0), x, low)
      inside = next >= low & next <= high
      next = select(inside, next, low + 0.5 * (high - low))
      moved = abs(next - x)
      x = select(busy, next, x)
      steps = steps + 1
      busy = busy & !(moved <= select(inside, ${SETTLED}, ${NOISE}) * x) & steps < ${STEP_CAP}`;

/** Where a region's lanes have their results. */
const leave = (mask: string, current: string, vov: string, vds: string, margin: string, region: number): string => `
    new_I = ${current}
    I = select(${mask}, new_I, I)
    vov = select(${mask}, ${vov}, vov)
    vds = select(${mask}, ${vds}, vds)
    margin = select(${mask}, ${margin}, margin)
    region = select(${mask}, ${region}, region)`;

const SATURATED = `
  if plain
    u = beta * (1 + lambda * b)
    ru = r * u
    low = 2 * A / (1 + sqrt(1 + 4 * ru * A))
    K = beta * lambda * R
    small = ${NOISE} * A
    high = A
    x = low
    steps = 0
    busy = plain & lambda != 0
    while busy
      d = 1 + K * x * x
      h = (x - A) * d + ru * x * x
      busy = busy & !(abs(h) <= small * d)
      next = x - d * h / (d * d + 2 * ru * x)
      ${STEP}
    end
    current = select(lambda == 0, beta * x * x, u * x * x / (1 + K * x * x))
    onset = max(x, b - R * current)
    ${leave('plain', 'current', 'x', 'onset', 'onset - x', 2)}
  end`;

const FED_BACK = `
  if fed
    k = r / R
    d = b - A - A * (R - r) / r
    rb = r * beta
    small = ${NOISE} * A
    low = 2 * A / (1 + sqrt(1 + 4 * rb * (1 + lambda * b) * A))
    high = max(low, 2 * A / (1 + sqrt(1 + 4 * rb * (1 + lambda * max(0, d)) * A)))
    x = high
    steps = 0
    busy = fed
    while busy
      y = max(0, d + x / k)
      e = 1 + lambda * y
      h = x - A + rb * x * x * e
      busy = busy & !(abs(h) <= small)
      next = x - h / (1 + rb * x * (2 * e + select(y > 0, lambda * x / k, 0)))
      ${STEP}
    end
    y = max(x, d + x / k)
    ${leave('fed', 'beta * x * x * (1 + lambda * y)', 'x', 'y', 'y - x', 2)}
  end`;

const OHMIC = `
  if ohmic & R > 0
    bent = ohmic & R > 0
    k = r / R
    j = (R - r) / R
    m = 2 * k - 1
    c = max(0, select(k > 0.5, A - b + j * b, A - k * b))
    bR = beta * R
    B = 1 + 2 * bR * c
    discriminant = B * B + 4 * bR * m * b
    x = 2 * b / (B + sqrt(max(0, discriminant)))
    small = ${NOISE} * b
    low = 0
    high = select(j > 0, min(b, c / j), b)
    steps = 0
    busy = bent & (lambda > 0 | 4 * discriminant < B * B)
    x = select(busy & !(x <= high), high, x)
    while busy
      g = 2 * c + m * x
      e = 1 + lambda * x
      h = x - b + bR * x * g * e
      busy = busy & !(abs(h) <= small)
      next = x - h / (1 + bR * ((g + m * x) * e + lambda * x * g))
      ${STEP}
    end
    current = select(2 * x > b, beta * x * (2 * c + m * x) * (1 + lambda * x), (b - x) / R)
    ${leave('bent', 'current', 'max(x, c + k * x)', 'x', 'min(0, j * x - c)', 1)}
  end
  if ohmic & !(R > 0)
    held = ohmic & !(R > 0)
    ${leave('held', 'beta * b * (2 * A - b) * (1 + lambda * b)', 'A', 'b', 'b - A', 1)}
  end`;

/** From beta, lambda, A, r, b, R to I, vov, vds, margin, region, as `solveLine` leaves them. */
export const LINE_LANES = `
  on = A > 0
  crossing = (b - A) / (R - r)
  over = A - r * crossing
  ohmic = on & (b < A | over > 0 & crossing < beta * over * over * (1 + lambda * over))
  fed = on & !ohmic & 2 * r > R & lambda > 0
  plain = on & !ohmic & !fed
  I = 0
  vov = A
  vds = b
  margin = A
  region = 0
  ${SATURATED}
  ${FED_BACK}
  ${OHMIC}`;

/** From vov, vds of the line and `reversed` to gm, gds, gmb over q, without body effect, as `deriveAt` leaves them. */
export const DERIVE_LANES = `
  w = min(vds, vov)
  f1 = select(vov <= 0, 0, 2 * beta * w * (1 + lambda * vds))
  f2 = select(vov <= 0, 0, beta * (2 * (vov - w) * (1 + lambda * vds) + w * (2 * vov - w) * lambda))
  body = f1 * 0
  gm = select(reversed, 0 - f1, f1)
  gds = select(reversed, f1 + body + f2, f2)
  gmb = select(reversed, 0 - body, body)
  q = 1 + (gm + gmb) * r_s + gds * (r_s + r_d)`;

/** The kernel of the operating point on its lines. */
export const POINT_LANES = `
  vgg = channel * V_GG
  vl = channel * V_L
  Rm = max(0, min(R_m, R_L))
  R = R_L + r_s + r_d
  sum = beta + V_TO + lambda + vgg + vl + Rm + R
  sound = beta > 0 & lambda >= 0 & R_L >= 0 & r_s >= 0 & r_d >= 0 & sum - sum == 0
  reversed = vl < 0
  A = select(sound, select(reversed, vgg - vl - V_TO, vgg - V_TO), NaN)
  r = select(reversed, R_L - Rm + r_d, Rm + r_s)
  b = select(reversed, -vl, vl)
  ${LINE_LANES}
  I = select(reversed, 0 - I, I)
  ${DERIVE_LANES}
  status = select(sound, ${SOLVED}, ${NOT_A_NUMBER})
  I_D = select(sound, I, NaN)
  V_GS = select(sound, channel * (vgg - Rm * I) + 0, NaN)
  V_DS = select(sound, channel * (select(reversed, -vds, vds) + (r_s + r_d) * I) + 0, NaN)
  V_ov = select(sound, vov, NaN)
  V_DSsat = select(sound, select(region == 0, Infinity, vov + (r_s + r_d) * abs(I)), NaN)
  margin = select(sound, margin, NaN)
  region = select(sound, region, NaN)
  g_m = select(sound, gm / q, NaN)
  g_ds = select(sound, gds / q, NaN)`;
