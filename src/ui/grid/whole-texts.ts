// Which long texts show all of their lines; kept as long as the page is open.

import { createSignal } from 'solid-js';
import type { Column } from '../desk/index.ts';

export interface WholeTexts {
  has(key: string, column: Column): boolean;
  toggle(key: string, column: Column): void;
}

/** Creates the memory of a grid. */
export function createWholeTexts(): WholeTexts {
  const [open, setOpen] = createSignal<ReadonlySet<string>>(new Set());
  const idOf = (key: string, column: Column): string => `${column} ${key}`;
  return {
    has: (key, column) => open().has(idOf(key, column)),
    toggle(key, column) {
      const id = idOf(key, column);
      setOpen((present) => {
        const next = new Set(present);
        if (!next.delete(id)) next.add(id);
        return next;
      });
    },
  };
}
