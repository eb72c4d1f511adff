// The page around the panes: head, verdict, sheet, figures and workings, status; tabs where it is narrow.

import { For, Show, createEffect, createSignal, onCleanup, onMount } from 'solid-js';
import { sha256Hex } from '../../numeric/index.ts';
import { saveFile } from '../../storage/index.ts';
import { CornerLine } from '../corner/index.ts';
import { commandForKey, createDesk, keyOf } from '../desk/index.ts';
import { FiguresPane } from '../figures/index.ts';
import { SheetGrid } from '../grid/index.ts';
import { RecordView, installPrint } from '../record/index.ts';
import type { Session } from '../session/index.ts';
import { sheetTitle } from '../session/index.ts';
import { createSpreadFeed } from '../spread/index.ts';
import { VerdictLine } from '../verdict/index.ts';
import { WorkingsPane } from '../workings/index.ts';
import { BandDialog } from './band-dialog.tsx';
import { Banners } from './banner.tsx';
import { NARROWEST, WIDEST, createDivider } from './divider.ts';
import { FindBar } from './find-bar.tsx';
import { Head } from './head.tsx';
import { HelpDialog } from './help-dialog.tsx';
import { keepWords } from './keep-words.ts';
import { cyclePane, focusPane, paneOf } from './panes.ts';
import { CardDialog } from './card-dialog.tsx';
import { DividerDialog } from './divider-dialog.tsx';
import { DataSheetDialog } from './data-sheet-dialog.tsx';
import { PartsDialog } from './parts-dialog.tsx';
import { RowsDialog } from './rows-dialog.tsx';
import { ShareDialog } from './share-dialog.tsx';
import { shellCommands } from './shell-commands.ts';
import type { DialogName } from './shell-commands.ts';
import { ShelfDialog } from './shelf-dialog.tsx';
import { StatusLine } from './status-line.tsx';
import { TextPane } from './text-pane.tsx';
import { createThemeChoice } from './theme-choice.ts';
import './shell.css';

const TABS = ['sheet', 'figures', 'workings', 'text'] as const;
type Tab = (typeof TABS)[number];
const THEME_TITLES = { system: 'Light or dark', light: 'Light', dark: 'Dark' } as const;

/** The whole page for an open session. */
export function Shell(props: { readonly session: Session }) {
  const { session } = props;
  const desk = createDesk(session.document, createSpreadFeed(session.document), session.folds);
  const [dialog, setDialog] = createSignal<DialogName | null>(null);
  const [finding, setFinding] = createSignal(false);
  const [tab, setTab] = createSignal<Tab>('sheet');
  const [now, setNow] = createSignal(Date.now());
  const divider = createDivider();
  const theme = createThemeChoice(window);
  const save = (): void => saveFile(session.document.text(), document);

  desk.addCommands(
    shellCommands({
      show: setDialog,
      find: () => setFinding(true),
      toggleText: () => setTab((present) => (present === 'text' ? 'sheet' : 'text')),
      turnTheme: () => theme.turn(),
      themeTitle: () => THEME_TITLES[theme.theme()],
      textTitle: () => (tab() === 'text' ? 'Sheet' : 'Text'),
    }),
  );

  createEffect(() => {
    session.keepState();
    setNow(Date.now());
  });
  createEffect(() => {
    document.title = `${sheetTitle(session.document.text())} · Squarelaw`;
  });
  // A jump leads to the sheet, wherever one is.
  createEffect(() => {
    if (desk.jumped() > 0) setTab('sheet');
  });

  function onKeyDown(event: KeyboardEvent): void {
    if (event.defaultPrevented || dialog() !== null) return;
    const key = keyOf(event);
    if (key === 'F6' || key === 'Shift+F6') {
      if (cyclePane(document, key === 'F6' ? 1 : -1)) event.preventDefault();
      return;
    }
    if (key === 'F9') {
      event.preventDefault();
      setTab((present) => (present === 'sheet' ? 'workings' : present));
      focusPane(document, 'workings');
      return;
    }
    // While find is open, the same key is the browser's own.
    if (key === 'Ctrl+F' && finding()) return;
    const typing = event.target instanceof HTMLTextAreaElement || event.target instanceof HTMLInputElement;
    if (key === 'Escape' && desk.corner() !== null) {
      event.preventDefault();
      desk.stand(null);
      return;
    }
    const command = commandForKey(desk.commands(), key);
    if (!command || (typing && !key.startsWith('F') && key !== 'Ctrl+F')) return;
    if (paneOf(event.target as Element) !== 'sheet' && ['Delete', 'Ctrl+Delete', 'Ctrl+Backspace'].includes(key))
      return;
    event.preventDefault();
    const reason = command.unavailable?.();
    if (reason) desk.say(reason);
    else command.run();
  }
  onMount(() => {
    document.addEventListener('keydown', onKeyDown);
    const endPrint = installPrint(desk, digestOf);
    onCleanup(() => {
      document.removeEventListener('keydown', onKeyDown);
      endPrint();
    });
  });

  return (
    <div class="page" data-tab={tab()}>
      <nav class="skip-links" aria-label="Skip">
        <For each={['sheet', 'figures', 'workings'] as const}>
          {(pane) => (
            <button type="button" onClick={() => focusPane(document, pane)}>
              Skip to the {pane}
            </button>
          )}
        </For>
      </nav>
      <div data-pane="commands" class="head-pane">
        <Head desk={desk} />
      </div>
      <section data-pane="verdict" aria-label="Verdict on the sheet">
        <Show when={desk.corner()} fallback={<VerdictLine desk={desk} />}>
          {(corner) => <CornerLine desk={desk} corner={corner()} />}
        </Show>
      </section>
      <Banners session={session} openShelf={() => setDialog('shelf')} saveFile={save} />
      <Show when={finding()}>
        <FindBar desk={desk} onClose={() => setFinding(false)} />
      </Show>
      <main class="panes" style={{ '--sheet-share': `${divider.share()}%` }}>
        <div data-pane="sheet" class="sheet-pane">
          <Show when={tab() === 'text'}>
            <TextPane desk={desk} />
          </Show>
          <div class="sheet-view">
            <SheetGrid desk={desk} />
          </div>
        </div>
        <div
          class="divider"
          role="separator"
          aria-orientation="vertical"
          aria-label="Width of the sheet"
          aria-valuemin={NARROWEST}
          aria-valuemax={WIDEST}
          aria-valuenow={divider.share()}
          tabindex="0"
          onKeyDown={(event) => divider.onKeyDown(event)}
          onPointerDown={(event) => divider.onPointerDown(event)}
        />
        <div class="side-panes">
          <div data-pane="figures" class="side-figures">
            <FiguresPane desk={desk} />
          </div>
          <div data-pane="workings" class="side-workings">
            <WorkingsPane desk={desk} />
          </div>
        </div>
      </main>
      <StatusLine desk={desk} kept={keepWords(session.keepState(), session.origin(), now())} />
      <nav class="tabs" aria-label="Panes">
        <For each={TABS}>
          {(name) => (
            <button type="button" aria-pressed={tab() === name} onClick={() => setTab(name)}>
              {name[0]!.toUpperCase() + name.slice(1)}
            </button>
          )}
        </For>
      </nav>
      <Show when={dialog() === 'shelf'}>
        <ShelfDialog session={session} onClose={() => setDialog(null)} saveFile={save} />
      </Show>
      <Show when={dialog() === 'share'}>
        <ShareDialog session={session} onClose={() => setDialog(null)} saveFile={save} />
      </Show>
      <Show when={dialog() === 'record'}>
        <RecordView desk={desk} digest={digestOf(session.document.text())} onClose={() => setDialog(null)} />
      </Show>
      <Show when={dialog() === 'rows'}>
        <RowsDialog desk={desk} onClose={() => setDialog(null)} />
      </Show>
      <Show when={dialog() === 'card'}>
        <CardDialog desk={desk} onClose={() => setDialog(null)} />
      </Show>
      <Show when={dialog() === 'divider'}>
        <DividerDialog desk={desk} onClose={() => setDialog(null)} />
      </Show>
      <Show when={dialog() === 'parts'}>
        <PartsDialog desk={desk} shelf={session.parts} onClose={() => setDialog(null)} />
      </Show>
      <Show when={dialog() === 'data-sheet'}>
        <DataSheetDialog desk={desk} onClose={() => setDialog(null)} />
      </Show>
      <Show when={dialog() === 'band'}>
        <BandDialog desk={desk} onClose={() => setDialog(null)} />
      </Show>
      <Show when={dialog() === 'help'}>
        <HelpDialog desk={desk} onClose={() => setDialog(null)} />
      </Show>
    </div>
  );
}

/** SHA-256 of a text's UTF-8 bytes, as the terminal prints it. */
function digestOf(text: string): string {
  return sha256Hex(new TextEncoder().encode(text));
}
