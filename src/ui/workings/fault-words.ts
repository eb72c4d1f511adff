// Where a fault stands, in words.

import { lineColumn } from '../../language/index.ts';
import type { CellReading, SheetView } from '../../sheet/index.ts';

interface FaultWords {
  /** `line 12, column 8`. */
  readonly place: string;
  readonly text: string;
}

/** The fault of a cell that is its own; null where it has none or only waits for another. */
export function faultWords({ fault, waitsFor }: CellReading, sheet: SheetView): FaultWords | null {
  if (fault === null || waitsFor !== null) return null;
  const line = sheet.tree.lines[fault.line];
  const column = line ? `, column ${lineColumn(line, fault.span.start)}` : '';
  return { place: `line ${fault.line + 1}${column}`, text: fault.text };
}
