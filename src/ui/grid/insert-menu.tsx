// The menu of what can be inserted; below it, where the selected row has a value to plot, the inputs to plot it against.

import { createEffect, createMemo, createSignal, For, on, onMount, Show } from 'solid-js';
import type { Column } from '../desk/index.ts';
import type { Mark } from '../rows/index.ts';
import { inputsBehind, INSERTIONS, plottedPath } from '../rows/index.ts';
import type { InsertionChoice } from '../rows/index.ts';
import { Prose } from '../typeset/index.ts';
import type { Grid } from './grid.ts';
import { insertChoice, insertPlot } from './insert-commands.ts';
import { MarkShape } from './mark.tsx';
import { menuStep } from './menu-keys.ts';

const MARKS: Readonly<Record<InsertionChoice['group'], Mark>> = {
  quantity: 'input',
  part: 'part',
  stage: 'stage',
  point: 'part',
  check: 'holds',
  inverse: 'inverse',
  figure: 'figure',
};

/** The open menu; `onClose` takes it away. */
export function InsertMenu(props: { readonly grid: Grid; readonly onClose: () => void }) {
  const { grid } = props;
  let menu: HTMLDivElement | undefined;
  const focusFirst = () => menu?.querySelector<HTMLElement>('[role=menuitem]')?.focus();
  onMount(focusFirst);

  /** What the selected row shows, as long as there is an input behind it. */
  const plotted = createMemo(() => {
    const selection = grid.desk.selection();
    const row = selection && grid.row(selection.row);
    const path = row ? plottedPath(row, grid.desk.document.sheet) : null;
    const inputs = path === null ? [] : inputsBehind(path, grid.desk.document.sheet);
    return path === null || inputs.length === 0 ? null : { path, inputs };
  });
  const [choosing, setChoosing] = createSignal(false);
  createEffect(on(choosing, focusFirst, { defer: true }));

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
      aria-label={choosing() ? `Plot ${plotted()?.path} against` : 'Insert'}
      onKeyDown={(event) => {
        event.stopPropagation();
        if (event.key === 'Escape' || event.key === 'Tab') {
          event.preventDefault();
          if (event.key === 'Escape' && choosing()) setChoosing(false);
          else backToCell();
        } else if (menu && menuStep(menu, event)) event.preventDefault();
      }}
      onFocusOut={(event) => {
        if (event.relatedTarget instanceof Node && !menu?.contains(event.relatedTarget)) props.onClose();
      }}
    >
      <Show
        when={choosing() && plotted()}
        fallback={
          <>
            <For each={INSERTIONS}>
              {(choice) => (
                <Item
                  mark={MARKS[choice.group]}
                  group={choice.group}
                  title={choice.title}
                  words={choice.words}
                  first={choice.first}
                  run={() => {
                    props.onClose();
                    insertChoice(grid, choice);
                  }}
                />
              )}
            </For>
            <For each={grid.desk.commands().filter(({ insert }) => insert !== undefined)}>
              {(command, index) => (
                <Item
                  mark={MARKS[command.insert!.group]}
                  group={command.insert!.group}
                  title={command.title}
                  words={command.insert!.words}
                  first={index() === 0}
                  run={() => {
                    props.onClose();
                    command.run();
                  }}
                />
              )}
            </For>
            <Show when={plotted()}>
              {(value) => (
                <Item
                  mark="figure"
                  group="figure"
                  title="plot this against …"
                  words={`${value().path} over an input behind it`}
                  first={false}
                  run={() => setChoosing(true)}
                />
              )}
            </Show>
          </>
        }
      >
        {(value) => (
          <For each={value().inputs}>
            {(input) => (
              <Item
                mark="input"
                group="input"
                title={input.path}
                words={`now ${input.text}`}
                first={false}
                run={() => {
                  props.onClose();
                  insertPlot(grid, value().path, input);
                }}
              />
            )}
          </For>
        )}
      </Show>
    </div>
  );
}

interface ItemProps {
  readonly mark: Mark;
  readonly group: string;
  readonly title: string;
  readonly words: string;
  /** The first of its group. */
  readonly first: boolean;
  readonly run: () => void;
}

function Item(props: ItemProps) {
  return (
    <button
      type="button"
      role="menuitem"
      class="insert-item"
      classList={{ 'insert-first': props.first }}
      tabIndex={-1}
      onClick={() => props.run()}
    >
      <MarkShape mark={props.mark} text={props.group} />
      <span class="insert-title">
        <Prose text={props.title} />
      </span>
      <span class="insert-words">
        <Prose text={props.words} />
      </span>
    </button>
  );
}
