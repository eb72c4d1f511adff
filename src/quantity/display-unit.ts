// In which unit a value is shown where the sheet does not say: the SI unit of its kind with an
// engineering prefix on the first symbol (nV/√Hz, mA/V²), °C for a point of the temperature scale.

import { siFactors } from './dimension-name.ts';
import type { ValueKind } from './kind.ts';
import type { UnitFactor } from './unit-factor.ts';
import { asciiFactors, typesetFactors } from './unit-factor.ts';
import type { Prefix } from './unit-symbols.ts';
import { PREFIXES } from './unit-symbols.ts';
import type { Unit } from './unit.ts';
import { asciiUnit } from './unit.ts';

/** A unit ready to be printed: how it is set, how it is typed, and 10^exponent10 SI units in one of it. */
export interface DisplayUnit {
  readonly typeset: string;
  readonly ascii: string;
  readonly exponent10: number;
}

const LOWEST_PREFIX = -15;
const HIGHEST_PREFIX = 9;
/** Nobody counts time in kiloseconds. */
const HIGHEST_PREFIX_OF: Readonly<Record<string, number>> = { s: 0 };

/** A unit that the sheet names, as a display unit; its power of ten is 0 where its factor is none. */
export function displayUnitOf(unit: Unit): DisplayUnit {
  return { typeset: unit.symbol, ascii: asciiUnit(unit), exponent10: unit.exponent10 ?? 0 };
}

/**
 * The unit of a kind under a prefix, given by its power of ten (3 for k, 0 for none). A kind that takes none
 * ignores it; throws RangeError for a power of ten that has no prefix.
 */
export function prefixedUnit(kind: ValueKind, prefix: number): DisplayUnit {
  if (kind.scale === 'celsius') return { typeset: '°C', ascii: 'degC', exponent10: 0 };
  if (kind.scale === 'decibel') return { typeset: 'dB', ascii: 'dB', exponent10: 0 };
  const factors = siFactors(kind.dimension);
  const power = prefixPower(factors);
  if (power === 0 || prefix === 0) return withPrefix(factors, null, 0);
  const found = PREFIXES.find((each) => each.exponent10 === prefix);
  if (!found) throw new RangeError(`no prefix stands for 1e${prefix}`);
  return withPrefix(factors, found, prefix * power);
}

/**
 * The power of ten of the prefix under which a value reads best, so that 1 to 3 digits stand before the point; `lead` is
 * the power of ten of its first digit. 0 where the kind takes no prefix or the value lies beyond f and G.
 */
export function choosePrefix(kind: ValueKind, lead: number): number {
  if (kind.scale !== 'linear') return 0;
  const factors = siFactors(kind.dimension);
  const power = prefixPower(factors);
  if (power === 0) return 0;
  // Under a square the steps are a million wide: stay without prefix as long as that reads well.
  if (power > 1 && lead >= -3 && lead < 3 * power) return 0;
  const highest = HIGHEST_PREFIX_OF[factors[0]!.symbol.ascii] ?? HIGHEST_PREFIX;
  const prefix = Math.floor(lead / (3 * power)) * 3;
  if (prefix < LOWEST_PREFIX) return 0;
  if (prefix > HIGHEST_PREFIX) return lead < (HIGHEST_PREFIX + 3) * power ? HIGHEST_PREFIX : 0;
  return Math.min(prefix, highest);
}

/** The exponent of the symbol that takes the prefix; 0 where none does: kelvin, √V, /V, plain numbers. */
function prefixPower(factors: readonly UnitFactor[]): number {
  const [first] = factors;
  if (!first || first.divides || first.root || first.symbol.ascii === 'K') return 0;
  const power = first.exponent.value;
  return Number.isInteger(power) && power > 0 ? power : 0;
}

function withPrefix(factors: readonly UnitFactor[], prefix: Prefix | null, exponent10: number): DisplayUnit {
  const prefixed = factors.map((factor, i) => (i === 0 ? { ...factor, prefix } : factor));
  return { typeset: typesetFactors(prefixed), ascii: asciiFactors(prefixed), exponent10 };
}
