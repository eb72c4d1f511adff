// The sheet as text: what is stored, shared and diffed, edited as it stands. One visit to the text is one step of undo.

import { createSignal } from 'solid-js';
import { splicesBetween } from '../../storage/index.ts';
import type { Desk } from '../desk/index.ts';

/** A text field over the whole sheet; the sheet follows while typing. */
export function TextPane(props: { readonly desk: Desk }) {
  const { document } = props.desk;
  const [visit, setVisit] = createSignal(0);
  return (
    <section class="text-pane" aria-label="Text of the sheet">
      <textarea
        aria-label="Text of the sheet"
        spellcheck={false}
        autocapitalize="off"
        value={document.text()}
        onFocus={() => setVisit((n) => n + 1)}
        onInput={(event) =>
          document.edit(splicesBetween(document.text(), event.currentTarget.value), 'edit the text', `text ${visit()}`)
        }
      />
    </section>
  );
}
