// What the head says about the sheet.

import { inputTally } from '../../record/index.ts';
import type { Sheet } from '../../sheet/index.ts';
import { inputWords } from './keep-words.ts';

interface SheetFacts {
  readonly title: string;
  /** `rev B · draft · 13 inputs: 2 assumed`. */
  readonly words: string;
}

/** Title and facts of a sheet. */
export function factsOf(sheet: Sheet): SheetFacts {
  const { tree } = sheet;
  const field = (name: string): string => {
    const found = tree.title?.fields.find(({ label }) => label[0]?.name === name);
    return found?.body.type === 'text' ? found.body.text.trim() : '';
  };
  const { inputs, assumed, unsourced } = inputTally(sheet);
  const revision = field('revision');
  const parts = [revision && `rev ${revision}`, field('status'), inputWords(inputs, assumed, unsourced)];
  return { title: tree.title?.text || 'Sheet without a title', words: parts.filter((part) => part !== '').join(' · ') };
}
