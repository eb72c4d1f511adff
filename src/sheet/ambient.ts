// T_A, the one cell name with a meaning of its own: what it may be, and what stands in where there is none.

import type { Line, QuantityEntry } from '../language/index.ts';
import { TEMPERATURE_DIFFERENCE, TEMPERATURE_POINT, formatValue, sameDimension, sameKind } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { Placed } from './draft.ts';
import type { DeclaredSpread, ValueType } from './model.ts';
import { operandText } from './scope.ts';
import { stop } from './stop.ts';
import { isQuantity, typeName } from './value-type.ts';

/** Ambient temperature in K, 25 degC, where the sheet has no cell T_A. */
export const DEFAULT_AMBIENT = 298.15;

/** Ambient temperatures in K beyond which a slip is likelier than the place (common practice, no source). */
const COLDEST = 213.15;
const HOTTEST = 473.15;

/** A difference in kelvin read as a point of the scale: 300 K as an ambient temperature is absolute. */
export function kelvinAsPoint(kind: ValueKind): ValueKind {
  return sameKind(kind, TEMPERATURE_DIFFERENCE) ? TEMPERATURE_POINT : kind;
}

/** Stops where T_A is no temperature. */
export function checkAmbientKind(type: ValueType, entry: QuantityEntry, line: Line): void {
  if (isQuantity(type) && sameDimension(type.dimension, TEMPERATURE_POINT.dimension)) return;
  stop(
    'ambient-kind',
    `T_A is the ambient temperature at which every stage stands; ${operandText({ text: line.text }, entry.span, 'this')} is ${typeName(type)}. Write it as 25 degC, or give the cell another name.`,
    entry.span,
  );
}

/** The fault of an ambient temperature in K, or of one of its limits, at or below absolute zero. */
export function ambientFault(
  value: number,
  spread: DeclaredSpread | null,
  entry: QuantityEntry,
  line: Line,
): Placed | null {
  if (ends(value, spread).every((kelvin) => kelvin > 0)) return null;
  const text = 'T_A lies at or below absolute zero. Write a temperature above −273.15 degC, such as 25 degC.';
  return { line, message: { code: 'ambient-range', text, span: entry.span } };
}

/** What is said of an ambient temperature in K, or a limit of it, at which no board is likely to stand. */
export function ambientCautions(value: number, spread: DeclaredSpread | null): string[] {
  const odd = ends(value, spread).find((kelvin) => kelvin < COLDEST || kelvin > HOTTEST);
  if (odd === undefined) return [];
  const shown = formatValue(odd, TEMPERATURE_POINT, { zeros: 'drop' }).text;
  return [
    `T_A reaches ${shown}, outside −60 °C to 200 °C, where FETs are hardly used: a number in K is absolute, one in degC is not.`,
  ];
}

function ends(value: number, spread: DeclaredSpread | null): number[] {
  return [value, spread?.low ?? value, spread?.high ?? value];
}
