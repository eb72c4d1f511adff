// A formula set by KaTeX, which comes when the first one is wanted. Until then its text stands there.

import { createEffect, createMemo, createSignal } from 'solid-js';
import type katex from 'katex';
import 'katex/dist/katex.min.css';
import './typeset.css';

type Katex = typeof katex;

const [renderer, setRenderer] = createSignal<Katex | null>(null);
let asked = false;

function loadKatex(): void {
  if (asked) return;
  asked = true;
  void import('katex').then((module) => setRenderer(() => module.default));
}

/** One formula; `text` says the same in the language of the sheet. */
export function Formula(props: { readonly tex: string; readonly text: string }) {
  loadKatex();
  let place!: HTMLSpanElement;
  const tex = createMemo(() => props.tex);
  const text = createMemo(() => props.text);
  createEffect(() => {
    const katexNow = renderer();
    // Fractions at full size: numbers in place are to be read. Rendering into the element keeps to the page's policy; markup as text would need style attributes.
    if (katexNow) katexNow.render(`\\displaystyle ${tex()}`, place, { throwOnError: false, output: 'htmlAndMathml' });
    else place.textContent = text();
  });
  return <span class="formula" ref={(element) => (place = element)} />;
}
