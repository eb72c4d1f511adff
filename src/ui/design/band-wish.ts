// What is wanted of a band: read from the entries of the dialog, with the lines that the sheet still lacks for it.

import { CURRENT, PLAIN, RESISTANCE, sameKind, VOLTAGE } from '../../quantity/index.ts';
import type { SeriesName } from '../../quantity/index.ts';
import { createSheet } from '../../sheet/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import { freeName, supplyOf } from '../rows/index.ts';
import { linesBehind } from './behind.ts';
import { biasRails } from './bias-rails.ts';
import type { BiasRails } from './bias-rails.ts';
import { readEntered } from './entered.ts';

/** The entries as they stand in the dialog. */
export interface BandEntries {
  readonly part: string;
  readonly least: string;
  readonly most: string;
  /** A cell, or an entry for a new one. */
  readonly supply: string;
  /** A cell, an entry for a new one, or nothing: the drain goes straight to its rail. */
  readonly drain: string;
  readonly gate: string;
  readonly series: SeriesName;
  readonly tolerance: string;
  readonly sourceTolerance: string;
  /** Whether the line leaves room for the tolerances of resistors and supply. */
  readonly roomy: boolean;
}

/** The same, read. Numbers are SI, tolerances shares. */
export interface BandWish {
  readonly part: string;
  readonly family: 'JFET' | 'MOSFET';
  readonly rails: BiasRails;
  readonly least: number;
  readonly most: number;
  /** The share by which the supply may be off. */
  readonly supplyOff: number;
  /** What stands between drain and far rail, as written in a leg, and its ohms; null where nothing does. */
  readonly drain: { readonly element: string; readonly ohms: number } | null;
  readonly gateOhms: number;
  readonly series: SeriesName;
  readonly tolerance: { readonly text: string; readonly share: number };
  readonly sourceTolerance: { readonly text: string; readonly share: number };
  readonly roomy: boolean;
  /** Cells of the sheet that all this rests on, as lines, and the new ones. */
  readonly behind: readonly string[];
  readonly added: readonly string[];
  /** Names that are taken: all of the sheet's and those of the new lines. */
  readonly sheet: SheetView;
  readonly taken: ReadonlySet<string>;
}

/** Entries to begin with, after what the sheet has. */
export function firstEntries(sheet: SheetView): BandEntries {
  return {
    part: partNames(sheet)[0] ?? '',
    least: '1 mA',
    most: '2 mA',
    supply: supplyOf(sheet)?.name ?? negativeSupply(sheet) ?? '15 V ± 5 %',
    drain: '',
    gate: '1 Mohm',
    series: 'E24',
    tolerance: '1 %',
    sourceTolerance: '5 %',
    roomy: true,
  };
}

/** An input of some volts below 0 V; null where there is none. */
function negativeSupply(sheet: SheetView): string | null {
  const found = sheet.cells().find(({ isInput, reading }) => {
    if (!isInput || !reading || typeof reading.type === 'string' || typeof reading.value !== 'number') return false;
    return sameKind(reading.type, VOLTAGE) && reading.value <= -LEAST_SUPPLY;
  });
  return found?.name ?? null;
}

/** V. */
const LEAST_SUPPLY = 3;

/** Parts of the sheet that compute. */
export function partNames(sheet: SheetView): string[] {
  return sheet
    .cells()
    .filter((cell) => cell.kind === 'part' && cell.fault === null && cell.waitsFor === null)
    .map(({ name }) => name);
}

/** Reads the entries, or says in a sentence what keeps them from being read. */
export function readWish(sheet: SheetView, entries: BandEntries): BandWish | string {
  const entry = sheet.cell(entries.part)?.tree.entry;
  if (entry?.type !== 'part') return 'The sheet has no part yet. Insert one from its data sheet first.';
  const [least, most, gate] = [
    readEntered(sheet, entries.least, CURRENT, 'The least current'),
    readEntered(sheet, entries.most, CURRENT, 'The largest current'),
    readEntered(sheet, entries.gate, RESISTANCE, 'The resistance at the gate'),
  ];
  for (const each of [least, most, gate]) if ('fault' in each) return each.fault;
  const [low, high, gateOhms] = [valueOf(least), valueOf(most), valueOf(gate)];
  if (!(low > 0)) return 'The least current is larger than 0.';
  if (!(high > low && high < Infinity)) return 'The largest current is larger than the least one.';
  if (!(gateOhms > 0 && gateOhms < Infinity)) return 'The resistance at the gate is larger than 0.';
  const tolerances = [
    readTolerance(sheet, entries.tolerance, 'The tolerance of the resistors'),
    readTolerance(sheet, entries.sourceTolerance, 'The tolerance of the current source'),
  ];
  for (const each of tolerances) if (typeof each === 'string') return each;
  const [tolerance, sourceTolerance] = tolerances as { text: string; share: number }[];

  const taken = new Set<string>();
  const added: string[] = [];
  const names: string[] = [entries.part];
  const cellOrNew = (text: string, stem: string, spread: string): string => {
    const written = text.trim();
    if (sheet.cell(written)) return (names.push(written), written);
    const name = ownName(sheet, stem, taken);
    taken.add(name);
    added.push(`${name} = ${written}${spread}  [assumed]`);
    return name;
  };
  if (entries.supply.trim() === '') return 'The supply is not given yet.';
  const supply = cellOrNew(entries.supply, 'V_DD', '');
  const bare = /±|\+\/-|\.\.| in /.test(entries.drain) || tolerance!.share === 0;
  const element =
    entries.drain.trim() === '' ? null : cellOrNew(entries.drain, 'R_D', bare ? '' : ` ± ${tolerance!.text}`);
  const behind = linesBehind(sheet, names);
  const trial = createSheet([...behind, ...added].join('\n'));
  const volts = amountOf(trial, supply, VOLTAGE, 'The supply');
  if (typeof volts === 'string') return volts;
  if (volts.value === 0) return 'The supply is 0 V: nothing flows.';
  const ohms = element === null ? null : amountOf(trial, element, RESISTANCE, 'The drain resistor');
  if (typeof ohms === 'string') return ohms;
  if (ohms !== null && !(ohms.value >= 0 && ohms.value < Infinity)) return 'The drain resistor is not negative.';
  return {
    part: entries.part,
    family: entry.family,
    rails: biasRails(entry.channel === 'n' ? 1 : -1, supply, volts.value),
    least: low,
    most: high,
    supplyOff: volts.off,
    drain: element === null ? null : { element, ohms: ohms!.value },
    gateOhms,
    series: entries.series,
    tolerance: tolerance!,
    sourceTolerance: sourceTolerance!,
    roomy: entries.roomy,
    behind,
    added,
    sheet,
    taken,
  };
}

/** The stem itself where no cell bears it, else numbered: `R_S`, `R_S1`. */
export function ownName(sheet: SheetView, stem: string, taken: ReadonlySet<string>): string {
  const isFree = !taken.has(stem) && !sheet.tree.cells.some((cell) => cell.name.name === stem);
  return isFree ? stem : freeName(sheet, stem, taken);
}

function valueOf(entered: ReturnType<typeof readEntered>): number {
  return 'value' in entered ? entered.value : NaN;
}

function readTolerance(sheet: SheetView, text: string, what: string): { text: string; share: number } | string {
  if (text.trim() === '') return { text: '', share: 0 };
  const entered = readEntered(sheet, text, PLAIN, what);
  if ('fault' in entered) return entered.fault;
  if (!(entered.value >= 0 && entered.value < 0.5)) return `${what} lies between 0 and 50 %.`;
  return { text: text.trim(), share: entered.value };
}

/** The nominal value of a cell of the trial sheet and the share by which it may be off. */
function amountOf(
  trial: SheetView,
  name: string,
  kind: typeof VOLTAGE,
  what: string,
): { readonly value: number; readonly off: number } | string {
  const cell = trial.cell(name);
  if (cell?.fault) return cell.fault.text;
  const entered = readEntered(trial, name, kind, what);
  if ('fault' in entered) return entered.fault;
  const { value } = entered;
  const ends = [cell?.spread?.low, cell?.spread?.high].filter((end) => typeof end === 'number');
  return { value, off: Math.max(0, ...ends.map((end) => Math.abs(end / value - 1))) };
}
