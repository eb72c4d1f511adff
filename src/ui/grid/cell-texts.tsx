// What stands in the cells of a row: names, entries, numbers, sources.

import { Show } from 'solid-js';
import type { Figure, Row, RowName, RowSource } from '../rows/index.ts';
import { Name, Prose } from '../typeset/index.ts';
import { LongText } from './long-text.tsx';
import { markedText } from './marked-text.ts';
import type { RowState } from './row-state.ts';

/** A name as it is set, with what readers say in its place. */
export function NameText(props: { readonly name: RowName }) {
  return (
    <>
      <span class="unseen">{props.name.said}</span>
      <span class="name-text" aria-hidden="true">
        <Show when={props.name.isName} fallback={props.name.text}>
          <Name path={props.name.text} />
        </Show>
      </span>
    </>
  );
}

/** An entry; the part that a message speaks of is underlined. */
export function EntryText(props: { readonly state: RowState }) {
  const { state } = props;
  const text = () => state.row().entry?.text ?? '';
  const parts = () => {
    const at = state.fault()?.at;
    return markedText(text(), at?.column === 'entry' ? at : null);
  };
  return (
    <LongText
      class="entry-text"
      length={text().length}
      what={`entry of ${saidOf(state.row())}`}
      open={state.isWhole('entry')}
      toggle={() => state.toggleWhole('entry')}
    >
      <Show
        when={state.row().entry?.look === 'words'}
        fallback={
          <>
            {parts().before}
            <Show when={parts().marked !== ''}>
              <span class="wavy">{parts().marked}</span>
            </Show>
            {parts().after}
          </>
        }
      >
        <Prose text={text()} />
      </Show>
    </LongText>
  );
}

function saidOf(row: Row): string {
  return row.name?.said ?? 'this line';
}

/** A number; its unit where asked for or where it is another than its neighbours'. */
export function NumberText(props: { readonly figure: Figure | null; readonly withUnit?: boolean }) {
  return (
    <Show when={props.figure}>
      {(figure) => (
        <>
          <span class={`number number-${figure().look}`}>{figure().number}</span>
          <Show when={figure().look !== 'words' && (props.withUnit || figure().unit !== '')}>
            <span class="unit">{figure().unit}</span>
          </Show>
        </>
      )}
    </Show>
  );
}

/** Source and note, or what is said in their place. */
export function SourceText(props: { readonly state: RowState; readonly source: RowSource }) {
  const { state } = props;
  return (
    <LongText
      class={`source-text source-${props.source.look}`}
      length={props.source.text.length + props.source.note.length}
      what={`source and note of ${saidOf(state.row())}`}
      open={state.isWhole('source')}
      toggle={() => state.toggleWhole('source')}
    >
      <Prose text={props.source.text} />
      <Show when={props.source.note !== ''}>
        <span class="note-text">
          {props.source.text === '' ? '' : ' · '}
          <Prose text={props.source.note} />
        </span>
      </Show>
    </LongText>
  );
}
