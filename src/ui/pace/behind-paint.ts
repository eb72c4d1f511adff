// Values that are followed one frame later, so that what changed under the user's hands is painted before what is
// drawn of it.

import { createEffect, createSignal, on, onCleanup } from 'solid-js';
import type { Accessor } from 'solid-js';

/** Follows `value` once the frame in which it changed is painted; the first value is there at once. */
export function createBehindPaint<T>(value: Accessor<T>): Accessor<T> {
  const [followed, setFollowed] = createSignal(value(), { equals: false });
  let frame = 0;
  let timer: ReturnType<typeof setTimeout> | undefined;
  const take = (): void => {
    frame = 0;
    setFollowed(() => value());
  };
  createEffect(
    on(
      value,
      () => {
        // A page that is not shown has no frames. While one is waited for, it takes the latest value.
        if (document.hidden) take();
        else if (frame === 0) frame = requestAnimationFrame(() => (timer = setTimeout(take)));
      },
      { defer: true },
    ),
  );
  onCleanup(() => {
    cancelAnimationFrame(frame);
    clearTimeout(timer);
  });
  return followed;
}
