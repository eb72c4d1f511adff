// The user's own parts: kept from a sheet, looked through, put into any sheet, passed on as a file.

import { For, Show, createMemo, createResource, createSignal } from 'solid-js';
import { isCellName, partsOfText, partText, renamedPart } from '../../language/index.ts';
import { createSheet } from '../../sheet/index.ts';
import { openFile, saveFile } from '../../storage/index.ts';
import type { KeptPart, PartShelf, ShownPart, StorageFault } from '../../storage/index.ts';
import { insertBlock } from '../desk/index.ts';
import type { Desk } from '../desk/index.ts';
import { freeName } from '../rows/index.ts';
import { Modal } from './modal.tsx';
import './rows-dialog.css';
import './parts-dialog.css';

/** Lists the parts; keeps, inserts, renames and removes them. */
export function PartsDialog(props: { readonly desk: Desk; readonly shelf: PartShelf; readonly onClose: () => void }) {
  const { desk, shelf } = props;
  const { sheet } = desk.document;
  const [listed, { refetch }] = createResource(() => shelf.list());
  const [sought, setSought] = createSignal('');
  const [chosen, choose] = createSignal<string | null>(null);
  const [said, setSaid] = createSignal<string | null>(null);
  const [removed, setRemoved] = createSignal<ShownPart | null>(null);
  const all = (): readonly ShownPart[] => {
    const result = listed();
    return result && 'parts' in result ? result.parts : [];
  };
  const fault = (): string | null => {
    const result = listed();
    return result && 'fault' in result ? result.fault.text : said();
  };
  const shown = createMemo(() => {
    const words = sought().toLowerCase().split(/\s+/).filter(Boolean);
    return all().filter(({ text }) => words.every((word) => text.toLowerCase().includes(word)));
  });
  const own = desk.document.tree().cells.filter(({ entry }) => entry.type === 'part');

  async function done(answer: Promise<{ readonly fault: StorageFault } | object>): Promise<boolean> {
    const result = await answer;
    setSaid('fault' in result ? (result as { fault: StorageFault }).fault.text : null);
    await refetch();
    return !('fault' in result);
  }
  async function keep(cell: (typeof own)[number]): Promise<void> {
    const text = partText(desk.document.tree(), cell);
    const alone = createSheet(`${text}\n`).cell(cell.name.name)?.fault ?? null;
    if (alone)
      return void setSaid(`${cell.name.name} rests on other lines of this sheet and cannot stand alone: ${alone.text}`);
    await done(shelf.keep(text));
  }
  function putIn({ name, text }: ShownPart): void {
    const taken = desk.document.tree().cells.some((cell) => cell.name.name === name);
    const own = taken ? freeName(sheet, 'Q') : name;
    const lines = (taken ? renamedPart(text, own) : text).split('\n');
    props.onClose();
    insertBlock(desk, lines, `insert ${own}`);
  }
  async function rename(part: ShownPart, name: string): Promise<void> {
    if (name === part.name) return;
    if (!isCellName(name)) return void setSaid(`${name || 'An empty name'} cannot name a part.`);
    const { id, text, kept } = part;
    await done(shelf.put({ id, kept, text: renamedPart(text, name) }));
  }
  async function remove(part: ShownPart): Promise<void> {
    if (await done(shelf.remove(part.id))) setRemoved(part);
  }
  async function putBack({ id, text, kept }: KeptPart): Promise<void> {
    if (await done(shelf.put({ id, text, kept }))) setRemoved(null);
  }
  async function readFile(file: File | undefined): Promise<void> {
    if (!file) return;
    const opened = await openFile(file);
    if ('fault' in opened) return void setSaid(opened.fault.text);
    const texts = partsOfText(opened.text);
    if (texts.length === 0) return void setSaid(`There is no part in ${file.name}.`);
    for (const text of texts) if (!(await done(shelf.keep(text)))) return;
    setSaid(`${texts.length === 1 ? '1 part was' : `${texts.length} parts were`} taken from ${file.name}.`);
  }

  return (
    <Modal title="Parts" onClose={() => props.onClose()}>
      <Show when={fault()}>
        {(text) => (
          <p class="modal-fault" role="alert">
            {text()}
          </p>
        )}
      </Show>
      <Show when={removed()}>
        {(part) => (
          <p role="status">
            {part().name} was removed.{' '}
            <button type="button" onClick={() => void putBack(part())}>
              Put {part().name} back
            </button>
          </p>
        )}
      </Show>
      <Show when={own.length > 0}>
        <section>
          <h3>Keep a part of this sheet</h3>
          <div class="modal-row">
            <For each={own}>
              {(cell) => (
                <button type="button" onClick={() => void keep(cell)}>
                  Keep {cell.name.name}
                </button>
              )}
            </For>
          </div>
        </section>
      </Show>
      <section>
        <h3>Kept in this browser</h3>
        <Show
          when={all().length > 0}
          fallback={<p class="soft">No part yet. One that is kept can be put into any sheet.</p>}
        >
          <label class="parts-search">
            Search
            <input type="search" value={sought()} onInput={(event) => setSought(event.currentTarget.value)} />
          </label>
          <ul class="shelf-list parts-list" aria-label="Parts">
            <For each={shown()} fallback={<li class="soft">No part has these words.</li>}>
              {(part) => (
                <li>
                  <button
                    type="button"
                    class="shelf-open"
                    aria-expanded={chosen() === part.id}
                    onClick={() => choose(chosen() === part.id ? null : part.id)}
                  >
                    {part.name}
                  </button>
                  <span class="soft">{part.kind}</span>
                  <button type="button" aria-label={`Put in ${part.name}`} onClick={() => putIn(part)}>
                    Put in
                  </button>
                  <button type="button" aria-label={`Remove ${part.name}`} onClick={() => void remove(part)}>
                    Remove
                  </button>
                  <Show when={chosen() === part.id}>
                    <div class="part-open">
                      <pre class="card-lines">{part.text}</pre>
                      <label>
                        Name{' '}
                        <input
                          value={part.name}
                          onChange={(event) => void rename(part, event.currentTarget.value.trim())}
                        />
                      </label>
                    </div>
                  </Show>
                </li>
              )}
            </For>
          </ul>
        </Show>
      </section>
      <section>
        <h3>Files</h3>
        <div class="modal-row">
          <label class="file-label">
            Take parts from a text file
            <input
              type="file"
              accept=".txt,text/plain"
              onChange={(event) => void readFile(event.currentTarget.files?.[0])}
            />
          </label>
          <Show when={all().length > 0}>
            <button
              type="button"
              onClick={() =>
                saveFile(
                  `# Parts\n\n${all()
                    .map(({ text }) => text)
                    .join('\n\n')}\n`,
                  document,
                )
              }
            >
              Save all as a file
            </button>
          </Show>
        </div>
      </section>
    </Modal>
  );
}
