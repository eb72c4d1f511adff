import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { number } from './kinds.ts';

const PART = 'Q1 = n-JFET\n  I_DSS: 2 mA\n  V_P: -2 V\n  r_s: 2 ohm\n';
const POINT = 'P1 = point of Q1\n  V_GS: -1 V\n  V_DS: 10 V\n';

/** What a sheet says with one field written otherwise. */
function afresh(field: string, entry: string, path: string): number {
  return number(createSheet(`${PART}${POINT}`.replace(new RegExp(`${field}: .*`), `${field}: ${entry}`)), path);
}

describe('a plot against a field', () => {
  it.each([
    ['Q1.I_DSS', 'I_DSS', '1 mA', '3 mA', 'P1.I_D'],
    ['Q1.V_P', 'V_P', '-3 V', '-2 V', 'P1.I_D'],
    ['Q1.r_s', 'r_s', '2 ohm', '50 ohm', 'Q1.g_fs0'],
    ['P1.V_GS', 'V_GS', '-1.5 V', '-0.5 V', 'P1.I_D'],
    ['P1.V_DS', 'V_DS', '0.5 V', '20 V', 'P1.I_D'],
  ])('turns %s and nothing of the same value', (path, field, low, high, value) => {
    const sheet = createSheet(`${PART}${POINT}F1 = plot ${value} against ${path} over ${low} .. ${high}\n`);
    const { values } = sheet.sweep('F1', 2)!.series[0]!;
    expect([...values]).toEqual([afresh(field, low, value), afresh(field, high, value)]);
  });
});

describe('a quantity with the value of another', () => {
  it('is turned alone', () => {
    const sheet = createSheet('a_1 = 2\nb_1 = a_1 * 2 + 2\nF1 = plot b_1 against a_1 over 2 .. 10\n');
    expect([...sheet.sweep('F1', 2)!.series[0]!.values]).toEqual([6, 22]);
  });
});

describe('the inputs that a message names', () => {
  it('are those of the sheet as it stands', () => {
    const text = 'V_1 = 1 V\nV_2 = V_1 * 2\nF1 = plot V_2 against V_2 over 1 V .. 2 V\n';
    const sheet = createSheet(text);
    const said = (): string => /Inputs here are (.*)\.$/.exec(sheet.error('F1')!.text)![1]!;
    expect(said()).toBe('V_1');
    sheet.update(`${text}V_3 = 5 V\n`);
    expect(said()).toBe('V_1, V_3');
    sheet.update(`${text}V_3 = V_1\n`);
    expect(said()).toBe('V_1');
    sheet.update(text.replace('V_1 * 2', '2 V'));
    expect(sheet.error('F1')).toBeNull();
  });
});
