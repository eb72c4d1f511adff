// Sheets of all four kinds of FET from one text.

import { createSheet } from '../../src/sheet/index.ts';
import type { Sheet } from '../../src/sheet/index.ts';

export const KINDS = [
  ['n-JFET', 1],
  ['p-JFET', -1],
  ['n-MOSFET', 1],
  ['p-MOSFET', -1],
] as const;

/** `{x}` is x volts in the sense of the channel; `{to x}` and `{from x}` turn a current source with it. */
export function textOf(kind: string, lines: string): string {
  const sign = kind.startsWith('n') ? 1 : -1;
  const turned = (way: string): string => (sign === 1 ? way : way === 'to' ? 'from' : 'to');
  return lines
    .replace(/\{(to|from) ([\d.-]+)\}/g, (_, way: string, x: string) => `${turned(way)} ${sign * Number(x)} V`)
    .replace(/\{([\d.e-]+)\}/g, (_, x: string) => `${sign * Number(x)} V`);
}

export function sheetOf(kind: string, lines: string): Sheet {
  return createSheet(textOf(kind, lines));
}

/** A number of a sheet; throws, with the fault, where there is none. */
export function number(sheet: Sheet, path: string): number {
  const value = sheet.value(path);
  if (typeof value !== 'number') throw new Error(`${path} is ${value}: ${sheet.error(path.split('.')[0])?.text}`);
  return value;
}

/** A part of each kind: JFETs with V_P at -2 V, MOSFETs with V_TO at 1.5 V in their own sense. */
export function partOf(kind: string, more = ''): string {
  const law = kind.endsWith('JFET') ? 'I_DSS: 6 mA\n  V_P: {-2}' : 'V_TO: {1.5}\n  K: 1.5 mA/V^2';
  return `Q1 = ${kind}\n  ${law}\n${more}`;
}
