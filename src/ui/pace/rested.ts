// Values that are followed at an easy pace: what is costly to show waits until typing or dragging rests.

import { createEffect, createSignal, on, onCleanup } from 'solid-js';
import type { Accessor } from 'solid-js';

export interface Pace {
  /** A value is taken over once it has stood for so long, in ms. */
  readonly rest: number;
  /** While it keeps changing it is taken over this often nevertheless, in ms. */
  readonly most?: number;
}

/** Follows `value` at that pace; the first value is there at once. */
export function createRested<T>(value: Accessor<T>, { rest, most = Infinity }: Pace): Accessor<T> {
  const [followed, setFollowed] = createSignal(value());
  let timer: ReturnType<typeof setTimeout> | undefined;
  /** When the change that is waited for began. */
  let since: number | null = null;
  const take = (): void => {
    since = null;
    clearTimeout(timer);
    setFollowed(() => value());
  };
  createEffect(
    on(
      value,
      () => {
        since ??= performance.now();
        clearTimeout(timer);
        timer = setTimeout(take, Math.max(0, Math.min(rest, since + most - performance.now())));
      },
      { defer: true },
    ),
  );
  onCleanup(() => clearTimeout(timer));
  return followed;
}
