// A formula set by KaTeX. Until that has come its text stands there.

import { createEffect, createMemo } from 'solid-js';
import { isTexReady, loadTex, setTex } from './tex-setter.ts';
import './typeset.css';

/** One formula; `text` says the same in the language of the sheet. */
export function Formula(props: { readonly tex: string; readonly text: string }) {
  void loadTex();
  let place!: HTMLSpanElement;
  const tex = createMemo(() => props.tex);
  const text = createMemo(() => props.text);
  createEffect(() => {
    if (isTexReady()) setTex(tex(), place, 'htmlAndMathml');
    else place.textContent = text();
  });
  return <span class="formula" ref={(element) => (place = element)} />;
}
