// The verdict: what the whole sheet comes to, in a sentence and as names to go to. Broken cells come
// first, then failing checks; a sheet with either is never called good.

import type { CellReading, Sheet } from '../sheet/index.ts';
import { checkText } from './check-text.ts';

export interface Verdict {
  /** `incomplete`: something is broken or has no value, whatever the checks say. */
  readonly state: 'incomplete' | 'fails' | 'holds' | 'nothing required';
  readonly sentence: string;
  /** Names of the cells that are broken, and `line N` for lines that belong to no cell, in sheet order. */
  readonly broken: readonly string[];
  /** Names of the cells that wait for another one or are not computed. */
  readonly waiting: readonly string[];
  /** Checks that fail, in sheet order. */
  readonly failing: readonly CellReading[];
  readonly checks: number;
}

/** Codes of faults that are not the author's: another cell keeps this one from having a value, or nothing computes it yet. */
const UNCOMPUTED: ReadonlySet<string> = new Set(['waits-for', 'not-computed-yet']);
/** Names listed before the rest is counted. */
const MOST_NAMES = 3;

/** What the sheet comes to at its nominal values. */
export function verdictOf(sheet: Sheet): Verdict {
  const cells = sheet.cells();
  const checks = cells.filter((cell) => cell.kind === 'check');
  const failing = checks.filter((cell) => cell.check?.holds === false);
  const holding = checks.filter((cell) => cell.check?.holds === true).length;
  const isBroken = (cell: CellReading): boolean => cell.fault !== null && !UNCOMPUTED.has(cell.fault.code);
  const broken = [
    ...cells.filter(isBroken).map((cell) => ({ line: cell.tree.line.index, name: cell.name })),
    ...sheet.loose().map((fault) => ({ line: fault.line, name: `line ${fault.line + 1}` })),
  ]
    .toSorted((a, b) => a.line - b.line)
    .map(({ name }) => name);
  const waiting = cells.filter((cell) => lacksValue(cell) && !isBroken(cell)).map((cell) => cell.name);

  const sentences: string[] = [];
  if (broken.length > 0) {
    sentences.push(`${broken.length === 1 ? '1 cell is' : `${broken.length} cells are`} broken: ${list(broken)}.`);
  }
  if (waiting.length > 0) {
    sentences.push(
      `${waiting.length === 1 ? '1 cell has' : `${waiting.length} cells have`} no value: ${list(waiting)}.`,
    );
  }
  if (checks.length === 0) {
    sentences.push('Nothing is required of this sheet yet.');
  } else if (holding === checks.length) {
    const which = holding === 1 ? `The only check, ${checks[0]!.name}, holds` : `All ${holding} checks hold`;
    sentences.push(`${which} at the nominal values.`);
  } else {
    sentences.push(`${holding} of ${checks.length} checks ${holding === 1 ? 'holds' : 'hold'} at the nominal values.`);
    if (failing.length > 0) sentences.push(`${failing[0]!.name} ${checkText(failing[0]!)}.`);
  }
  const incomplete = broken.length + waiting.length > 0;
  const state = failing.length > 0 ? 'fails' : checks.length === 0 ? 'nothing required' : 'holds';
  return {
    state: incomplete ? 'incomplete' : state,
    sentence: sentences.join(' '),
    broken,
    waiting,
    failing,
    checks: checks.length,
  };
}

/** Whether a cell that should have a value, or offer some, has none: broken, waiting, or not computed. */
function lacksValue(cell: CellReading): boolean {
  if (cell.fault !== null || cell.waitsFor !== null) return true;
  if (cell.kind === 'check') return cell.check === null;
  if (cell.kind === 'quantity' || cell.kind === 'inverse') return cell.reading === null || cell.reading.value === null;
  return cell.values.length > 0 && cell.values.every(({ value }) => value === null);
}

function list(names: readonly string[]): string {
  if (names.length <= MOST_NAMES) return names.join(', ');
  return `${names.slice(0, MOST_NAMES).join(', ')} and ${names.length - MOST_NAMES} more`;
}
