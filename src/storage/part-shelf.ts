// The user's own parts, kept beside the sheets: each the lines of a part as a sheet writes them.
//
// Every part is a record of its own, so that two tabs that keep parts at the same moment lose none.

import { promisifyRequest } from 'idb-keyval';
import type { UseStore } from 'idb-keyval';
import { parseSheet } from '../language/index.ts';
import { shelfFault } from './sentences.ts';
import type { StorageFault } from './sentences.ts';
import { failureOf, transact } from './store.ts';

/** A part as it is kept. */
export interface KeptPart {
  readonly id: string;
  /** Its lines: `Q1 = n-JFET` and its rows, without a line end behind the last. */
  readonly text: string;
  /** When, in milliseconds of the epoch. */
  readonly kept: number;
}

/** A part with what its first line says. */
export interface ShownPart extends KeptPart {
  readonly name: string;
  /** `n-JFET`, .. */
  readonly kind: string;
}

type Parts = { readonly parts: readonly ShownPart[] } | { readonly fault: StorageFault };
type Done = { readonly part: KeptPart } | { readonly fault: StorageFault };

export interface PartShelf {
  /** All parts by name, those of one name by time. */
  list(): Promise<Parts>;
  /** Keeps a new part. */
  keep(text: string): Promise<Done>;
  /** Puts a part in the place of its earlier form, or back. */
  put(part: KeptPart): Promise<Done>;
  remove(id: string): Promise<{ readonly removed: true } | { readonly fault: StorageFault }>;
}

const FORMAT = 1;

/** The parts in `store`. */
export function createPartShelf({
  store,
  now,
  newId,
}: {
  readonly store: UseStore;
  readonly now: () => number;
  readonly newId: () => string;
}): PartShelf {
  const put: PartShelf['put'] = async (part) => {
    try {
      await transact(store, 'readwrite', (objects) => {
        objects.put({ format: FORMAT, ...part }, partKey(part.id));
        return promisifyRequest<void>(objects.transaction);
      });
      return { part };
    } catch (thrown) {
      return { fault: shelfFault(failureOf(thrown), 'Room for the part') };
    }
  };
  return {
    put,
    keep: (text) => put({ id: newId(), text, kept: now() }),
    async list() {
      try {
        const kept = await transact(store, 'readonly', (objects) =>
          promisifyRequest<unknown[]>(objects.getAll(allParts())),
        );
        const parts = kept.map(readPart).filter((part) => part !== null);
        return { parts: parts.toSorted((a, b) => a.name.localeCompare(b.name, 'en') || a.kept - b.kept) };
      } catch (thrown) {
        return { fault: shelfFault(failureOf(thrown), 'The list of parts') };
      }
    },
    async remove(id) {
      try {
        await transact(store, 'readwrite', (objects) => {
          objects.delete(partKey(id));
          return promisifyRequest<void>(objects.transaction);
        });
        return { removed: true };
      } catch (thrown) {
        return { fault: shelfFault(failureOf(thrown), 'Room') };
      }
    },
  };
}

/** What can be read of a record; null of one that is damaged or of a newer version, which stays where it is. */
function readPart(kept: unknown): ShownPart | null {
  if (typeof kept !== 'object' || kept === null) return null;
  const { format, id, text, kept: at } = kept as Record<string, unknown>;
  if (format !== FORMAT || typeof id !== 'string' || typeof text !== 'string' || typeof at !== 'number') return null;
  const [cell] = parseSheet(text).cells;
  if (cell?.entry.type !== 'part') return null;
  return { id, text, kept: at, name: cell.name.name, kind: `${cell.entry.channel}-${cell.entry.family}` };
}

const partKey = (id: string) => ['part', id];
/** An array sorts behind every string. */
const allParts = () => IDBKeyRange.bound(['part'], ['part', []]);
