// The mark before the verdict: the state in a shape, whatever its colour.

import { Match, Switch } from 'solid-js';
import type { Verdict } from '../../record/index.ts';

/** 14 px: ring with tick, disc with cross, torn square, or an empty ring. */
export function VerdictMark(props: { readonly state: Verdict['state'] }) {
  return (
    <svg class="verdict-mark" viewBox="0 0 14 14" width="14" height="14" aria-hidden="true">
      <Switch fallback={<circle class="verdict-stroke" cx="7" cy="7" r="5.5" />}>
        <Match when={props.state === 'holds'}>
          <circle class="verdict-stroke" cx="7" cy="7" r="5.8" />
          <path class="verdict-stroke" d="M4.2 7.2 L6.3 9.3 L10 5" />
        </Match>
        <Match when={props.state === 'fails'}>
          <circle class="verdict-fill" cx="7" cy="7" r="6.5" />
          <path class="verdict-cross" d="M4.8 4.8 L9.2 9.2 M9.2 4.8 L4.8 9.2" />
        </Match>
        <Match when={props.state === 'incomplete'}>
          <path class="verdict-stroke" d="M6 1.5 H1.5 V12.5 H5 L6.5 9 L4.5 6.5 Z" />
          <path class="verdict-stroke" d="M9 1.5 H12.5 V12.5 H8 L9.5 9 L7.5 6.5 Z" />
        </Match>
      </Switch>
    </svg>
  );
}
