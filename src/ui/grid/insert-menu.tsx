// The menu of what can be inserted.

import { For, onMount } from 'solid-js';
import type { Column } from '../desk/index.ts';
import type { Mark } from '../rows/index.ts';
import { INSERTIONS } from '../rows/index.ts';
import type { InsertionChoice } from '../rows/index.ts';
import { Prose } from '../typeset/index.ts';
import type { Grid } from './grid.ts';
import { insertChoice } from './insert-commands.ts';
import { MarkShape } from './mark.tsx';
import { menuStep } from './menu-keys.ts';

const MARKS: Readonly<Record<InsertionChoice['group'], Mark>> = {
  quantity: 'input',
  part: 'part',
  stage: 'stage',
  point: 'part',
  check: 'holds',
  figure: 'figure',
};

/** The open menu; `onClose` takes it away. */
export function InsertMenu(props: { readonly grid: Grid; readonly onClose: () => void }) {
  const { grid } = props;
  let menu: HTMLDivElement | undefined;
  onMount(() => menu?.querySelector<HTMLElement>('[role=menuitem]')?.focus());

  function backToCell(): void {
    props.onClose();
    const selection = grid.desk.selection();
    const column: Column = selection?.column ?? 'name';
    const key = selection?.row ?? grid.keys()[0];
    if (key !== undefined) grid.focus(key, column);
  }

  return (
    <div
      ref={(element) => (menu = element)}
      class="insert-menu"
      role="menu"
      aria-label="Insert"
      onKeyDown={(event) => {
        event.stopPropagation();
        if (event.key === 'Escape' || event.key === 'Tab') {
          event.preventDefault();
          backToCell();
        } else if (menu && menuStep(menu, event)) event.preventDefault();
      }}
      onFocusOut={(event) => {
        if (event.relatedTarget instanceof Node && !menu?.contains(event.relatedTarget)) props.onClose();
      }}
    >
      <For each={INSERTIONS}>
        {(choice) => (
          <button
            type="button"
            role="menuitem"
            class="insert-item"
            classList={{ 'insert-first': choice.first }}
            tabIndex={-1}
            onClick={() => {
              props.onClose();
              insertChoice(grid, choice);
            }}
          >
            <MarkShape mark={MARKS[choice.group]} text={choice.group} />
            <span class="insert-title">{choice.title}</span>
            <span class="insert-words">
              <Prose text={choice.words} />
            </span>
          </button>
        )}
      </For>
    </div>
  );
}
