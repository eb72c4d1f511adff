// What is wrong with a text that should be a unit, where, and what would be right there.

import type { UnitSymbol } from './unit-symbols.ts';
import { findPrefix, findSymbol, PREFIXES, readWord, UNIT_SYMBOLS } from './unit-symbols.ts';

type UnitFaultKind =
  | 'unit missing'
  | 'unknown symbol'
  | 'wrong case'
  | 'prefix alone'
  | 'prefix not allowed'
  | 'power not allowed'
  | 'stands alone'
  | 'blank inside'
  | 'text behind';

/** A fault of `text`, which stands at [start, end) of what was read; `hint` is what would be right in its place. */
export interface UnitFault {
  readonly fault: UnitFaultKind;
  readonly text: string;
  readonly start: number;
  readonly end: number;
  readonly hint: string | null;
}

/** Whether a unit could not be read. */
export function isUnitFault(read: object): read is UnitFault {
  return 'fault' in read;
}

/** A sentence on the fault and what would be right. */
export function describeUnitFault({ fault, text, hint }: UnitFault): string {
  const write = hint === null ? '' : ` Write ${hint}.`;
  switch (fault) {
    case 'unit missing':
      return `A unit should stand here.${write}`;
    case 'unknown symbol':
      return `${text} is not a unit known here.${write}`;
    case 'wrong case':
      return `${text} is not a unit: capital and small letters differ.${write}`;
    case 'prefix alone':
      return `${text} is a prefix without a unit behind it.${write}`;
    case 'prefix not allowed':
      return `${text} carries a prefix, which this unit never has.${write}`;
    case 'power not allowed':
      return `${text} carries a power that this unit does not take.${write}`;
    case 'stands alone':
      return `dB takes no other unit beside it, so ${text} is not a unit.${write}`;
    case 'blank inside':
      return `A unit has no blank inside.${write}`;
    case 'text behind':
      return `${text} does not belong to the unit before it.${write}`;
  }
}

/** Names, habits and other trades' symbols, in small letters; '' where there is no unit to offer. */
const OTHER_NAMES: ReadonlyMap<string, string> = new Map(
  Object.entries({
    volt: 'V',
    amp: 'A',
    ampere: 'A',
    farad: 'F',
    henry: 'H',
    henries: 'H',
    siemens: 'S',
    mho: 'S',
    watt: 'W',
    hertz: 'Hz',
    second: 's',
    sec: 's',
    kelvin: 'K',
    coulomb: 'C',
    meter: 'm',
    metre: 'm',
    r: 'ohm',
    rthz: 'Hz^0.5',
    j: 'W*s',
    joule: 'W*s',
  }),
);
const OTHER_WORDS: ReadonlyMap<string, string> = new Map(
  Object.entries({
    percent: '%',
    pct: '%',
    celsius: 'degC',
    degree: 'deg',
    degk: 'K',
    '\u00b0k': 'K',
    degf: '',
    '\u00b0f': '',
    radian: 'rad',
    decibel: 'dB',
    min: 's',
    hour: 's',
  }),
);
const PREFIX_NAMES: Readonly<Record<string, string>> = {
  femto: 'f',
  pico: 'p',
  nano: 'n',
  micro: 'u',
  milli: 'm',
  kilo: 'k',
  mega: 'M',
  meg: 'M',
  giga: 'G',
};
/** What a prefix alone is most often short for: as the letters of a component code. */
const ALONE: ReadonlyMap<string, string> = new Map(
  Object.entries({
    f: 'fF',
    p: 'pF',
    n: 'nF',
    u: 'uF',
    k: 'kohm',
    M: 'Mohm',
    G: 'Gohm',
  }),
);

const SPELLINGS: readonly string[] = [
  ...UNIT_SYMBOLS.map((symbol) => symbol.ascii),
  ...UNIT_SYMBOLS.filter((symbol) => symbol.prefixes).flatMap((symbol) =>
    PREFIXES.map((prefix) => prefix.ascii + symbol.ascii),
  ),
];

/** The fault of a word that is no unit symbol, at `start` of what is read. */
export function faultOfWord(word: string, start: number): UnitFault {
  const fault = (kind: UnitFaultKind, hint: string | null): UnitFault => ({
    fault: kind,
    text: word,
    start,
    end: start + word.length,
    hint,
  });
  const prefix = findPrefix(word);
  if (prefix) return fault('prefix alone', ALONE.get(prefix.ascii) ?? null);
  const behindPrefix: UnitSymbol | undefined = findPrefix(word.slice(0, 1)) && findSymbol(word.slice(1));
  if (behindPrefix) return fault('prefix not allowed', behindPrefix.ascii);
  const otherCase = inOtherCase(word);
  if (otherCase) return fault('wrong case', otherCase);
  return fault('unknown symbol', (byName(word) ?? withoutSuffix(word) ?? nearestSpelling(word)) || null);
}

/** The known spellings that differ in case alone, fewest differences first; MHz and mHz are both offered for `mhz`. */
function inOtherCase(word: string): string | null {
  const small = asciiWord(word).toLowerCase();
  if (small === 'mhz') return 'MHz or mHz';
  let best: string | null = null;
  let least = Infinity;
  for (const spelling of SPELLINGS) {
    if (spelling.toLowerCase() !== small) continue;
    const differences = [...spelling].filter((letter, i) => letter !== word[i]).length;
    if (differences < least) [best, least] = [spelling, differences];
  }
  return best;
}

/** `ohms`, `kOhms`, `millivolts`, `percent`; '' where the name has no unit here, null where it is no such name. */
function byName(word: string): string | null {
  const small = word.toLowerCase();
  const other = OTHER_WORDS.get(small) ?? OTHER_WORDS.get(small.replace(/s$/, ''));
  if (other !== undefined) return other;
  for (const singular of [small, small.replace(/s$/, '')]) {
    const named = symbolNamed(singular);
    if (named) return named;
    for (const [name, prefix] of Object.entries(PREFIX_NAMES)) {
      const rest = singular.startsWith(name) && symbolNamed(singular.slice(name.length));
      if (rest) return prefix + rest;
    }
    const prefix = findPrefix(word.slice(0, 1)) ?? findPrefix(small.slice(0, 1));
    const rest = prefix && symbolNamed(singular.slice(1));
    if (rest) return prefix.ascii + rest;
  }
  return null;
}

function symbolNamed(small: string): string | undefined {
  return small === 'ohm' ? 'ohm' : OTHER_NAMES.get(small);
}

/** `Vrms`, `mVpp`, `Vdc` without what says how it was measured; `dBm` and its kin as dB; `V2` as a power. */
function withoutSuffix(word: string): string | null {
  const power = /^(\D+)([2-9])$/.exec(word);
  if (power && readWord(power[1])?.symbol.prefixes) return `${power[1]}^${power[2]}`;
  const base = word.replace(/_?(rms|pp|pk|p|dc|ac)$/i, '');
  if (base !== word && readWord(base)) return base;
  return /^dB[a-zA-Zµ]{1,2}$/.test(word) ? 'dB' : null;
}

/** The known spelling one letter away (two in words of five letters and more); a unit without prefix first. */
function nearestSpelling(word: string): string | null {
  const written = asciiWord(word);
  const { length } = written;
  // A1, V_x: a name, not a slip of the finger.
  if (/[0-9_]/.test(word)) return null;
  let best: string | null = null;
  let least = length < 5 ? 2 : 3;
  for (const spelling of SPELLINGS) {
    // Two letters replaced by two others are a guess; one letter too many is not.
    if (length < 3 && spelling.length >= length) continue;
    const distance = editDistance(written, spelling);
    if (distance < least && distance < length) [best, least] = [spelling, distance];
  }
  return best;
}

function asciiWord(word: string): string {
  return word.replace(/[\u00b5\u03bc]/g, 'u').replace(/[\u03a9\u2126]/g, 'ohm');
}

/** Letters to insert, delete or replace (Levenshtein). */
function editDistance(a: string, b: string): number {
  let row = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const next = [i];
    for (let j = 1; j <= b.length; j++)
      next.push(Math.min(row[j] + 1, next[j - 1] + 1, row[j - 1] + (a[i - 1] === b[j - 1] ? 0 : 1)));
    row = next;
  }
  return row[b.length];
}
