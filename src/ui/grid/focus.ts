// From cells of the grid to elements and back.

import { COLUMNS } from '../desk/index.ts';
import type { Column } from '../desk/index.ts';

/** How long the ring around a row that was jumped to stays, in milliseconds. */
const RING = 600;

/** The row that an element inside the grid belongs to, and the column where it is in one. */
export function rowAt(target: EventTarget | null): { key: string; column: Column | null } | null {
  if (!(target instanceof Element)) return null;
  const key = target.closest<HTMLElement>('[data-key]')?.dataset['key'];
  const written = target.closest<HTMLElement>('[data-column]')?.dataset['column'];
  return key === undefined ? null : { key, column: COLUMNS.find((each) => each === written) ?? null };
}

/** The row and column that an element inside the grid belongs to. */
export function cellAt(target: EventTarget | null): { key: string; column: Column } | null {
  const place = rowAt(target);
  return place && place.column !== null ? { key: place.key, column: place.column } : null;
}

/** The element of a cell. */
function elementOf(table: HTMLElement, key: string, column: Column): HTMLElement | null {
  return table.querySelector<HTMLElement>(`[data-key="${CSS.escape(key)}"] [data-column="${column}"]`);
}

/** Moves the browser's focus to cells of this table. */
export function createFocus(table: HTMLElement): (key: string, column: Column, jump: boolean) => void {
  return (key, column, jump) => {
    const cell = elementOf(table, key, column);
    if (!cell) return;
    if (document.activeElement !== cell) cell.focus({ preventScroll: true });
    cell.scrollIntoView({ block: jump ? 'center' : 'nearest', inline: 'nearest' });
    if (!jump) return;
    const row = cell.closest('.row');
    row?.classList.add('row-jumped');
    setTimeout(() => row?.classList.remove('row-jumped'), RING);
  };
}
