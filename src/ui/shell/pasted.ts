// The state of the dialog that takes rows from a spreadsheet: the pasted text, what was read of it, and the lines it makes.

import { createMemo, createSignal } from 'solid-js';
import { isCellName, parseSheet, pastedBench, readPastedRows } from '../../language/index.ts';
import type { SheetView } from '../../sheet/index.ts';

/** Rows shown of a long table. */
const SHOWN = 8;
/** Faults listed at once. */
const LISTED = 5;

/** Creates the state; `name` is the one that the bench gets unless another is typed. */
export function createPasted(sheet: SheetView, freeName: string) {
  const [text, setText] = createSignal('');
  const [name, setName] = createSignal(freeName);
  const [drainVoltage, setDrainVoltage] = createSignal('');
  const [decimal, setDecimal] = createSignal<'comma' | 'point'>('comma');
  const table = createMemo(() => readPastedRows(text(), { decimal: decimal() }));
  const isEmpty = (): boolean => text().trim() === '';
  const lines = (): string[] => {
    const asked = table().lacksDrainVoltage ? drainVoltage().trim() : '';
    return pastedBench(name().trim(), table(), asked === '' ? null : asked);
  };
  const fault = createMemo<string | null>(() => {
    if (isEmpty()) return 'Paste the rows first.';
    const { faults, rows, lacksDrainVoltage } = table();
    if (faults.length > 0) return 'The table cannot be read yet: see what is listed above.';
    if (rows.length === 0) return 'The table has headings and no rows yet.';
    if (!isCellName(name().trim())) return `${name().trim() || 'An empty name'} cannot name a cell.`;
    if (sheet.tree.cells.some((cell) => cell.name.name === name().trim()))
      return `${name().trim()} already stands in the sheet. Choose another name.`;
    if (lacksDrainVoltage && drainVoltage().trim() === '')
      return 'No column is V_DS: write at which one all rows were measured.';
    return brokenField(lines());
  });
  return {
    text,
    setText,
    name,
    setName,
    drainVoltage,
    setDrainVoltage,
    decimal,
    setDecimal,
    table,
    isEmpty,
    lines,
    /** Why the rows cannot be put in, as a sentence; null where they can. */
    fault,
    shown: () => table().rows.slice(0, SHOWN),
    /** What of the table is not shown. */
    beyond: () => Math.max(0, table().rows.length - SHOWN),
    faults: () => table().faults.slice(0, LISTED),
    moreFaults: () => Math.max(0, table().faults.length - LISTED),
    /** What was read, in a sentence. */
    summary(): string {
      const { rows, columns, faults } = table();
      if (isEmpty() || columns.length === 0) return '';
      const named = columns.findIndex(({ unit }) => unit === null);
      const specimens = new Set(rows.map((row) => row[named])).size;
      const said = [counted(rows.length, 'row')];
      if (named >= 0) said.push(counted(specimens, 'specimen'));
      if (faults.length > 0)
        said.push(counted(faults.length, 'place that cannot be read', 'places that cannot be read'));
      return `${said.join(', ')}.`;
    },
  };
}

export type Pasted = ReturnType<typeof createPasted>;

/** What is wrong with a field of the lines, such as a V_DS that is no voltage. */
function brokenField(lines: readonly string[]): string | null {
  const [cell] = parseSheet(lines.join('\n')).cells;
  const broken = cell?.fields.find(({ body }) => body.type === 'broken')?.body;
  return broken?.type === 'broken' ? broken.message.text : null;
}

function counted(n: number, one: string, several = `${one}s`): string {
  return `${n} ${n === 1 ? one : several}`;
}
