// The general operating point without body effect in the language of lanes: every lane goes its own way from the ambient
// temperature through the scan of thermal-balance.ts into the search for the root, and all of them share one evaluation of
// the point at their own temperatures. The states:
//
//   0  at the ambient temperature       3  at the point x of the search for a root in [a, b]
//   1  at the end of step n of the scan  4  at the junction temperature: the lane stays there until all have come
//   2  at the other end of that step
//
// The search is that of `solveBracketed`, its sums in the same order.

import { DERIVE_LANES, LINE_LANES } from './line-lanes.ts';
import { NOT_A_NUMBER, RUNAWAY, SOLVED } from './point-status.ts';
import { CHUNK, ROUNDING, SCAN_STEPS, THERMAL_CEILING } from './thermal-balance.ts';

/** The point at T, and `excess`, by how much T lies above the temperature of its own heat. */
const EVALUATE = `
    doublings = power(2, (T - T_nom) / doubling)
    leakage = select(I_GSS == 0, 0, I_GSS * doublings)
    mobility = power(T / T_nom, beta_exponent)
    beta = select(T == T_nom, beta_nom, beta_nom * mobility)
    vto = V_TO + tempco * (T - T_nom)
    vgs = vgg + q_gs * leakage
    vl_T = vl + q_ds * leakage
    vsb = vsb0 + q_sb * leakage
    reversed = vl_T < 0
    A = select(sound, select(reversed, vgs - vl_T - vto, vgs - vto), NaN)
    r = select(reversed, R_L - Rm + r_d, Rm + r_s)
    b = select(reversed, -vl_T, vl_T)
    ${LINE_LANES}
    I = select(reversed, 0 - I, I)
    vds_T = select(reversed, 0 - vds, vds) + (r_s + r_d) * I
    excess = T - T_A - R_thJA * (vds_T * I)`;

/** What the excess says at the ambient temperature and along the scan; `advance` are the lanes that take their next step. */
const SCAN = `
    at_ambient = open & state == 0
    at_step = open & state == 1
    cold = at_ambient & excess == 0
    hot = at_ambient & excess != 0 & !(T_A < ${THERMAL_CEILING})
    hot = hot | at_ambient & excess != excess & !(T_A < ${THERMAL_CEILING})
    roots = select(at_ambient & !cold, 0, roots)
    crossed = at_step & (excess > 0 & !(before > 0) | !(excess > 0) & before > 0)
    roots = select(crossed, roots + 1, roots)
    entered = crossed & roots == 1
    before = select(at_ambient | at_step, excess, before)
    advance = at_ambient & !cold & !hot | at_step & !entered
    T = select(entered, T - step, T)
    fb = select(entered, excess, fb)
    high_end = select(entered, T_A + n * step, high_end)`;

/** The search between the ends of the step; `found` are the lanes whose search ends. */
const SEARCH = `
    at_low = open & state == 2
    at_x = open & state == 3
    a = select(at_low, T, a)
    fa = select(at_low, excess, fa)
    to = select(at_low, high_end, to)
    tolerance = select(at_low, max(abs(a), abs(to)) * ${2 ** -70}, tolerance)
    lost = at_low & (fa != fa | fb != fb) | at_x & excess != excess
    on_end = at_low & !lost & (fa == 0 | fb == 0)
    alike = at_low & !lost & !on_end & (fa > 0 & fb > 0 | !(fa > 0) & !(fb > 0))
    root = select(lost | alike, NaN, select(fa == 0, a, to))
    begun = at_low & !lost & !on_end & !alike
    x = select(begun, a + 0.5 * (to - a), x)
    tries = select(begun, 1, tries)

    moving = at_x & !lost
    flip = moving & (excess > 0 & !(fa > 0) | !(excess > 0) & fa > 0)
    from = select(flip, to, a)
    ffrom = select(flip, fb, fa)
    to = select(flip, a, to)
    fb = select(flip, fa, fb)
    a = select(moving, T, a)
    fa = select(moving, excess, fa)
    near_a = abs(fa) < abs(fb)
    best = select(near_a, a, to)
    residual = select(best == a, fa, fb)
    width = abs(to - a)
    wanted = ${2 * Number.EPSILON} * abs(best) + tolerance
    settled = moving & (residual == 0 | width <= 2 * wanted | tries >= 200)
    root = select(settled, best, root)
    xi = (a - to) / (from - to)
    phi = (fa - fb) / (ffrom - fb)
    inverse = fa / (fb - fa) * (ffrom / (fb - ffrom))
    inverse = inverse + (from - a) / (to - a) * (fa / (ffrom - fa)) * (fb / (ffrom - fb))
    least = wanted / width
    safe = phi * phi < xi & (1 - phi) * (1 - phi) < 1 - xi & inverse == inverse
    fraction = select(safe, min(max(inverse, least), 1 - least), 0.5)
    on = moving & !settled
    tries = select(on, tries + 1, tries)
    x = select(on, a + fraction * (to - a), x)
    T = select(begun | on, x, T)
    found = lost | on_end | alike | settled
    first = select(found, root, first)
    advance = advance | found`;

/** To the next step of the scan, over chunks in which the power is known to be too small for a root. */
const ADVANCE = `
    n = select(advance, n + 1, n)
    skipped = advance
    while skipped
      last = ${CHUNK} * floor((n - 1) / ${CHUNK}) + ${CHUNK}
      twice = max(0, -floor(-(T_A + last * step - T_nom) / doubling))
      bound = select(I_GSS == 0, 0, I_GSS * twoTo(min(twice, 31)))
      volts = abs(vl) + abs(q_ds * bound)
      tame = (I_GSS == 0 | twice < 31) & ${ROUNDING} * volts * volts < 4 * R_L * (n * step / R_thJA)
      skipped = skipped & before > 0 & n <= ${SCAN_STEPS} & tame
      n = select(skipped, last + 1, n)
    end
    ended = cold | hot | advance & n > ${SCAN_STEPS}
    T = select(advance, T_A + n * step, T)
    first = select(cold, T_A, first)
    T = select(ended, first, T)
    open = open & state != 4
    state = select(begun | on, 3, select(entered, 2, select(advance, 1, state)))
    state = select(ended, 4, state)`;

/** The kernel of the general operating point, gamma being 0. */
export const GENERAL_LANES = `
  vgg = channel * V_GG
  vl = channel * V_L
  vsb0 = channel * V_SB0
  Rm = max(0, min(R_m, R_L))
  Rb = max(0, min(R_b, R_L))
  R = R_L + r_s + r_d
  sum = 0 + channel + beta + V_TO + lambda + V_GG + R_m + V_L + R_L + V_SB0 + R_b + r_s + r_d + gamma + phi
  sum = sum + I_GSS + doubling + q_gs + q_ds + q_sb + beta_exponent + tempco + T_nom + T_A + R_thJA
  sound = sum - sum == 0 & beta > 0 & lambda >= 0 & R_L >= 0 & r_s >= 0 & r_d >= 0
  sound = sound & phi > 0 & R_thJA >= 0 & T_A > 0 & T_nom > 0
  beta_nom = beta
  step = (${THERMAL_CEILING} - T_A) / ${SCAN_STEPS}
  heats = R_thJA > 0
  state = select(heats, 0, 4)
  first = select(heats, NaN, T_A)
  roots = 1
  n = 0
  T = T_A
  before = 0
  high_end = 0
  a = 0
  fa = 0
  to = 0
  fb = 0
  tolerance = 0
  x_T = 0
  tries = 0
  open = sound
  while open
    ${EVALUATE}
    ${SCAN}
    ${SEARCH.replace(/\bx\b/g, 'x_T')}
    ${ADVANCE}
  end
  alive = sound & T == T
  ${DERIVE_LANES}
  status = select(sound, select(T == T, ${SOLVED}, ${RUNAWAY}), ${NOT_A_NUMBER})
  I_D = select(alive, I, NaN)
  V_GS = select(alive, channel * (vgg - Rm * I + q_gs * leakage) + 0, NaN)
  V_DS = select(alive, channel * vds_T + 0, NaN)
  V_ov = select(alive, vov, NaN)
  V_DSsat = select(alive, select(region == 0, Infinity, vov + (r_s + r_d) * abs(I)), NaN)
  margin = select(alive, margin, NaN)
  region = select(alive, region, NaN)
  g_m = select(alive, gm / q, NaN)
  g_ds = select(alive, gds / q, NaN)
  V_SB = select(alive, channel * (vsb + Rb * I) + 0, NaN)
  g_mb = select(alive, gmb / q, NaN)
  I_G = select(alive, leakage, NaN)
  T_J = select(alive, T, NaN)
  beta_out = select(alive, beta, NaN)
  V_TO_out = select(alive, vto, NaN)
  thermal_roots = select(alive, roots, NaN)`;
