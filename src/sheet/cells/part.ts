// A part: its data-sheet rows checked, turned into the constants of the square law by the first complete
// route, and shown in every convention of the trade.

import { wantedSign } from '../../fet/index.ts';
import { TEMPERATURE_POINT, formatValue, sameKind } from '../../quantity/index.ts';
import { nearestNames } from '../../language/index.ts';
import type { PartEntry } from '../../language/index.ts';
import type { Handle } from '../../network/index.ts';
import { EMPTY_DRAFT } from '../draft.ts';
import type { CellContext, Draft, FieldDraft, OfferDraft, Placed, Read } from '../draft.ts';
import { exampleAmount } from '../example-amount.ts';
import type { LimitName } from '../interface.ts';
import { PART_FIELDS } from '../part-fields.ts';
import type { GivenField, GivenFields } from '../part-given.ts';
import { comparedCautions, leadCautions, measuredComparisons } from '../measured-comparison.ts';
import { measuredRows } from '../measured-rows.ts';
import { partReading } from '../part-conventions.ts';
import { partDevice } from '../part-device.ts';
import { partLaw } from '../part-law.ts';
import { fieldName, isShadowed, partSpread } from '../part-spread.ts';
import { partWorkings } from '../part-workings.ts';
import { stop } from '../stop.ts';
import { conditionsOf } from '../test-conditions.ts';
import { typeName } from '../value-type.ts';
import { compileQuantityEntry, fromZeroText, heldAtZero, standInText } from './quantity.ts';
import { labelOf } from './stage-places.ts';
import { signFault } from '../part-signs.ts';

const LIMITS: readonly LimitName[] = ['V_DSmax', 'V_DGmax', 'V_GSmax', 'I_Dmax', 'T_Jmax'];

/** Compiles a part cell. */
export function compilePartCell(context: CellContext): Draft {
  const { tree, builder } = context;
  const entry = tree.entry as PartEntry;
  const channel = entry.channel === 'n' ? 1 : -1;
  const written = readFields(entry, context);
  const { given, assumptions: measured } = entry.fittedTo
    ? measuredRows(entry, written, context)
    : { given: written, assumptions: [] };
  checkSizes(given);
  const law = partLaw(entry, channel, given, context);
  const { device, statedTemperatureLaws, assumptions } = partDevice(entry.family, law, given, builder);
  const limits: Partial<Record<LimitName, Handle>> = {};
  for (const name of LIMITS) {
    const field = given.get(name)?.[0];
    if (field) limits[name] = field.handle;
  }
  const fields = [...given.values()].flat();
  const comparisons = entry.fittedTo ? measuredComparisons(entry, law, given, context) : [];
  return {
    ...EMPTY_DRAFT,
    offers: [
      ...fields.filter((field) => !isShadowed(field, given)).map((field) => offerOf(field, fieldName(field, given))),
      ...law.forms.filter((form) => !given.has(form.name)),
    ],
    verify: (read) => verifyPart(entry, channel, fields, law.verify, read),
    cautions: (read) => [
      ...law.cautions(read),
      ...temperatureCautions(fields, device.T_nom, read),
      ...comparedCautions(comparisons, read),
      ...(entry.fittedTo ? leadCautions(entry.fittedTo.name, written) : []),
    ],
    assumptions: [
      ...fields.filter((field) => field.quantity.chosen).map((field) => chosenText(tree.name.name, field)),
      ...fields
        .filter((field) => field.quantity.fromZero)
        .map((field) => fromZeroText(`${tree.name.name}.${field.name}`)),
      ...measured,
      ...law.assumptions,
      ...assumptions,
    ],
    workings: (read) => partWorkings(tree.name.name, entry, given, law, read),
    fields: (read) => [...written.values()].flat().map((field) => fieldReading(field, read)),
    measured: (read) => fields.filter(({ measured: from }) => from).map((field) => fieldReading(field, read)),
    part: (read) => partReading(entry, law, given, read),
    drawn: partSpread(entry.family, channel, law, given, builder),
    extra: { type: 'part', channel, family: entry.family, device, limits, statedTemperatureLaws },
  };
}

function readFields(entry: PartEntry, context: CellContext): GivenFields {
  const given = new Map<string, GivenField[]>();
  for (const field of context.tree.fields) {
    const { body, line } = field;
    const name = labelOf(field);
    if (body.type !== 'quantity') throw new Error('A field of a part is a quantity.');
    const known = Object.hasOwn(PART_FIELDS, name) ? PART_FIELDS[name] : undefined;
    if (!known) {
      const near = nearestNames(name, Object.keys(PART_FIELDS));
      stop(
        'unknown-field',
        `A part has no field ${name}.${near.length > 0 ? ` Did you mean ${near.join(' or ')}?` : ''}`,
        field.labelSpan,
        line,
      );
    }
    if (!known.families.includes(entry.family)) stop('field-family', familyText(name, entry), field.labelSpan, line);
    const present = given.get(name) ?? [];
    if (present.length > 0 && !known.repeats) {
      stop('field-twice', `${name} stands twice in this part. Keep one of the two lines.`, field.labelSpan, line);
    }
    const written = compileQuantityEntry(body, line, context);
    const wanted = wantedSign(name, entry.family, entry.channel === 'n' ? 1 : -1);
    const quantity = wanted === 'not negative' ? heldAtZero(written, body) : written;
    if (typeof quantity.type === 'string' || !sameKind(quantity.type, known.kind)) {
      const isNegative = wanted === 'negative' || name === 'tempco';
      stop(
        'field-dimension',
        `${name} is ${typeName(known.kind)}; this is ${typeName(quantity.type)}. Write for example ${name}: ${exampleAmount(known.kind, isNegative ? -1 : 1)}.`,
        body.span,
        line,
      );
    }
    given.set(name, [
      ...present,
      { name, handle: quantity.handle, kind: known.kind, quantity, conditions: conditionsOf(body, line), tree: field },
    ]);
  }
  return given;
}

/** W / L is 1 where neither is given; one of them alone says nothing. */
function checkSizes(given: GivenFields): void {
  for (const [name, other] of [
    ['W', 'L'],
    ['L', 'W'],
  ] as const) {
    const alone = given.has(other) ? undefined : given.get(name)?.[0];
    if (alone) {
      stop(
        'size-alone',
        `${name} counts only with ${other}. Write both, or neither for W / L = 1.`,
        alone.tree.labelSpan,
        alone.tree.line,
      );
    }
  }
}

function familyText(name: string, entry: PartEntry): string {
  if (name === 'beta')
    return 'beta is not used for MOSFETs, because half of the books mean twice the other half by it. Write K, with I_D = K (V_GS - V_TO)².';
  return `${name} is no field of a ${entry.family}.`;
}

function verifyPart(
  entry: PartEntry,
  channel: 1 | -1,
  fields: readonly GivenField[],
  law: (read: Read) => Placed | null,
  read: Read,
): Placed | null {
  for (const field of fields) {
    const fault = signFault(entry, channel, field, read);
    if (fault) return fault;
  }
  return reverseCapacitanceFault(fields, read) ?? law(read);
}

/** C_rss is C_GD, which C_iss holds beside C_GS and C_oss beside C_DS: it exceeds neither. */
function reverseCapacitanceFault(fields: readonly GivenField[], read: Read): Placed | null {
  const row = (name: string): GivenField | undefined => fields.find((field) => field.name === name);
  const reverse = row('C_rss');
  if (!reverse) return null;
  for (const [name, other] of [
    ['C_iss', 'C_GS'],
    ['C_oss', 'C_DS'],
  ] as const) {
    const whole = row(name);
    if (!whole || read(reverse.handle) <= read(whole.handle)) continue;
    const shown = (field: GivenField): string => formatValue(read(field.handle), field.kind, { zeros: 'drop' }).text;
    const text = `C_rss is ${shown(reverse)} and ${name} ${shown(whole)}, so ${other} = ${name} - C_rss would lie below 0. Take both rows at the same voltages, where C_rss is the smaller one.`;
    const { line, body } = reverse.tree;
    return { line, message: { code: 'capacitance-order', text, span: body.span } };
  }
  return null;
}

/** Temperature in K by which a row's own may differ from T_nom without a word. */
const SAME_TEMPERATURE = 0.5;

/** What is said of rows that name a temperature: all are read at T_nom. */
function temperatureCautions(fields: readonly GivenField[], T_nom: Handle, read: Read): ReturnType<Draft['cautions']> {
  const nominal = read(T_nom);
  return fields.flatMap((field) => {
    const stated = field.conditions.get('T_J') ?? field.conditions.get('T_A');
    if (PART_FIELDS[field.name]!.role === 'limit' || stated === undefined) return [];
    if (Math.abs(stated - nominal) <= SAME_TEMPERATURE) return [];
    const [at, here] = [stated, nominal].map(
      (kelvin) => formatValue(kelvin, TEMPERATURE_POINT, { zeros: 'drop' }).text,
    );
    const text = `${field.name} is stated at ${at} and read as if at T_nom, ${here}: the temperature behind at changes nothing. Give all rows at one temperature, and name it as T_nom.`;
    return [{ text, line: field.tree.line }];
  });
}

function offerOf(field: GivenField, name: string): OfferDraft {
  const { body } = field.tree;
  return {
    name,
    type: field.kind,
    handle: field.handle,
    sentence: PART_FIELDS[field.name]!.sentence,
    missing: null,
    as: body.type === 'quantity' ? (body.as?.unit ?? null) : null,
    isInput: field.quantity.isInput,
  };
}

function fieldReading(field: GivenField, read: Read): FieldDraft {
  const { body } = field.tree;
  return {
    name: field.name,
    type: field.kind,
    value: read(field.handle),
    as: body.type === 'quantity' ? (body.as?.unit ?? null) : null,
    line: field.tree.line,
    spread: field.quantity.spread?.(read) ?? null,
    isInput: field.quantity.isInput,
  };
}

function chosenText(part: string, field: GivenField): string {
  const { body } = field.tree;
  if (body.type !== 'quantity') throw new Error('A field of a part is a quantity.');
  return `${part}.${field.name}: no nominal is given; ${standInText(body)} stands in.`;
}
