// Numbers that come out alike on every machine: elementary functions made of + - * / sqrt and the bits
// of doubles only, roots, and the digest of a text. All angles are in rad.

export { atan } from './arctangent.ts';
export { exp, expm1 } from './exponential.ts';
export { hypot } from './hypotenuse.ts';
export { ln, log10, log1p } from './logarithm.ts';
export { pow } from './power.ts';
export { createNarrowing, solveBracketed } from './root.ts';
export type { Narrowing } from './root.ts';
export { isRoot, scanPlaces, scanRoots } from './scan-roots.ts';
export type { ScannedRoots } from './scan-roots.ts';
export { sha256Hex } from './sha256.ts';
export { cos, sin, tan } from './trigonometry.ts';
export { binomialInterval } from './binomial-interval.ts';
export { drawKey, fillUniform, uniformAt } from './counter-draw.ts';
export { quantileOf } from './histogram.ts';
export { addColumn, addMoments, createMoments } from './moments.ts';
export type { Moments } from './moments.ts';
export { normalQuantile, normalShare } from './normal.ts';
