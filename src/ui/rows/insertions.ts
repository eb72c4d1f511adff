// What Insert writes: ordinary lines, with names that are free and values that work with what the sheet has.

import { CURRENT, plainText, RESISTANCE } from '../../quantity/index.ts';
import { createSheet } from '../../sheet/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import { stageLines } from './stage-shapes.ts';
import type { StageShape } from './stage-shapes.ts';
import { firstStage, freeName, partOf, sourceResistor } from './sheet-stock.ts';

type Insertion =
  | { readonly type: 'quantity' | 'point' | 'check' | 'inverse' | 'figure' }
  | { readonly type: 'part'; readonly kind: PartKind }
  | { readonly type: 'stage'; readonly shape: StageShape };

type PartKind = 'n-JFET' | 'p-JFET' | 'n-MOSFET' | 'p-MOSFET';

export interface InsertionChoice {
  readonly insertion: Insertion;
  /** The first of its group in the menu. */
  readonly first: boolean;
  readonly group: 'quantity' | 'part' | 'stage' | 'point' | 'check' | 'inverse' | 'figure';
  readonly title: string;
  readonly words: string;
}

const CHOICES = [
  choice('quantity', { type: 'quantity' }, 'quantity', 'a number with its spread, or a formula'),
  choice('part', { type: 'part', kind: 'n-JFET' }, 'n-JFET', 'rows of its data sheet: I_DSS and V_GSoff'),
  choice('part', { type: 'part', kind: 'p-JFET' }, 'p-JFET', 'the same, V_GSoff positive'),
  choice('part', { type: 'part', kind: 'n-MOSFET' }, 'n-MOSFET', 'rows of its data sheet: V_GSth and I_on'),
  choice('part', { type: 'part', kind: 'p-MOSFET' }, 'p-MOSFET', 'the same, V_GSth negative'),
  choice('stage', { type: 'stage', shape: 'common source' }, 'common source', 'gain from gate to drain'),
  choice('stage', { type: 'stage', shape: 'follower' }, 'follower', 'gain near 1 from gate to source'),
  choice(
    'stage',
    { type: 'stage', shape: 'common gate' },
    'common gate',
    'gain from source to drain, low input resistance',
  ),
  choice('stage', { type: 'stage', shape: 'current sink' }, 'current sink', 'a current set by the source resistor'),
  choice('stage', { type: 'stage', shape: 'switch' }, 'switch', 'fully on, with its load'),
  choice('point', { type: 'point' }, 'point', 'one specimen at a given current and voltage'),
  choice('check', { type: 'check' }, 'check', 'a value and the limit it must keep'),
  choice('inverse', { type: 'inverse' }, 'inverse', 'what a resistor would have to be for a wanted current'),
  choice('figure', { type: 'figure' }, 'figure', 'curves of a stage with its operating point'),
];

/** Everything that can be inserted, in the order of the menu. */
export const INSERTIONS: readonly InsertionChoice[] = CHOICES.map((each, k) => ({
  ...each,
  first: CHOICES[k - 1]?.group !== each.group,
}));

/** The lines of an insertion. */
export function insertionLines(insertion: Insertion, sheet: SheetView): string[] {
  switch (insertion.type) {
    case 'quantity':
      return [`${freeName(sheet, 'R_')} = 10 kohm ± 1 %`];
    case 'part':
      return partLines(insertion.kind, freeName(sheet, 'Q'));
    case 'point':
      return pointLines(sheet);
    case 'check':
      return checkLines(sheet);
    case 'inverse':
      return inverseLines(sheet);
    case 'figure':
      return withStage(sheet, (stage) => [`${freeName(sheet, 'F')} = plot transfer of ${stage}`]);
    case 'stage':
      return withPart(sheet, (part, extra) => [...extra, ...stageLines(insertion.shape, part, sheet)]);
  }
}

function choice(
  group: InsertionChoice['group'],
  insertion: Insertion,
  title: string,
  words: string,
): Omit<InsertionChoice, 'first'> {
  return { group, insertion, title, words };
}

const PART_ROWS: Readonly<Record<PartKind, readonly string[]>> = {
  'n-JFET': ['I_DSS: 2 mA .. 10 mA at V_DS = 15 V', 'V_GSoff: -4 V .. -1 V at I_D = 10 nA'],
  'p-JFET': ['I_DSS: 2 mA .. 10 mA at V_DS = -15 V', 'V_GSoff: 1 V .. 4 V at I_D = 10 nA'],
  'n-MOSFET': ['V_GSth: 1 V .. 2.5 V at I_D = 1 mA', 'I_on: 100 mA at V_GS = 10 V'],
  'p-MOSFET': ['V_GSth: -2.5 V .. -1 V at I_D = 1 mA', 'I_on: 100 mA at V_GS = -10 V'],
};

function partLines(kind: PartKind, name: string): string[] {
  return [`${name} = ${kind}`, ...[...PART_ROWS[kind], 'lambda: 0.01 /V'].map((row) => `  ${row}  [assumed]`)];
}

function pointLines(sheet: SheetView): string[] {
  return withPart(sheet, (part, extra) => {
    const sign = part.channel === 'p' ? '-' : '';
    return [...extra, `${freeName(sheet, 'P')} = point of ${part.name}`, '  I_D: 1 mA', `  V_DS: ${sign}10 V`];
  });
}

function checkLines(sheet: SheetView): string[] {
  const stage = firstStage(sheet);
  const name = sheet.cell('headroom') ? freeName(sheet, 'check_') : 'headroom';
  if (stage !== null) return [`${name} = check ${stage} >= 1 V`];
  const quantity = sheet.cells().find((cell) => cell.kind === 'quantity' && typeof cell.reading?.value === 'number');
  return quantity
    ? [`${freeName(sheet, 'check_')} = check ${quantity.name} >= ${quantity.name} / 2`]
    : [`${name} = check 1 >= 0`];
}

/** What the resistor in a source lead would have to be for the current that flows now, ready for another to be typed. */
function inverseLines(sheet: SheetView): string[] {
  const biased = sourceResistor(sheet);
  if (biased === null) {
    const written = insertionLines({ type: 'stage', shape: 'current sink' }, sheet);
    return [...written, ...inverseLines(createSheet(`${sheet.tree.text}\n${written.join('\n')}\n`))];
  }
  const { stage, resistor, ohms, current } = biased;
  const [low, high] = [ohms / INVERSE_RANGE, ohms * INVERSE_RANGE].map((end) =>
    plainText(Number(end.toPrecision(2)), RESISTANCE),
  );
  const wanted = plainText(Number(current.toPrecision(2)), CURRENT);
  return [`${freeName(sheet, 'R_x')} = ${resistor} such that ${stage}.I_D = ${wanted} over ${low} .. ${high}`];
}

/** How far a resistor is looked for, as a factor to either side. */
const INVERSE_RANGE = 10;

function withStage(sheet: SheetView, lines: (stage: string) => string[]): string[] {
  const stage = firstStage(sheet);
  if (stage !== null) return lines(stage.split('.')[0]!);
  const written = insertionLines({ type: 'stage', shape: 'common source' }, sheet);
  return [...written, ...lines(freeName(sheet, 'A'))];
}

type Part = NonNullable<ReturnType<typeof partOf>>;

/** The first part of the sheet, or a new one whose lines come first. */
function withPart(sheet: SheetView, lines: (part: Part, extra: readonly string[]) => string[]): string[] {
  const part = partOf(sheet);
  if (part !== null) return lines(part, []);
  const name = freeName(sheet, 'Q');
  // The square law of the rows just written, near their middle.
  const fresh: Part = { name, channel: 'n', family: 'JFET', beta: 1.1e-3, threshold: -2 };
  return lines(fresh, partLines('n-JFET', name));
}
