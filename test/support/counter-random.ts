// Reproducible draws for tests: an answer depends on the seed and on how many were drawn before.

/** Uniform numbers in [0, 1) from a seed. Source: S. Vigna, splitmix64's mixing, in two 32-bit halves. */
export function createDraw(seed: number): () => number {
  let counter = seed >>> 0;
  return () => {
    counter = (counter + 0x9e3779b9) >>> 0;
    let z = counter;
    z = Math.imul(z ^ (z >>> 16), 0x85ebca6b);
    z = Math.imul(z ^ (z >>> 13), 0xc2b2ae35);
    return ((z ^ (z >>> 16)) >>> 0) / 4294967296;
  };
}
