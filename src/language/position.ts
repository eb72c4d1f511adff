// Where a span stands, as people count.

/** The column of a UTF-16 offset in a line, counted in characters from 1. */
export function lineColumn(line: { readonly text: string }, utf16: number): number {
  return Array.from(line.text.slice(0, utf16)).length + 1;
}
