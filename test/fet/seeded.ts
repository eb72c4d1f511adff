// Random numbers for the tests of this folder: the same ones in every run.

/** Mulberry32: uniform in [0, 1). */
export function generator(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let t = state;
    t = Math.imul(t ^ (t >>> 15), t | 1);
    t ^= t + Math.imul(t ^ (t >>> 7), t | 61);
    return ((t ^ (t >>> 14)) >>> 0) / 2 ** 32;
  };
}

export function between(u: () => number, low: number, high: number): number {
  return low + (high - low) * u();
}

/** Uniform in the logarithm. */
export function decade(u: () => number, low: number, high: number): number {
  return low * (high / low) ** u();
}
