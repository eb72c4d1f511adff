// Uniform draws without a state: number `sample` of a name is a hash of the seed, the name and the sample, so that it is
// the same whatever else is drawn, in whatever order and portions.
//
// Mixing function: two rounds of a 32-bit bijection whose multipliers and shifts were searched for the least bias.
// Source: C. Wellons, "Prospecting for hash functions" (2018), lowbias32.

/** What a name draws by: two words that depend on every letter and on the seed. */
interface DrawKey {
  readonly first: number;
  readonly second: number;
}

/** The key of a name under a seed (a 32-bit integer). */
export function drawKey(seed: number, name: string): DrawKey {
  let first = mix(seed ^ 0x9e3779b9);
  let second = mix(first ^ 0x85ebca6b);
  for (let i = 0; i < name.length; i++) {
    first = mix(first ^ name.charCodeAt(i));
    second = mix(second + first);
  }
  return { first, second };
}

/** One draw in 0..1, both ends excluded: sample and attempt are whole numbers from 0 below 2^32. */
export function uniformAt({ first, second }: DrawKey, sample: number, attempt: number): number {
  return toUnit(mix(mix(sample ^ first) ^ mix(second + Math.imul(attempt, STEP))));
}

/** Fills out[0 .. count) with the draws of samples first, first + 1, .. */
export function fillUniform(out: Float64Array, count: number, key: DrawKey, first: number, attempt: number): void {
  const salt = key.first;
  const pepper = mix(key.second + Math.imul(attempt, STEP));
  for (let i = 0; i < count; i++) out[i] = toUnit(mix(mix((first + i) ^ salt) ^ pepper));
}

/** An odd number: steps of it visit every word. */
const STEP = 0x9e3779b1;

function mix(word: number): number {
  let x = word ^ (word >>> 16);
  x = Math.imul(x, 0x7feb352d);
  x ^= x >>> 15;
  x = Math.imul(x, 0x846ca68b);
  return x ^ (x >>> 16);
}

/** The middle of the word's interval of 2^-32. */
function toUnit(word: number): number {
  return ((word >>> 0) + 0.5) * 2 ** -32;
}
