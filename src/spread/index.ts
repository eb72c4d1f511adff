// How far the values of a sheet move over what its limits allow, and in what share of builds its checks hold.

export { ANALYSES, PORTION, analyse } from './analyse.ts';
export type { SheetSpread } from './analyse.ts';
export { searchExtremes } from './extremes.ts';
export type { Extremes } from './extremes.ts';
export type { Share, ValueSpread } from './report.ts';
export { slotsAt } from './where.ts';
export type { StandingDraw } from './where.ts';
export { createAnalysis } from './analysis.ts';
export { createBuilds } from './builds.ts';
