// Which rows stand in the document: all of them up to a limit, beyond it those near what is seen, and always the one
// that has the focus. Gaps keep the place of the others.

/** Up to so many rows all of them stand in the document, for the browser's find and for readers. */
export const MOST_ROWS = 2000;
/** Height of a row that is not there, in pixels. */
export const ROW_HEIGHT = 26;
/** Rows kept ready above and below what is seen. */
const MARGIN = 60;

/** What is seen of the rows, in pixels from the top of the first. */
export interface Seen {
  readonly top: number;
  readonly height: number;
}

/** A row by its key, or the height of those left out. */
type Item = { readonly key: string } | { readonly gap: number };

/** The items in order; `kept` is the row that must not go. */
export function windowItems(keys: readonly string[], seen: Seen, kept: string | null): Item[] {
  if (keys.length <= MOST_ROWS) return keys.map((key) => ({ key }));
  const first = Math.max(0, Math.floor(seen.top / ROW_HEIGHT) - MARGIN);
  const last = Math.min(keys.length, Math.ceil((seen.top + seen.height) / ROW_HEIGHT) + MARGIN);
  const at = kept === null ? -1 : keys.indexOf(kept);
  const items: Item[] = [];
  const gap = (count: number): void => {
    if (count > 0) items.push({ gap: count * ROW_HEIGHT });
  };
  if (at >= 0 && at < first) {
    gap(at);
    items.push({ key: keys[at]! });
    gap(first - at - 1);
  } else gap(first);
  for (let index = first; index < last; index++) items.push({ key: keys[index]! });
  if (at >= last) {
    gap(at - last);
    items.push({ key: keys[at]! });
    gap(keys.length - at - 1);
  } else gap(keys.length - last);
  return items;
}

/** Items as texts, so that those that stay are the same: a key behind `row `, a height behind `gap `. */
export function itemText(item: Item, place: number): string {
  return 'key' in item ? `row ${item.key}` : `gap ${place} ${item.gap}`;
}

/** The item that a text stands for. */
export function itemOf(text: string): Item {
  const [kind, , height] = text.split(' ');
  return kind === 'row' ? { key: text.slice(4) } : { gap: Number(height) };
}
