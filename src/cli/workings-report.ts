// The workings of one cell as text for a terminal.

import { stepText, workingsOf } from '../record/index.ts';
import type { Sheet } from '../sheet/index.ts';
import { faultText } from './text-report.ts';
import { wrapText } from './text-table.ts';

const INDENT = '  ';

/** Sentence, then formula, numbers in place and result of every step; lines are broken between words. */
export function workingsReport(sheet: Sheet, name: string, width: number): string {
  const lines = [`Workings of ${name}`];
  const fault = sheet.error(name);
  if (fault) lines.push(...indented(faultText(sheet.tree.lines, fault), width));
  const steps = workingsOf(sheet, name);
  if (steps.length === 0 && !fault) lines.push(`${INDENT}Nothing is computed in this cell.`);
  for (const step of steps) {
    if (step.sentence !== '') lines.push('', ...wrapText(step.sentence, width));
    lines.push(...indented(stepText(step), width));
  }
  return `${lines.join('\n')}\n`;
}

function indented(text: string, width: number): string[] {
  const [first, ...rest] = wrapText(text, width - 3 * INDENT.length);
  return [INDENT + first!, ...rest.map((line) => INDENT.repeat(3) + line)];
}
