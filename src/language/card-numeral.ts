// Numbers as model cards write them: a decimal, then a suffix of size, then letters without meaning. M is milli, MEG mega.

/** Powers of ten of the suffixes, longest first. MIL, a thousandth of an inch, is none. */
const SUFFIXES: readonly (readonly [suffix: string, exponent: number])[] = [
  ['meg', 6],
  ['f', -15],
  ['p', -12],
  ['n', -9],
  ['u', -6],
  ['µ', -6],
  ['m', -3],
  ['k', 3],
  ['g', 9],
  ['t', 12],
];
const MIL = 25.4e-6;

interface CardNumeral {
  readonly value: number;
  /** In lower case; empty where there is none. */
  readonly suffix: string;
}

/** Reads a number of a card; null where it is none. */
export function readCardNumeral(text: string): CardNumeral | null {
  const found = /^([+-]?(?:\d+\.?\d*|\.\d+))(e[+-]?\d+)?([a-zµ]*)$/i.exec(text);
  if (!found) return null;
  const [, mantissa, power = '', letters = ''] = found;
  const tail = letters.toLowerCase();
  const isMil = tail.startsWith('mil');
  const [suffix, exponent] = isMil ? ['mil', 0] : (SUFFIXES.find(([each]) => tail.startsWith(each)) ?? ['', 0]);
  // The power of ten goes into the decimal, so that 2.2p reads as the double nearest to 2.2e-12.
  const value = Number(`${mantissa}e${Number(power.slice(1) || 0) + exponent}`) * (isMil ? MIL : 1);
  return Number.isFinite(value) ? { value, suffix } : null;
}
