// What is seen of the grid's rows as it scrolls.

import { createSignal, onCleanup } from 'solid-js';
import { scrollerOf } from './place-below.ts';
import type { Seen } from './row-window.ts';

/** Follows the scrolling ancestor of a table; to be called once the table is in the document. */
export function createSeen(table: HTMLElement): () => Seen {
  const scroller = scrollerOf(table) ?? document.documentElement;
  const measure = (): Seen => ({
    top: Math.max(0, scroller.getBoundingClientRect().top - table.getBoundingClientRect().top),
    height: scroller.clientHeight,
  });
  const [seen, setSeen] = createSignal(measure());
  let frame = 0;
  const follow = (): void => {
    cancelAnimationFrame(frame);
    frame = requestAnimationFrame(() => setSeen(measure()));
  };
  const observer = new ResizeObserver(follow);
  observer.observe(scroller);
  scroller.addEventListener('scroll', follow, { passive: true });
  onCleanup(() => {
    cancelAnimationFrame(frame);
    observer.disconnect();
    scroller.removeEventListener('scroll', follow);
  });
  return seen;
}
