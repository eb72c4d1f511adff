// An amount of every kind that a field may have, as an author would write it.

import * as kinds from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';

const EXAMPLES: readonly (readonly [ValueKind, string])[] = [
  [kinds.VOLTAGE, '2 V'],
  [kinds.CURRENT, '2 mA'],
  [kinds.RESISTANCE, '10 ohm'],
  [kinds.CONDUCTANCE, '2 mS'],
  [kinds.CAPACITANCE, '5 pF'],
  [kinds.SQUARE_LAW_CONSTANT, '2 mA/V^2'],
  [kinds.RECIPROCAL_VOLTAGE, '0.01 /V'],
  [kinds.ROOT_VOLTAGE, '0.5 V^0.5'],
  [kinds.LENGTH, '2 um'],
  [kinds.FREQUENCY, '1 kHz'],
  [kinds.NOISE_VOLTAGE_DENSITY, '5 nV/√Hz'],
  [kinds.TEMPERATURE_POINT, '25 degC'],
  [kinds.TEMPERATURE_DIFFERENCE, '10 K'],
  [kinds.THERMAL_RESISTANCE, '300 K/W'],
  [kinds.VOLTAGE_TEMPERATURE_COEFFICIENT, '2 mV/K'],
  [kinds.PLAIN, '0.5'],
];

/** An amount of a kind, with its sign: `2 mA`, `-2 V`. */
export function exampleAmount(kind: ValueKind, sign: 1 | -1 = 1): string {
  const found = EXAMPLES.find(([known]) => kinds.sameKind(known, kind));
  if (!found) throw new RangeError('No example of this kind.');
  return sign === -1 ? `-${found[1]}` : found[1];
}
