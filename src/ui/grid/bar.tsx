// The bar of a spread, with the tick that turns the value.

import { For, Show } from 'solid-js';
import type { SpreadBar } from '../../figure/index.ts';
import { BAR_HEIGHT, BAR_WIDTH, barShape } from './bar-shape.ts';

/** Draws a bar; a tick that can be dragged is given by `turns`. */
export function Bar(props: {
  readonly bar: SpreadBar;
  readonly turns: boolean;
  readonly shift: number;
  readonly onGrip?: (event: PointerEvent) => void;
}) {
  const shape = () => barShape(props.bar, props.shift);
  return (
    <svg
      class="bar"
      classList={{ 'bar-own': props.bar.scale === 'own', 'bar-dashed': props.bar.dashed, 'bar-turns': props.turns }}
      viewBox={`0 0 ${BAR_WIDTH} ${BAR_HEIGHT}`}
      width={BAR_WIDTH}
      height={BAR_HEIGHT}
      aria-hidden="true"
    >
      <path class="bar-scale" d={shape().scale} />
      <path class="bar-fill" d={shape().outline} />
      <path class="bar-open" d={shape().open} />
      <For each={shape().failing}>
        {(part) => <rect class="bar-failing" x={part.x} y="8.5" width={part.width} height="8" />}
      </For>
      <For each={shape().devices}>
        {(tick) => <path class={`bar-device bar-device-${tick.device}`} d={`M${tick.x} 7V18`} />}
      </For>
      <For each={shape().posts}>
        {(post) => <path class="bar-post" classList={{ 'bar-post-passed': post.passed }} d={post.path} />}
      </For>
      <path class="bar-tick" d={`M${shape().tick} 6V19`} />
      <Show when={props.turns}>
        <path class="bar-grip" d={`M${shape().tick} 2V23`} onPointerDown={(event) => props.onGrip?.(event)} />
      </Show>
    </svg>
  );
}
