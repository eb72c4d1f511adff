// How far the values of a sheet move over what its limits allow, and in what share of builds its checks hold.

export { ANALYSES, analyse, readSpread } from './analyse.ts';
export { createSpreadJob } from './job.ts';
export type { SpreadAnswer, SpreadQuestion } from './job.ts';
export { PORTION } from './portion.ts';
export type { SheetSpread } from './analyse.ts';
export { searchExtremes } from './extremes.ts';
export type { Extremes } from './extremes.ts';
export type { End, Share, ValueSpread } from './report.ts';
export { slotsAt, slotsOf } from './where.ts';
export type { StandingDraw } from './where.ts';
export { createAnalysis } from './analysis.ts';
export { createBuilds } from './builds.ts';
export { moversOf } from './movers.ts';
export type { Mover } from './movers.ts';
