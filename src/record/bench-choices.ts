// What a bench is measured for: specimens that match, and the resistor that sets each to a current.

import { CURRENT, RESISTANCE, VOLTAGE, formatValue } from '../quantity/index.ts';
import type { ValueKind } from '../quantity/index.ts';
import type { BenchReading } from '../sheet/index.ts';
import { byColumns, namesOf, number, quantity, word } from './bench-table.ts';
import type { BenchTable } from './bench-table.ts';
import { NONE, columnTexts } from './column-texts.ts';

const METER_DIGITS = 4;

/** One row for each pair or quad. */
export function matchingTable(
  { channel }: BenchReading,
  { size, I_D, I_second, V_DS, groups, single }: NonNullable<BenchReading['match']>,
): BenchTable {
  const isPair = size === 2;
  const there = I_second === null ? null : shown(I_second, CURRENT);
  const gates = groups.flatMap(({ members }) => members.map(({ V_GS }) => V_GS));
  const gateTexts = columnTexts(gates, VOLTAGE, METER_DIGITS);
  const sentences = [
    `${isPair ? 'Pairs' : 'Quads'} by the difference of V_GS at ${shown(I_D, CURRENT)}${atDrain(V_DS, channel)}, which is their offset.`,
    isPair
      ? 'R_S in the source lead of the one that is named takes it away.'
      : 'R_S in the source leads of those that are named takes it away.',
    ...(single.length === 0 ? [] : [`Left over: ${single.join(', ')}.`]),
  ];
  const resistors = groups.map(({ members }) => {
    const fitted = members.filter(({ R_S }) => R_S > 0);
    return fitted.map(({ name, R_S }) => `${shown(R_S, RESISTANCE)} at ${name}`).join(', ') || NONE;
  });
  return {
    name: 'matching',
    caption: sentences.join(' '),
    ...byColumns([
      word(
        isPair ? 'pair' : 'quad',
        groups.map(({ members }) => members.map(({ name }) => name).join(', ')),
      ),
      quantity(
        'V_GS',
        groups.map((_, k) => gateTexts.slice(k * size, (k + 1) * size).join(', ')),
      ),
      number(
        'offset',
        columnTexts(
          groups.map(({ difference }) => difference),
          VOLTAGE,
        ),
      ),
      ...(there === null
        ? []
        : [
            number(
              `at ${there}`,
              columnTexts(
                groups.map(({ second }) => second),
                VOLTAGE,
              ),
            ),
          ]),
      word('R_S', resistors),
      ...(there === null
        ? []
        : [
            number(
              `at ${there} with R_S`,
              columnTexts(
                groups.map(({ equalised }) => equalised),
                VOLTAGE,
              ),
            ),
          ]),
    ]),
  };
}

/** The resistor of each specimen, and the table by which the next ones are fitted. */
export function fittingTables(
  { channel }: BenchReading,
  { I_D, V_DS, V_GG, specimens, table }: NonNullable<BenchReading['fitting']>,
): BenchTable[] {
  const gate = V_GG === 0 ? '' : ` and V_GG = ${drop(V_GG, VOLTAGE)}`;
  const at = `${shown(I_D, CURRENT)}${atDrain(V_DS, channel)}`;
  const hasNames = specimens.some(({ name }) => name !== '');
  const own: BenchTable = {
    name: 'specimens',
    caption: `R_S that sets ${hasNames ? 'each specimen' : 'the specimen'} to ${at}${gate}; the nearest E24 value, and the current with it.`,
    ...byColumns([
      ...(hasNames ? [word('specimen', namesOf(specimens))] : []),
      quantity(
        'V_GS',
        columnTexts(
          specimens.map(({ V_GS }) => V_GS),
          VOLTAGE,
          METER_DIGITS,
        ),
      ),
      quantity(
        'R_S',
        columnTexts(
          specimens.map(({ R_S }) => R_S),
          RESISTANCE,
        ),
      ),
      number(
        'E24',
        specimens.map(({ bought }) => (bought ? drop(bought.R_S, RESISTANCE) : NONE)),
      ),
      number(
        'I_D then',
        columnTexts(
          specimens.map(({ bought }) => bought && bought.I_D),
          CURRENT,
        ),
      ),
    ]),
  };
  if (table.length === 0) return [own];
  const ends = columnTexts(
    table.flatMap(({ from, to }) => [from, to]),
    VOLTAGE,
    METER_DIGITS,
  );
  const fitting: BenchTable = {
    name: 'fitting',
    caption: `For the bench: V_GS measured at ${at}, and the E24 resistor to fit${gate === '' ? '' : ` with${gate.slice(4)}`}.`,
    ...byColumns([
      number(
        'V_GS from',
        ends.filter((_, i) => i % 2 === 0),
      ),
      number(
        'to',
        ends.filter((_, i) => i % 2 === 1),
      ),
      number(
        'R_S to fit',
        table.map(({ R_S }) => drop(R_S, RESISTANCE)),
      ),
    ]),
  };
  return [own, fitting];
}

/** ` and V_DS = 5 V`; nothing for the edge of saturation. */
function atDrain(V_DS: number, channel: 1 | -1): string {
  return Number.isNaN(V_DS) ? '' : ` and V_DS = ${drop(channel * V_DS, VOLTAGE)}`;
}

function shown(value: number, kind: ValueKind): string {
  return formatValue(value, kind).text;
}

function drop(value: number, kind: ValueKind): string {
  return formatValue(value, kind, { zeros: 'drop' }).text;
}
