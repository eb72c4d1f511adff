// Sentences for showing: names with `_` and paths are typeset, the rest stays text.

import { texOfPath } from './tex-name.ts';

/** A stretch of a sentence: text as it stands, or a name to be set as TeX (with its plain spelling). */
export type ProsePart =
  | { readonly type: 'text'; readonly text: string }
  | { readonly type: 'name'; readonly text: string; readonly tex: string };

/** Function names such as E24_up are words. */
const NAME = /(?<![\w.])(?!E\d+_)(?:[A-Za-z][A-Za-z0-9]*\.)*[A-Za-z][A-Za-z0-9]*_\w*/g;

/** The sentence in parts; every name with `_` in it is a part of its own. */
export function proseParts(sentence: string, subject: string | null): readonly ProsePart[] {
  const parts: ProsePart[] = [];
  let end = 0;
  for (const match of sentence.matchAll(NAME)) {
    if (match.index > end) parts.push({ type: 'text', text: sentence.slice(end, match.index) });
    parts.push({ type: 'name', text: match[0], tex: texOfPath(match[0].split('.'), subject) });
    end = match.index + match[0].length;
  }
  if (end < sentence.length) parts.push({ type: 'text', text: sentence.slice(end) });
  return parts;
}
