// What canvas figures must be told of the page: its colours and faces, when they change, and when it is printed.

import { createSignal, onCleanup, onMount } from 'solid-js';
import type { Accessor } from 'solid-js';
import { TOKENS } from '../../figure/index.ts';
import type { Token } from '../../figure/index.ts';
import type { Palette } from './canvas-painter.ts';

/** The face of quantities' letters, which comes with the formulas. */
const SERIF = 'KaTeX_Math, Georgia, serif';
const SCHEMES = ['(prefers-color-scheme: dark)', '(forced-colors: active)'];

/** The page's colours and faces; a new object whenever one of them may have changed. */
export function createPalette(): Accessor<Palette> {
  const [palette, setPalette] = createSignal(readPalette());
  const refresh = (): void => {
    setPalette(readPalette());
  };
  onMount(() => {
    const queries = SCHEMES.map((query) => matchMedia(query));
    const observer = new MutationObserver(refresh);
    queries.forEach((query) => query.addEventListener('change', refresh));
    observer.observe(document.documentElement, { attributes: true, attributeFilter: ['data-theme'] });
    void document.fonts.load(`italic 12px ${SERIF}`).then(refresh);
    onCleanup(() => {
      queries.forEach((query) => query.removeEventListener('change', refresh));
      observer.disconnect();
    });
  });
  return palette;
}

/** Whether the page is being printed. */
export function createPrinting(): Accessor<boolean> {
  const [printing, setPrinting] = createSignal(false);
  const begin = (): void => void setPrinting(true);
  const end = (): void => void setPrinting(false);
  onMount(() => {
    window.addEventListener('beforeprint', begin);
    window.addEventListener('afterprint', end);
    onCleanup(() => {
      window.removeEventListener('beforeprint', begin);
      window.removeEventListener('afterprint', end);
    });
  });
  return printing;
}

function readPalette(): Palette {
  const style = getComputedStyle(document.documentElement);
  const colors = new Map<Token, string>();
  for (const token of Object.keys(TOKENS) as Token[]) {
    colors.set(token, style.getPropertyValue(`--${token}`).trim() || TOKENS[token]);
  }
  return {
    color: (token) => colors.get(token)!,
    sans: style.getPropertyValue('--ui-face').trim() || 'system-ui, sans-serif',
    serif: SERIF,
  };
}
