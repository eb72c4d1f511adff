// What is said of what builds would have wanted of an inverse cell.

import type { SheetSpread } from '../spread/index.ts';
import { yieldText } from './yield-text.ts';

/** The share of builds with just one answer; nothing of a cell that is no inverse cell, and before builds are counted. */
export function answeredSentence(path: string, { value }: SheetSpread): string | null {
  const answered = value(path)?.answered ?? null;
  if (answered === null) return null;
  const counted = `${path} has just one answer in ${yieldText(answered)}`;
  return answered.share === 1
    ? `${counted}; its ends are those of what each would have wanted.`
    : `${counted}; the others have none or several in the range that is searched, and do not count in its ends.`;
}

/** The sentences on all inverse cells. */
export function answeredSentences(spread: SheetSpread): string[] {
  return spread.report.values.flatMap(({ path }) => answeredSentence(path, spread) ?? []);
}
