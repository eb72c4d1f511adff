// The record as a tree of plain nodes: what is printed and in which order, nothing of how it looks. Texts are as
// they are read, unescaped; formulas are TeX beside the same in the language of the sheet.

import type { Run } from '../figure/index.ts';

/** A piece of running text. */
export type Inline =
  | { readonly type: 'text'; readonly text: string }
  | { readonly type: 'strong'; readonly content: Inlines }
  /** A name or path as the trade sets it; `text` is its spelling in the sheet. */
  | { readonly type: 'name'; readonly text: string; readonly runs: readonly Run[] }
  /** Text of the sheet as its author typed it. */
  | { readonly type: 'entry'; readonly text: string }
  | { readonly type: 'formula'; readonly tex: string; readonly text: string }
  /** Room to write in by hand. */
  | { readonly type: 'blank' };

export type Inlines = readonly Inline[];

/** How a column is aligned: `number` cells hold a number and its unit. */
type ColumnKind = 'text' | 'number' | 'right';

interface TableColumn {
  readonly title: string;
  /** The title with its names typeset, where it has some. */
  readonly head?: Inlines;
  readonly kind: ColumnKind;
}

export interface Cell {
  readonly content: Inlines;
  /** Of a `number` cell: what stands behind the number, in a line of its own from row to row. */
  readonly unit?: string;
}

export interface TableRow {
  readonly cells: readonly Cell[];
  readonly mark: Mark | null;
}

/** What stands in front of a row or paragraph: a verdict, or a box to be ticked by hand. */
export type Mark = 'holds' | 'fails' | 'unknown' | 'box';

export interface Step {
  /** `5.3.12`. */
  readonly number: string;
  readonly sentence: Inlines;
  /** Formula, numbers in place, result: each side of the equation; of a condition the verdict comes last. */
  readonly sides: readonly { readonly tex: string; readonly text: string; readonly sign: '' | '=' | ':' }[];
  /** The printed numbers give the printed result. */
  readonly agrees: boolean;
}

export interface Person {
  readonly role: string;
  readonly name: Inlines;
  readonly date: Inlines;
}

export type Block =
  | { readonly type: 'heading'; readonly number: string; readonly content: Inlines; readonly remark: string }
  | { readonly type: 'paragraph'; readonly tone: 'plain' | 'prose' | 'remark'; readonly content: Inlines }
  | { readonly type: 'verdict'; readonly mark: Mark; readonly content: Inlines }
  | { readonly type: 'list'; readonly mark: 'box' | 'dot'; readonly items: readonly Inlines[] }
  | {
      readonly type: 'table';
      /** `checks`, `inputs`, `part`, `wiring`: the page gives each its widths. */
      readonly name: string;
      readonly columns: readonly TableColumn[];
      readonly rows: readonly TableRow[];
    }
  /** Names and values in columns, read downwards. */
  | { readonly type: 'values'; readonly values: readonly { readonly name: Inline; readonly value: Cell }[] }
  /** A stage: its drawing and wiring, and beside them what it comes to. */
  | {
      readonly type: 'stage';
      readonly drawing: Figure | null;
      readonly wiring: Block;
      readonly values: Block | null;
    }
  | { readonly type: 'steps'; readonly steps: readonly Step[] }
  | { readonly type: 'figures'; readonly figures: readonly Figure[] }
  | { readonly type: 'sign-off'; readonly people: readonly Person[] }
  /** Lines of the sheet with their numbers from 1. */
  | { readonly type: 'listing'; readonly lines: readonly string[] };

export interface Figure {
  readonly kind: 'schematic' | 'chart';
  readonly svg: string;
  readonly caption: Inlines;
}

export interface Section {
  readonly number: string;
  readonly title: string;
  readonly remark: string;
  readonly blocks: readonly Block[];
}

interface TitleEntry {
  /** The field of the title, as the sheet calls it. */
  readonly field: string;
  readonly label: string;
  readonly content: Inlines;
}

export interface RecordTree {
  readonly title: string;
  /** `revision B, draft`; empty where neither is given. */
  readonly edition: string;
  readonly paper: 'A4' | 'Letter';
  /** Of the sheet text, in hexadecimal. */
  readonly digest: string;
  /** As given by whoever prints; null where it is not said. */
  readonly printedAt: string | null;
  /** Why the record is not one of a finished sheet; null where it is. */
  readonly incomplete: Inlines | null;
  readonly titleBlock: readonly TitleEntry[];
  readonly sections: readonly Section[];
}
