// How much of a text that is cut behind its first lines does not show.

/** Lines that are cut off, from the heights of the whole text, of what shows, and of a line; all in pixels. */
export function hiddenLines(whole: number, shown: number, line: number): number {
  return line > 0 ? Math.max(0, Math.round((whole - shown) / line)) : 0;
}
