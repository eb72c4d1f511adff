// Below the field of an edited card, where the keyboard is a phone's: steps of the preferred series, the signs such
// keyboards lack, and what the edit does to the checks.

import { For, Show } from 'solid-js';
import { Prose } from '../typeset/index.ts';
import { inserted, SIGNS, stepsOf, verdictText } from './aids.ts';
import type { Grid } from './grid.ts';

/** The aids of the cell that is being edited. */
export function EditAids(props: { readonly grid: Grid }) {
  const { grid } = props;
  const { editor } = grid;
  const keep = (event: Event): void => event.preventDefault();

  function put(text: string, caret: number): void {
    editor.setText(text);
    grid.field()?.setSelectionRange(caret, caret);
  }

  return (
    <div class="aids" onMouseDown={keep}>
      <Show when={stepsOf(editor)}>
        {(steps) => (
          <div class="aids-steps">
            <For each={steps()}>
              {(step) => (
                <button
                  type="button"
                  tabIndex={-1}
                  aria-label={step.label}
                  onClick={() => put(step.text, step.text.length)}
                >
                  {step.title}
                </button>
              )}
            </For>
          </div>
        )}
      </Show>
      <div class="aids-signs">
        <For each={SIGNS}>
          {(sign) => (
            <button
              type="button"
              tabIndex={-1}
              onClick={() => {
                const { text, caret } = inserted(editor.text(), grid.field()?.selectionStart ?? null, sign);
                put(text, caret);
              }}
            >
              {sign}
            </button>
          )}
        </For>
      </div>
      <p class="aids-verdict">
        <Prose text={verdictText(grid.desk.document)} />
      </p>
    </div>
  );
}
