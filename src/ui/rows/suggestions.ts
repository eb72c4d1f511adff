// What can be written at a place: names and values with what they are now, functions, units, kinds of cell, sources.

import { dimensionName, isUnitFault, parseUnit } from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import type { SheetTree } from '../../language/index.ts';
import { shownCell, shownReading } from '../../record/index.ts';
import { FUNCTIONS, PART_FIELDS } from '../../sheet/index.ts';
import type { CellReading, SheetView } from '../../sheet/index.ts';

export interface Suggestion {
  /** What is put in place of the token. */
  readonly text: string;
  readonly label: string;
  /** Present value; empty where it has none. */
  readonly value: string;
  readonly meaning: string;
  readonly kind: ValueKind | null;
}

/** Names of cells and, for blocks, the values they offer (`A1.I_D`), but nothing of `except`. */
export function nameSuggestions(sheet: SheetView, except: string | null): Suggestion[] {
  return sheet.cells().flatMap((cell) => {
    if (cell.name === except || cell.kind === 'plot' || cell.kind === 'broken') return [];
    return [ownSuggestion(cell), ...valueSuggestions(cell)];
  });
}

/** The values of a block, under their whole path. */
function valueSuggestions(cell: CellReading): Suggestion[] {
  return cell.values.map((value) => ({
    text: `${cell.name}.${value.name}`,
    label: `${cell.name}.${value.name}`,
    value: shownReading(value) ?? '',
    meaning: value.sentence,
    kind: typeof value.type === 'string' ? null : value.type,
  }));
}

/** Cells of some kinds, by name. */
export function cellSuggestions(sheet: SheetView, kinds: readonly CellReading['kind'][]): Suggestion[] {
  return sheet
    .cells()
    .filter((cell) => kinds.includes(cell.kind))
    .map(ownSuggestion);
}

/** Every function, with an opening parenthesis. */
export function functionSuggestions(): Suggestion[] {
  return [...FUNCTIONS].map(([name, { form, sentence }]) => ({
    text: `${name}(`,
    label: form,
    value: '',
    meaning: sentence,
    kind: null,
  }));
}

const UNITS = (
  'V mV uV kV A mA uA nA pA ohm kohm Mohm mohm F uF nF pF H mH uH S mS uS W mW uW Hz kHz MHz s ms us K degC % ppm dB ' +
  '/V mA/V^2 uA/V^2 K/W mV/K nV/√Hz'
).split(' ');

/** The common units, those of `kind` first. */
export function unitSuggestions(): Suggestion[] {
  return UNITS.flatMap((text) => {
    const unit = parseUnit(text);
    if (isUnitFault(unit)) return [];
    return [{ text, label: text, value: unit.symbol, meaning: dimensionName(unit.kind), kind: unit.kind }];
  });
}

const KINDS: readonly (readonly [text: string, meaning: string])[] = [
  ['n-JFET', 'a part: n-channel junction FET; its data-sheet rows follow'],
  ['p-JFET', 'a part: p-channel junction FET; its data-sheet rows follow'],
  ['n-MOSFET', 'a part: n-channel MOSFET; its data-sheet rows follow'],
  ['p-MOSFET', 'a part: p-channel MOSFET; its data-sheet rows follow'],
  ['stage of ', 'FETs with what hangs on their terminals; places and legs follow'],
  ['point of ', 'one specimen at given terminal voltages or current'],
  ['check ', 'a value and the limit it must keep'],
  ['another ', 'a further piece of the same kind'],
  ['plot transfer of ', 'device curve with the bias line'],
  ['plot output of ', 'family of curves with the load line'],
  ['plot bench of ', 'readings with the fitted laws'],
  ['bench', 'measured points of real specimens'],
];

/** What a cell can be. */
export function kindSuggestions(): Suggestion[] {
  return KINDS.map(([text, meaning]) => ({ text, label: text.trim(), value: '', meaning, kind: null }));
}

/** Behind a kind of part. */
export function partSuggestions(): Suggestion[] {
  const meaning = 'takes its law from what the specimens of a bench spread over';
  return [{ text: 'fitted to ', label: 'fitted to', value: '', meaning, kind: null }];
}

/** The sources used so far, those nearest above the line first, then the words that stand for one. */
export function sourceSuggestions(tree: SheetTree, line: number): Suggestion[] {
  const used = new Set<string>();
  const add = (from: number, to: number): void => {
    for (let index = from; index >= to; index--) {
      const read = tree.lines[index]?.tree;
      if (read && 'source' in read && read.source !== null) used.add(read.source.text);
    }
  };
  add(line - 1, 0);
  add(tree.lines.length - 1, line + 1);
  for (const word of ['same', 'assumed', 'measured']) used.delete(word);
  const words: readonly (readonly [string, string])[] = [
    ['same', 'as the line above'],
    ['assumed', 'to be confirmed'],
    ['measured', 'on the bench'],
  ];
  return [
    ...[...used].map((text) => ({ text, label: text, value: '', meaning: 'used in this sheet', kind: null })),
    ...words.map(([text, meaning]) => ({ text, label: text, value: '', meaning, kind: null })),
  ];
}

/** The lines that a block may have, those it has left out. */
export function fieldSuggestions(cell: CellReading): Suggestion[] {
  const present = new Set(cell.tree.fields.map((field) => field.label.map((part) => part.name).join('.')));
  const { entry } = cell.tree;
  const fields: readonly (readonly [string, string])[] =
    entry.type === 'part'
      ? Object.entries(PART_FIELDS)
          .filter(([, field]) => field.families.includes(entry.family))
          .map(([name, { sentence }]) => [name, sentence] as const)
      : entry.type === 'stage'
        ? STAGE_LINES
        : entry.type === 'point'
          ? POINT_LINES
          : entry.type === 'bench'
            ? BENCH_LINES
            : [];
  return fields
    .filter(([name]) => !present.has(name) || name === 'keep')
    .map(([name, meaning]) => ({ text: `${name}: `, label: name, value: '', meaning, kind: null }));
}

/** What a leg can lead to: the nodes of the stage, its test source, rails. */
export function placeSuggestions(cell: CellReading, sheet: SheetView): Suggestion[] {
  const nodes = cell.tree.fields
    .filter((field) => field.body.type === 'legs')
    .map((field) => field.label.map((part) => part.name).join('.'));
  const words = [...nodes, 'signal', 'load', '0 V'];
  const rails = nameSuggestions(sheet, cell.name).filter(
    ({ kind }) => kind !== null && dimensionName(kind) === 'a voltage',
  );
  return [
    ...[...new Set(words)].map((text) => ({ text, label: text, value: '', meaning: placeMeaning(text), kind: null })),
    ...rails.filter(({ text }) => !text.includes('.')),
  ];
}

const STAGE_LINES: readonly (readonly [string, string])[] = [
  ['gate', 'what hangs on the gate'],
  ['drain', 'what hangs on the drain'],
  ['source', 'what hangs on the source'],
  ['bulk', 'what hangs on the bulk; with the source where it has no line'],
  ['load', 'what hangs outside, at the output'],
  ['output', 'the place where gain is taken'],
  ['driven', 'the resistor that belongs to the test source'],
  ['midband', 'the frequency at which gain is taken exactly'],
];

const POINT_LINES: readonly (readonly [string, string])[] = [
  ['I_D', 'Drain current.'],
  ['V_GS', 'Gate to source voltage.'],
  ['V_DS', 'Drain to source voltage.'],
  ['V_SB', 'Source to bulk voltage, where it is not 0.'],
];

const BENCH_LINES: readonly (readonly [string, string])[] = [
  ['columns', 'what the rows hold: unit, V_GS [V], I_D [mA], V_DS [V]'],
  ['V_DS', 'the drain voltage of all rows, where no column has it'],
  ['lambda', 'taken as it is, not fitted'],
  ['exponent', 'free: fitted beside the square law'],
  ['R_thJA', 'finds readings that heated the specimen'],
  ['keep', 'which specimens count: V_P in -2 V .. -1.2 V'],
  ['match', 'pairs or quads that differ least: pairs at I_D = 1 mA'],
  ['fitting', 'the source resistor of each for a current: I_D = 1 mA'],
];

function placeMeaning(text: string): string {
  return text === 'signal' ? 'the test source' : text === '0 V' ? 'the common rail' : 'a place of this stage';
}

function ownSuggestion(cell: CellReading): Suggestion {
  const { reading, tree } = cell;
  const type = reading?.type;
  const kind = type === undefined || typeof type === 'string' ? null : type;
  const note = tree.note ? `, ${tree.note.text}` : '';
  const meaning = kind ? `${dimensionName(kind)}${note}` : `${cell.kind}${note}`;
  return { text: cell.name, label: cell.name, value: shownCell(cell) ?? '', meaning, kind };
}
