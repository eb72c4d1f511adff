// The verdict: what the whole sheet comes to, in a sentence and as names to go to. Broken cells come
// first, then failing checks; a sheet with either is never called good.

import type { CellReading, Sheet } from '../sheet/index.ts';
import type { SheetSpread } from '../spread/index.ts';
import { checkText, checkUnit, reserveText } from './check-text.ts';
import { declaredSentences } from './declared-text.ts';
import { whereText } from './where-text.ts';
import { countText, shareText, yieldText } from './yield-text.ts';

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

/** The spread of a sheet, and the share of builds that is enough where the share is what counts. */
export interface JudgedSpread {
  readonly spread: SheetSpread;
  /** null: a check must hold at every extreme. */
  readonly leastYield: number | null;
}

/** What the sheet comes to: at its nominal values, and with its spread where that is known. */
export function verdictOf(sheet: Sheet, judged: JudgedSpread | null = null): Verdict {
  const cells = sheet.cells();
  const checks = cells.filter((cell) => cell.kind === 'check');
  const failing = checks.filter((cell) => failsCheck(cell, judged));
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
  if (judged?.spread.report.isEmpty) sentences.push(...declaredSentences(judged.spread));
  sentences.push(...checkSentences(checks, failing, judged));
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

/** Whether a check counts as failing: at the nominal values, at an extreme or undecided there, or in too many builds. */
export function failsCheck(cell: CellReading, judged: JudgedSpread | null): boolean {
  if (cell.check === null) return false;
  const spread = judged?.spread.check(cell.name) ?? null;
  if (spread === null) return !cell.check.holds;
  const { leastYield } = judged!;
  if (leastYield !== null) return spread.yield === null ? spread.holds !== true : spread.yield.share < leastYield;
  return !cell.check.holds || spread.holds !== true;
}

function checkSentences(
  checks: readonly CellReading[],
  failing: readonly CellReading[],
  judged: JudgedSpread | null,
): string[] {
  if (checks.length === 0) return ['Nothing is required of this sheet yet.'];
  const holding = checks.filter((cell) => cell.check !== null).length - failing.length;
  const where = whereHeld(judged);
  const all = judged?.spread.report.all ?? null;
  const builds = all ? ` ${sentenceCase(yieldText(all))} hold ${checks.length === 1 ? 'it' : 'them'}.` : '';
  if (holding === checks.length) {
    const which = holding === 1 ? `The only check, ${checks[0]!.name}, holds` : `All ${holding} checks hold`;
    return [`${which} ${where}.${builds}`];
  }
  const first = failing[0];
  return [
    `${holding} of ${checks.length} checks ${holding === 1 ? 'holds' : 'hold'} ${where}.`,
    ...(first ? [`${first.name} ${failingText(first, judged)}.`] : []),
    ...(all && judged?.spread.report.checks.length === checks.length
      ? [`${sentenceCase(yieldText(all))} hold all of them.`]
      : []),
  ];
}

function whereHeld(judged: JudgedSpread | null): string {
  if (judged === null) return 'at the nominal values';
  return judged.leastYield === null ? 'at every extreme' : `in at least ${shareText(judged.leastYield)} of the builds`;
}

/** What is wrong with a failing check, said behind its name. */
export function failingText(cell: CellReading, judged: JudgedSpread | null): string {
  const spread = judged?.spread.check(cell.name) ?? null;
  if (spread === null || cell.check === null || !cell.check.holds) return checkText(cell);
  if (judged!.leastYield !== null && spread.yield) return `holds in only ${yieldText(spread.yield)}`;
  if (spread.holds === null) return `is undecided: ${openText(spread.open)}`;
  const { reserve } = spread;
  const short =
    reserve?.value === null || reserve === null || cell.check.reserveType === null
      ? 'fails'
      : `is ${reserveText(reserve.value, cell.check.reserveType, checkUnit(cell))}`;
  const place = whereText(judged!.spread, spread.failsAt ?? []);
  const reached = spread.yield?.share === 1 ? `, which none of ${countText(spread.yield.n)} builds reached` : '';
  const needed = spread.trackingNeeded;
  const tracking = needed
    ? `; with a tracking of ${needed.part} of ${trackingText(needed.tracking)} it would hold`
    : '';
  return `holds nominally but ${short} at an extreme${place === '' ? '' : ` (${place})`}${reached}${tracking}`;
}

function trackingText(tracking: number): string {
  const text = Math.abs(tracking).toFixed(2).replace(/0$/, '');
  return tracking < 0 ? `−${text} or below` : `${text} or more`;
}

function openText(open: readonly string[]): string {
  return open.length === 0 ? 'some builds of it could not be computed' : `${list(open)} has an open end`;
}

function sentenceCase(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
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
