// The kinds of the values that a stage or point offers, from the unit words of the table of offered values.

import {
  CAPACITANCE,
  CONDUCTANCE,
  CURRENT,
  FREQUENCY,
  PLAIN,
  POWER,
  RESISTANCE,
  TEMPERATURE_POINT,
  VOLTAGE,
} from '../quantity/index.ts';
import type { OfferedUnit } from '../network/index.ts';
import type { ValueType } from './model.ts';

/** What an offered unit word stands for; `K` is a point of the temperature scale there. */
export const OFFERED_KIND: Readonly<Record<OfferedUnit, ValueType>> = {
  A: CURRENT,
  V: VOLTAGE,
  S: CONDUCTANCE,
  ohm: RESISTANCE,
  '1': PLAIN,
  K: TEMPERATURE_POINT,
  W: POWER,
  F: CAPACITANCE,
  Hz: FREQUENCY,
  region: 'region',
};
