// Exact fractions, so that rounding can be judged without rounding: a double is a whole number over a
// power of two, a printed decimal one over a power of ten.

/** over / under, under > 0. */
export interface Rational {
  readonly over: bigint;
  readonly under: bigint;
}

/** The exact value of a finite double. */
export function rationalOf(value: number): Rational {
  const bits = new DataView(new ArrayBuffer(8));
  bits.setFloat64(0, value);
  const word = bits.getBigUint64(0);
  const biased = Number((word >> 52n) & 0x7ffn);
  const fraction = word & 0xfffffffffffffn;
  const magnitude = biased === 0 ? fraction : fraction | (1n << 52n);
  const exponent = Math.max(biased, 1) - 1075;
  const over = value < 0 ? -magnitude : magnitude;
  return exponent >= 0 ? { over: over << BigInt(exponent), under: 1n } : { over, under: 1n << BigInt(-exponent) };
}

/** The exact value of a decimal such as `-12.50e-3`, and of one unit of its last digit. */
export function rationalOfText(text: string): Rational & { readonly quantum: Rational } {
  const [, sign, whole, fraction = '', exponent = '0'] = /^(-?)(\d+)(?:\.(\d+))?(?:e(-?\d+))?$/.exec(text)!;
  const shift = Number(exponent) - fraction.length;
  const scale = (n: bigint): Rational =>
    shift >= 0 ? { over: n * 10n ** BigInt(shift), under: 1n } : { over: n, under: 10n ** BigInt(-shift) };
  const digits = BigInt(whole + fraction);
  return { ...scale(sign === '-' ? -digits : digits), quantum: scale(1n) };
}

export function plus(a: Rational, b: Rational): Rational {
  return { over: a.over * b.under + b.over * a.under, under: a.under * b.under };
}

export function times(a: Rational, over: bigint, under = 1n): Rational {
  return { over: a.over * over, under: a.under * under };
}

/** -1, 0 or 1 as a is below, equal to or above b. */
export function compare(a: Rational, b: Rational): number {
  const difference = a.over * b.under - b.over * a.under;
  return difference === 0n ? 0 : difference > 0n ? 1 : -1;
}
