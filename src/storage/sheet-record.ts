// A sheet as the shelf keeps it, and what the list of sheets shows of one. What comes from the disk may have been
// written by a newer version of the program, or damaged: it is checked before it is taken for a record.

import { parseSheet } from '../language/index.ts';
import { EMPTY_HISTORY, fits } from './history.ts';
import type { History, HistoryStep } from './history.ts';

/** The form in which this version of the program keeps sheets; a record with a higher one is never touched. */
export const FORMAT = 1;

/** What the page has to keep of a sheet. */
export interface SheetContent {
  readonly text: string;
  readonly history: History;
  /** Names of the rows that are folded. */
  readonly folded: readonly string[];
}
export interface SheetRecord extends SheetContent {
  readonly format: number;
  readonly id: string;
  /** Counts the times it was kept; 0 where it was never kept. */
  readonly revision: number;
  /** The page that kept it. */
  readonly writer: string;
  /** Milliseconds of the epoch: when it was made, when its text was last changed. */
  readonly created: number;
  readonly changed: number;
  /** The sheet of which this is the version of another tab, set aside. */
  readonly asideOf: string | null;
}
/** A line in the list of sheets. */
export interface SheetHead {
  readonly format: number;
  readonly id: string;
  readonly title: string;
  readonly created: number;
  readonly changed: number;
  readonly revision: number;
  readonly asideOf: string | null;
  /** Length of the text in UTF-16 units. */
  readonly length: number;
}

/** The line of the list for a record. */
export function headOf({ format, id, text, created, changed, revision, asideOf }: SheetRecord): SheetHead {
  return { format, id, title: titleOf(text), created, changed, revision, asideOf, length: text.length };
}

/** The title of a sheet by its first heading, or words for a sheet that has none. */
export function titleOf(text: string): string {
  if (text.trim() === '') return 'Empty sheet';
  for (const line of text.split('\n')) {
    if (!/^\uFEFF?# /.test(line)) continue;
    const title = parseSheet(line).title?.text;
    if (title) return title;
  }
  return 'Sheet without a title';
}

/** Format of whatever stands on the disk; one that cannot be read counts as newer. */
export function formatOf(kept: unknown): number {
  return isObject(kept) && typeof kept.format === 'number' ? kept.format : Infinity;
}

/** The record in what stands on the disk, or null where it is damaged; a history that does not fit its text is dropped. */
export function readRecord(kept: unknown): SheetRecord | null {
  if (!isObject(kept) || kept.format !== FORMAT) return null;
  const { id, text, revision, writer, created, changed, asideOf } = kept;
  if (typeof id !== 'string' || typeof text !== 'string' || typeof writer !== 'string') return null;
  if (typeof revision !== 'number' || typeof created !== 'number' || typeof changed !== 'number') return null;
  const history = readHistory(kept.history);
  return {
    format: FORMAT,
    id,
    text,
    history: history && fits(text, history) ? history : EMPTY_HISTORY,
    folded: isArrayOf(kept.folded, isString) ? kept.folded : [],
    revision,
    writer,
    created,
    changed,
    asideOf: typeof asideOf === 'string' ? asideOf : null,
  };
}

/** The line of the list in what stands on the disk; of a newer one, what can be made out. */
export function readHead(kept: unknown): SheetHead | null {
  if (!isObject(kept) || typeof kept.id !== 'string') return null;
  const { id, title, created, changed, revision, asideOf, length } = kept;
  return {
    format: formatOf(kept),
    id,
    title: typeof title === 'string' ? title : 'Sheet of a newer version',
    created: typeof created === 'number' ? created : 0,
    changed: typeof changed === 'number' ? changed : 0,
    revision: typeof revision === 'number' ? revision : 0,
    asideOf: typeof asideOf === 'string' ? asideOf : null,
    length: typeof length === 'number' ? length : 0,
  };
}

function readHistory(kept: unknown): History | null {
  if (!isObject(kept)) return null;
  const { undo, redo } = kept;
  return isArrayOf(undo, isStep) && isArrayOf(redo, isStep) ? { undo, redo } : null;
}

function isStep(kept: unknown): kept is HistoryStep {
  return (
    isObject(kept) &&
    typeof kept.label === 'string' &&
    isArrayOf(
      kept.splices,
      (splice): splice is HistoryStep['splices'][number] =>
        isObject(splice) &&
        Number.isInteger(splice.start) &&
        Number.isInteger(splice.end) &&
        typeof splice.text === 'string',
    )
  );
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}

function isString(value: unknown): value is string {
  return typeof value === 'string';
}

function isArrayOf<T>(value: unknown, isItem: (item: unknown) => item is T): value is readonly T[] {
  return Array.isArray(value) && value.every(isItem);
}
