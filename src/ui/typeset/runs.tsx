// Names and sentences with names in them, as the trade sets them.

import { For, Show } from 'solid-js';
import type { Run } from '../../figure/index.ts';
import { proseParts } from '../../record/index.ts';
import { pathRuns } from './name-runs.ts';
import './typeset.css';

/** Runs of text in their styles. */
function Runs(props: { readonly runs: readonly Run[] }) {
  return (
    <For each={props.runs}>
      {(run) => (
        <Show
          when={run.style === 'upright'}
          fallback={
            <Show when={run.style === 'italic'} fallback={<sub>{run.text}</sub>}>
              <i>{run.text}</i>
            </Show>
          }
        >
          {run.text}
        </Show>
      )}
    </For>
  );
}

/** A name or a path, typeset; `subject` is the cell that need not be said. */
export function Name(props: { readonly path: string; readonly subject?: string | null }) {
  return (
    <span class="name">
      <Runs runs={pathRuns(props.path, props.subject ?? null)} />
    </span>
  );
}

/** A sentence in which every name with `_` is typeset. */
export function Prose(props: { readonly text: string; readonly subject?: string | null }) {
  return (
    <For each={proseParts(props.text, props.subject ?? null)}>
      {(part) => (
        <Show when={part.type === 'name'} fallback={part.text}>
          <Name path={part.text} subject={props.subject} />
        </Show>
      )}
    </For>
  );
}
