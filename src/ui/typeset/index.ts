// Names, sentences and formulas as they are set on the page.

export { Formula } from './formula.tsx';
export { Name, Prose } from './runs.tsx';
export { isTexReady, loadTex, setTex } from './tex-setter.ts';
