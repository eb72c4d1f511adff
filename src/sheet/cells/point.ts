// A point: one specimen of a part held at given terminal voltages, or at a drain current.

import { CURRENT, VOLTAGE, sameKind } from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import { nearestNames } from '../../language/index.ts';
import type { FieldTree, PointEntry } from '../../language/index.ts';
import { OFFERED_VALUES, POINT_STATUS, POINT_STATUS_SENTENCES, lowerPoint } from '../../network/index.ts';
import { absentValue } from '../absent-value.ts';
import { deviceCautions } from '../cautions.ts';
import { drawsOf } from '../compiled-quantity.ts';
import type { CompiledQuantity } from '../compiled-quantity.ts';
import { EMPTY_DRAFT, NO_SPREAD } from '../draft.ts';
import type { CellContext, Draft, OfferDraft } from '../draft.ts';
import { exampleAmount } from '../example-amount.ts';
import { OFFERED_KIND } from '../offered-kind.ts';

import { pointWorkings } from '../stage-workings.ts';
import { stop } from '../stop.ts';
import { typeName } from '../value-type.ts';
import { partOf } from './part-of.ts';
import { compileQuantityEntry } from './quantity.ts';
import { labelOf } from './stage-places.ts';

const FIELDS: Readonly<Record<string, ValueKind>> = { V_GS: VOLTAGE, I_D: CURRENT, V_DS: VOLTAGE, V_SB: VOLTAGE };

/** Compiles a point cell. */
export function compilePointCell(context: CellContext): Draft {
  const { tree, builder } = context;
  const entry = tree.entry as PointEntry;
  const part = partOf(entry.of, context);
  const given = readFields(tree.fields, context);
  const [vgs, id, vds] = [given.get('V_GS'), given.get('I_D'), given.get('V_DS')];
  if (!vgs && !id) stop('point-incomplete', `A point wants V_GS or I_D. Write a line V_GS: -1 V below it.`, entry.span);
  if (vgs && id)
    stop('point-overdone', `V_GS and I_D both stand here; one follows from the other. Keep one of them.`, entry.span);
  if (!vds) stop('point-incomplete', `A point wants V_DS. Write a line V_DS: 10 V below it.`, entry.span);
  const ambient = context.ambient();
  const lowering = lowerPoint(
    {
      channel: part.channel,
      family: part.family,
      device: part.device,
      held: vgs ? { type: 'V_GS', value: vgs.handle } : { type: 'I_D', value: id!.handle },
      V_DS: vds.handle,
      V_SB: given.get('V_SB')?.handle ?? null,
      ambient,
    },
    builder,
  );
  return {
    ...EMPTY_DRAFT,
    offers: OFFERED_VALUES.filter((row) => row.point).map((row): OfferDraft => {
      // What is held is read as it was entered, so that turning its slot turns the point.
      const held = given.get(row.name);
      const handle = held?.handle ?? lowering.values.get(row.name) ?? null;
      const text = lowering.absent.get(row.name) ?? `${row.name} is not computed yet.`;
      return {
        name: row.name,
        type: OFFERED_KIND[row.unit],
        handle,
        sentence: row.sentence,
        missing: handle === null ? absentValue(text, entry.span) : null,
        isInput: held?.isInput ?? false,
      };
    }),
    verify: (read) => {
      const status = read(lowering.status);
      if (status === 0) return null;
      const reason =
        id && status === CANNOT_CARRY ? noGateVoltage(part.channel) : (POINT_STATUS_SENTENCES[status] ?? '');
      const text = `${tree.name.name} was not solved. ${reason} No value is shown that rests on it.`;
      return { line: tree.line, message: { code: 'not-solved', text, span: entry.span } };
    },
    cautions: (read) => {
      const value = (offered: string): number => {
        const handle = lowering.values.get(offered);
        return handle === undefined ? NaN : read(handle);
      };
      return deviceCautions({
        part,
        partName: entry.of.name,
        value,
        idle: null,
        thermalRoots: lowering.thermalRoots,
        read,
      }).map((text) => ({
        text,
        line: tree.line,
      }));
    },
    workings: (read) => pointWorkings({ part, lowering, ambient: read(ambient), read }),
    drawn: { ...NO_SPREAD, draws: [...given].flatMap(([name, field]) => drawsOf(name, field, field.tree.line)) },
    fields: (read) =>
      [...given].map(([name, field]) => ({
        name,
        type: field.type,
        value: read(field.handle),
        as: field.tree.body.type === 'quantity' ? (field.tree.body.as?.unit ?? null) : null,
        line: field.tree.line,
        spread: field.spread?.(read) ?? null,
        isInput: field.isInput,
      })),
  };
}

/** Code of `POINT_STATUS` for a current that no terminal voltages give. */
const CANNOT_CARRY = POINT_STATUS.indexOf('cannot carry it');

function noGateVoltage(channel: 1 | -1): string {
  const [kind, sign] = channel === 1 ? ['an n-channel', 'positive'] : ['a p-channel', 'negative'];
  return `No gate voltage gives this I_D at this V_DS. V_DS of ${kind} FET is ${sign} where I_D is positive, and exceeds the drop across r_s and r_d.`;
}

function readFields(
  fields: readonly FieldTree[],
  context: CellContext,
): Map<string, CompiledQuantity & { tree: FieldTree }> {
  const given = new Map<string, CompiledQuantity & { tree: FieldTree }>();
  for (const field of fields) {
    const { body, line } = field;
    const name = labelOf(field);
    if (body.type !== 'quantity') throw new Error('A field of a point is a quantity.');
    const kind = Object.hasOwn(FIELDS, name) ? FIELDS[name] : undefined;
    if (!kind) {
      const near = nearestNames(name, Object.keys(FIELDS));
      stop(
        'unknown-field',
        `A point has no field ${name}. Its fields are V_GS or I_D, V_DS and V_SB.${near.length > 0 ? ` Did you mean ${near[0]}?` : ''}`,
        field.labelSpan,
        line,
      );
    }
    if (given.has(name))
      stop('field-twice', `${name} stands twice in this point. Keep one of the two lines.`, field.labelSpan, line);
    if (body.conditions.length > 0) {
      stop(
        'condition-misplaced',
        `${name} of a point carries no test condition: the point itself is one, and stands at T_A. Leave out what is behind at.`,
        body.conditions[0]!.name.span,
        line,
      );
    }
    const quantity = compileQuantityEntry(body, line, context);
    if (typeof quantity.type === 'string' || !sameKind(quantity.type, kind)) {
      stop(
        'field-dimension',
        `${name} is ${typeName(kind)}; this is ${typeName(quantity.type)}. Write for example ${name}: ${exampleAmount(kind)}.`,
        body.span,
        line,
      );
    }
    given.set(name, { ...quantity, tree: field });
  }
  return given;
}
