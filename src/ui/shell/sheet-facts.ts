// What the head says about the sheet.

import type { SheetTree, Source } from '../../language/index.ts';
import type { CellReading } from '../../sheet/index.ts';
import { inputWords } from './keep-words.ts';

export interface SheetFacts {
  readonly title: string;
  /** `rev B · draft · 13 inputs: 2 assumed`. */
  readonly words: string;
}

/** Title and facts of a sheet. */
export function factsOf(tree: SheetTree, cells: readonly CellReading[]): SheetFacts {
  const field = (name: string): string => {
    const found = tree.title?.fields.find(({ label }) => label[0]?.name === name);
    return found?.body.type === 'text' ? found.body.text.trim() : '';
  };
  const sources: (Source | null)[] = [];
  for (const { isInput, tree: cell, fields } of cells) {
    if (isInput) sources.push(cell.source);
    for (const reading of fields) {
      const written = cell.fields.find(({ line }) => line.index === reading.line);
      if (reading.isInput && written && cell.entry.type === 'part') sources.push(written.source);
    }
  }
  const assumed = sources.filter((source) => source?.text.trim() === 'assumed').length;
  const unsourced = sources.filter((source) => source === null).length;
  const revision = field('revision');
  const parts = [revision && `rev ${revision}`, field('status'), inputWords(sources.length, assumed, unsourced)];
  return { title: tree.title?.text || 'Sheet without a title', words: parts.filter((part) => part !== '').join(' · ') };
}
