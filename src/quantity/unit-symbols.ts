// The symbols of the grammar's `unit`: their spellings, what they mean, and which of them take a prefix.

import type { ValueKind } from './kind.ts';
import * as kinds from './kind.ts';

export interface UnitSymbol {
  /** The spelling in plain ASCII, as the sheet language reads it. */
  readonly ascii: string;
  readonly typeset: string;
  /** Further spellings that mean the same. */
  readonly aliases: readonly string[];
  readonly kind: ValueKind;
  readonly factor: number;
  /** factor = 10^exponent10, or null where it is no power of ten. */
  readonly exponent10: number | null;
  readonly prefixes: boolean;
}

const prefixed = (ascii: string, kind: ValueKind, typeset = ascii, aliases: readonly string[] = []): UnitSymbol => ({
  ascii,
  typeset,
  aliases,
  kind,
  factor: 1,
  exponent10: 0,
  prefixes: true,
});

const bare = (ascii: string, typeset: string, aliases: readonly string[], exponent10: number): UnitSymbol => ({
  ascii,
  typeset,
  aliases,
  kind: kinds.PLAIN,
  factor: Number(`1e${exponent10}`),
  exponent10,
  prefixes: false,
});

const OHM = prefixed('ohm', kinds.RESISTANCE, 'Ω', ['\u03a9', '\u2126']);
const FARAD = prefixed('F', kinds.CAPACITANCE);
export const DEGREE_CELSIUS: UnitSymbol = {
  ...bare('degC', '°C', ['\u00b0C', '\u00baC', '\u2103'], 0),
  kind: kinds.TEMPERATURE_POINT,
};
export const DECIBEL_SYMBOL: UnitSymbol = { ...bare('dB', 'dB', [], 0), kind: kinds.DECIBEL };

export const UNIT_SYMBOLS: readonly UnitSymbol[] = [
  prefixed('V', kinds.VOLTAGE),
  prefixed('A', kinds.CURRENT),
  OHM,
  FARAD,
  prefixed('H', kinds.INDUCTANCE),
  prefixed('S', kinds.CONDUCTANCE),
  prefixed('W', kinds.POWER),
  prefixed('Hz', kinds.FREQUENCY),
  prefixed('s', kinds.TIME),
  prefixed('K', kinds.TEMPERATURE_DIFFERENCE),
  prefixed('C', kinds.CHARGE),
  prefixed('m', kinds.LENGTH),
  bare('%', '%', [], -2),
  bare('ppm', 'ppm', [], -6),
  DECIBEL_SYMBOL,
  { ...bare('deg', '°', ['\u00b0', '\u00ba'], 0), factor: Math.PI / 180, exponent10: null },
  bare('rad', 'rad', [], 0),
  DEGREE_CELSIUS,
];

export interface Prefix {
  readonly ascii: string;
  readonly typeset: string;
  readonly aliases: readonly string[];
  readonly exponent10: number;
}

const prefix = (ascii: string, exponent10: number, typeset = ascii, aliases: readonly string[] = []): Prefix => ({
  ascii,
  typeset,
  aliases,
  exponent10,
});

/** From the smallest to the largest. */
export const PREFIXES: readonly Prefix[] = [
  prefix('f', -15),
  prefix('p', -12),
  prefix('n', -9),
  prefix('u', -6, '\u00b5', ['\u00b5', '\u03bc']),
  prefix('m', -3),
  prefix('k', 3),
  prefix('M', 6),
  prefix('G', 9),
];

interface ReadWord {
  readonly prefix: Prefix | null;
  readonly symbol: UnitSymbol;
}

const SYMBOL_BY_SPELLING = new Map<string, UnitSymbol>();
for (const symbol of UNIT_SYMBOLS)
  for (const spelling of [symbol.ascii, ...symbol.aliases]) SYMBOL_BY_SPELLING.set(spelling, symbol);

const PREFIX_BY_SPELLING = new Map<string, Prefix>();
for (const each of PREFIXES)
  for (const spelling of [each.ascii, ...each.aliases]) PREFIX_BY_SPELLING.set(spelling, each);

/** The symbol spelled exactly so (`ohm`, `Ω`, `%`), or undefined. */
export function findSymbol(spelling: string): UnitSymbol | undefined {
  return SYMBOL_BY_SPELLING.get(spelling);
}

/** The prefix spelled exactly so, or undefined. */
export function findPrefix(spelling: string): Prefix | undefined {
  return PREFIX_BY_SPELLING.get(spelling);
}

/** Reads a whole word as prefix and symbol; a symbol alone comes first (`m` is metre, `dB` no deci-). Null where it is none. */
export function readWord(word: string): ReadWord | null {
  const alone = SYMBOL_BY_SPELLING.get(word);
  if (alone) return { prefix: null, symbol: alone };
  const before = PREFIX_BY_SPELLING.get(word.slice(0, 1));
  const symbol = SYMBOL_BY_SPELLING.get(word.slice(1));
  return before && symbol?.prefixes ? { prefix: before, symbol } : null;
}

/** Whether the name is a unit symbol, with or without prefix (`V`, `mA`, `K`, `kohm`), and so no cell name. */
export function isUnitSymbol(name: string): boolean {
  return readWord(name) !== null;
}
