// The workings of everything that is computed: one heading for each part, point and stage, one for the formulas that
// stand together in a section of the sheet. Checks have their numbers in their own table.

import type { CellReading, Sheet } from '../sheet/index.ts';
import { name, plainText, sentence } from './inline.ts';
import type { Block, Inlines, Step } from './record-tree.ts';
import { originOf } from './source.ts';
import type { PrintedStep } from './workings.ts';
import { workingsOf } from './workings.ts';

/** Formulas that share a heading, or the one cell that has it alone. */
interface Group {
  readonly title: Inlines;
  readonly alone: boolean;
  readonly section: string;
  readonly steps: { readonly printed: PrintedStep; readonly sentence: Inlines }[];
}

const ALONE: ReadonlySet<string> = new Set(['part', 'another', 'point', 'stage', 'bench']);

/** Headings and steps in sheet order; `number` is that of their section. */
export function workingsBlocks(sheet: Sheet, number: string): readonly Block[] {
  const groups: Group[] = [];
  for (const cell of sheet.cells()) {
    if (cell.fault !== null || cell.kind === 'check') continue;
    const steps = workingsOf(sheet, cell.name).map((printed) => ({ printed, sentence: about(printed, cell, sheet) }));
    if (steps.length > 0) groupFor(cell, sheet, groups).steps.push(...steps);
  }
  if (groups.length === 0) {
    return [{ type: 'paragraph', tone: 'plain', content: plainText('Nothing is computed in this sheet.') }];
  }
  return groups.flatMap(({ title, steps }, at): Block[] => {
    const heading = `${number}.${at + 1}`;
    return [
      { type: 'heading', number: heading, content: title, remark: '' },
      {
        type: 'steps',
        steps: steps.map((step, index) => stepOf(step.printed, step.sentence, `${heading}.${index + 1}`)),
      },
    ];
  });
}

function groupFor(cell: CellReading, sheet: Sheet, groups: Group[]): Group {
  const section = sectionOf(cell, sheet);
  const alone = ALONE.has(cell.kind);
  const last = groups[groups.length - 1];
  if (!alone && last && !last.alone && last.section === section) return last;
  const title: Inlines = alone
    ? [name(cell.name), ...plainText(`, ${kindWords(cell)}`)]
    : plainText(section === '' ? 'Formulas' : section);
  const group: Group = { title, alone, section, steps: [] };
  groups.push(group);
  return group;
}

function kindWords({ kind, tree }: CellReading): string {
  const { entry } = tree;
  if (entry.type === 'part') return `${entry.channel}-${entry.family}: the law its rows settle`;
  if (entry.type === 'another') return `another ${entry.of.name}`;
  if (entry.type === 'point') return `point of ${entry.of.name}`;
  if (entry.type === 'stage') return `stage of ${entry.fets.map(({ part }) => part.name).join(', ')}`;
  return kind === 'bench' ? 'bench: the laws that fit its readings' : kind;
}

/** The heading above a cell; empty where there is none. */
function sectionOf(cell: CellReading, sheet: Sheet): string {
  const { lines, title } = sheet.tree;
  for (let at = cell.tree.line.index; at >= 0; at--) {
    const line = lines[at]!;
    if (line.tree.type === 'heading' && line !== title?.line) return line.tree.text;
  }
  return '';
}

/** What a step is: its own sentence, else the note of the cell. */
function about({ sentence: own }: PrintedStep, cell: CellReading, sheet: Sheet): Inlines {
  if (own !== '') return sentence(own, cell.name);
  const { note } = originOf(cell.tree.line, sheet.tree.lines);
  return ALONE.has(cell.kind) || note === null ? [] : sentence(note, cell.name);
}

function stepOf({ text, tex, isCondition, agrees }: PrintedStep, about: Inlines, number: string): Step {
  const pairs = [
    { text: text.left, tex: tex.left },
    { text: text.formula, tex: tex.formula },
    { text: text.substitution, tex: tex.substitution },
    { text: text.result, tex: tex.result },
  ].filter((side): side is { text: string; tex: string } => side.text !== null);
  const different = pairs.filter((side, at) => side.text !== pairs[at - 1]?.text);
  const sides = different.map((side, at) => ({
    ...side,
    sign: at === 0 ? ('' as const) : isCondition ? (':' as const) : ('=' as const),
  }));
  return { number, sentence: about, sides, agrees };
}
