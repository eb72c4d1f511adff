// What a bench's numbers do not say by themselves: doubts of the fit, and readings that heated the specimen.

import type { CellTree } from '../../language/index.ts';
import { selfHeating } from '../../measured/index.ts';
import { CURRENT, TEMPERATURE_DIFFERENCE, VOLTAGE, formatValue } from '../../quantity/index.ts';
import { gateAt } from './fits.ts';
import type { FittedSpecimen, UnfittedSpecimen } from './fits.ts';
import type { BenchSettings } from './settings.ts';

/** Rise of the junction in K from which a reading is not that of a cool specimen (common practice, no source). */
const WARM = 2;

interface Found {
  readonly text: string;
  readonly line: CellTree['line'];
}

/** Every caution of a bench. */
export function benchCautions(
  specimens: readonly FittedSpecimen[],
  unfitted: readonly UnfittedSpecimen[],
  settings: BenchSettings,
): Found[] {
  const { match, fitting } = settings;
  const second = match?.I_second ? [{ ...match, I_D: match.I_second }] : [];
  const asked = [...(match ? [match] : []), ...second, ...(fitting ? [fitting] : [])];
  return [
    ...unfitted.map(({ specimen: { name, rows }, text }) => ({
      text: `${name} is left out, since it cannot be fitted. ${text}`,
      line: rows[0]!.line,
    })),
    ...specimens.flatMap((each) => [...doubts(each), ...heat(each, settings)]),
    ...asked.flatMap((point) => beyond(specimens, point)),
  ];
}

/** What is asked at a current that a specimen carries only in another way than is computed. */
function beyond(
  specimens: readonly FittedSpecimen[],
  { I_D, V_DS, tree }: { readonly I_D: number; readonly V_DS: number; readonly tree: { readonly line: Found['line'] } },
): Found[] {
  const kept = specimens.filter(({ reading }) => reading.isKept);
  const current = formatValue(I_D, CURRENT).text;
  const namesOf = (which: (each: FittedSpecimen) => boolean): string =>
    kept
      .filter(which)
      .map(({ specimen }) => specimen.name || 'the specimen')
      .join(', ');
  const forward = namesOf(({ fit, reading }) => reading.I_DSS > 0 && fit.channel * gateAt(fit, { I_D, V_DS }) > 0);
  const ohmic = namesOf(({ fit }) => fit.channel * (gateAt(fit, { I_D, V_DS }) - fit.V_TO) > V_DS);
  const drain = formatValue((kept[0]?.fit.channel ?? 1) * (V_DS || 0), VOLTAGE, { zeros: 'drop' }).text;
  return [
    ...(forward === ''
      ? []
      : [
          `More than I_DSS is asked of ${forward} at ${current}: V_GS lies beyond 0 V there, where the gate of a JFET conducts.`,
        ]),
    ...(ohmic === ''
      ? []
      : [
          `A V_DS of ${drain} leaves ${ohmic} ohmic at ${current}, and the law of saturation is taken. Write a V_DS above V_DSsat.`,
        ]),
  ].map((text) => ({ text, line: tree.line }));
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
