// What a way to bias comes to, in words and numbers: one row of the comparison and its sentences.

import { CURRENT, formatRow, formatValue, PLAIN, RESISTANCE, VOLTAGE } from '../../quantity/index.ts';
import type { BiasForm, FormName } from './band-forms.ts';
import type { Reached } from './band-reached.ts';
import type { BandWish } from './band-wish.ts';

/** One row of the comparison. */
export interface FormRow {
  readonly form: FormName;
  readonly title: string;
  /** `6.2 kΩ`, `1.2 mA`; '' where the form has no bias. */
  readonly source: string;
  /** As a true voltage against the near rail. */
  readonly V_GG: string;
  /** `1.00 to 1.49 mA`. */
  readonly band: string;
  /** `1.49 : 1`. */
  readonly ratio: string;
  readonly verdict: 'holds' | 'misses' | 'not possible' | 'not known';
  readonly sentences: readonly string[];
}

const TITLES: Readonly<Record<FormName, string>> = {
  self: 'self-bias',
  fixed: 'fixed plus self',
  source: 'current source',
};

/** The row of a form; `reached` is null where it has no bias, a sentence where its stage is not solved. */
export function formRow(wish: BandWish, form: BiasForm, reached: Reached | string | null): FormRow {
  const { bias } = form;
  const base = { form: form.form, title: TITLES[form.form], source: '', V_GG: '', band: '', ratio: '' };
  const line = form.line === null ? [] : [form.line];
  if (bias === null || reached === null) {
    return { ...base, verdict: 'not possible', sentences: [...line, ...form.reasons] };
  }
  const source =
    bias.source.type === 'resistor' ? exactly(bias.source.ohms, RESISTANCE) : exactly(bias.source.amps, CURRENT);
  const V_GG = formatValue(wish.rails.channel * bias.V_GG, VOLTAGE).text;
  const shown = { ...base, source, V_GG: bias.V_GG === 0 ? '0 V' : V_GG };
  if (typeof reached === 'string') {
    return { ...shown, verdict: 'not possible', sentences: [...line, ...form.reasons, reached] };
  }
  const { low, high } = reached.I_D;
  const sentences = [...line, ...form.reasons, ...endSentences(wish, reached), ...marginSentences(reached)];
  if (low === null || high === null) return { ...shown, verdict: 'not known', sentences };
  const row = formatRow({ low, nominal: reached.I_D.nominal, high }, CURRENT);
  return {
    ...shown,
    band: `${row.low!.text} to ${row.high!.text}`,
    ratio: low > 0 ? `${formatValue(high / low, PLAIN, { rounding: 'up' }).text} : 1` : '∞ : 1',
    verdict: low >= wish.least && high <= wish.most && (reached.margin.low ?? 0) >= 0 ? 'holds' : 'misses',
    sentences,
  };
}

/** Which end holds with how much to spare, which fails by how much. */
function endSentences({ least, most }: BandWish, { I_D, open }: Reached): string[] {
  if (I_D.low === null || I_D.high === null) {
    const ends = [I_D.low === null ? 'low' : '', I_D.high === null ? 'high' : ''].filter((end) => end !== '');
    const why = open.length > 0 ? `: ${open.join(' and ')} ${open.length > 1 ? 'have' : 'has'} an open limit` : '';
    return [`The ${ends.join(' and the ')} end of the band is not known${why}.`];
  }
  const spare = [I_D.low - least, most - I_D.high];
  if (spare.every((amount) => amount >= 0)) {
    return [
      `Both ends hold over every tolerance: ${amount(spare[0]!, 'down')} to spare at the low end, ${amount(spare[1]!, 'down')} at the high end.`,
    ];
  }
  const names = ['low', 'high'];
  const missing = spare.flatMap((each, k) => {
    const reached = formatRow({ low: I_D.low, nominal: I_D.nominal, high: I_D.high }, CURRENT);
    const at = (k === 0 ? reached.low : reached.high)!.text;
    return each < 0 ? [`The ${names[k]} end misses by ${amount(-each, 'up')}: a unit may carry ${at}.`] : [];
  });
  const held = spare.findIndex((each) => each >= 0);
  if (held >= 0) missing.push(`The ${names[held]} end holds, ${amount(spare[held]!, 'down')} to spare.`);
  return missing;
}

function marginSentences({ margin }: Reached): string[] {
  if (margin.low === null || margin.low >= 0) return [];
  const short = formatValue(-margin.low, VOLTAGE, { digits: 2, rounding: 'up' }).text;
  return [`Saturation is short by ${short}: drain and source take too much of the supply.`];
}

function amount(value: number, rounding: 'up' | 'down'): string {
  return formatValue(value, CURRENT, { digits: 2, rounding }).text;
}

function exactly(value: number, kind: typeof CURRENT): string {
  return formatValue(value, kind, { digits: 'all', zeros: 'drop' }).text;
}
