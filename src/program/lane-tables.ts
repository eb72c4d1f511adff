// The tables of exp, ln and log10 for the lanes: those of the scalar functions, computed again in whole numbers of 2^-160.
//
// Each entry is a sum of two doubles. The first of a logarithm is a multiple of 2^-42, so that it adds exactly to a whole
// number of ln 2 or log10 2; the first of a power is the nearest double.

const DIGITS = 160n;
const ONE = 1n << DIGITS;
/** Rows of the logarithms: j/64 for j = 45..91. */
export const FIRST_ROW = 45;
const ROWS = 47;

/** 2 artanh(p / q) = ln((q + p) / (q - p)). */
function twiceArtanh(p: bigint, q: bigint): bigint {
  let power = (p * ONE) / q;
  let sum = 0n;
  for (let k = 1n; power !== 0n; k += 2n) {
    sum += power / k;
    power = (power * p * p) / (q * q);
  }
  return 2n * sum;
}

const LN2 = twiceArtanh(1n, 3n);
const LN10 = 3n * LN2 + twiceArtanh(1n, 9n);

function exponential(x: bigint): bigint {
  let term = ONE;
  let sum = 0n;
  for (let k = 1n; term !== 0n; k++) {
    sum += term;
    term = (term * x) / (ONE * k);
  }
  return sum;
}

/** The nearest double. */
function toDouble(x: bigint): number {
  return Number(x) / 2 ** 160;
}

/** x as a multiple of 2^-42 and the rest. */
function parted(x: bigint): [number, number] {
  const unit = 1n << (DIGITS - 42n);
  const rounded = x + unit / 2n - ((((x + unit / 2n) % unit) + unit) % unit);
  return [toDouble(rounded), toDouble(x - rounded)];
}

/** ln 2 and log10 2 in two parts, and what Math.LOG10E leaves of log10 e. */
export const [LN2_HIGH, LN2_LOW] = parted(LN2);
export const [LOG10_2_HIGH, LOG10_2_LOW] = parted((LN2 * ONE) / LN10);
export const LOG10E_LOW = toDouble((ONE * ONE) / LN10 - doubleToFixed(Math.LOG10E));

function doubleToFixed(x: number): bigint {
  return BigInt(x * 2 ** 60) << (DIGITS - 60n);
}

/** All tables in one row of numbers, and the place of each. */
export function laneTables(): { readonly numbers: Float64Array; readonly places: Readonly<Record<string, number>> } {
  const ln: number[] = [];
  const log10: number[] = [];
  for (let row = 0; row < ROWS; row++) {
    const j = BigInt(FIRST_ROW + row);
    const log = twiceArtanh(j - 64n, j + 64n);
    ln.push(...parted(log));
    log10.push(...parted((log * ONE) / LN10));
  }
  const exp: number[] = [];
  for (let j = 0n; j < 32n; j++) {
    const power = exponential((j * LN2) / 32n);
    const high = toDouble(power);
    exp.push(high, toDouble(power - doubleToFixed(high)));
  }
  return {
    numbers: Float64Array.from([...ln, ...log10, ...exp]),
    places: { LN: 0, LOG10: ln.length, EXP: ln.length + log10.length },
  };
}
