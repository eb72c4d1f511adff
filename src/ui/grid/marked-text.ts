// A text cut at the part that a message speaks of.

/** The text before, in and behind a place; an empty place marks the character at it, or a blank at the end. */
export function markedText(
  text: string,
  at: { readonly start: number; readonly end: number } | null,
): { readonly before: string; readonly marked: string; readonly after: string } {
  if (at === null) return { before: text, marked: '', after: '' };
  const end = Math.max(at.end, at.start + 1);
  const marked = text.slice(at.start, end);
  return { before: text.slice(0, at.start), marked: marked === '' ? '\u00a0\u00a0' : marked, after: text.slice(end) };
}
