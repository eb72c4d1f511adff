// Names, sentences and formulas as they are set on the page.

export { Formula } from './formula.tsx';
export { pathRuns } from './name-runs.ts';
export { Name, Prose, Runs } from './runs.tsx';
