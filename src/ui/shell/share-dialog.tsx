// Share: a link whose fragment holds the whole sheet. Nothing is sent anywhere.

import { Show, createResource, createSignal } from 'solid-js';
import type { Session } from '../session/index.ts';
import { Modal } from './modal.tsx';

/** Makes the link, copies it, and shows it for copying by hand. */
export function ShareDialog(props: {
  readonly session: Session;
  readonly onClose: () => void;
  readonly saveFile: () => void;
}) {
  const [copied, setCopied] = createSignal<string | null>(null);
  const [link] = createResource(async () => {
    const written = await props.session.shareLink();
    if ('fault' in written) return { fault: written.fault.text };
    const address = `${location.origin}${location.pathname}#${written.fragment}`;
    await copy(address);
    return { address };
  });
  const address = (): string | null => {
    const result = link();
    return result && 'address' in result ? result.address! : null;
  };
  const fault = (): string | null => {
    const result = link();
    return result && 'fault' in result ? result.fault! : null;
  };
  async function copy(text: string): Promise<void> {
    try {
      await navigator.clipboard.writeText(text);
      setCopied('The link is copied.');
    } catch {
      setCopied('This browser does not let the page copy: take the link from the field.');
    }
  }
  return (
    <Modal title="Share" onClose={() => props.onClose()}>
      <p>
        The link holds the whole sheet behind its #, which never leaves the browser of whoever opens it. They get a
        copy.
      </p>
      <Show when={address()}>
        {(text) => (
          <>
            <label class="share-field">
              Link
              <input readonly value={text()} onFocus={(event) => event.currentTarget.select()} />
            </label>
            <p class="soft" role="status">
              {copied()}
            </p>
          </>
        )}
      </Show>
      <Show when={fault()}>
        <p class="modal-fault" role="alert">
          {fault()}
        </p>
      </Show>
      <div class="modal-row">
        <Show when={address()}>
          {(text) => (
            <button type="button" onClick={() => void copy(text())}>
              Copy the link
            </button>
          )}
        </Show>
        <button type="button" onClick={() => props.saveFile()}>
          Save as a file instead
        </button>
      </div>
    </Modal>
  );
}
