// What an offered value is, in a few words beside its row; the whole sentence stands in completion and workings.

import type { OfferedReading } from '../../sheet/index.ts';

const WORDS: Readonly<Record<string, string>> = {
  V_ov: 'gate voltage beyond the threshold',
  V_DSsat: 'V_DS at which saturation begins',
  margin: 'V_DS beyond V_DSsat',
  region: 'cutoff, ohmic or saturation',
  A_v: 'voltage gain at midband',
  R_in: 'resistance at the input, midband',
  R_out: 'resistance at the output, midband',
  f_T: 'current gain 1',
  swing_up: 'largest upward peak at the output',
  swing_down: 'largest downward peak at the output',
  P_total: 'power from all rails at rest',
};

/** A few words for a value, with names as they stand in the sheet. */
export function valueWords({ name, sentence }: OfferedReading): string {
  return WORDS[name.slice(name.lastIndexOf('.') + 1)] ?? firstClause(sentence);
}

function firstClause(sentence: string): string {
  return sentence.replace(/[,:;.].*$/s, '').replace(/^[A-Z](?=[a-z])/, (letter) => letter.toLowerCase());
}
