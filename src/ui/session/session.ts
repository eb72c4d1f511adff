// Which sheet is open, and how it is kept: the first visit, the shelf, links that arrive, other tabs.
//
// A sheet that was received or opened as an example stands on no shelf until it is edited or kept, so
// opening one overwrites nothing. The tab remembers which sheet it has open, and a reload comes back to it.

import { batch, createEffect, createRoot, createSignal, on } from 'solid-js';
import { sha256Hex } from '../../numeric/index.ts';
import {
  createKeeper,
  createPartShelf,
  createShelf,
  followPage,
  joinTabs,
  openStore,
  pageSchedule,
  randomId,
  readLink,
  titleOf,
  writeLink,
} from '../../storage/index.ts';
import type { Keeper, KeepState, PartShelf, Shelf, SheetRecord, StorageFault, Written } from '../../storage/index.ts';
import { createSheetDocument } from '../document/index.ts';
import type { SheetDocument } from '../document/index.ts';
import { EXAMPLES } from './examples.ts';
import { createFolds } from './folds.ts';
import type { Folds } from './folds.ts';

/** How the open sheet came here. */
export type Origin = 'shelf' | 'example' | 'received' | 'new';

export interface Session {
  readonly document: SheetDocument;
  readonly shelf: Shelf;
  /** The user's own parts. */
  readonly parts: PartShelf;
  /** What is folded of the open sheet; kept with it. */
  readonly folds: Folds;
  /** True once a sheet is open. */
  ready(): boolean;
  origin(): Origin;
  keepState(): KeepState;
  /** What went wrong with a link that was opened, or null. */
  linkFault(): StorageFault | null;
  dismissLinkFault(): void;
  /** Id of the open sheet. */
  openId(): string;
  openFromShelf(id: string): Promise<StorageFault | null>;
  openText(text: string, origin: Origin): Promise<void>;
  /** Puts a sheet on the shelf that is not there yet. */
  keepNow(): Promise<void>;
  takeTheirs(): Promise<void>;
  keepMine(): Promise<void>;
  shareLink(): Promise<Written>;
}

/** What the session needs of the browser window. */
type SessionWindow = Window;

/** Where the tab remembers its open sheet. */
const OPEN_KEY = 'squarelaw-open';

/** Opens the session: the sheet of a link, else the one this tab had open, else the latest, else the worked example. */
export function createSession(page: SessionWindow): Session {
  const tabs = joinTabs();
  const store = openStore();
  const shelf = createShelf({ store, tabs, now: Date.now, newId: randomId });
  const parts = createPartShelf({ store, now: Date.now, newId: randomId });
  const document = createSheetDocument('');
  const folds = createFolds();
  const [ready, setReady] = createSignal(false);
  const [origin, setOrigin] = createSignal<Origin>('new');
  const [keepState, setKeepState] = createSignal<KeepState>({ state: 'kept', at: null });
  const [linkFault, setLinkFault] = createSignal<StorageFault | null>(null);
  const [openId, setOpenId] = createSignal('');
  let keeper: Keeper | null = null;
  let unfollow = (): void => {};

  async function open(record: SheetRecord, from: Origin): Promise<void> {
    unfollow();
    const last = keeper;
    keeper = null;
    await last?.close();
    batch(() => {
      folds.reset(record.folded);
      document.load(record.text, record.history);
    });
    const next = createKeeper(record, {
      shelf,
      tabs,
      schedule: pageSchedule,
      now: Date.now,
      onState(state) {
        if (keeper !== next) return;
        setKeepState(state);
        if (state.state === 'kept' && state.at !== null) settle();
      },
    });
    keeper = next;
    unfollow = followPage(next, page);
    setOpenId(record.id);
    setOrigin(from);
    setKeepState(next.state());
    if (from === 'shelf') settle();
    setReady(true);
  }

  /** The sheet stands on the shelf now: a reload finds it there, whatever link it came from. */
  function settle(): void {
    setOrigin('shelf');
    remember(page, openId());
    if (page.location.hash !== '') page.history.replaceState(null, '', page.location.pathname + page.location.search);
  }

  const content = () => ({ text: document.text(), history: document.history(), folded: folds.said() });

  async function openLink(): Promise<boolean> {
    const read = await readLink(page.location.hash, sha256Hex);
    if (read === null) return false;
    if ('fault' in read) {
      setLinkFault(read.fault);
      return false;
    }
    setLinkFault(null);
    await open(shelf.draft({ text: read.text }), 'received');
    return true;
  }

  async function openLatest(): Promise<void> {
    const remembered = recall(page);
    const own = remembered === null ? null : await shelf.load(remembered);
    if (own && 'record' in own) return open(own.record, 'shelf');
    const listed = await shelf.list();
    const [latest] = 'sheets' in listed ? listed.sheets : [];
    const loaded = latest ? await shelf.load(latest.id) : null;
    if (loaded && 'record' in loaded) return open(loaded.record, 'shelf');
    return open(shelf.draft({ text: EXAMPLES[0]!.text }), 'example');
  }

  createRoot(() => {
    createEffect(
      on(
        [document.text, document.history],
        () => {
          if (keeper && document.history().undo.length + document.history().redo.length > 0) keeper.keep(content());
        },
        { defer: true },
      ),
    );
  });
  createRoot(() => {
    // What is folded is kept with a sheet that is kept already; it puts none on the shelf.
    createEffect(
      on(
        folds.said,
        () => {
          if (keeper && origin() === 'shelf') keeper.keep(content());
        },
        { defer: true },
      ),
    );
  });
  page.addEventListener('hashchange', () => void openLink());
  void openLink().then((opened) => (opened ? undefined : openLatest()));

  const shown = (taken: Awaited<ReturnType<Keeper['takeTheirs']>>): void => {
    if (taken) document.load(taken.text, taken.history);
    if (keeper) setKeepState(keeper.state());
  };
  return {
    document,
    shelf,
    parts,
    folds,
    ready,
    origin,
    keepState,
    linkFault,
    dismissLinkFault: () => setLinkFault(null),
    openId,
    async openFromShelf(id) {
      await keeper?.flush();
      const loaded = await shelf.load(id);
      if ('fault' in loaded) return loaded.fault;
      await open(loaded.record, 'shelf');
      return null;
    },
    openText: (text, from) => open(shelf.draft({ text }), from),
    async keepNow() {
      keeper?.keep(content());
      await keeper?.flush();
    },
    takeTheirs: async () => shown((await keeper?.takeTheirs()) ?? null),
    keepMine: async () => shown((await keeper?.keepMine()) ?? null),
    shareLink: () => writeLink(document.text(), sha256Hex),
  };
}

/** The name a sheet goes by in sentences. */
export function sheetTitle(text: string): string {
  return titleOf(text);
}

function remember(page: Window, id: string): void {
  try {
    page.sessionStorage.setItem(OPEN_KEY, id);
  } catch {
    // A browser that refuses storage says so elsewhere; without a memory a reload opens the latest sheet.
  }
}

function recall(page: Window): string | null {
  try {
    return page.sessionStorage.getItem(OPEN_KEY);
  } catch {
    return null;
  }
}
