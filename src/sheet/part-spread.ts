// How the specimens of a part spread: which of its rows are drawn, which cut the declared set, and which go together.

import { DEFAULTS, ROW_VALUES } from '../fet/index.ts';
import type { Family } from '../fet/index.ts';
import type { Handle } from '../network/index.ts';
import type { Builder } from '../program/index.ts';
import type { GivenField, GivenFields } from './part-given.ts';
import { fieldNames } from './part-law.ts';
import type { PartLaw } from './part-law.ts';
import { drawsOf } from './compiled-quantity.ts';
import type { SpreadDraft } from './draft.ts';

/** Rows that place the threshold of a law. */
const THRESHOLD_ROWS: readonly string[] = ['V_P', 'V_GSoff', 'V_TO', 'V_GSth'];
/** Rows that say how much there is, with the sense in which they go with the square-law constant. */
const GAIN_ROWS: ReadonlyMap<string, 'rises' | 'falls'> = new Map([
  ['I_DSS', 'rises'],
  ['beta', 'rises'],
  ['K', 'rises'],
  ['K_P', 'rises'],
  ['I_on', 'rises'],
  ['g_fs', 'rises'],
  ['R_DSon', 'falls'],
] as const);

/** The spread of a part. A row of limits that the law does not need is not drawn: it says which specimens there are. */
export function partSpread(
  family: Family,
  channel: 1 | -1,
  law: PartLaw,
  given: GivenFields,
  builder: Builder,
): SpreadDraft {
  const used = new Set(fieldNames(law.used.route));
  const fields = [...given.values()].flat();
  const cutting = fields.filter((field) => isCut(field, used, given));
  return {
    draws: fields
      .filter((field) => !cutting.includes(field))
      .flatMap((field) => drawsOf(fieldName(field, given), field.quantity, field.tree.line)),
    cuts: cutting.map((field) => ({
      field: fieldName(field, given),
      line: field.tree.line,
      handle: readingOf(field, family, channel, law, given, builder),
      limits: field.quantity.spread!,
    })),
    tie: tieOf(family, channel, used, given),
  };
}

/** `R_DSon_2` for the second of its name. */
export function fieldName(field: GivenField, given: GivenFields): string {
  const nth = given.get(field.name)!.indexOf(field);
  return nth === 0 ? field.name : `${field.name}_${nth + 1}`;
}

function isCut(field: GivenField, used: ReadonlySet<string>, given: GivenFields): boolean {
  if (!field.quantity.spread || !Object.hasOwn(ROW_VALUES, field.name)) return false;
  if (field.name === 'g_os') return given.has('lambda');
  return !used.has(field.name);
}

function readingOf(
  field: GivenField,
  family: Family,
  channel: 1 | -1,
  law: PartLaw,
  given: GivenFields,
  builder: Builder,
): Handle {
  const defaults = DEFAULTS[family];
  const only = (name: string, otherwise: number): Handle => given.get(name)?.[0]?.handle ?? builder.constant(otherwise);
  const stated = (name: string): Handle => builder.constant(field.conditions.get(name) ?? NaN);
  const inputs = [
    builder.constant(channel),
    law.used.beta,
    law.used.V_TO,
    law.lambda,
    builder.constant(defaults.n.value),
    only('T_nom', defaults.T_nom.value),
    only('r_s', 0),
    only('r_d', 0),
    only('W', 1),
    only('L', 1),
    ...['V_GS', 'V_DS', 'I_D'].map(stated),
  ];
  return builder.call(`reading of ${field.name}`, inputs, 1)[0]!;
}

/** For a JFET the quantile of |V_P| goes with that of the other row, for a MOSFET that of the threshold itself. */
function tieOf(family: Family, channel: 1 | -1, used: ReadonlySet<string>, given: GivenFields): SpreadDraft['tie'] {
  const tracking = given.get('tracking')?.[0];
  const threshold = THRESHOLD_ROWS.find((name) => used.has(name));
  const gain = [...GAIN_ROWS.keys()].find((name) => used.has(name));
  if (!tracking || !threshold || !gain) return null;
  const cardOfJfet = family === 'JFET' && threshold === 'V_TO';
  const sense = cardOfJfet ? 1 : channel;
  return {
    threshold,
    // |V_P| grows as the value falls where the value is negative in the n-channel frame.
    thresholdFalls: family === 'JFET' ? sense === 1 : sense === -1,
    gain,
    gainFalls: GAIN_ROWS.get(gain) === 'falls',
    tracking: tracking.handle,
  };
}
