// The shelf: the sheets kept in this browser, worked examples, files.

import { For, Show, createResource, createSignal } from 'solid-js';
import { openFile, timeText } from '../../storage/index.ts';
import type { SheetHead } from '../../storage/index.ts';
import { EXAMPLES } from '../session/index.ts';
import type { Session } from '../session/index.ts';
import { Modal } from './modal.tsx';

/** Lists the sheets; opens, copies and removes them. */
export function ShelfDialog(props: {
  readonly session: Session;
  readonly onClose: () => void;
  readonly saveFile: () => void;
}) {
  const { session } = props;
  const [listed, { refetch }] = createResource(() => session.shelf.list());
  const [said, setSaid] = createSignal<string | null>(null);
  const sheets = (): readonly SheetHead[] => {
    const result = listed();
    return result && 'sheets' in result ? result.sheets : [];
  };
  const fault = (): string | null => {
    const result = listed();
    return result && 'fault' in result ? result.fault.text : said();
  };

  async function open(id: string): Promise<void> {
    const failed = await session.openFromShelf(id);
    if (failed) setSaid(failed.text);
    else props.onClose();
  }
  async function remove(id: string): Promise<void> {
    const removed = await session.shelf.remove(id);
    if ('fault' in removed) setSaid(removed.fault.text);
    void refetch();
  }
  async function start(text: string, origin: 'new' | 'example'): Promise<void> {
    await session.openText(text, origin);
    props.onClose();
  }
  async function readFile(file: File | undefined): Promise<void> {
    if (!file) return;
    const opened = await openFile(file);
    if ('fault' in opened) return void setSaid(opened.fault.text);
    await session.openText(opened.text, 'new');
    await session.keepNow();
    props.onClose();
  }

  return (
    <Modal title="Shelf" onClose={() => props.onClose()}>
      <Show when={fault()}>
        <p class="modal-fault" role="alert">
          {fault()}
        </p>
      </Show>
      <section>
        <h3>Kept in this browser</h3>
        <Show
          when={sheets().length > 0}
          fallback={<p class="soft">No sheet yet. One is kept as soon as you change it.</p>}
        >
          <ul class="shelf-list">
            <For each={sheets()}>
              {(sheet) => (
                <li>
                  <button type="button" class="shelf-open" onClick={() => void open(sheet.id)}>
                    {sheet.title}
                  </button>
                  <span class="soft">
                    {sheet.id === session.openId() ? 'open now, ' : ''}changed {timeText(sheet.changed, Date.now())}
                  </span>
                  <button
                    type="button"
                    aria-label={`Remove ${sheet.title} from the shelf`}
                    aria-disabled={sheet.id === session.openId() ? 'true' : undefined}
                    title={sheet.id === session.openId() ? 'It is open now.' : undefined}
                    onClick={() =>
                      void (sheet.id === session.openId()
                        ? setSaid('The open sheet stays: open another one first.')
                        : remove(sheet.id))
                    }
                  >
                    Remove
                  </button>
                </li>
              )}
            </For>
          </ul>
        </Show>
      </section>
      <section>
        <h3>Begin</h3>
        <div class="modal-row">
          <button type="button" onClick={() => void start('', 'new')}>
            Empty sheet
          </button>
          <For each={EXAMPLES}>
            {(example) => (
              <button type="button" onClick={() => void start(example.text, 'example')}>
                Example: {example.title}
              </button>
            )}
          </For>
        </div>
      </section>
      <section>
        <h3>Files</h3>
        <div class="modal-row">
          <label class="file-label">
            Open a text file
            <input
              type="file"
              accept=".txt,text/plain"
              onChange={(event) => void readFile(event.currentTarget.files?.[0])}
            />
          </label>
          <button type="button" onClick={() => props.saveFile()}>
            Save this sheet as a file
          </button>
        </div>
      </section>
    </Modal>
  );
}
