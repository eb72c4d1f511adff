// The record of a sheet: title block, result, checks, what is to be confirmed, the sheet in its own order with its
// values, workings, figures, cautions, sign-off, and the sheet text.

import type { Sheet } from '../sheet/index.ts';
import { checksBlock } from './checks-section.ts';
import { cautionBlocks, signOffBlocks, textBlocks } from './closing-sections.ts';
import { figuresBlocks } from './figures-section.ts';
import { orBlank, plainText, sentence, strong } from './inline.ts';
import { leadProse } from './lead-prose.ts';
import { inputTally, openPoints } from './open-points.ts';
import type { OpenPoint } from './open-points.ts';
import type { Block, Inlines, Mark, RecordTree, Section } from './record-tree.ts';
import { sheetBlocks } from './sheet-section.ts';
import { TITLE_LABELS, paperOf, titleField } from './title-fields.ts';
import type { TitleField } from './title-fields.ts';
import type { JudgedSpread, Verdict } from './verdict.ts';
import { verdictOf } from './verdict.ts';
import { countText } from './yield-text.ts';
import { workingsBlocks } from './workings-section.ts';

interface RecordOptions {
  /** SHA-256 of the sheet text in UTF-8, in hexadecimal. */
  readonly digest: string;
  /** When it is printed, as it is to be read. */
  readonly printedAt?: string;
  /** The spread of the sheet with what is asked of it; left out where it has none, or none is known. */
  readonly judged?: JudgedSpread | null;
}

const MARKS: Readonly<Record<Verdict['state'], Mark>> = {
  incomplete: 'unknown',
  'nothing required': 'unknown',
  fails: 'fails',
  holds: 'holds',
};

/** The record of a sheet as it stands. */
export function recordOf(sheet: Sheet, { digest, printedAt, judged = null }: RecordOptions): RecordTree {
  const { tree } = sheet;
  const verdict = verdictOf(sheet, judged);
  const open = openPoints(sheet, judged);
  return {
    title: tree.title?.text.trim() || 'Sheet without a title',
    edition: editionOf(sheet),
    paper: paperOf(tree),
    digest,
    printedAt: printedAt ?? null,
    incomplete: incompleteWords(verdict),
    titleBlock: (Object.keys(TITLE_LABELS) as TitleField[]).map((label) => ({
      field: label,
      label: TITLE_LABELS[label],
      content: orBlank(titleField(tree, label)),
    })),
    sections: numberedSections(sheet, verdict, open, judged),
  };
}

/** A title, what is said behind it, and the blocks under it once its number is known; null to leave it out. */
type Draft = readonly [title: string, remark: string, blocks: (number: string) => readonly Block[]];

function numberedSections(
  sheet: Sheet,
  verdict: Verdict,
  open: readonly OpenPoint[],
  judged: JudgedSpread | null,
): readonly Section[] {
  const uncomputed = open.filter(({ kind }) => kind === 'broken' || kind === 'waiting');
  const toConfirm = open.filter(({ kind }) => ['assumed', 'taken', 'no source'].includes(kind));
  const drafts: readonly (Draft | null)[] = [
    ['Result', '', () => resultBlocks(sheet, verdict, open, judged)],
    uncomputed.length === 0
      ? null
      : ['Not computed', 'broken lines, and what waits for them', () => [listOf(uncomputed, 'dot')]],
    [
      'Checks',
      judged ? 'at every extreme, failing ones first' : 'at the nominal values, failing ones first',
      () => [checksBlock(sheet, judged)],
    ],
    toConfirm.length === 0 ? null : ['To be confirmed', '', () => confirmBlocks(toConfirm)],
    [
      'The sheet',
      'values as entered and as computed, ends rounded outward',
      (number) => sheetBlocks(sheet, number, judged),
    ],
    ['Workings', 'formula, numbers in place, result, at the nominal values', (number) => workingsBlocks(sheet, number)],
    ['Figures', '', () => figuresBlocks(sheet, judged?.spread ?? null)],
    ['Cautions and limits', '', () => cautionBlocks(sheet)],
    ['Sign-off', '', () => signOffBlocks(sheet)],
    ['The sheet text', 'typed in again, this gives the record above', () => textBlocks(sheet)],
  ];
  const sections: Section[] = [];
  for (const draft of drafts) {
    if (draft === null) continue;
    const [title, remark, blocksOf] = draft;
    const number = String(sections.length + 1);
    const blocks = blocksOf(number);
    if (blocks.length > 0) sections.push({ number, title, remark, blocks });
  }
  return sections;
}

function resultBlocks(
  sheet: Sheet,
  { state, sentence: words }: Verdict,
  open: readonly OpenPoint[],
  judged: JudgedSpread | null,
): readonly Block[] {
  const content: Inlines = [
    strong(words),
    ...plainText(` ${searchedSentence(judged)}`),
    ...plainText(` ${openSentence(sheet, open)}`),
  ];
  const lead = leadProse(sheet.tree)
    .map(({ tree }) => (tree.type === 'prose' ? tree.text : ''))
    .join(' ');
  const blocks: readonly Block[] = [{ type: 'verdict', mark: MARKS[state], content }];
  return lead === '' ? blocks : [...blocks, { type: 'paragraph', tone: 'prose', content: sentence(lead) }];
}

/** What was searched for this record. */
function searchedSentence(judged: JudgedSpread | null): string {
  if (judged === null) return 'Spread is not searched in this record.';
  const { builds, repaired } = judged.spread.report;
  const beaten = repaired === 0 ? '' : ` ${repaired} extremes were found by a build first and searched for again.`;
  return `Ends are those of all values that the limits allow, service included; yields are of ${countText(builds)} builds, with the 95 % interval of sampling alone: the assumed laws are not in it.${beaten}`;
}

/** How much is open, in one sentence. */
function openSentence(sheet: Sheet, open: readonly OpenPoint[]): string {
  const { inputs, assumed, unsourced } = inputTally(sheet);
  const count = (number: number, one: string, several: string): string[] =>
    number === 0 ? [] : [`${number} ${number === 1 ? one : several}`];
  const taken = open.filter(({ kind }) => kind === 'taken').length;
  const parts = [
    ...count(assumed, 'assumed input', 'assumed inputs'),
    ...count(unsourced, 'input without a source', 'inputs without a source'),
    ...count(taken, 'number taken by the sheet', 'numbers taken by the sheet'),
  ];
  const all = `${inputs === 1 ? '1 input' : `${inputs} inputs`}`;
  return parts.length === 0 ? `${all}, all with a source.` : `${all}; to be confirmed: ${parts.join(', ')}.`;
}

function confirmBlocks(open: readonly OpenPoint[]): readonly Block[] {
  const groups: readonly (readonly [OpenPoint['kind'], string])[] = [
    ['assumed', 'Assumed by the author:'],
    ['no source', 'Without a source:'],
    ['taken', 'Taken by the sheet where nothing was given:'],
  ];
  return groups.flatMap(([kind, title]): Block[] => {
    const points = open.filter((point) => point.kind === kind);
    if (points.length === 0) return [];
    return [{ type: 'paragraph', tone: 'plain', content: plainText(title) }, listOf(points, 'box')];
  });
}

function listOf(points: readonly OpenPoint[], mark: 'box' | 'dot'): Block {
  const items = points.map(({ kind, text, line }): Inlines => {
    const isEntry = kind === 'assumed' || kind === 'no source';
    const words: Inlines = isEntry ? [{ type: 'entry', text }] : sentence(text);
    return isEntry && line !== null ? [...words, ...plainText(` (line ${line + 1})`)] : words;
  });
  return { type: 'list', mark, items };
}

function incompleteWords({ broken, waiting, state }: Verdict): Inlines | null {
  if (state !== 'incomplete') return null;
  const parts = [
    ...(broken.length > 0 ? [`${broken.length === 1 ? '1 cell is' : `${broken.length} cells are`} broken`] : []),
    ...(waiting.length > 0 ? [`${waiting.length === 1 ? '1 has' : `${waiting.length} have`} no value`] : []),
  ];
  return plainText(`Record of an incomplete sheet: ${parts.join(' and ')}. Not to be signed as it stands.`);
}

function editionOf({ tree }: Sheet): string {
  const revision = titleField(tree, 'revision');
  const status = titleField(tree, 'status');
  return [...(revision === null ? [] : [`revision ${revision}`]), ...(status === null ? [] : [status])].join(', ');
}
