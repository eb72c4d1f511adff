// The oracle of the elementary functions: the same functions in integers of several hundred bits.
//
// A real is held as an integer times 2^-P (`fixed point with P places`); P is chosen per call so that
// the result has at least 120 good bits. Nothing here shares code or tables with src/numeric.

/** An exact binary rational: integer times 2^exponent. */
export interface Exact {
  readonly integer: bigint;
  readonly exponent: number;
}

export function exactOf(x: number): Exact {
  const view = new DataView(new ArrayBuffer(8));
  view.setFloat64(0, x);
  const bits = view.getBigUint64(0);
  const biased = Number((bits >> 52n) & 0x7ffn);
  const fraction = bits & 0xfffffffffffffn;
  const integer = biased === 0 ? fraction : fraction | 0x10000000000000n;
  return { integer: x < 0 ? -integer : integer, exponent: Math.max(biased, 1) - 1075 };
}

/** floor(x 2^places). */
export function toFixed(x: number, places: number): bigint {
  const { integer, exponent } = exactOf(x);
  return shift(integer, exponent + places);
}

function shift(n: bigint, by: number): bigint {
  return by >= 0 ? n << BigInt(by) : n >> BigInt(-by);
}

/** How far `got` is from reference (fixed point), in units of the last place of the reference value. */
export function ulpsOff(got: number, reference: bigint, places: number): number {
  const size = reference < 0n ? -reference : reference;
  const ulpExponent = Math.max(size.toString(2).length - places - 53, -1074);
  const difference = toFixed(got, places) - reference;
  // Scaled by 2^20 before the conversion so that fractions of an ulp survive.
  return Math.abs(Number(shift(difference, 20 - ulpExponent - places))) / 2 ** 20;
}

const divide = (a: bigint, b: bigint, p: number): bigint => (a << BigInt(p)) / b;
const times = (a: bigint, b: bigint, p: number): bigint => (a * b) >> BigInt(p);

/** e^r by halving the argument and squaring the Taylor sum; |r| below about 1. */
function expSmall(r: bigint, places: number): bigint {
  const halvings = 16;
  const p = places + 40;
  const x = (r << 40n) >> BigInt(halvings);
  const one = 1n << BigInt(p);
  let term = one;
  let sum = one;
  for (let k = 1n; term !== 0n && term !== -1n; k++) {
    term = times(term, x, p) / k;
    sum += term;
  }
  for (let k = 0; k < halvings; k++) sum = times(sum, sum, p);
  return sum >> 40n;
}

const memo = new Map<string, bigint>();
function remembered(name: string, places: number, make: () => bigint): bigint {
  const key = `${name}${places}`;
  const known = memo.get(key);
  if (known !== undefined) return known;
  const value = make();
  memo.set(key, value);
  return value;
}

/** 2 artanh(1/3). */
export function ln2(places: number): bigint {
  return remembered('ln2', places, () => {
    const p = places + 40;
    let power = (2n << BigInt(p)) / 3n;
    let sum = 0n;
    for (let k = 1n; power !== 0n; k += 2n) {
      sum += power / k;
      power /= 9n;
    }
    return sum >> 40n;
  });
}

/** 16 atan(1/5) - 4 atan(1/239), J. Machin. */
export function pi(places: number): bigint {
  return remembered('pi', places, () => {
    const p = places + 40;
    const atanOfInverse = (n: bigint): bigint => {
      let power = (1n << BigInt(p)) / n;
      let sum = 0n;
      for (let k = 1n, sign = 1n; power !== 0n; k += 2n, sign = -sign) {
        sum += (sign * power) / k;
        power /= n * n;
      }
      return sum;
    };
    return (16n * atanOfInverse(5n) - 4n * atanOfInverse(239n)) >> 40n;
  });
}

/** e^x for a fixed-point x of any size. */
export function expFixed(x: bigint, places: number): bigint {
  const k = x / ln2(places);
  return shift(expSmall(x - k * ln2(places), places), Number(k));
}

/** ln x for a fixed-point x > 0: a double's guess, then one step of Halley's rule on e^y = x. */
export function lnFixed(x: bigint, places: number): bigint {
  const length = x.toString(2).length;
  const mantissa = shift(x, places - length);
  const k = length - places;
  const guess = toFixed(Math.log(Number(mantissa >> BigInt(places - 60)) / 2 ** 60), places);
  const back = expSmall(guess, places);
  return guess + divide(2n * (mantissa - back), mantissa + back, places) + BigInt(k) * ln2(places);
}

/** [sin, cos] of a fixed-point angle. */
export function sinCosFixed(x: bigint, places: number): [bigint, bigint] {
  const half = pi(places) >> 1n;
  let n = x / half;
  let r = x - n * half;
  if (2n * r > half) {
    r -= half;
    n += 1n;
  }
  if (2n * r < -half) {
    r += half;
    n -= 1n;
  }
  const series = (first: bigint, start: bigint): bigint => {
    let term = first;
    let sum = first;
    for (let k = start; term !== 0n && term !== -1n; k += 2n) {
      term = -times(times(term, r, places), r, places) / (k * (k + 1n));
      sum += term;
    }
    return sum;
  };
  const s = series(r, 2n);
  const c = series(1n << BigInt(places), 1n);
  const quadrant = Number(((n % 4n) + 4n) % 4n);
  return (
    [
      [s, c],
      [c, -s],
      [-s, -c],
      [-c, s],
    ] as [bigint, bigint][]
  )[quadrant];
}

export function squareRoot(n: bigint): bigint {
  if (n < 2n) return n;
  let x = 1n << BigInt(Math.ceil(n.toString(2).length / 2));
  for (;;) {
    const next = (x + n / x) >> 1n;
    if (next >= x) return x;
    x = next;
  }
}

/** The exponent e with 2^e <= |x| < 2^(e+1), for x not 0. */
export function binaryExponent(x: number): number {
  const { integer, exponent } = exactOf(Math.abs(x));
  return integer.toString(2).length - 1 + exponent;
}

export interface Reference {
  readonly value: bigint;
  readonly places: number;
}
/** Places so that a number of the size of x keeps 160 bits. */
const placesFor = (x: number, extra = 0): number => 160 + Math.max(0, -binaryExponent(x)) + Math.max(0, extra);

export const reference = {
  exp(x: number): Reference {
    const places = 160 + Math.max(0, Math.ceil(-x * Math.LOG2E));
    return { value: expFixed(toFixed(x, places), places), places };
  },
  expm1(x: number): Reference {
    const places = placesFor(x);
    return { value: expFixed(toFixed(x, places), places) - (1n << BigInt(places)), places };
  },
  ln(x: number): Reference {
    const places = 160 + Math.max(0, x === 1 ? 0 : -binaryExponent(x - 1)) + Math.max(0, -binaryExponent(x));
    return { value: lnFixed(toFixed(x, places), places), places };
  },
  log10(x: number): Reference {
    const { value, places } = reference.ln(x);
    return { value: divide(value, lnFixed(10n << BigInt(places), places), places), places };
  },
  log1p(x: number): Reference {
    const places = 2 * placesFor(x);
    return { value: lnFixed((1n << BigInt(places)) + toFixed(x, places), places), places };
  },
  pow(x: number, y: number): Reference {
    const size = Math.abs(y * Math.log2(x)) + 160;
    const places = Math.ceil(
      size + 2 * Math.max(0, -binaryExponent(x)) + Math.max(0, -binaryExponent(y)) + Math.max(0, binaryExponent(y)),
    );
    const product = times(lnFixed(toFixed(x, places), places), toFixed(y, places), places);
    return { value: expFixed(product, places), places };
  },
  sin(x: number): Reference {
    const places = placesFor(x, binaryExponent(x)) + 140;
    return { value: sinCosFixed(toFixed(x, places), places)[0], places };
  },
  cos(x: number): Reference {
    const places = placesFor(x, binaryExponent(x)) + 140;
    return { value: sinCosFixed(toFixed(x, places), places)[1], places };
  },
  tan(x: number): Reference {
    const places = placesFor(x, binaryExponent(x)) + 140;
    const [s, c] = sinCosFixed(toFixed(x, places), places);
    return { value: divide(s, c, places), places };
  },
  /** atan y0 + atan((x - tan y0) / (1 + x tan y0)), the second by its first two terms. */
  atan(x: number): Reference {
    const places = placesFor(x, binaryExponent(x)) + 120;
    const [s, c] = sinCosFixed(toFixed(Math.atan(x), places), places);
    const fixed = toFixed(x, places);
    const delta = divide(times(fixed, c, places) - s, c + times(fixed, s, places), places);
    const cube = times(times(delta, delta, places), delta, places);
    return { value: toFixed(Math.atan(x), places) + delta - cube / 3n, places };
  },
  hypot(a: number, b: number): Reference {
    const places = 160 + Math.max(0, -binaryExponent(Math.max(Math.abs(a), Math.abs(b))));
    const x = toFixed(a, 2 * places);
    const y = toFixed(b, 2 * places);
    return { value: squareRoot((x * x + y * y) >> BigInt(2 * places)), places };
  },
};
