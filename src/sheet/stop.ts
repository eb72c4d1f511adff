// How checking a cell ends early. Inside this folder a fault of the user is thrown as a `Stop` and
// caught where the cell is compiled; it never leaves the folder.

import type { Line, Message, Span } from '../language/index.ts';

export class Stop extends Error {
  constructor(
    readonly code: string,
    readonly text: string,
    readonly span: Span,
    /** The line it stands in, where that is not the cell's own. */
    readonly line: Line | null,
  ) {
    super(text);
  }
  get fault(): Message {
    return { code: this.code, text: this.text, span: this.span };
  }
}

/** Ends the check of the present cell with a message. */
export function stop(code: string, text: string, span: Span, line: Line | null = null): never {
  throw new Stop(code, text, span, line);
}
