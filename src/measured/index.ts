// What measured specimens come to: the law of each from its readings, what several spread over, and who goes with whom.
//
// SI throughout; voltages as a voltmeter shows them, currents positive on both channels.

export { fitLaw } from './fit-law.ts';
export type { LawFit } from './law-fit.ts';
export { matchGroups } from './matching.ts';
export type { Points } from './points.ts';
export { selfHeating } from './self-heating.ts';
export { summarise } from './summary.ts';
