// Which place every leg of a stage leads to: a terminal, a named node, the test source or a rail.

import { nearestNames } from '../../language/index.ts';
import type { CellTree, FieldTree, Leg, NameRef, StageEntry } from '../../language/index.ts';
import { VOLTAGE, sameKind } from '../../quantity/index.ts';
import { OFFERED_VALUES } from '../../network/index.ts';
import type { PlaceRef } from '../../network/index.ts';
import type { CellContext } from '../draft.ts';
import { compileQuantity } from '../operand.ts';
import { operandText } from '../scope.ts';
import { stop } from '../stop.ts';
import { typeName } from '../value-type.ts';

/** The labels that a stage's fields may bear besides its places. */
const SETTINGS = ['output', 'driven', 'midband'];
/** Names that other notations have for the place at 0 V. */
const GROUND = /^(gnd|agnd|dgnd|ground|earth)$/i;
const TERMINALS = ['gate', 'drain', 'source', 'bulk'];

export interface Places {
  /** Named nodes in sheet order, terminals not among them. */
  readonly nodes: readonly string[];
  /** The terminals that a leg or an output may name. */
  readonly terminals: readonly string[];
  /** Those of them that its FETs have, to be named in messages. */
  readonly present: readonly string[];
}

/** Collects the places of a stage; stops when a node bears the name of a cell. */
export function placesOf(tree: CellTree, entry: StageEntry, context: CellContext): Places {
  const named = entry.fets.filter((fet) => fet.name !== null).map((fet) => fet.name!.name);
  const terminals =
    named.length > 0 ? named.flatMap((fet) => TERMINALS.map((terminal) => `${fet}.${terminal}`)) : TERMINALS;
  const present = entry.fets.flatMap((fet) => {
    const hasBulk = context.look(fet.part.name)?.extra?.family !== 'JFET';
    return TERMINALS.filter((terminal) => hasBulk || terminal !== 'bulk').map((terminal) =>
      fet.name === null ? terminal : `${fet.name.name}.${terminal}`,
    );
  });
  const nodes: string[] = [];
  for (const field of tree.fields) {
    const label = labelOf(field);
    if (SETTINGS.includes(label) || terminals.includes(label)) continue;
    const [first] = field.label;
    if (field.label.length > 1 || TERMINALS.includes(label.toLowerCase())) unknownTerminal(field, present);
    if (context.has(label)) {
      stop(
        'node-named-like-cell',
        `${label} is a cell of this sheet, so it cannot also be a node of the stage. Give the node another name.`,
        first!.span,
        field.line,
      );
    }
    if (OFFERED_VALUES.some((value) => value.name === `V_${label}`)) {
      stop(
        'node-name-taken',
        `A node ${label} would offer V_${label}, which is a voltage of the FET. Give the node another name.`,
        first!.span,
        field.line,
      );
    }
    nodes.push(label);
  }
  return { nodes, terminals, present };
}

/** `gate`, `Qa.gate`, `out`. */
export function labelOf(field: FieldTree): string {
  return field.label.map((part) => part.name).join('.');
}

/** Resolves the far place of a leg; stops when it is neither a place nor a voltage. */
export function resolvePlace(leg: Leg, field: FieldTree, places: Places, context: CellContext): PlaceRef {
  const { place } = leg;
  if (place.type === 'signal') return { type: 'signal', inverted: place.inverted };
  if (place.type === 'common') return { type: 'common' };
  const { expr } = place;
  const label = field.line.text.slice(expr.span.start, expr.span.end).trim();
  if (expr.type === 'path') {
    const name = expr.names.map((part) => part.name).join('.');
    if (places.terminals.includes(name) || places.nodes.includes(name)) return { type: 'node', name };
    const first = expr.names[0]!.name;
    if (expr.names.length === 1 && context.look(first) === null)
      unknownPlace(name, expr.names[0]!, field, places, context);
  }
  const volts = compileQuantity(expr, context.scope(field.line));
  if (!sameKind(volts.type, VOLTAGE)) {
    stop(
      'place-kind',
      `A leg leads to a place or a rail voltage; ${operandText(field.line, expr.span, 'this')} is ${typeName(volts.type)}. Write for example to 0 V.`,
      expr.span,
      field.line,
    );
  }
  return { type: 'rail', volts: volts.handle, label };
}

function unknownPlace(name: string, at: NameRef, field: FieldTree, places: Places, context: CellContext): never {
  const near = nearestNames(name, [...places.present, ...places.nodes, 'signal', ...context.names()]);
  const hint = GROUND.test(name)
    ? ' Ground is a rail of 0 V: write to 0 V.'
    : near.length > 0
      ? ` Did you mean ${near.join(' or ')}?`
      : ` A node of its own gets a line: ${name}: R to 0 V.`;
  stop('unknown-place', `There is no place ${name} in this stage and no such cell.${hint}`, at.span, field.line);
}

function unknownTerminal(field: FieldTree, terminals: readonly string[]): never {
  const near = nearestNames(labelOf(field), terminals);
  stop(
    'unknown-terminal',
    `${labelOf(field)} is no terminal of this stage. Its terminals are ${terminals.join(', ')}.${near.length > 0 ? ` Did you mean ${near[0]}?` : ''}`,
    field.labelSpan,
    field.line,
  );
}
