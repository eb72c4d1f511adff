// How far the values of a sheet move over what its limits allow, and in what share of builds its checks hold.

export { ANALYSES, PORTION, analyse, readSpread } from './analyse.ts';
export type { SheetSpread } from './analyse.ts';
export { createAnalysis } from './analysis.ts';
export type { Analysis } from './analysis.ts';
export { createBuilds } from './builds.ts';
export type { Builds } from './builds.ts';
export type { Device, StageDevices } from './devices.ts';
export { searchExtremes } from './extremes.ts';
export type { Extremes } from './extremes.ts';
export type { CheckSpread, End, Share, SpreadReport, ValueSpread } from './report.ts';
export type { Tally } from './tally.ts';
export { slotsAt } from './where.ts';
export type { StandingDraw } from './where.ts';
