// Reading and building doubles by their bits: the only view of memory that the elementary functions need.

const VALUE = new Float64Array(1);
const WORDS = new Uint32Array(VALUE.buffer);
/** Which of the two words holds sign and exponent: the byte order of the machine decides. */
const HIGH = new Uint8Array(Uint32Array.of(1).buffer)[0] === 1 ? 1 : 0;

/** Biased exponent of x, 0..2047; 0 for zero and subnormal numbers. */
export function biasedExponent(x: number): number {
  VALUE[0] = x;
  return (WORDS[HIGH] >>> 20) & 0x7ff;
}

/** The significand of a normal x > 0, in [1, 2). */
export function significand(x: number): number {
  VALUE[0] = x;
  WORDS[HIGH] = (WORDS[HIGH] & 0x000fffff) | 0x3ff00000;
  return VALUE[0];
}

/** 2^k for k in -1022..1023. */
export function powerOfTwo(k: number): number {
  VALUE[0] = 0;
  WORDS[HIGH] = (k + 1023) << 20;
  return VALUE[0];
}

/** x 2^k for x in [0.5, 4) and k in -1150..1024, rounded once even where the result is subnormal. */
export function scaleByPowerOfTwo(x: number, k: number): number {
  if (k > 1022) return x * powerOfTwo(k - 2) * 4;
  if (k >= -1021) return x * powerOfTwo(k);
  return x * powerOfTwo(k + 200) * powerOfTwo(-200);
}
