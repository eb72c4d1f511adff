// The declared spread of a value in words. Ends are rounded outward.

import { formatRow } from '../../quantity/index.ts';
import type { Unit, ValueKind } from '../../quantity/index.ts';
import type { DeclaredSpread } from '../../sheet/index.ts';

/** Ends that a tolerance gives are shown to so many digits. */
const DIGITS = 4;

/** Sentences: where the value lies, how the units are spread there, and whether it changes in use. */
export function spreadSentences(spread: DeclaredSpread, kind: ValueKind, as: Unit | null): readonly string[] {
  const { low, nominal, high, law, form, service, nominalChosen } = spread;
  const ends = formatRow({ low, nominal, high }, kind, { unit: as, digits: DIGITS, zeros: 'drop' });
  const sentences = [rangeSentence(ends.low?.text ?? null, ends.high?.text ?? null)];
  if (low !== null && high !== null) sentences.push(lawSentence(law, form));
  if (nominalChosen) {
    sentences.push(`The nominal value, ${ends.nominal.text}, was chosen by the sheet: the limits stand alone.`);
  }
  if (service) sentences.push('It changes in use, not from unit to unit.');
  return sentences;
}

function rangeSentence(low: string | null, high: string | null): string {
  if (low === null && high === null) return 'No limit is given at either end.';
  if (low === null) return `At most ${high}; no lower limit is given.`;
  if (high === null) return `At least ${low}; no upper limit is given.`;
  return `From ${low} to ${high}.`;
}

function lawSentence(law: DeclaredSpread['law'], form: DeclaredSpread['form']): string {
  if (law === 'normal') return 'Units follow a normal law that ends at the limits, which stand for 3 sigma.';
  return form === 'limits'
    ? 'Half of the units lie evenly below the nominal value, half evenly above.'
    : 'Units lie evenly between the limits.';
}
