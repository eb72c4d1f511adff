// The open sheet of this tab and how it is kept.

export { EXAMPLES } from './examples.ts';
export { createSession, sheetTitle } from './session.ts';
export type { Origin, Session } from './session.ts';
export type { Folds } from './folds.ts';
