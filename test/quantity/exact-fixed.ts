// Exact values as whole numbers, so that rounding can be judged without rounding: everything is
// counted in units of 2^-140 · 10^-40, in which doubles from 1e-20 on and decimals of 40 places are whole.

const TWOS = 140;
const TENS = 40;
const BITS = new DataView(new ArrayBuffer(8));
const POWERS = Array.from({ length: 80 }, (_, n) => 10n ** BigInt(n));

/** The exact value of a double; throws where it has finer parts than the unit. */
export function exactOf(value: number): bigint {
  BITS.setFloat64(0, value);
  const word = BITS.getBigUint64(0);
  const biased = Number((word >> 52n) & 0x7ffn);
  const magnitude = (word & 0xfffffffffffffn) | (biased === 0 ? 0n : 1n << 52n);
  const shift = Math.max(biased, 1) - 1075 + TWOS;
  if (shift < 0 && magnitude !== 0n) throw new RangeError(`too small for the unit: ${value}`);
  const exact = magnitude === 0n ? 0n : (magnitude << BigInt(shift)) * POWERS[TENS];
  return value < 0 ? -exact : exact;
}

/** The exact value of a decimal such as `-12.50e-3`. */
export function exactOfText(text: string): bigint {
  const { digits, exponent } = readText(text);
  return (digits * POWERS[exponent + TENS]) << BigInt(TWOS);
}

/** One unit of the last digit of the decimal, of which `significant` were asked for: 12300 to three is in hundreds. */
export function lastDigitOf(text: string, significant: number): bigint {
  const { digits, exponent, decimals } = readText(text);
  const surplus = decimals > 0 ? 0 : Math.max(0, String(digits < 0n ? -digits : digits).length - significant);
  return POWERS[exponent + TENS + surplus] << BigInt(TWOS);
}

function readText(text: string): { digits: bigint; exponent: number; decimals: number } {
  const [, sign, whole, fraction = '', power = '0'] = /^(-?)(\d+)(?:\.(\d+))?(?:e(-?\d+))?$/.exec(text)!;
  const digits = BigInt(whole + fraction);
  return {
    digits: sign === '-' ? -digits : digits,
    exponent: Number(power) - fraction.length,
    decimals: fraction.length,
  };
}
