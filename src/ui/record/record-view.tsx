// The record on the screen, before it is printed: what is open, the title block to be filled in, and the record as it
// will print.

import { createEffect, createMemo, createSignal, onMount } from 'solid-js';
import { recordOf } from '../../record/index.ts';
import type { Desk } from '../desk/index.ts';
import { OpenList } from './open-list.tsx';
import { TitleForm } from './title-form.tsx';
import { loadTypesetter, recordElement, typesetFormulas } from './typeset-record.ts';
import './record-view.css';

/** The record of the sheet on the desk over the whole page; `digest` is the SHA-256 of its text. */
export function RecordView(props: { readonly desk: Desk; readonly digest: string; readonly onClose: () => void }) {
  const { document } = props.desk;
  const tree = createMemo(
    () => (
      document.version(),
      recordOf(document.sheet, {
        digest: props.digest,
        judged: props.desk.spread.isStale() ? null : props.desk.spread.judged(),
      })
    ),
  );
  const [ready, setReady] = createSignal(false);
  let dialog!: HTMLDialogElement;
  let place!: HTMLDivElement;

  onMount(() => {
    dialog.showModal();
    void loadTypesetter().then(() => setReady(true));
  });
  createEffect(() => {
    const record = recordElement(tree());
    place.replaceChildren(record);
    if (ready()) typesetFormulas(record);
  });

  return (
    <dialog
      class="record-view"
      ref={(element) => (dialog = element)}
      aria-labelledby="record-view-title"
      onClose={() => props.onClose()}
    >
      <header>
        <h2 id="record-view-title">Record</h2>
        <button type="button" class="record-print-button" onClick={() => window.print()}>
          Print
        </button>
        <button type="button" onClick={() => dialog.close()}>
          Close
        </button>
      </header>
      <div class="record-view-body">
        <aside aria-label="Before printing">
          <h3>Title block</h3>
          <TitleForm desk={props.desk} />
          <h3>Open before issue</h3>
          <OpenList desk={props.desk} onFollow={() => dialog.close()} />
        </aside>
        <div
          class={`record-sheet record-on-${tree().paper.toLowerCase()}`}
          ref={(element) => (place = element)}
          role="region"
          aria-label="The record as it prints"
          tabindex="0"
        />
      </div>
    </dialog>
  );
}
