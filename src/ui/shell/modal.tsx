// A dialog over the page: the browser's own, with a heading and a way out.

import { onMount } from 'solid-js';
import type { JSX } from 'solid-js';

/** Shown as long as it is mounted; Escape and the button close it. */
export function Modal(props: { readonly title: string; readonly onClose: () => void; readonly children: JSX.Element }) {
  let dialog!: HTMLDialogElement;
  const id = `dialog-${props.title.toLowerCase().replace(/\W+/g, '-')}`;
  onMount(() => dialog.showModal());
  return (
    <dialog class="modal" ref={(element) => (dialog = element)} aria-labelledby={id} onClose={() => props.onClose()}>
      <header>
        <h2 id={id}>{props.title}</h2>
        <button type="button" onClick={() => dialog.close()}>
          Close
        </button>
      </header>
      {props.children}
    </dialog>
  );
}
