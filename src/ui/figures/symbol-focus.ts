// Which symbol of a schematic the keyboard stands on, and what it is called.

import type { Drawing, GroupItem } from '../../figure/index.ts';

/** Symbols that lead to a cell, in drawing order. */
export function linkedGroups({ items }: Drawing): readonly GroupItem[] {
  return items.filter((item): item is GroupItem => item.kind === 'group' && item.cell !== null);
}

/** What tells a symbol from the others of its drawing. */
export function groupKey({ of, leg, cell }: GroupItem): string {
  return leg === null ? `${of}-${cell}` : `${of}-${leg}`;
}

/** What stands beside the symbol, as those see it who speak to the page, then what it is. */
export function symbolLabel({ items, sentence }: GroupItem): string {
  const texts = items.flatMap((item) => (item.kind === 'text' ? [item.runs.map(({ text }) => text).join('')] : []));
  const seen = texts.join(' ');
  return seen === '' || sentence.includes(seen) ? sentence : `${seen}: ${sentence}`;
}

/** The symbol that an arrow key, Home or End leads to; null for other keys and at the ends. */
export function stepTo(key: string, present: string | null, groups: readonly GroupItem[]): string | null {
  const keys = groups.map(groupKey);
  const at = present === null ? -1 : keys.indexOf(present);
  switch (key) {
    case 'ArrowRight':
    case 'ArrowDown':
      return keys[at + 1] ?? null;
    case 'ArrowLeft':
    case 'ArrowUp':
      return keys[at - 1] ?? null;
    case 'Home':
      return keys[0] ?? null;
    case 'End':
      return keys[keys.length - 1] ?? null;
    default:
      return null;
  }
}
