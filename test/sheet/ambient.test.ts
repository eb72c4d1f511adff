import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { TEMPERATURE_POINT } from '../../src/quantity/index.ts';
import { number } from './kinds.ts';

const POINT = `Q1 = n-JFET
  I_DSS: 6 mA
  V_P: -2 V
P1 = point of Q1
  V_GS: -1 V
  V_DS: 5 V
`;

describe('T_A in kelvin', () => {
  it.each([
    ['300 K', 300],
    ['300 K in 273 K .. 330 K', 300],
    ['273 K .. 330 K', 301.5],
    ['0.3 * 1000 K', 300],
  ])('is a point of the temperature scale: %s', (entry, kelvin) => {
    const sheet = createSheet(`T_A = ${entry}\nwarm = T_A - 25 degC\n${POINT}`);
    expect(sheet.cell('T_A')!.reading!.type).toEqual(TEMPERATURE_POINT);
    expect(number(sheet, 'T_A')).toBe(kelvin);
    expect(number(sheet, 'warm')).toBeCloseTo(kelvin - 298.15, 9);
    expect(number(sheet, 'P1.I_D')).toBe(number(createSheet(`T_A = ${kelvin - 273.15} degC\n${POINT}`), 'P1.I_D'));
  });

  it('takes limits on either scale and a tolerance in kelvin', () => {
    expect(createSheet('T_A = 25 degC in 273 K .. 330 K').cell('T_A')!.spread).toMatchObject({ low: 273, high: 330 });
    expect(createSheet('T_A = 300 K ± 5 K').cell('T_A')!.spread).toMatchObject({ low: 295, high: 305 });
  });
});

describe('a sheet without a cell T_A', () => {
  it('has T_A = 25 °C in its expressions until it gets one', () => {
    const sheet = createSheet('R_t = 1 kohm * (1 + 0.004 /K * (T_A - 20 degC))\n');
    expect(number(sheet, 'R_t')).toBeCloseTo(1020, 9);
    sheet.update(`${sheet.tree.text}T_A = 45 degC\n`);
    expect(number(sheet, 'R_t')).toBeCloseTo(1100, 9);
    sheet.update('R_t = 1 kohm * (1 + 0.004 /K * (T_A - 20 degC))\n');
    expect(number(sheet, 'R_t')).toBeCloseTo(1020, 9);
  });

  it('waits for a broken one', () => {
    expect(createSheet('x = T_A\nT_A = 3 oops 4').cell('x')!.waitsFor).toBe('T_A');
  });
});

describe('an ambient temperature at which no board stands', () => {
  it.each([
    ['25 K', '−248 °C'],
    ['-70 degC', '−70 °C'],
    ['250 degC', '250 °C'],
    ['25 degC in -40 degC .. 400 degC', '400 °C'],
  ])('gets a caution: %s', (entry, shown) => {
    expect(createSheet(`T_A = ${entry}`).cautions()).toEqual([
      {
        cell: 'T_A',
        line: 0,
        text: `T_A reaches ${shown}, outside −60 °C to 200 °C, where FETs are hardly used: a number in K is absolute, one in degC is not.`,
      },
    ]);
  });

  it.each(['-60 degC', '200 degC', '300 K', '25 degC in -55 degC .. 125 degC'])('gets none: %s', (entry) => {
    expect(createSheet(`T_A = ${entry}`).cautions()).toEqual([]);
  });
});
