import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';

function cautions(text: string): string[] {
  return createSheet(text)
    .cautions()
    .map((caution) => caution.text);
}

describe('a spread across 0', () => {
  it.each(['R_1 = 10 kohm ± 99 %', 'R_1 = 5 kohm in 0 ohm .. 10 kohm', 'C_1 = 10 nF in .. 20 nF', 'V_1 = 1 mV ± 5 mV'])(
    'is none, or is meant: %s',
    (text) => {
      const sheet = createSheet(text);
      expect([sheet.cells()[0]!.fault, sheet.cautions()]).toEqual([null, []]);
    },
  );

  it('of a tolerance in percent gets a caution where it is no component', () => {
    expect(cautions('V_1 = 5 V ± 150 %')).toEqual([
      'V_1 goes from −2.5 V to 12.5 V: a tolerance of 100 % and more reaches 0 or beyond.',
    ]);
    expect(cautions('V_1 = -5 V ± 50 %')).toEqual([]);
  });
});

describe('a test condition that changes nothing', () => {
  it('is said to be kept as text behind a plain quantity', () => {
    expect(cautions('V_F = 0.6 V at I_F = 10 mA')).toEqual([
      'I_F is no test condition that the sheet knows, which are V_DS, V_GS, V_DG, I_D, f, T_A, T_J. It is kept as text and changes nothing.',
    ]);
    expect(cautions('I_1 = 2 mA at V_DS = 10 V')).toEqual([]);
  });

  it('is said of a row that names another temperature than T_nom', () => {
    const part = (row: string): string => `Q1 = n-JFET\n  I_DSS: 6 mA at V_DS = 15 V${row}\n  V_P: -2 V\n`;
    expect(cautions(part(', T_J = 100 degC'))).toEqual([
      'I_DSS is stated at 100 °C and read as if at T_nom, 25 °C: the temperature behind at changes nothing. Give all rows at one temperature, and name it as T_nom.',
    ]);
    expect(cautions(part(', T_A = 25 degC'))).toEqual([]);
    expect(cautions(`${part(', T_A = 100 degC')}  T_nom: 100 degC\n`)).toEqual([]);
  });
});
