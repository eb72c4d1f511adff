// Rows of the law that a part has beside its bench: what the measured law reads where they were written.

import type { PartEntry } from '../language/index.ts';
import type { Handle } from '../network/index.ts';
import { PLAIN, formatValue } from '../quantity/index.ts';
import type { CellContext, Placed, Read } from './draft.ts';
import { PART_FIELDS } from './part-fields.ts';
import type { GivenField, GivenFields } from './part-given.ts';
import type { PartLaw } from './part-law.ts';
import { hasReading, readingOf } from './part-spread.ts';

interface Comparison {
  readonly field: GivenField;
  readonly reading: Handle;
}

/** Beyond this a row and the bench do not speak of one FET (common practice, no source; the same as between routes). */
const DISAGREEMENT = 0.25;

/** The rows written as one number, with what the measured law reads there. */
export function measuredComparisons(
  entry: PartEntry,
  law: PartLaw,
  given: GivenFields,
  { builder }: CellContext,
): readonly Comparison[] {
  const channel = entry.channel === 'n' ? 1 : -1;
  return [...given.values()]
    .flat()
    .filter(
      (field) =>
        !field.measured && !field.quantity.spread && PART_FIELDS[field.name]!.role === 'law' && hasReading(field.name),
    )
    .map((field) => ({ field, reading: readingOf(field, entry.family, channel, law, given, builder) }));
}

/** What is said of rows from which the measured law is far. */
export function comparedCautions(
  comparisons: readonly Comparison[],
  read: Read,
): { text: string; line: Placed['line'] }[] {
  return comparisons.flatMap(({ field, reading }) => {
    const [found, written] = [read(reading), read(field.handle)];
    const relative = found / written - 1;
    if (Math.abs(relative) <= DISAGREEMENT) return [];
    const percent = formatValue(Math.abs(relative) * 100, PLAIN, { digits: 2 }).text;
    const shown = formatValue(found, field.kind).text;
    const text = `${field.name} of the measured law is ${shown}, ${percent} % ${relative > 0 ? 'above' : 'below'} what is written. The bench settles the law.`;
    return [{ text, line: field.tree.line }];
  });
}

/** What is said of r_s and r_d beside a bench, whose readings hold them already. */
export function leadCautions(bench: string, written: GivenFields): { text: string; line: Placed['line'] }[] {
  return ['r_s', 'r_d'].flatMap((name) => {
    const field = written.get(name)?.[0];
    if (!field) return [];
    const text = `${bench} was measured at the terminals, so its numbers hold ${name} already: it is counted twice here. Leave it out.`;
    return [{ text, line: field.tree.line }];
  });
}
