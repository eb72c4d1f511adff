// What the trade calls each dimension, and the unit in which it is shown. The dimensions are read from
// the units themselves, so a row cannot contradict its unit.

import type { Dimension } from './dimension.ts';
import { sameDimension } from './dimension.ts';
import type { ValueKind } from './kind.ts';
import { asciiFactors, typesetFactors } from './unit-factor.ts';
import type { UnitFactor } from './unit-factor.ts';
import { UNIT_SYMBOLS } from './unit-symbols.ts';
import { knownFactors, knownUnit } from './unit.ts';

/** Unit in the spelling of the sheet language, and name with its article. */
const NAMES: readonly (readonly [unit: string, name: string])[] = [
  ['V', 'a voltage'],
  ['A', 'a current'],
  ['ohm', 'a resistance'],
  ['S', 'a conductance'],
  ['F', 'a capacitance'],
  ['H', 'an inductance'],
  ['C', 'a charge'],
  ['W', 'a power'],
  ['W*s', 'an energy'],
  ['Hz', 'a frequency'],
  ['Hz^0.5', 'a square root of a frequency'],
  ['s', 'a time'],
  ['m', 'a length'],
  ['m^2', 'an area'],
  ['K', 'a temperature difference'],
  ['K/W', 'a thermal resistance'],
  ['W/K', 'a thermal conductance'],
  ['V/K', 'a temperature coefficient of voltage'],
  ['A/K', 'a temperature coefficient of current'],
  ['/K', 'a relative temperature coefficient'],
  ['W*s/K', 'an energy per kelvin'],
  ['A/V^2', 'a square-law constant'],
  ['/V', 'a reciprocal voltage'],
  ['/A', 'a reciprocal current'],
  ['V^0.5', 'a body-effect coefficient'],
  ['V^2', 'a squared voltage'],
  ['A^2', 'a squared current'],
  ['V/Hz^0.5', 'a noise voltage density'],
  ['A/Hz^0.5', 'a noise current density'],
  ['V^2/Hz', 'a squared noise voltage density'],
  ['A^2/Hz', 'a squared noise current density'],
  ['V*s', 'a magnetic flux'],
  ['V/s', 'a slew rate'],
  ['A/s', 'a rate of change of current'],
  ['V/m', 'an electric field'],
  ['A/m', 'a current per length'],
  ['A/m^2', 'a current density'],
  ['F/m', 'a capacitance per length'],
  ['F/m^2', 'a capacitance per area'],
  ['m^2/V/s', 'a mobility'],
];

interface NamedDimension {
  readonly dimension: Dimension;
  readonly name: string;
  readonly factors: readonly UnitFactor[];
}

const NAMED: readonly NamedDimension[] = NAMES.map(([unit, name]) => ({
  dimension: knownUnit(unit).kind.dimension,
  name,
  factors: knownFactors(unit),
}));

const BASE = ['V', 'A', 's', 'K', 'm'].map((ascii) => UNIT_SYMBOLS.find((symbol) => symbol.ascii === ascii)!);

/** What the trade calls a value of this kind, with its article: "a voltage", "a level in dB", "a quantity in A²/V". */
export function dimensionName(kind: ValueKind): string {
  if (kind.scale === 'celsius') return 'a temperature';
  if (kind.scale === 'decibel') return 'a level in dB';
  const named = findNamed(kind.dimension);
  if (named) return named.name;
  const factors = siFactors(kind.dimension);
  return factors.length === 0 ? 'a plain number' : `a quantity in ${withUnity(typesetFactors(factors))}`;
}

/** The SI unit of the stored number in ASCII: `ohm`, `A/V^2`, `V/Hz^0.5`, `1/V`; `1` for a plain number, `dB` for a level. */
export function siUnitText(kind: ValueKind): string {
  if (kind.scale === 'decibel') return 'dB';
  const factors = siFactors(kind.dimension);
  return factors.length === 0 ? '1' : withUnity(asciiFactors(factors));
}

/** The factors of the SI unit in which the trade writes this dimension; none for a plain number. */
export function siFactors(dimension: Dimension): readonly UnitFactor[] {
  return findNamed(dimension)?.factors ?? baseFactors(dimension);
}

function findNamed(dimension: Dimension): NamedDimension | undefined {
  return NAMED.find((named) => sameDimension(named.dimension, dimension));
}

/** `/V` as `1/V`, where it does not stand behind a number. */
function withUnity(unit: string): string {
  return unit.startsWith('/') ? `1${unit}` : unit;
}

/** Base units, those above the line first. */
function baseFactors(dimension: Dimension): readonly UnitFactor[] {
  const factors = dimension.flatMap((power, i): UnitFactor[] => {
    const magnitude = Math.round(Math.abs(power) * 1e6) / 1e6;
    if (magnitude === 0) return [];
    const root = magnitude % 1 === 0.5;
    const value = root ? magnitude * 2 : magnitude;
    return [{ divides: power < 0, root, prefix: null, symbol: BASE[i], exponent: { text: String(value), value } }];
  });
  return [...factors.filter((factor) => !factor.divides), ...factors.filter((factor) => factor.divides)];
}
