// What is said about keeping sheets: the words, with their times. Times are milliseconds of the epoch.

import type { StoreFailure } from './store.ts';

/** A fault of the surroundings or of what was received, with a code that never changes. */
export interface StorageFault {
  readonly code: string;
  /** Whole sentences, as shown to the user. */
  readonly text: string;
}

/** The change that could not be kept, the version that is, and now. */
interface UnkeptTimes {
  readonly changed: number;
  /** null where no version was ever kept. */
  readonly kept: number | null;
  readonly now: number;
}

const REFUSED: StorageFault = {
  code: 'storage-refused',
  text:
    'This browser refuses to store anything, perhaps because the window is private. ' +
    'Your sheet lives in this tab only; save it as a file or copy a link before you close it.',
};
const NEWER_STORE: StorageFault = {
  code: 'storage-newer',
  text:
    'The sheets of this browser are kept by a newer version of this program, and were left as they are. ' +
    'Save what stands here as a file, then load the page again.',
};

/** The local time of day, `14:07`; with the date before it where it is not the day of `now`. */
export function timeText(at: number, now: number): string {
  const two = (n: number) => String(n).padStart(2, '0');
  const then = new Date(at);
  const clock = `${two(then.getHours())}:${two(then.getMinutes())}`;
  const day = `${then.getFullYear()}-${two(then.getMonth() + 1)}-${two(then.getDate())}`;
  return then.toDateString() === new Date(now).toDateString() ? clock : `${day} ${clock}`;
}

/** A count with thin spaces between its groups of three. */
export function countText(count: number): string {
  return String(count).replace(/\B(?=(\d{3})+$)/g, '\u2009');
}

/** An edit that was not kept. */
export function unkeptFault(failure: StoreFailure, times: UnkeptTimes): StorageFault {
  const change = `The last change, at ${timeText(times.changed, times.now)}, could not be kept`;
  switch (failure) {
    case 'full':
      return {
        code: 'storage-full',
        text: `${change}: storage is full. ${safeText(times)} Save a file now, then make room on the shelf.`,
      };
    case 'refused':
      if (times.kept === null) return REFUSED;
      return {
        code: 'storage-refused',
        text: `${change}: the browser refuses to store it. ${safeText(times)} Save a file now.`,
      };
    case 'newer':
      return NEWER_STORE;
  }
}

/** A write of which nothing was heard for some time. */
export function silentFault(seconds: number, times: UnkeptTimes): StorageFault {
  const change = `The last change, at ${timeText(times.changed, times.now)}, is not kept yet`;
  return {
    code: 'storage-silent',
    text: `${change}: storage has not answered for ${seconds} s. ${safeText(times)} Save a file before you close this tab.`,
  };
}

function safeText({ kept, now }: UnkeptTimes): string {
  return kept === null ? 'No version of it is kept yet.' : `The version of ${timeText(kept, now)} is safe.`;
}

/** What another tab has done to the sheet that is open here. */
export type Elsewhere =
  | { readonly kind: 'changed'; readonly changed: number }
  | { readonly kind: 'deleted' }
  /** Left in a form that this version cannot read; `changed` where it says when. */
  | { readonly kind: 'unreadable'; readonly changed: number | null };

/** How this tab's own text is off: it has no edits of its own, or they are kept as a second sheet, or they are not. */
export type OwnText = 'unchanged' | 'set aside' | 'unkept';

/** What another tab has done, what stays safe, and what can be done about it. */
export function elsewhereText(elsewhere: Elsewhere, own: OwnText, now: number): string {
  const deed = deedText(elsewhere, now);
  if (own === 'unkept') {
    return `${deed} Your text could not be kept beside it. Save it as a file before you close this tab.`;
  }
  switch (elsewhere.kind) {
    case 'changed':
      return own === 'unchanged'
        ? `${deed} You changed nothing here since: take theirs, or keep what you see.`
        : `${deed} Both texts are kept: take theirs, keep yours, or compare.`;
    case 'deleted':
      return own === 'unchanged'
        ? `${deed} What you see is kept nowhere: keep it, or let it go.`
        : `${deed} Your text is kept as a second sheet: keep it, or let it go.`;
    case 'unreadable':
      return own === 'unchanged'
        ? `${deed} It was left as it is. Load the page again to open it.`
        : `${deed} It was left as it is, and your text is kept as a second sheet. Load the page again to open both.`;
  }
}

function deedText(elsewhere: Elsewhere, now: number): string {
  if (elsewhere.kind === 'deleted') return 'This sheet was deleted in another tab.';
  const at = elsewhere.changed === null ? '' : ` at ${timeText(elsewhere.changed, now)}`;
  return elsewhere.kind === 'changed'
    ? `This sheet was changed in another tab${at}.`
    : `This sheet was changed in another tab${at}, in a form that this page cannot read, as a newer version of the program would.`;
}

/** The shelf itself could not be read or written; `what` is the deed, as in `The copy`. */
export function shelfFault(failure: StoreFailure, what: string): StorageFault {
  switch (failure) {
    case 'full':
      return {
        code: 'storage-full',
        text: `${what} could not be made: storage is full. Everything else is safe. Make room on the shelf first.`,
      };
    case 'refused':
      return REFUSED;
    case 'newer':
      return NEWER_STORE;
  }
}

export const MISSING_SHEET: StorageFault = {
  code: 'sheet-missing',
  text: 'This sheet is no longer on the shelf.',
};
export const DAMAGED_SHEET: StorageFault = {
  code: 'sheet-damaged',
  text: 'What the shelf holds of this sheet cannot be read. It was left as it is.',
};
export const NEWER_SHEET: StorageFault = {
  code: 'sheet-newer',
  text:
    'This sheet was kept by a newer version of this program, and was left as it is. ' +
    'Load the page again to open it with that version.',
};
