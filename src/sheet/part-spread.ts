// How the specimens of a part spread: which of its rows are drawn, which cut the declared set, and which go together.

import { DEFAULTS, FORMS } from '../fet/index.ts';
import type { Family } from '../fet/index.ts';
import type { Handle } from '../network/index.ts';
import type { Builder } from '../program/index.ts';
import type { GivenField, GivenFields } from './part-given.ts';
import { fieldNames } from './part-law.ts';
import type { PartLaw } from './part-law.ts';
import { drawsOf } from './compiled-quantity.ts';
import type { SpreadDraft } from './draft.ts';

/** Rows that the square law of a specimen settles. */
const LAW_ROWS: ReadonlySet<string> = new Set([...Object.keys(FORMS), 'V_TO', 'beta', 'K']);
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

/** Whether the law of a specimen settles what this row reads. */
export function hasReading(name: string): boolean {
  return LAW_ROWS.has(name);
}

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

/** `R_DSon_2` for the second of its name; rows of a bench and of the part itself are counted apart. */
export function fieldName(field: GivenField, given: GivenFields): string {
  const alike = given
    .get(field.name)!
    .filter(({ measured }) => (measured === undefined) === (field.measured === undefined));
  const nth = alike.indexOf(field);
  return nth === 0 ? field.name : `${field.name}_${nth + 1}`;
}

function isCut(field: GivenField, used: ReadonlySet<string>, given: GivenFields): boolean {
  if (!field.quantity.spread || !LAW_ROWS.has(field.name)) return false;
  if (field.name === 'g_os') return given.has('lambda');
  return !used.has(field.name) || isShadowed(field, given);
}

/** Whether a bench gives this row as well, which then is the law's own. */
export function isShadowed(field: GivenField, given: GivenFields): boolean {
  return !field.measured && given.get(field.name)![0]!.measured !== undefined;
}

/** What a row reads on the specimen. */
export function readingOf(
  field: GivenField,
  family: Family,
  channel: 1 | -1,
  law: PartLaw,
  given: GivenFields,
  builder: Builder,
): Handle {
  const { beta, V_TO } = law.used;
  if (!Object.hasOwn(FORMS, field.name)) {
    if (field.name !== 'V_TO') return beta;
    return family === 'JFET' || channel === 1 ? V_TO : builder.neg(V_TO);
  }
  const defaults = DEFAULTS[family];
  const only = (name: string, otherwise: number): Handle => given.get(name)?.[0]?.handle ?? builder.constant(otherwise);
  const known: Readonly<Record<string, () => Handle>> = {
    channel: () => builder.constant(channel),
    beta: () => beta,
    V_TO: () => V_TO,
    lambda: () => law.lambda,
    n: () => builder.constant(defaults.n.value),
    T_nom: () => only('T_nom', defaults.T_nom.value),
    r_s: () => only('r_s', 0),
    r_d: () => only('r_d', 0),
    W: () => only('W', 1),
    L: () => only('L', 1),
  };
  const form = FORMS[field.name]!;
  const inputs = form.inputs.map((input) => {
    if (Object.hasOwn(known, input)) return known[input]!();
    return builder.constant(field.conditions.get(input.slice(input.indexOf('@') + 1)) ?? NaN);
  });
  return builder.call(form.id, inputs, 1)[0]!;
}

/** For a JFET the quantile of |V_P| goes with that of the other row, for a MOSFET that of the threshold itself. */
function tieOf(family: Family, channel: 1 | -1, used: ReadonlySet<string>, given: GivenFields): SpreadDraft['tie'] {
  const tracking = given.get('tracking')?.[0];
  const threshold = THRESHOLD_ROWS.find((name) => used.has(name));
  const gain = [...GAIN_ROWS.keys()].find((name) => used.has(name));
  if (!threshold || !gain) return null;
  const cardOfJfet = family === 'JFET' && threshold === 'V_TO';
  const sense = cardOfJfet ? 1 : channel;
  return {
    threshold,
    // |V_P| grows as the value falls where the value is negative in the n-channel frame.
    thresholdFalls: family === 'JFET' ? sense === 1 : sense === -1,
    gain,
    gainFalls: GAIN_ROWS.get(gain) === 'falls',
    tracking: tracking?.handle ?? null,
  };
}
