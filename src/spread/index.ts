// How far the values of a sheet move over what its limits allow, and in what share of builds its checks hold.

export { searchExtremes } from './extremes.ts';
export type { Extremes } from './extremes.ts';
export { slotsAt } from './where.ts';
