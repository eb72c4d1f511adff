// Amounts as the sentences of a band have them.

import { CURRENT, formatValue, RESISTANCE, VOLTAGE } from '../../quantity/index.ts';

/** Three digits, with the unit. */
export const volts = (value: number): string => formatValue(value, VOLTAGE).text;
/** As many digits as tell, with the unit. */
export const amps = (value: number): string => formatValue(value, CURRENT, { zeros: 'drop' }).text;
/** Three digits, with the unit. */
export const resistance = (value: number): string => formatValue(value, RESISTANCE).text;
