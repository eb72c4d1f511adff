// Where the page stands: at the nominal values, with the low or the high device, or where a check fails.

import { For, Show, createMemo } from 'solid-js';
import type { Desk } from '../desk/index.ts';
import { stageCorners } from '../spread/index.ts';
import './corner.css';

/** The radio group of places to stand; nothing where there is none but the nominal one. */
export function StandGroup(props: { readonly desk: Desk }) {
  const { desk } = props;
  const corners = createMemo(() => stageCorners(desk.stage(), desk.spread.now()));
  const isAt = (name: string | null): boolean => (desk.corner()?.name ?? null) === name;
  return (
    <Show when={corners().length > 0}>
      <fieldset class="stand-group">
        <legend>stand at</legend>
        <label>
          <input type="radio" name="stand" checked={isAt(null)} onChange={() => desk.stand(null)} />
          nominal
        </label>
        <For each={corners()}>
          {(corner) => (
            <label>
              <input type="radio" name="stand" checked={isAt(corner.name)} onChange={() => desk.stand(corner)} />
              {corner.name.replace(/ of .*$/, '')}
            </label>
          )}
        </For>
      </fieldset>
    </Show>
  );
}
