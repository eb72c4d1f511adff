// The head of the page: the sheet's title and facts, and the toolbar (one stop of the keyboard, arrows inside).

import { For, createMemo, createSignal } from 'solid-js';
import type { Desk } from '../desk/index.ts';
import { moveInToolbar } from './toolbar-keys.ts';
import { factsOf } from './sheet-facts.ts';

/** Commands on the toolbar, by id, in groups. */
const GROUPS: readonly (readonly string[])[] = [
  ['undo', 'redo'],
  ['insert', 'find', 'text'],
  ['shelf', 'share', 'record'],
  ['theme', 'help'],
];

/** Title, facts and toolbar. */
export function Head(props: { readonly desk: Desk }) {
  const { desk } = props;
  const facts = createMemo(() => (desk.document.version(), factsOf(desk.document.sheet)));
  const [current, setCurrent] = createSignal('undo');
  const groups = createMemo(() =>
    GROUPS.map((ids) => ids.flatMap((id) => desk.commands().find((command) => command.id === id) ?? [])),
  );
  let toolbar!: HTMLDivElement;

  return (
    <header class="head">
      <h1>{facts().title}</h1>
      <p class="head-facts">{facts().words}</p>
      <div
        class="toolbar"
        role="toolbar"
        aria-label="Commands"
        id="commands"
        ref={(element) => (toolbar = element)}
        onKeyDown={(event) => moveInToolbar(event, toolbar, setCurrent)}
      >
        <For each={groups()}>
          {(group) => (
            <div class="toolbar-group">
              <For each={group}>
                {(command) => (
                  <button
                    type="button"
                    data-command={command.id}
                    tabindex={current() === command.id ? 0 : -1}
                    aria-disabled={command.unavailable?.() ? 'true' : undefined}
                    title={command.unavailable?.() ?? [command.title, ...command.keys.slice(0, 1)].join(', ')}
                    onFocus={() => setCurrent(command.id)}
                    onClick={() => {
                      const reason = command.unavailable?.();
                      if (reason) desk.say(reason);
                      else command.run();
                    }}
                  >
                    {command.title}
                  </button>
                )}
              </For>
            </div>
          )}
        </For>
      </div>
    </header>
  );
}
