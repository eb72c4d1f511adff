// The state of the dialog that takes a model card: the pasted text, the card that is chosen, and the part it makes.

import { createMemo, createSignal } from 'solid-js';
import { cardLines, isCellName, nameOfCard, readModelCards } from '../../language/index.ts';
import { createSheet } from '../../sheet/index.ts';
import type { SheetView } from '../../sheet/index.ts';

/** Creates the state; `freeName` is the name of a part whose card has none that a cell could bear. */
export function createPastedCard(sheet: SheetView, freeName: string) {
  const [text, setText] = createSignal('');
  const [chosen, choose] = createSignal(0);
  const [typedName, setTypedName] = createSignal<string | null>(null);
  const read = createMemo(() => readModelCards(text()));
  const card = createMemo(() => read().cards[chosen()] ?? read().cards[0] ?? null);
  const isTaken = (name: string): boolean => sheet.tree.cells.some((cell) => cell.name.name === name);
  const name = (): string => {
    const typed = typedName();
    if (typed !== null) return typed;
    const found = card();
    const own = found === null ? freeName : nameOfCard(found, freeName);
    return isTaken(own) ? freeName : own;
  };
  const lines = (): string[] => {
    const found = card();
    return found === null ? [] : cardLines(found, name().trim());
  };
  const faults = createMemo(() => [...read().faults, ...(card()?.faults ?? [])]);
  const fault = createMemo<string | null>(() => {
    if (text().trim() === '') return 'Paste a card first.';
    if (faults().length > 0) return 'The card cannot be read yet: see what is listed above.';
    if (card() === null) return 'There is no card in this text.';
    if (!isCellName(name().trim())) return `${name().trim() || 'An empty name'} cannot name a cell.`;
    if (isTaken(name().trim())) return `${name().trim()} already stands in the sheet. Choose another name.`;
    return alone()?.error('Q')?.text ?? null;
  });
  /** A sheet of the part alone, as `Q`. */
  const alone = createMemo<SheetView | null>(() => {
    const found = card();
    if (found === null || faults().length > 0) return null;
    return createSheet(`${cardLines(found, 'Q').join('\n')}\n`);
  });
  return {
    text,
    setText(value: string): void {
      setText(value);
      choose(0);
      setTypedName(null);
    },
    cards: () => read().cards,
    card,
    chosen,
    choose(at: number): void {
      choose(at);
      setTypedName(null);
    },
    name,
    setName: setTypedName,
    lines,
    /** The law of the part as it would compute. */
    law: () => alone()?.part('Q') ?? null,
    faults,
    /** Why no part can be put in, as a sentence; null where it can. */
    fault,
  };
}
