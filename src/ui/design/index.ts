// Choosing values for a sheet: states of the dialogs that look for them and write them as ordinary lines. No DOM.

export { createBandChoice } from './band-choice.ts';
export type { BandChoice } from './band-choice.ts';
export { readEntered } from './entered.ts';
