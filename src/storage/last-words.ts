// What a page leaves when it goes with an edit that is not kept yet.
//
// A transaction of the shelf reads before it writes, and a page that is being closed is not given the time: the text
// is lost between the two. So such a page also puts its text into the browser's small storage, which is written
// within the call, and the next page that looks at the shelf brings it there. A page has one entry for each sheet.

import { FORMAT, formatOf, readRecord } from './sheet-record.ts';
import type { SheetRecord } from './sheet-record.ts';
import { EMPTY_HISTORY } from './history.ts';

/** The part of `localStorage` that is used. */
export type SmallStorage = Pick<Storage, 'getItem' | 'setItem' | 'removeItem' | 'key' | 'length'>;

/** `record` is the version the page went out from, with the text, history, folding and time of its last edit in place. */
export interface LastWords {
  readonly record: SheetRecord;
  /** The page that left them. */
  readonly writer: string;
}

const PREFIX = 'squarelaw-left ';

/** The small storage of this browser, or null where it is refused. */
export function openSmallStorage(): SmallStorage | null {
  try {
    return globalThis.localStorage ?? null;
  } catch {
    return null;
  }
}

/** Leaves words; where there is no room for the history, without it, and where there is none for the text, not at all. */
export function leaveWords(storage: SmallStorage | null, { record, writer }: LastWords): void {
  for (const history of [record.history, EMPTY_HISTORY]) {
    try {
      storage?.setItem(keyOf(record.id, writer), JSON.stringify({ ...record, history, leftBy: writer }));
      return;
    } catch (thrown) {
      if (!(thrown instanceof DOMException)) throw thrown;
    }
  }
}

/** Takes words back, once they are on the shelf. */
export function dropWords(storage: SmallStorage | null, id: string, writer: string): void {
  try {
    storage?.removeItem(keyOf(id, writer));
  } catch (thrown) {
    if (!(thrown instanceof DOMException)) throw thrown;
  }
}

/** All words that can be read; those of a newer version stay for that one. */
export function findWords(storage: SmallStorage | null): LastWords[] {
  const found: LastWords[] = [];
  for (let index = 0; index < (storage?.length ?? 0); index++) {
    const key = storage!.key(index);
    if (key?.startsWith(PREFIX)) found.push(...readWords(storage!.getItem(key)));
  }
  return found;
}

function keyOf(id: string, writer: string): string {
  return `${PREFIX}${id} ${writer}`;
}

function readWords(text: string | null): LastWords[] {
  let kept: unknown;
  try {
    kept = JSON.parse(text ?? '');
  } catch {
    return [];
  }
  if (formatOf(kept) > FORMAT) return [];
  const record = readRecord(kept);
  const { leftBy } = kept as { leftBy?: unknown };
  return record && typeof leftBy === 'string' ? [{ record, writer: leftBy }] : [];
}
