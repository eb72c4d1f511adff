// A stage: its legs resolved into a network, lowered to straight-line operations and one root solve.

import { CAPACITANCE, CURRENT, FREQUENCY, INDUCTANCE, RESISTANCE, VOLTAGE, sameKind } from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import type { Expr, FieldTree, StageEntry } from '../../language/index.ts';
import { OFFERED_VALUES, POINT_STATUS_SENTENCES, lowerStage } from '../../network/index.ts';
import type { NetElement, NetFet, NetLeg, OfferedValue, StageLowering, StageNet } from '../../network/index.ts';
import { absentValue } from '../absent-value.ts';
import { stageCautions } from '../cautions.ts';
import type { PlacedLeg } from '../stage-in-hand.ts';
import { EMPTY_DRAFT } from '../draft.ts';
import type { CellContext, Draft, OfferDraft, Placed, Read } from '../draft.ts';
import { compileQuantity } from '../operand.ts';
import type { PartInterface } from '../interface.ts';
import { OFFERED_KIND } from '../offered-kind.ts';
import { operandText } from '../scope.ts';
import { readStage } from '../stage-reading.ts';
import { stageWorkings } from '../stage-workings.ts';
import { stop } from '../stop.ts';
import { typeName } from '../value-type.ts';
import { partOf } from './part-of.ts';
import { labelOf, placesOf, resolvePlace } from './stage-places.ts';
import type { Places } from './stage-places.ts';

const ELEMENTS: readonly { readonly kind: NetElement['kind']; readonly type: ValueKind }[] = [
  { kind: 'resistor', type: RESISTANCE },
  { kind: 'capacitor', type: CAPACITANCE },
  { kind: 'inductor', type: INDUCTANCE },
  { kind: 'source', type: CURRENT },
];

/** Capacitors from here on are shorts at midband; the border decides the shape of the code. */
const MIDBAND_SHORT = 1e-9;

/** Compiles a stage cell. */
export function compileStageCell(context: CellContext): Draft {
  const { tree } = context;
  const entry = tree.entry as StageEntry;
  checkFields(tree.fields);
  const places = placesOf(tree, entry, context);
  const fets = entry.fets.map((fet): NetFet & { part: PartInterface; partName: string } => {
    const part = partOf(fet.part, context);
    return {
      name: fet.name?.name ?? null,
      channel: part.channel,
      family: part.family,
      device: part.device,
      part,
      partName: fet.part.name,
    };
  });
  const legs = collectLegs(tree.fields, places, context);
  const output = outputOf(tree.fields, places);
  const driven = drivenOf(tree.fields, context);
  midband(tree.fields, context);

  if (entry.fets.length > 1) {
    context.later('A stage of several FETs', entry.span, tree.line);
    return { ...EMPTY_DRAFT, offers: offersOf(null, places, entry, 'A stage of several FETs is not computed yet.') };
  }
  const net: StageNet = {
    fets,
    nodes: places.nodes,
    legs: legs.map((leg) => leg.net),
    output,
    driven: driven?.handle ?? null,
    ambient: context.ambient(),
  };
  const lowering = lowerStage(net, context.builder);
  if (lowering.faults.length > 0) {
    const [first] = lowering.faults;
    const at = first!.leg === null ? null : legs[first!.leg];
    stop(`stage-${first!.code}`, first!.text, at ? at.leg.span : entry.span, at?.field.line ?? tree.line);
  }
  return {
    ...EMPTY_DRAFT,
    offers: offersOf(lowering, places, entry, ''),
    verify: (read) => verify(lowering, read, context),
    cautions: (read) => stageCautions({ tree, fets, legs, lowering, read, context }),
    workings: (read) => stageWorkings({ lowering, net, read }),
    stage: (read, solved) => readStage({ tree, fets, legs, lowering, net, read, context, solved }),
    shape: () => legs.map((leg) => shapeOf(leg, context)).join(' '),
  };
}

/** Every leg of every place, in sheet order. */
function collectLegs(fields: readonly FieldTree[], places: Places, context: CellContext): PlacedLeg[] {
  const legs: PlacedLeg[] = [];
  for (const field of fields) {
    if (field.body.type !== 'legs') continue;
    for (const leg of field.body.legs) {
      const element = leg.element ? elementOf(leg.element, field, context) : null;
      if (leg.direction === 'from' && element?.kind !== 'source') {
        stop('from-without-source', `from belongs to a current; write to for everything else.`, leg.span, field.line);
      }
      const net: NetLeg = {
        from: labelOf(field),
        element,
        reversed: leg.direction === 'from',
        to: resolvePlace(leg, field, places, context),
        leg: legs.length,
      };
      legs.push({ net, leg, field });
    }
  }
  return legs;
}

function elementOf(expr: Expr, field: FieldTree, context: CellContext): NetElement {
  const value = compileQuantity(expr, context.scope(field.line));
  const found = ELEMENTS.find(({ type }) => sameKind(type, value.type));
  if (!found) {
    const voltage = sameKind(value.type, VOLTAGE) ? ' A rail stands behind to: R to 15 V.' : '';
    stop(
      'element-kind',
      `${operandText(field.line, expr.span, 'This')} is ${typeName(value.type)}; a leg holds a resistance, a capacitance, an inductance or a current.${voltage}`,
      expr.span,
      field.line,
    );
  }
  const nominal = context.now(expr, field.line).value;
  return {
    kind: found.kind,
    value: value.handle,
    // Without a value the stage waits for it; until then any sound number will do.
    nominal: Number.isNaN(nominal) ? 1 : nominal,
    label: field.line.text.slice(expr.span.start, expr.span.end).trim(),
  };
}

/** What of an element's number decides the code: its sign, and for capacitors the midband border. */
function shapeOf({ net, leg, field }: PlacedLeg, context: CellContext): string {
  if (!net.element) return 'tie';
  const value = context.now(leg.element!, field.line).value;
  const border = net.element.kind === 'capacitor' && value >= MIDBAND_SHORT ? 'short' : 'open';
  return `${net.element.kind} ${value > 0 ? 'positive' : String(Math.sign(value))} ${border}`;
}

function outputOf(fields: readonly FieldTree[], places: Places): StageNet['output'] {
  const field = fields.find((candidate) => candidate.body.type === 'output');
  if (!field || field.body.type !== 'output') return null;
  const name = (path: {
    readonly names: readonly { readonly name: string }[];
    readonly span: { start: number; end: number };
  }): string => {
    const text = path.names.map((part) => part.name).join('.');
    if (!places.nodes.includes(text) && !places.terminals.includes(text)) {
      stop(
        'unknown-place',
        `The output is a place of this stage; there is no ${text}. Its places are ${[...places.present, ...places.nodes].join(', ')}.`,
        path.span,
        field.line,
      );
    }
    return text;
  };
  return { plus: name(field.body.plus), minus: field.body.minus ? name(field.body.minus) : null };
}

function drivenOf(fields: readonly FieldTree[], context: CellContext) {
  const field = fields.find((candidate) => candidate.body.type === 'driven');
  if (!field || field.body.type !== 'driven') return null;
  const value = compileQuantity(field.body.through, context.scope(field.line));
  if (!sameKind(value.type, RESISTANCE)) {
    stop(
      'driven-kind',
      `driven: through names the resistance of the test source; ${operandText(field.line, field.body.through.span, 'this')} is ${typeName(value.type)}.`,
      field.body.through.span,
      field.line,
    );
  }
  return value;
}

function midband(fields: readonly FieldTree[], context: CellContext): void {
  const field = fields.find((candidate) => candidate.body.type === 'midband');
  if (!field || field.body.type !== 'midband') return;
  const value = compileQuantity(field.body.frequency, context.scope(field.line));
  if (!sameKind(value.type, FREQUENCY)) {
    stop(
      'midband-kind',
      `midband names a frequency; ${operandText(field.line, field.body.frequency.span, 'this')} is ${typeName(value.type)}.`,
      field.body.frequency.span,
      field.line,
    );
  }
  context.later('The response at a stated midband frequency', field.body.frequency.span, field.line);
}

/** A stage never computes without a leg that it was given: a doubled setting stops. */
function checkFields(fields: readonly FieldTree[]): void {
  const seen = new Set<string>();
  for (const field of fields) {
    const label = labelOf(field);
    if (field.body.type !== 'legs' && seen.has(label))
      stop(
        'field-twice',
        `${label} stands twice in this stage. Keep one of the two lines.`,
        field.labelSpan,
        field.line,
      );
    seen.add(label);
  }
}

function verify(lowering: StageLowering, read: Read, context: CellContext): Placed | null {
  const { tree } = context;
  const status = lowering.status === null ? 0 : read(lowering.status);
  if (status === 0) return null;
  const text = POINT_STATUS_SENTENCES[status] ?? 'No operating point was found.';
  return {
    line: tree.line,
    message: {
      code: 'not-solved',
      text: `${tree.name.name} was not solved. ${text} No value is shown that rests on it.`,
      span: tree.entry.span,
    },
  };
}

/** The table of offered values, filled with what this stage has. */
function offersOf(
  lowering: StageLowering | null,
  places: Places,
  entry: StageEntry,
  missingText: string,
): OfferDraft[] {
  const offers: OfferDraft[] = [];
  const add = (row: OfferedValue, name: string): void => {
    const handle = lowering?.values.get(name) ?? null;
    const missing =
      handle === null ? (lowering?.absent.get(name) ?? (missingText || `${name} is not computed yet.`)) : null;
    offers.push({
      name,
      type: OFFERED_KIND[row.unit],
      handle,
      sentence: row.sentence,
      missing: missing === null ? null : absentValue(missing, entry.span),
    });
  };
  for (const row of OFFERED_VALUES) {
    if (row.per === 'place')
      for (const place of [...places.terminals, ...places.nodes]) addPlace(add, row, place, lowering);
    else if (row.per === 'stage' || entry.fets.length === 1) add(row, row.name);
    else {
      if (row.name === 'margin') add(row, 'margin');
      for (const fet of entry.fets) add(row, `${fet.name!.name}.${row.name}`);
    }
  }
  return offers;
}

/** `V_drain`, `V_out`, `Qa.V_drain`; a bulk that the FET does not have is left out. */
function addPlace(
  add: (row: OfferedValue, name: string) => void,
  row: OfferedValue,
  place: string,
  lowering: StageLowering | null,
): void {
  const [fet, terminal] = place.includes('.') ? place.split('.') : [null, place];
  const name = fet === null ? `V_${terminal}` : `${fet}.V_${terminal}`;
  if (lowering && terminal === 'bulk' && !lowering.values.has(name)) return;
  add(row, name);
}
