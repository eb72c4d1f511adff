// A pointer that drags something sideways, once a frame, until it is let go; Escape puts it back.

interface Follower {
  /** Pixels from where the drag began. */
  move(pixels: number): void;
  end(keep: boolean): void;
}

/** Follows the pointer that has just gone down. */
export function followPointer(down: PointerEvent, { move, end }: Follower): void {
  const start = down.clientX;
  const listening = new AbortController();
  const { signal } = listening;
  let at = start;
  let frame = 0;
  const finish = (keep: boolean): void => {
    listening.abort();
    cancelAnimationFrame(frame);
    if (keep && at !== start) move(at - start);
    end(keep);
  };
  addEventListener(
    'pointermove',
    (event) => {
      at = event.clientX;
      cancelAnimationFrame(frame);
      frame = requestAnimationFrame(() => move(at - start));
    },
    { signal },
  );
  addEventListener('pointerup', () => finish(true), { signal });
  addEventListener('pointercancel', () => finish(false), { signal });
  addEventListener(
    'keydown',
    (event) => {
      if (event.key !== 'Escape') return;
      event.stopPropagation();
      finish(false);
    },
    { signal, capture: true },
  );
}
