// The lines of a text with their offsets. A line ends with LF, with or without CR before it; the line
// end is no part of its text. A text that ends with a line end has no further, empty line behind it.

export interface RawLine {
  /** UTF-16 offset of its first character. */
  readonly offset: number;
  readonly text: string;
}

/** Splits a text into its lines. */
export function splitLines(text: string): RawLine[] {
  const lines: RawLine[] = [];
  let offset = 0;
  while (offset < text.length) {
    const feed = text.indexOf('\n', offset);
    const next = feed < 0 ? text.length : feed + 1;
    let end = feed < 0 ? text.length : feed;
    if (feed > offset && text.charCodeAt(feed - 1) === 13) end--;
    lines.push({ offset, text: text.slice(offset, end) });
    offset = next;
  }
  return lines;
}
