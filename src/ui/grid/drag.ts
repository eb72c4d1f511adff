// A pointer that drags the tick of a bar.

import type { Grid } from './grid.ts';
import { beginDrag } from './turn-commands.ts';

/** Follows the pointer until it is let go; Escape puts the value back. */
export function dragTick(grid: Grid, key: string, event: PointerEvent): void {
  const drag = event.button === 0 ? beginDrag(grid, key) : null;
  if (!drag) return;
  event.preventDefault();
  grid.focus(key, 'spread');
  const start = event.clientX;
  const listening = new AbortController();
  const { signal } = listening;
  let frame = 0;
  let at = start;
  const end = (keep: boolean): void => {
    listening.abort();
    cancelAnimationFrame(frame);
    if (keep) drag.move(at - start);
    drag.end(keep);
  };
  addEventListener(
    'pointermove',
    (moved) => {
      at = moved.clientX;
      cancelAnimationFrame(frame);
      frame = requestAnimationFrame(() => drag.move(at - start));
    },
    { signal },
  );
  addEventListener('pointerup', () => end(true), { signal });
  addEventListener('pointercancel', () => end(false), { signal });
  addEventListener('keydown', (pressed) => pressed.key === 'Escape' && end(false), { signal, capture: true });
}
