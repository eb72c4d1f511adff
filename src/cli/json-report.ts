// The sheet as one JSON object, for builds and other programs. Numbers are SI; lines and columns count from 1.

import { lineColumn } from '../language/index.ts';
import type { Line } from '../language/index.ts';
import { sha256Hex } from '../numeric/index.ts';
import { siUnitText } from '../quantity/index.ts';
import { checkText, shownCell, shownReading, workingsOf } from '../record/index.ts';
import type { JudgedSpread } from '../record/index.ts';
import type { SheetSpread, StandingDraw } from '../spread/index.ts';
import type { BenchReading, CellKind, CellReading, Fault, Reading, Sheet } from '../sheet/index.ts';
import { entryText } from './entry-text.ts';

interface JsonValue {
  /** In `unit`; a region's word; null where there is none or it is infinite. */
  readonly value: number | string | null;
  /** SI unit, `1` for plain numbers; null for regions, conditions, and where the kind is not known. */
  readonly unit: string | null;
  /** As shown; null where there is no value. */
  readonly text: string | null;
  /** Where anything that spreads moves it. */
  readonly spread?: JsonSpread;
}

interface JsonSpread {
  /** Over the declared set and service; null where an end is open, infinite or could not be computed. */
  readonly low: number | null;
  readonly high: number | null;
  /** Of the builds at the nominal of service; null where the spread is not known. */
  readonly mean: number | null;
  readonly sd: number | null;
  readonly p01: number | null;
  readonly p05: number | null;
  readonly p50: number | null;
  readonly p95: number | null;
  readonly p99: number | null;
  /** The inputs that stand away from their nominal there, SI, by name. */
  readonly low_at: Readonly<Record<string, number>>;
  readonly high_at: Readonly<Record<string, number>>;
  /** Inputs whose missing limit leaves an end open. */
  readonly open: readonly string[];
}

interface JsonFault {
  readonly code: string;
  readonly message: string;
  readonly line: number;
  readonly column: number;
}

interface JsonCell extends JsonValue {
  readonly kind: CellKind;
  readonly line: number;
  /** As written, without name, source and note. */
  readonly entry: string;
  readonly error: JsonFault | null;
  /** Of inverse cells, where the sheet has spread: the share of builds with just one answer. */
  readonly answered?: JsonYield;
  /** Of benches that ask for them: groups that match, and resistors for a current. */
  readonly match?: NonNullable<BenchReading['match']>['groups'];
  readonly fitting?: NonNullable<BenchReading['fitting']>['table'];
  /** Of parts, points, stages and benches, by value name. */
  readonly values?: Readonly<Record<string, JsonValue>>;
}

export interface JsonReport {
  readonly title: string | null;
  /** SHA-256 of the UTF-8 text. */
  readonly digest: string;
  readonly cells: Readonly<Record<string, JsonCell>>;
  /** null where a check is not computed; `reserve` also where it has no number or is infinite. */
  readonly checks: Readonly<Record<string, JsonCheck>>;
  /** Parts with further limits: the share of specimens left, and whether the nominal one is among them; where the sheet has spread. */
  readonly declared?: Readonly<Record<string, { readonly share: number | null; readonly holds_nominal: boolean }>>;
  /** All checks together; where the sheet has spread. */
  readonly yield?: JsonYield | null;
  readonly cautions: readonly { readonly cell: string; readonly line: number; readonly text: string }[];
  readonly workings?: readonly JsonStep[];
}

interface JsonCheck {
  readonly holds: boolean | null;
  readonly reserve: number | null;
  /** The rest where the sheet has spread. Whether it holds everywhere; null where an open end leaves that undecided. */
  readonly holds_at_extremes?: boolean | null;
  readonly least_reserve?: number | null;
  readonly fails_at?: Readonly<Record<string, number>> | null;
  readonly yield?: JsonYield | null;
}

/** A share of builds with its exact interval at 95 %, of sampling alone. */
interface JsonYield {
  readonly share: number;
  readonly low: number;
  readonly high: number;
  readonly n: number;
}

interface JsonStep {
  readonly name: string | null;
  readonly formula: string;
  readonly substitution: string | null;
  readonly result: string;
  readonly sentence: string;
}

/** The report of a computed sheet; `workings` names the cell whose workings it shall hold. */
export function jsonReport(sheet: Sheet, workings: string | null, judged: JudgedSpread | null): JsonReport {
  const spread = judged?.spread ?? null;
  const { tree } = sheet;
  const cells = new Map<string, JsonCell>();
  const checks = new Map<string, JsonCheck>();
  const keyed = sheet
    .cells()
    .map((cell) => ({ line: cell.tree.line.index, name: cell.name, cell: jsonCell(sheet, cell, spread) }));
  const loose = sheet.loose().map((fault) => ({ line: fault.line, name: null, cell: looseCell(sheet, fault) }));
  for (const { line, name, cell } of [...keyed, ...loose].toSorted((a, b) => a.line - b.line)) {
    cells.set(name === null || cells.has(name) ? `line ${line + 1}` : name, cell);
  }
  for (const { name, kind, check } of sheet.cells()) {
    if (kind !== 'check' || checks.has(name)) continue;
    checks.set(name, {
      holds: check?.holds ?? null,
      reserve: finite(check?.reserve ?? null),
      ...checkSpread(name, spread),
    });
  }
  return {
    title: tree.title?.text ?? null,
    digest: sha256Hex(new TextEncoder().encode(tree.text)),
    cells: Object.fromEntries(cells),
    checks: Object.fromEntries(checks),
    ...(spread ? { declared: declaredParts(spread), yield: spread.report.all } : {}),
    cautions: sheet.cautions().map(({ cell, line, text }) => ({ cell, line: line + 1, text })),
    ...(workings === null ? {} : { workings: jsonWorkings(sheet, workings) }),
  };
}

function jsonCell(sheet: Sheet, cell: CellReading, spread: SheetSpread | null): JsonCell {
  const { line } = cell.tree;
  const offers =
    cell.kind === 'part' ||
    cell.kind === 'another' ||
    cell.kind === 'point' ||
    cell.kind === 'stage' ||
    cell.kind === 'bench';
  const bench = sheet.bench(cell.name);
  const own = cell.reading === null ? null : jsonValue(cell.reading, shownCell(cell));
  const text = cell.check === null ? (own?.text ?? null) : checkText(cell);
  return {
    kind: cell.kind,
    line: line.index + 1,
    entry: entryText(line, cell.tree.entry.span),
    value: own?.value ?? null,
    unit: own?.unit ?? null,
    text,
    ...valueSpread(cell.name, spread),
    ...answeredShare(cell.name, spread),
    error: cell.fault === null ? null : jsonFault(sheet.tree.lines, cell.fault),
    ...(bench?.match ? { match: bench.match.groups } : {}),
    ...(bench?.fitting ? { fitting: bench.fitting.table } : {}),
    ...(offers
      ? {
          values: Object.fromEntries(
            cell.values.map((each) => [
              each.name,
              { ...jsonValue(each, shownReading(each)), ...valueSpread(`${cell.name}.${each.name}`, spread) },
            ]),
          ),
        }
      : {}),
  };
}

function valueSpread(path: string, spread: SheetSpread | null): { spread?: JsonSpread } {
  const found = spread?.value(path) ?? null;
  if (!spread || !found || !found.moves || found.isWord) return {};
  const { low, high, distribution } = found;
  const of = (key: 'mean' | 'sd' | 'p01' | 'p05' | 'p50' | 'p95' | 'p99'): number | null =>
    distribution === null ? null : finite(distribution[key]);
  return {
    spread: {
      low: finite(low.value),
      high: finite(high.value),
      mean: of('mean'),
      sd: of('sd'),
      p01: of('p01'),
      p05: of('p05'),
      p50: of('p50'),
      p95: of('p95'),
      p99: of('p99'),
      low_at: place(low.where, spread),
      high_at: place(high.where, spread),
      open: [...new Set([...low.open, ...high.open])],
    },
  };
}

function answeredShare(name: string, spread: SheetSpread | null): { answered?: JsonYield } {
  const answered = spread?.value(name)?.answered ?? null;
  return answered === null ? {} : { answered };
}

function checkSpread(name: string, spread: SheetSpread | null): Partial<JsonCheck> {
  const found = spread?.check(name) ?? null;
  if (!spread || !found) return {};
  return {
    holds_at_extremes: found.holds,
    least_reserve: finite(found.reserve?.value ?? null),
    fails_at: found.failsAt && place(found.failsAt, spread),
    yield: found.yield,
  };
}

function declaredParts({ report }: SheetSpread): NonNullable<JsonReport['declared']> {
  return Object.fromEntries(
    report.parts.map(({ cell, share, holdsNominal }) => [
      cell,
      { share: report.isEmpty ? 0 : share, holds_nominal: holdsNominal },
    ]),
  );
}

function place(where: readonly StandingDraw[], { model }: SheetSpread): Record<string, number> {
  return Object.fromEntries(where.map(({ draw, value }) => [model.drawn[draw]!.name, value]));
}

function looseCell(sheet: Sheet, fault: Fault): JsonCell {
  const { text } = sheet.tree.lines[fault.line]!;
  return {
    kind: 'broken',
    line: fault.line + 1,
    entry: text.trim(),
    value: null,
    unit: null,
    text: null,
    error: jsonFault(sheet.tree.lines, fault),
  };
}

function jsonValue(reading: Reading, text: string | null): JsonValue {
  const { type, value } = reading;
  return {
    value: typeof value === 'number' ? finite(value) : typeof value === 'string' ? value : null,
    unit: typeof type === 'string' ? null : siUnitText(type),
    text,
  };
}

function jsonFault(lines: readonly Line[], fault: Fault): JsonFault {
  const column = lineColumn(lines[fault.line]!, fault.span.start);
  return { code: fault.code, message: fault.text, line: fault.line + 1, column };
}

function jsonWorkings(sheet: Sheet, name: string): readonly JsonStep[] {
  return workingsOf(sheet, name).map(({ text, sentence }) => ({
    name: text.left,
    formula: text.formula,
    substitution: text.substitution,
    result: text.result,
    sentence,
  }));
}

function finite(value: number | null): number | null {
  return value !== null && Number.isFinite(value) ? value : null;
}
