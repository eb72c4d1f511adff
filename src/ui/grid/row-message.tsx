// The line below a row that says what is wrong with it, or what is to be minded.

import { Show } from 'solid-js';
import { Prose } from '../typeset/index.ts';
import type { RowState } from './row-state.ts';

/** The message of a row, or nothing. */
export function RowMessage(props: { readonly state: RowState }) {
  const { state } = props;
  const { grid, key, row, fault } = state;

  function goThere(start: number): void {
    grid.commit('stay');
    grid.focus(key, 'entry');
    grid.edit({ caret: start, column: 'entry' });
  }

  return (
    <>
      <Show when={fault()}>
        {(present) => (
          <div role="row" class="row row-message">
            <div role="gridcell" class="message" id={state.messageId} aria-colspan={8}>
              <Show when={present().column}>
                {(column) => (
                  <button
                    type="button"
                    class="to-column"
                    tabIndex={grid.isSelected(key) ? 0 : -1}
                    onMouseDown={(event) => event.preventDefault()}
                    onClick={() => goThere(present().at!.start)}
                  >
                    column {column()}
                  </button>
                )}
              </Show>{' '}
              <Prose text={present().text} />
            </div>
          </div>
        )}
      </Show>
      <Show when={fault() === null && row().cautions.length > 0}>
        <div role="row" class="row row-message">
          <div role="gridcell" class="message message-caution" aria-colspan={8}>
            <Prose text={row().cautions.join(' ')} />
          </div>
        </div>
      </Show>
    </>
  );
}
