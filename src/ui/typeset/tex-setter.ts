// KaTeX, which comes when the first formula is wanted: one loader and one way to set a formula for the page and the record.

import { createSignal } from 'solid-js';
import type katex from 'katex';
import 'katex/dist/katex.min.css';

type Katex = typeof katex;

const [setter, setSetter] = createSignal<Katex | null>(null);
let loading: Promise<void> | null = null;

/** Loads KaTeX, once. */
export function loadTex(): Promise<void> {
  loading ??= import('katex').then((module) => void setSetter(() => module.default));
  return loading;
}

/** Whether formulas can be set; followed where it is read inside a computation. */
export function isTexReady(): boolean {
  return setter() !== null;
}

/** Sets a formula inside `place`, for readers as well unless it has a label of its own; nothing before KaTeX has come. */
export function setTex(tex: string, place: HTMLElement, output: 'html' | 'htmlAndMathml'): void {
  // Fractions at full size: numbers in place are to be read. Rendering into the element keeps to the page's policy;
  // markup as text would need style attributes. The upright µ of units comes from the face behind KaTeX's own.
  setter()?.render(`\\displaystyle ${tex}`, place, { throwOnError: false, output, strict: false });
}
