// The workings of one cell as text for a terminal.

import { benchTables, partTables, stepSides, stepText, workingsOf } from '../record/index.ts';
import type { BenchTable, PrintedStep } from '../record/index.ts';
import type { Sheet } from '../sheet/index.ts';
import { faultText } from './text-report.ts';
import { characterCount, wrapText } from './text-table.ts';

const INDENT = '  ';

/** Sentence, then formula, numbers in place and result of every step. */
export function workingsReport(sheet: Sheet, name: string, width: number): string {
  const lines = [`Workings of ${name}`];
  const fault = sheet.error(name);
  if (fault) lines.push(...indented(faultText(sheet.tree.lines, fault), width));
  const steps = workingsOf(sheet, name);
  if (steps.length === 0 && !fault) lines.push(`${INDENT}Nothing is computed in this cell.`);
  for (const step of steps) {
    if (step.sentence !== '') lines.push('', ...wrapText(step.sentence, width));
    lines.push(...stepLines(step, width));
  }
  lines.push(...tablesOf(sheet, name).flatMap((table) => ['', ...tableLines(table, width)]));
  return `${lines.join('\n')}\n`;
}

function tablesOf(sheet: Sheet, name: string): readonly BenchTable[] {
  const bench = sheet.bench(name);
  const part = sheet.part(name);
  const entry = sheet.cell(name)?.tree.entry;
  return [
    ...(bench ? benchTables(bench) : []),
    ...(part && entry?.type === 'part' ? partTables(part, entry.family === 'JFET') : []),
  ];
}

/** What the table shows, its heads, its rows; numbers stand to the right. What is too wide is not broken. */
function tableLines({ caption, columns, rows }: BenchTable, width: number): string[] {
  const heads = columns.map(({ title }) => title);
  const widths = heads.map((head, i) => Math.max(...[head, ...rows.map((row) => row[i]!)].map(characterCount)));
  const line = (cells: readonly string[]): string =>
    INDENT +
    cells
      .map((cell, i) => {
        const room = ' '.repeat(widths[i]! - characterCount(cell));
        return columns[i]!.isNumber ? room + cell : cell + room;
      })
      .join(INDENT)
      .trimEnd();
  return [...wrapText(caption, width), line(heads), ...rows.map(line)];
}

/** The step in one line, or, where it is too long, each side of its equation in lines of its own. */
function stepLines(step: PrintedStep, width: number): string[] {
  const whole = INDENT + stepText(step);
  if (characterCount(whole) <= width) return [whole];
  const [left, first, ...sides] = stepSides(step);
  if (first === undefined) return indented(left!, width);
  return [
    ...indented(`${left} = ${first}`, width),
    ...sides.flatMap((side) => indented(`= ${side}`, width, INDENT.repeat(2))),
  ];
}

function indented(text: string, width: number, indent = INDENT): string[] {
  const behind = indent + INDENT.repeat(2);
  const [first, ...rest] = wrapText(text, width - behind.length);
  return [indent + first!, ...rest.map((line) => behind + line)];
}
