// One row of the sheet as it is shown: plain data, made from the text's tree and the engine's readings.
//
// A row holds no place in the document: its line is looked up by its key (`SheetRows.lineOf`), so that an edit
// above leaves the object as it is and nothing is painted again. Offsets in a row count from the start of the text
// that the column shows.

import type { SpreadBar } from '../../figure/index.ts';
import type { Column } from '../desk/index.ts';

type RowType =
  | 'title'
  | 'title-field'
  | 'section'
  | 'prose'
  | 'note'
  | 'cell'
  | 'field'
  | 'wiring'
  | 'value'
  | 'more'
  | 'line'
  | 'bench-row'
  | 'ghost';

/** What is drawn at the left edge. */
export type Mark =
  | 'input'
  | 'assumed'
  | 'no-source'
  | 'computed'
  | 'part'
  | 'stage'
  | 'inverse'
  | 'figure'
  | 'holds'
  | 'fails-at-an-end'
  | 'fails'
  | 'broken';

export interface RowName {
  /** As it stands in the sheet. */
  readonly text: string;
  /** Whether it is a name or path to be set as the trade does; words stand as they are. */
  readonly isName: boolean;
  /** What a reader says: `I_DSS, of part Q1`. */
  readonly said: string;
}

export interface RowEntry {
  readonly text: string;
  /** `input`: the user's own number; `formula`: other sheet text; `words`: said by the sheet, not to be edited. */
  readonly look: 'input' | 'formula' | 'words' | 'prose';
}

export interface Figure {
  readonly number: string;
  readonly unit: string;
  /** `chosen`: the sheet's own, because the author gave none; `edit`: can be typed over here. */
  readonly look: 'plain' | 'edit' | 'chosen' | 'words';
}

export interface RowSource {
  readonly text: string;
  readonly note: string;
  readonly look: 'plain' | 'assumed' | 'missing' | 'ok' | 'fail' | 'words';
}

export interface RowFault {
  readonly text: string;
  /** The column that shows the text concerned, and the part of that text; null where the fault has no place there. */
  readonly at: { readonly column: Column; readonly start: number; readonly end: number } | null;
  /** Counted in characters from 1, for the button that leads there. */
  readonly column: number | null;
}

interface RowFold {
  readonly key: string;
  readonly open: boolean;
}

export interface Row {
  readonly key: string;
  readonly type: RowType;
  /** The cell it belongs to; null for titles, sections, prose and loose lines. */
  readonly cell: string | null;
  /** The offered value it shows. */
  readonly value: string | null;
  /** Inside a block. */
  readonly inside: boolean;
  readonly mark: Mark | null;
  /** The mark in words, read first. */
  readonly markText: string;
  readonly name: RowName | null;
  readonly entry: RowEntry | null;
  readonly low: Figure | null;
  readonly nominal: Figure | null;
  readonly high: Figure | null;
  readonly bar: SpreadBar | null;
  /** Whether its number can be stepped and its tick dragged. */
  readonly turns: boolean;
  readonly source: RowSource | null;
  readonly fault: RowFault | null;
  readonly cautions: readonly string[];
  readonly waitsFor: string | null;
  /** What its columns let the user edit. */
  readonly editable: readonly Column[];
  readonly fold: RowFold | null;
}

/** A row with nothing in it but its key. */
export function emptyRow(key: string, type: RowType): Row {
  return {
    key,
    type,
    cell: null,
    value: null,
    inside: false,
    mark: null,
    markText: '',
    name: null,
    entry: null,
    low: null,
    nominal: null,
    high: null,
    bar: null,
    turns: false,
    source: null,
    fault: null,
    cautions: [],
    waitsFor: null,
    editable: [],
    fold: null,
  };
}

/** What marks mean, in words. */
export const MARK_TEXT: Readonly<Record<Mark, string>> = {
  input: 'input',
  assumed: 'input, assumed',
  'no-source': 'input, no source',
  computed: 'computed',
  part: 'part',
  stage: 'stage',
  inverse: 'inverse',
  figure: 'figure',
  holds: 'holds',
  'fails-at-an-end': 'holds nominally, fails at an end',
  fails: 'fails',
  broken: 'broken',
};
