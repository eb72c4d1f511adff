// What a schematic says to those who do not see it: one sentence per symbol, one for the whole.

import type { SchematicInput, StageLeg } from './stage-input.ts';

const KIND_NAMES: Readonly<Record<Exclude<StageLeg['kind'], 'tie'>, string>> = {
  resistor: 'resistor',
  capacitor: 'capacitor',
  inductor: 'inductor',
  source: 'current source',
};

/** `R_S, resistor of 1.2 kΩ, from source to 0 V`; `drain tied to V_DD, 18 V`. */
export function legSentence(leg: StageLeg): string {
  const far = endName(leg);
  if (leg.kind === 'tie') return `${leg.from} tied to ${far}`;
  const value = leg.value === '' ? '' : ` of ${leg.value}`;
  const [first, last] = leg.reversed ? [far, leg.from] : [leg.from, far];
  return `${leg.label === '' ? '' : `${leg.label}, `}${KIND_NAMES[leg.kind]}${value}, from ${first} to ${last}`;
}

/** `Q1, n-JFET`; a MOSFET says whether it is of the enhancement type. */
export function fetSentence({ fetName, channel, family, enhancement }: SchematicInput): string {
  const type = family === 'JFET' ? '' : enhancement ? ', enhancement type' : ', depletion type';
  return `${fetName}, ${channel}-${family}${type}`;
}

/** What a circle stands for. */
export function placeSentence(name: string): string {
  return `place ${name}`;
}

/** How a leg to the test source names its end: `signal`, `−signal`, `common`. */
export function sourceName({ to }: StageLeg): string {
  return to.kind === 'common' ? 'common' : to.name.replace('-', '−');
}

/** The whole stage: its FET, what hangs on each place, and what is known of voltages and current. */
export function stageSentence(input: SchematicInput): string {
  const parts = [`${fetSentence(input)}.`, ...input.legs.map((leg) => `${legSentence(leg)}.`)];
  const voltages = Object.entries(input.voltages).flatMap(([node, text]) => (text === null ? [] : [`${node} ${text}`]));
  if (voltages.length > 0) parts.push(`Voltages: ${voltages.join(', ')}.`);
  if (input.current !== null) parts.push(`Channel current ${input.current}.`);
  if (input.output.length > 0) parts.push(`Output at ${input.output.join(' and ')}.`);
  return parts.join(' ');
}

function endName({ to }: StageLeg): string {
  if (to.kind === 'common') return 'common';
  return to.kind === 'rail' && to.value !== '' ? `${to.name}, ${to.value}` : to.name;
}
