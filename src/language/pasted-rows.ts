// Rows pasted from a spreadsheet, read as the rows of a bench.
//
// Nothing is guessed in silence: what was decided stands in `notes`, and what cannot be read in `faults`, with
// its line and column in the pasted text. The text of the cell is written only where there is no fault.

import { asciiUnit, isUnitFault, knownUnit, parseUnit } from '../quantity/index.ts';
import type { Unit } from '../quantity/index.ts';
import { decimalMark, pastedCells, withPoint } from './pasted-cells.ts';
import type { PastedLine } from './pasted-cells.ts';
import { pastedColumn, pastedUnit } from './pasted-header.ts';
import type { PastedColumn, PastedQuantity } from './pasted-header.ts';

/** Something in the pasted text that cannot be read; line and column count from 1. */
interface PastedFault {
  readonly line: number;
  readonly column: number;
  readonly text: string;
}

interface PastedTable {
  /** The columns that are kept, as the bench names them. */
  readonly columns: readonly { readonly name: string; readonly unit: string | null }[];
  /** The cells of the kept columns, as they will be written. */
  readonly rows: readonly (readonly string[])[];
  readonly notes: readonly string[];
  readonly faults: readonly PastedFault[];
  /** No column says at which V_DS the rows were measured. */
  readonly lacksDrainVoltage: boolean;
  /** The comma in its numbers may be a decimal mark or stand between thousands. */
  readonly isAmbiguous: boolean;
}

const NUMBER = /^[+-]?\d+(\.\d+)?([eE][+-]?\d+)?$/;
const UNITS = { V_GS: 'V', V_DS: 'V', I_D: 'mA' } as const;

/** Reads a pasted table; `decimal` settles what the comma is where the text leaves it open. */
export function readPastedRows(text: string, { decimal = 'comma' }: { decimal?: 'comma' | 'point' } = {}): PastedTable {
  const { separator, lines } = pastedCells(text);
  const notes: string[] = [];
  const faults: PastedFault[] = [];
  const [head, ...below] = lines;
  if (!head || head.cells.every((cell) => !/[A-Za-zΑ-Ωα-ω]/.test(cell))) {
    const fault = { line: head?.number ?? 1, column: 1, text: HEADLESS };
    return {
      columns: [],
      rows: [],
      notes,
      faults: lines.length > 0 ? [fault] : [],
      lacksDrainVoltage: false,
      isAmbiguous: false,
    };
  }
  const { columns: all, body } = readHead(head, below, faults);
  const kept = keptColumns(all, head, notes, faults);
  const found = decimalMark(body.flatMap(({ cells }) => cells));
  const mark = found === 'either' ? decimal : found;
  if (found === 'either') notes.push(ambiguityText(body, mark));
  else if (found === 'comma') notes.push('The comma is read as a decimal mark.');
  const names = createNames();
  let above = '';
  const rows = body.map((line) => {
    if (line.cells.length > all.length) faults.push(surplus(line, all.length, separator));
    return kept.map(({ index, column }): string => {
      const cell = line.cells[index] ?? '';
      if (column.quantity) return numberIn(cell, column, mark, { line, index }, faults);
      above = cell === '' ? above : cell;
      if (above === '')
        faults.push({
          line: line.number,
          column: index + 1,
          text: `The place of ${column.heading} is empty: it names the specimen.`,
        });
      return names.of(above);
    });
  });
  notes.push(...names.notes());
  const has = (quantity: PastedQuantity): boolean => kept.some(({ column }) => column.quantity === quantity);
  return {
    columns: kept.map(({ column }) => ({
      name: column.quantity ?? specimenColumn(column.heading),
      unit: column.quantity && asciiUnit(unitOf(column)),
    })),
    rows,
    notes,
    faults,
    lacksDrainVoltage: !has('V_DS'),
    isAmbiguous: found === 'either',
  };
}

const HEADLESS = 'The first line names no columns. Put a line above the numbers such as VGS [V], ID [mA], VDS [V].';

/** The lines of a bench cell with these rows; `drainVoltage` as typed where no column has it. */
export function pastedBench(name: string, { columns, rows }: PastedTable, drainVoltage: string | null): string[] {
  const heads = columns.map(({ name: column, unit }) => (unit ? `${column} [${unit}]` : column));
  return [
    `${name} = bench`,
    `  columns: ${heads.join(', ')}`,
    ...(drainVoltage === null ? [] : [`  V_DS: ${drainVoltage}`]),
    ...rows.map((row) => `  ${row.join(', ')}`),
  ];
}

// ---------------------------------------------------------------- the head

function readHead(
  head: PastedLine,
  below: readonly PastedLine[],
  faults: PastedFault[],
): { columns: PastedColumn[]; body: readonly PastedLine[] } {
  const columns = head.cells.map(pastedColumn);
  const [units] = below;
  const isUnits = units?.cells.every((cell) => cell === '' || !isUnitFault(parseUnit(bare(cell)))) ?? false;
  const withUnits = columns.map((column, i) => {
    const unit = isUnits && column.quantity ? pastedUnit(bare(units!.cells[i] ?? ''), column.quantity) : null;
    return { ...column, unit: column.unit ?? unit };
  });
  withUnits.forEach(({ quantity, unit, heading }, i) => {
    if (quantity === 'I_D' && !unit)
      faults.push({
        line: head.number,
        column: i + 1,
        text: `${heading} has no unit of current. Write it in the first line, as in ${heading} [mA].`,
      });
  });
  return { columns: withUnits, body: isUnits ? below.slice(1) : below };
}

function bare(cell: string): string {
  return cell.replace(/^[[(]\s*|\s*[\])]$/g, '');
}

interface Kept {
  readonly index: number;
  readonly column: PastedColumn;
}

function keptColumns(all: readonly PastedColumn[], head: PastedLine, notes: string[], faults: PastedFault[]): Kept[] {
  const kept: Kept[] = [];
  all.forEach((column, index) => {
    const { quantity, unit, heading } = column;
    if (heading === '' && !quantity) return;
    const rival = kept.find((each) => each.column.quantity === quantity);
    if (rival && quantity)
      faults.push({
        line: head.number,
        column: index + 1,
        text: `${heading} is ${quantity}, and so is ${rival.column.heading}. Keep one of the two columns.`,
      });
    else if (rival)
      notes.push(
        `${heading} is left out: a bench has V_GS, I_D, V_DS and one column that names the specimen, which is ${rival.column.heading}.`,
      );
    else kept.push({ index, column });
    if (quantity && quantity !== 'I_D' && !unit) notes.push(`${heading} has no unit and is read in V.`);
  });
  for (const wanted of ['V_GS', 'I_D'] as const) {
    if (kept.some(({ column }) => column.quantity === wanted)) continue;
    const example = wanted === 'V_GS' ? 'VGS [V]' : 'ID [mA]';
    faults.push({
      line: head.number,
      column: 1,
      text: `No column is ${wanted}. Name one in the first line, as in ${example}.`,
    });
  }
  return kept;
}

function unitOf({ unit, quantity }: PastedColumn): Unit {
  return unit ?? knownUnit(UNITS[quantity!]);
}

/** The heading as a name of the language, where it is one. */
function specimenColumn(heading: string): string {
  return /^[A-Za-z][A-Za-z0-9_]*$/.test(heading) ? heading : 'specimen';
}

// ---------------------------------------------------------------- the rows

function numberIn(
  cell: string,
  column: PastedColumn,
  mark: 'comma' | 'point',
  { line, index }: { readonly line: PastedLine; readonly index: number },
  faults: PastedFault[],
): string {
  const place = { line: line.number, column: index + 1 };
  if (cell === '') {
    faults.push({
      ...place,
      text: `The place of ${column.quantity} is empty. Write what was measured there, or take the line out.`,
    });
    return '';
  }
  const number = withPoint(cell, mark);
  if (NUMBER.test(number)) return number.replace(/^\+/, '');
  const [, numeral, unit] = /^([+-]?\d+(?:\.\d+)?(?:[eE][+-]?\d+)?)\s*(\S+)$/.exec(number) ?? [];
  if (numeral && unit && pastedUnit(unit, column.quantity!)) return `${numeral} ${unit}`;
  faults.push({ ...place, text: `${cell} is no number for ${column.quantity}.` });
  return cell;
}

function surplus({ number, cells }: PastedLine, most: number, separator: string): PastedFault {
  const commas = separator === 'comma' && cells.every((cell) => /^[+\-−]?\d*$/.test(cell));
  const text = commas
    ? 'Commas stand here between the numbers and perhaps inside them, which cannot be told apart. Paste the table with tabs or semicolons between its columns.'
    : `This line has ${cells.length} places and the first line names ${most} columns.`;
  return { line: number, column: most + 1, text };
}

function ambiguityText(body: readonly PastedLine[], mark: 'comma' | 'point'): string {
  const example = body.flatMap(({ cells }) => cells).find((cell) => /\d,\d{3}/.test(cell))!;
  const [chosen, other] = mark === 'comma' ? (['comma', 'point'] as const) : (['point', 'comma'] as const);
  return `${example} can be read in two ways: it is taken as ${withPoint(example, chosen)}, not as ${withPoint(example, other)}.`;
}

/** Turns what names specimens into names of the language, each to one of its own. */
function createNames(): { of(label: string): string; notes(): string[] } {
  const given = new Map<string, string>();
  const isTaken = (name: string): boolean => [...given.values()].includes(name);
  return {
    of(label) {
      const present = given.get(label);
      if (present !== undefined || label === '') return present ?? '';
      const plain = label.replace(/[^A-Za-z0-9_]+/g, '_').replace(/^_+|_+$/g, '');
      const wanted = /^\d+$/.test(label) ? label : /^[A-Za-z]/.test(plain) ? plain : `s${plain}`;
      let name = wanted;
      for (let i = 2; isTaken(name); i++) name = `${wanted}_${i}`;
      given.set(label, name);
      return name;
    },
    notes() {
      const changed = [...given].filter(([label, name]) => label !== name);
      if (changed.length === 0) return [];
      const shown = changed.slice(0, 3).map(([label, name]) => `${label} as ${name}`);
      return [`Specimens are written as names: ${shown.join(', ')}${changed.length > 3 ? ' and others' : ''}.`];
    },
  };
}
