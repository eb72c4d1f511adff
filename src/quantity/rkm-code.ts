// Component codes: the letter stands for the decimal point and the multiplier (4k7, 470R, 4n7).
// Source: IEC 60062:2016, as the sheet's grammar restricts it: R k M G are ohms, p n u farads, and K only with
// digits behind it, since 300K is kelvin. m and L are no letters of it: m is milli, always.

import { decimalToNumber, readDecimal } from './decimal.ts';
import type { ValueKind } from './kind.ts';
import type { Unit } from './unit.ts';
import { knownUnit } from './unit.ts';

interface ComponentCode {
  /** Ohms or farads. */
  readonly value: number;
  readonly kind: ValueKind;
  /** ohm or F. */
  readonly unit: Unit;
}

const OHM_UNIT = knownUnit('ohm');
const FARAD_UNIT = knownUnit('F');

const LETTERS: Readonly<Record<string, readonly [exponent10: number, unit: Unit]>> = {
  R: [0, OHM_UNIT],
  k: [3, OHM_UNIT],
  K: [3, OHM_UNIT],
  M: [6, OHM_UNIT],
  G: [9, OHM_UNIT],
  p: [-12, FARAD_UNIT],
  n: [-9, FARAD_UNIT],
  u: [-6, FARAD_UNIT],
  '\u00b5': [-6, FARAD_UNIT],
  '\u03bc': [-6, FARAD_UNIT],
};

// Nothing of a name may follow, and no second decimal point (`1k..2k` has none).
const CODE = /(\d+)(?:([RkMGpnu\u00b5\u03bc])(\d*)|(K)(\d+))(?![A-Za-zΑ-Ωα-ω\u2126\u00b50-9_]|\.\d)/y;

/** Reads a component code from `at`, or null where none stands there; it ends before `end`. */
export function scanCode(text: string, at: number): (ComponentCode & { readonly end: number }) | null {
  CODE.lastIndex = at;
  const found = CODE.exec(text);
  if (!found) return null;
  const [exponent10, unit] = LETTERS[found[2] ?? found[4]];
  const behind = found[3] ?? found[5] ?? '';
  const digits = behind === '' ? found[1] : `${found[1]}.${behind}`;
  const value = decimalToNumber(readDecimal(digits), exponent10);
  return { end: at + found[0].length, value, kind: unit.kind, unit };
}

/** Reads the whole text as a component code: `4k7` is 4700 ohms, `10p` 10 pF; null where it is none. */
export function readCode(text: string): ComponentCode | null {
  const scanned = scanCode(text, 0);
  if (!scanned || scanned.end < text.length) return null;
  const { value, kind, unit } = scanned;
  return { value, kind, unit };
}
