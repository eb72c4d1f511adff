// One row of the grid, with what is to be said about it below.

import { Match, Show, Switch } from 'solid-js';
import { Bar } from './bar.tsx';
import { Cell } from './cell.tsx';
import { EntryText, NameText, NumberText, SourceText } from './cell-texts.tsx';
import { EditAids } from './edit-aids.tsx';
import type { Grid } from './grid.ts';
import { MarkShape } from './mark.tsx';
import { RowMessage } from './row-message.tsx';
import { dragTick } from './drag.ts';
import { createRowState } from './row-state.ts';
import type { RowState } from './row-state.ts';

interface RowProps {
  readonly grid: Grid;
  readonly rowKey: string;
}

/** The row of a key. */
export function RowView(props: RowProps) {
  const { grid, rowKey } = props;
  const state = createRowState(grid, rowKey);
  const { row, has } = state;
  const isSelected = () => grid.isSelected(rowKey);
  return (
    <>
      <div
        role="row"
        class={`row row-${row().type}`}
        classList={{
          'row-inside': row().inside,
          'row-selected': isSelected(),
          'row-range': grid.isInRange(rowKey),
          'row-editing': state.editing() !== null,
          'row-held': grid.isHeld(row().cell),
          'row-head': row().fold !== null && row().type === 'cell',
        }}
        data-key={rowKey}
        aria-rowindex={state.index()}
        aria-selected={isSelected() || grid.isInRange(rowKey)}
      >
        <Show when={has('mark')} fallback={<Gutter state={state} />}>
          <Cell state={state} column="mark">
            <MarkShape mark={row().mark} text={row().markText} />
          </Cell>
        </Show>
        <Show when={has('name')}>
          <Cell state={state} column="name">
            <RowHeader state={state} />
          </Cell>
        </Show>
        <Show when={has('entry')}>
          <Cell state={state} column="entry" class={`entry-${row().entry?.look ?? 'none'}`}>
            <EntryText state={state} />
          </Cell>
        </Show>
        <Show when={has('nominal')}>
          <Numbers state={state} />
        </Show>
        <Show when={row().type === 'ghost' && state.editing() && grid.pending()}>
          {(pending) => (
            <span class="pending" aria-hidden="true">
              <Show when={pending().waitsFor} fallback={<NumberText figure={pending().nominal} withUnit />}>
                {(name) => <span class="waiting">waits for {name()}</span>}
              </Show>
            </span>
          )}
        </Show>
        <Show when={row().type === 'wiring'}>
          <span class="aside wiring-aside">{row().source?.text}</span>
        </Show>
        <Show when={state.editing()}>
          <EditAids grid={grid} />
        </Show>
      </div>
      <RowMessage state={state} />
    </>
  );
}

/** Left of rows that have no cell for a mark. */
function Gutter(props: { readonly state: RowState }) {
  const { row } = props.state;
  return (
    <span class="gutter">
      <Show when={row().fold} fallback={<MarkShape mark={row().mark} text={row().markText} />}>
        {(fold) => <span class="fold-arrow" classList={{ 'fold-open': fold().open }} aria-hidden="true" />}
      </Show>
    </span>
  );
}

function RowHeader(props: { readonly state: RowState }) {
  const { row } = props.state;
  return (
    <Switch fallback={<Show when={row().name}>{(name) => <NameText name={name()} />}</Show>}>
      <Match when={row().type === 'ghost'}>
        <span class="hint">{row().entry?.text ?? 'new line'}</span>
      </Match>
      <Match when={row().type === 'section' || row().type === 'title'}>
        {row().name?.text}
        <Show when={row().mark}>
          <MarkShape mark={row().mark} text={row().markText} />
        </Show>
        <Show when={row().source}>
          {(source) => <span class={`aside source-${source().look}`}>{source().text}</span>}
        </Show>
      </Match>
    </Switch>
  );
}

function Numbers(props: { readonly state: RowState }) {
  const { state } = props;
  const { row } = state;
  return (
    <>
      <Cell state={state} column="low">
        <NumberText figure={row().low} />
      </Cell>
      <Cell state={state} column="nominal">
        <Show when={row().waitsFor} fallback={<NumberText figure={row().nominal} withUnit />}>
          {(name) => <span class="waiting">waits for {name()}</span>}
        </Show>
      </Cell>
      <Cell state={state} column="high">
        <NumberText figure={row().high} />
      </Cell>
      <Cell state={state} column="spread">
        <Show when={row().bar}>
          {(bar) => (
            <Bar
              bar={bar()}
              turns={row().turns}
              shift={state.shift()}
              onGrip={(event) => dragTick(state.grid, state.key, event)}
            />
          )}
        </Show>
      </Cell>
      <Cell state={state} column="source">
        <Show
          when={state.editing()}
          fallback={<Show when={row().source}>{(source) => <SourceText state={state} source={source()} />}</Show>}
        >
          {(present) => <span class="long-text source-text">was {present().was === '' ? 'empty' : present().was}</span>}
        </Show>
      </Cell>
    </>
  );
}
