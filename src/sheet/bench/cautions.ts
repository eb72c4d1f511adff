// What a bench's numbers do not say by themselves: doubts of the fit, and readings that heated the specimen.

import type { CellTree } from '../../language/index.ts';
import { selfHeating } from '../../measured/index.ts';
import { TEMPERATURE_DIFFERENCE, formatValue } from '../../quantity/index.ts';
import type { FittedSpecimen } from './fits.ts';
import type { BenchSettings } from './settings.ts';

/** Rise of the junction in K from which a reading is not that of a cool specimen (common practice, no source). */
const WARM = 2;

interface Found {
  readonly text: string;
  readonly line: CellTree['line'];
}

/** Every caution of a bench. */
export function benchCautions(specimens: readonly FittedSpecimen[], settings: BenchSettings): Found[] {
  return specimens.flatMap((each) => [...doubts(each), ...heat(each, settings)]);
}

function doubts({ specimen, fit, free }: FittedSpecimen): Found[] {
  const { line } = specimen.rows[0]!;
  const flags = [
    ...fit.flags,
    ...(free?.flags ?? []).filter(({ code }) => !fit.flags.some((flag) => flag.code === code)),
  ];
  return flags.map(({ text }) => ({ text: specimen.name === '' ? text : `${specimen.name}: ${text}`, line }));
}

function heat({ specimen }: FittedSpecimen, { R_thJA }: BenchSettings): Found[] {
  if (!R_thJA) return [];
  const { worst, index } = selfHeating(specimen.points, R_thJA.value);
  if (worst <= WARM) return [];
  const rise = formatValue(worst, TEMPERATURE_DIFFERENCE).text;
  const whose = specimen.name === '' ? 'The specimen' : specimen.name;
  const text = `${whose} was ${rise} above ambient at this reading if it settled there, more than ${WARM} K: its threshold and constant had moved. Measure with short pulses, or at a lower V_DS.`;
  return [{ text, line: specimen.rows[index]!.line }];
}
