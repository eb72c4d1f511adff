// The state of the dialog that takes the rows of a data sheet: what was typed, the part it makes, and what is wrong with it.

import { createMemo, createSignal } from 'solid-js';
import { createStore } from 'solid-js/store';
import { dataSheetLine, isCellName } from '../../language/index.ts';
import type { DataSheetRow } from '../../language/index.ts';
import { declaredSentences } from '../../record/index.ts';
import { createSheet } from '../../sheet/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import { analyse } from '../../spread/index.ts';
import { freeName } from '../rows/index.ts';
import { printedRows } from './data-sheet-rows.ts';
import type { PartKind } from './data-sheet-rows.ts';

/** Builds that tell what share of specimens the rows leave. */
const BUILDS = 500;

/** Creates the state. */
export function createDataSheet(sheet: SheetView) {
  const [kind, setKind] = createSignal<PartKind>('n-JFET');
  const [name, setName] = createSignal(freeName(sheet, 'Q'));
  const [source, setSource] = createSignal('');
  const [rows, setRows] = createStore<DataSheetRow[]>(blankRows('n-JFET'));
  const written = createMemo(() =>
    rows.map((row) => ({ row, line: dataSheetLine(row, kind().startsWith('n') ? 'n' : 'p') })),
  );
  const faults = createMemo(() =>
    written().flatMap(({ row, line }) =>
      line !== null && typeof line !== 'string' ? [{ field: row.field, ...line }] : [],
    ),
  );
  const lines = createMemo(() => {
    const from = source().trim().replace(/[[\]]/g, '');
    const fields = written().flatMap(({ line }) => (typeof line === 'string' ? [line] : []));
    return [
      `${name().trim()} = ${kind()}`,
      ...fields.map((line, k) => `  ${line}${from === '' ? '' : `  [${k === 0 ? from : 'same'}]`}`),
    ];
  });
  /** The part as it would compute, alone, and what its rows leave of it. */
  const outcome = createMemo(() => {
    if (lines().length === 1 || faults().length > 0) return null;
    const own = isCellName(name().trim()) ? name().trim() : 'Q';
    const alone = createSheet(`${[`${own} = ${kind()}`, ...lines().slice(1)].join('\n')}\n`);
    const part = alone.cell(own)!;
    if (part.fault) return { part, law: null, said: [] };
    const spread = analyse(alone.spreadModel(), { samples: BUILDS, seed: 1 });
    const cautions = part.cautions.map(({ text }) => text);
    return { part, law: alone.part(own), said: [...(spread ? declaredSentences(spread) : []), ...cautions] };
  });
  return {
    kind,
    setKind(next: PartKind): void {
      setKind(next);
      setRows(blankRows(next));
    },
    name,
    setName,
    source,
    setSource,
    rows,
    setRow: (at: number, place: keyof DataSheetRow, text: string): void => setRows(at, { [place]: text }),
    lines,
    faults,
    outcome,
    /** Why no part can be put in, as a sentence; null where one can. */
    fault(): string | null {
      const own = name().trim();
      if (lines().length === 1 && faults().length === 0) return 'Type the numbers of at least one row.';
      if (faults().length > 0) return 'A row cannot be read yet: see what is listed above.';
      if (!isCellName(own)) return `${own || 'An empty name'} cannot name a cell.`;
      if (sheet.tree.cells.some((cell) => cell.name.name === own))
        return `${own} already stands in the sheet. Choose another name.`;
      return outcome()?.part.fault?.text ?? null;
    },
  };
}

function blankRows(kind: PartKind): DataSheetRow[] {
  return printedRows(kind).map((row) => ({ ...row, min: '', typ: '', max: '' }));
}
