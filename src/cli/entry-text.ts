// The entry of a line as its author wrote it.

import type { Line, Span } from '../language/index.ts';

/** What stands at `span` of the line, without the blanks around. */
export function entryText(line: Line, span: Span): string {
  return line.text.slice(span.start, span.end).trim();
}
