// How far the values of a sheet move over what its limits allow, and in what share of builds its checks hold.

export { ANALYSES, analyse, readSpread } from './analyse.ts';
export { bandsOver } from './band.ts';
export type { Band } from './band.ts';
export { createMendJob, createSpreadJob } from './job.ts';
export type {
  Answer,
  BandAnswer,
  BandQuestion,
  MendAnswer,
  MendQuestion,
  Question,
  SpreadAnswer,
  SpreadQuestion,
} from './job.ts';
export { portionsOf } from './portion.ts';
export type { SheetSpread } from './analyse.ts';
export { searchExtremes } from './extremes.ts';
export { openEnds } from './open-ends.ts';
export type { Extremes } from './extremes.ts';
export type { End, Share, ValueSpread } from './report.ts';
export { slotsAt, slotsOf } from './where.ts';
export type { StandingDraw } from './where.ts';
export { createAnalysis } from './analysis.ts';
export { createBuilds } from './builds.ts';
export { moversOf } from './movers.ts';
export type { Mover } from './movers.ts';
export { mendWith, tunersOf } from './mending.ts';
