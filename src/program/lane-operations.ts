// The plain operations for two lanes at a time: the same sums in the same order as those of one number, so that their
// results are the same to the last bit.

import type { LaneText } from './lane-language.ts';
import { FIRST_ROW, LN2_HIGH, LN2_LOW, LOG10E_LOW, LOG10_2_HIGH, LOG10_2_LOW } from './lane-tables.ts';
import type { OperationName } from './operations.ts';

/** 2^27 + 1 splits 53 bits into two halves whose products are exact. */
const SPLITTER = 134217729;
const LOG10E_WIDE = Math.LOG10E * SPLITTER;
const LOG10E_HIGH_HALF = LOG10E_WIDE - (LOG10E_WIDE - Math.LOG10E);
const LOG10E_LOW_HALF = Math.LOG10E - LOG10E_HIGH_HALF;

/** x = 2^e m and the nearest row j of a table, with m / (j/64) = (1 + s) / (1 - s); see ln. */
const REDUCE = `
  tiny = a < ${2 ** -1022}
  x = select(tiny, a * ${2 ** 54}, a)
  e = exponent(x)
  m = mantissa(x)
  large = m > ${Math.SQRT2}
  m = select(large, m * 0.5, m)
  e = select(large, e + 1, e)
  j = floor(m * 64 + 0.5)
  row = 2 * (j - ${FIRST_ROW})
  s = (m - j / 64) / (m + j / 64)
  z = s * s
  tail = z * (1/3 + z * (1/5 + z * (1/7 + z * 1/9)))
  d = a - 1
  near = d < 0.0625 & d > -0.0625`;

/** ln(1 + d) - d. */
const NEAR_ONE = `
    z = d * d
    odd = 1/3 + z * (1/5 + z * (1/7 + z * (1/9 + z * (1/11 + z * (1/13 + z * 1/15)))))
    even = 1/4 + z * (1/6 + z * (1/8 + z * (1/10 + z * (1/12 + z * 1/14))))
    rest = z * (d * odd - z * even) - 0.5 * z`;

const SPECIAL = `
  t = select(a == Infinity, Infinity, t)
  t = select(a > 0, t, select(a == 0, -Infinity, NaN))`;

const LN = `${REDUCE}
  t = e * ${LN2_HIGH} + lookUp(LN, row) + (2 * s + (2 * s * tail + (e * ${LN2_LOW} + lookUp(LN, row + 1))))
  t = select(tiny, t - ${54 * Math.LN2}, t)
  if near
    ${NEAR_ONE}
    t = select(near, d + rest, t)
  end
  ${SPECIAL}`;

const LOG10 = `${REDUCE}
  small = 2 * s * ${Math.LOG10E}
  low = e * ${LOG10_2_LOW} + lookUp(LOG10, row + 1)
  t = e * ${LOG10_2_HIGH} + lookUp(LOG10, row) + (small + (small * tail + low))
  t = select(tiny, t - ${54 * (LOG10_2_HIGH + LOG10_2_LOW)}, t)
  if near
    ${NEAR_ONE}
    product = d * ${Math.LOG10E}
    wide = d * ${SPLITTER}
    high = wide - (wide - d)
    low = d - high
    over = product - high * ${LOG10E_HIGH_HALF} - low * ${LOG10E_HIGH_HALF} - high * ${LOG10E_LOW_HALF}
    over = low * ${LOG10E_LOW_HALF} - over + d * ${LOG10E_LOW}
    t = select(near, product + (rest * ${Math.LOG10E} + over), t)
  end
  ${SPECIAL}`;

/** e^(a + rest). */
const EXP_OF_SUM = `
  step = a * 46.16624130844683 + ${1.5 * 2 ** 52} - ${1.5 * 2 ** 52}
  r = a - step * 0.021660849392446835 - step * 5.145609244655338e-14 + rest
  k = floor(step / 32)
  row = 2 * (step - 32 * k)
  short = r + r * r * (1/2 + r * (1/6 + r * (1/24 + r * (1/120 + r * 1/720))))
  lead = lookUp(EXP, row)
  t = lead + (lookUp(EXP, row + 1) + lead * short)
  up = k > 1022
  down = k < -1021
  t = t * twoTo(select(up, k - 2, select(down, k + 200, k))) * select(up, 4, select(down, ${2 ** -200}, 1))
  t = select(a > 709.79, Infinity, select(a < -745.2, 0, t))
  t = select(a == a, t, NaN)`;

const EXP = `
  rest = 0
  ${EXP_OF_SUM}`;

/** product = u v without its rounding: what is left of it in `lost`. */
const LOST = `
  wide = u * ${SPLITTER}
  uHigh = wide - (wide - u)
  uLow = u - uHigh
  wide = v * ${SPLITTER}
  vHigh = wide - (wide - v)
  vLow = v - vHigh
  lost = uLow * vLow - (product - uHigh * vHigh - uLow * vHigh - uHigh * vLow)`;

const POWER = `
  size = abs(base)
  a = size
  ${REDUCE}
  e = select(tiny, e - 54, e)
  c = j / 64
  d = m - c
  q = m + c
  s = d / q
  product = s * q
  u = s
  v = q
  ${LOST}
  rounded = q - m
  sLow = (d - product - lost - s * (m - (q - rounded) + (c - rounded))) / q
  z = s * s
  tail = z * (1/3 + z * (1/5 + z * (1/7 + z * 1/9)))
  sum = e * ${LN2_HIGH} + lookUp(LN, row)
  leading = sum + 2 * s
  trailing = sum - leading + 2 * s + (e * ${LN2_LOW} + lookUp(LN, row + 1) + 2 * (sLow + s * tail))
  log = leading + trailing
  logLow = leading - log + trailing
  a = y * log
  product = a
  u = y
  v = log
  ${LOST}
  rest = lost + y * logLow
  ${EXP_OF_SUM}
  t = select(a > 710, Infinity, select(a < -746, 0, select(abs(a) < ${2 ** -60}, 1, t)))
  t = select(y == 1, size, t)
  t = select(size == 0 | size == Infinity, select(size == 0 & y > 0 | size != 0 & !(y > 0), 0, Infinity), t)
  t = select(size == 1, select(abs(y) == Infinity, NaN, 1), t)
  odd = floor(y) == y & floor(y / 2) * 2 != y
  t = select((base < 0 | 1 / base < 0) & odd, -t, t)
  t = select(base < 0 & size != Infinity & floor(y) != y, NaN, t)
  t = select(base == base & y == y, t, NaN)
  t = select(y == 0, 1, t)`;

/** Texts that others may set in: power(base, y) is base^y, see `pow`. */
export const LANE_LIBRARY: Readonly<Record<string, LaneText>> = {
  power: { inputs: ['base', 'y'], outputs: ['t'], text: POWER },
};

const BY_NAME: Readonly<Partial<Record<OperationName, string>>> = {
  add: 't = a + b',
  sub: 't = a - b',
  mul: 't = a * b',
  div: 't = a / b',
  neg: 't = -a',
  abs: 't = abs(a)',
  sqrt: 't = sqrt(a)',
  min: 't = min(a, b)',
  max: 't = max(a, b)',
  parallel: `
    t = select(a == 0 | b == 0, 0, a * b / (a + b))
    t = select(a == Infinity, b, select(b == Infinity, a, t))`,
  sign: 't = select(a > 0, 1, select(a < 0, -1, a))',
  exp: EXP,
  ln: LN,
  log10: LOG10,
  pow: 't = power(a, b)',
  less: 't = select(a < b, 1, 0)',
  lessOrEqual: 't = select(a <= b, 1, 0)',
  equal: 't = select(a == b, 1, 0)',
  and: 't = a * b',
  or: 't = max(a, b)',
  not: 't = 1 - a',
};

/** The operations that have a form for lanes, by name: t of a, or of a and b. */
export const LANE_OPERATIONS: readonly (readonly [name: OperationName, lanes: LaneText])[] = Object.entries(
  BY_NAME,
).map(([name, text]) => [name as OperationName, { inputs: ['a', 'b'], outputs: ['t'], text }]);
