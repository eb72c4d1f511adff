// How a spread is written, and what the sheet then declares: low, nominal, high, law, form, service, who chose the nominal.

import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { DeclaredSpread } from '../../src/sheet/index.ts';

interface Expected {
  readonly law?: DeclaredSpread['law'];
  readonly form?: DeclaredSpread['form'];
  readonly service?: true;
  readonly chosen?: true;
}

type Row = readonly [entry: string, low: number | null, nominal: number, high: number | null, rest?: Expected];

const LIMITS: Expected = { form: 'limits' };
const ALONE: Expected = { form: 'limits', chosen: true };

/** Numbers are SI, as the decimal arithmetic by hand gives them. */
const ROWS: readonly Row[] = [
  ['10 kohm ± 1 %', 9900, 10e3, 10100],
  ['10 kohm +/- 1 %', 9900, 10e3, 10100],
  ['10 kohm ± 1%', 9900, 10e3, 10100],
  ['4k7 ± 10 %', 4230, 4700, 5170],
  ['5 V ± 50 mV', 4.95, 5, 5.05],
  ['5 V ± 0 V', 5, 5, 5],
  ['10 kohm ± 25 ppm', 9999.75, 10e3, 10000.25],
  ['-5 V ± 10 %', -5.5, -5, -4.5],
  ['-5 V ± 0.5 V', -5.5, -5, -4.5],
  ['0 V ± 10 mV', -0.01, 0, 0.01],
  ['0.5 ± 20 %', 0.4, 0.5, 0.6],
  ['0.5 ± 0.2', 0.3, 0.5, 0.7],
  ['25 degC ± 5 K', 293.15, 298.15, 303.15],
  ['10 K ± 2 K', 8, 10, 12],
  ['6 dB ± 1 dB', 5, 6, 7],
  ['10 kohm ± 1 % normal', 9900, 10e3, 10100, { law: 'normal' }],
  ['10 kohm ± 1 % uniform', 9900, 10e3, 10100],
  ['15 V ± 5 % service', 14.25, 15, 15.75, { service: true }],
  ['15 V ± 5 % normal service', 14.25, 15, 15.75, { law: 'normal', service: true }],
  ['15 V ± 5 % uniform service', 14.25, 15, 15.75, { service: true }],
  ['-2.2 V in -4 V .. -1 V', -4, -2.2, -1, LIMITS],
  ['-2.2 V in -1 V .. -4 V', -4, -2.2, -1, LIMITS],
  ['5 mA in 2 mA .. 9 mA', 2e-3, 5e-3, 9e-3, LIMITS],
  ['5 mA in 2 mA … 9 mA', 2e-3, 5e-3, 9e-3, LIMITS],
  ['5 mA in 9 mA .. 2 mA', 2e-3, 5e-3, 9e-3, LIMITS],
  ['5 mA in 5 mA .. 9 mA', 5e-3, 5e-3, 9e-3, LIMITS],
  ['5 mA in 2 mA .. 9 mA normal', 2e-3, 5e-3, 9e-3, { form: 'limits', law: 'normal' }],
  ['24 V in 21 V .. 27 V service', 21, 24, 27, { form: 'limits', service: true }],
  ['0 V in -1 V .. 2 V', -1, 0, 2, LIMITS],
  ['25 degC in 0 degC .. 60 degC', 273.15, 298.15, 333.15, LIMITS],
  ['-12 degC in -40 degC .. 10 degC', 233.15, 261.15, 283.15, LIMITS],
  ['8 mA in 5 mA ..', 5e-3, 8e-3, null, LIMITS],
  ['8 mA in .. 9 mA', null, 8e-3, 9e-3, LIMITS],
  ['-2 V in -1 V ..', null, -2, -1, LIMITS],
  ['-2 V in .. -4 V', -4, -2, null, LIMITS],
  ['-2 V in -4 V ..', -4, -2, null, LIMITS],
  ['-2 V in .. -1 V', null, -2, -1, LIMITS],
  ['2 mA .. 9 mA', 2e-3, Math.sqrt(2e-3 * 9e-3), 9e-3, ALONE],
  ['9 mA .. 2 mA', 2e-3, Math.sqrt(2e-3 * 9e-3), 9e-3, ALONE],
  ['2 mA .. 9 mA normal', 2e-3, Math.sqrt(2e-3 * 9e-3), 9e-3, { ...ALONE, law: 'normal' }],
  ['2 mA .. 9 mA service', 2e-3, Math.sqrt(2e-3 * 9e-3), 9e-3, { ...ALONE, service: true }],
  ['-4 V .. -1 V', -4, -2, -1, ALONE],
  ['-1 V .. -4 V', -4, -2, -1, ALONE],
  ['-1 V .. 3 V', -1, 1, 3, ALONE],
  ['3 V .. -1 V', -1, 1, 3, ALONE],
  ['0 V .. 3 V', 0, 1.5, 3, ALONE],
  ['0 degC .. 60 degC', 273.15, 303.15, 333.15, ALONE],
  ['2 dB .. 8 dB', 2, 5, 8, ALONE],
  ['5 mA ..', 5e-3, 5e-3, null, ALONE],
  ['.. 1 nA', null, 1e-9, 1e-9, ALONE],
  ['-1 V ..', null, -1, -1, ALONE],
  ['.. -4 V', -4, -4, null, ALONE],
  ['5 mA .. at V_DS = 10 V', 5e-3, 5e-3, null, ALONE],
  [
    '5 mA in 2 mA .. 9 mA normal service at V_DS = 15 V as uA',
    2e-3,
    5e-3,
    9e-3,
    { form: 'limits', law: 'normal', service: true },
  ],
];

function near(found: number | null | undefined, wanted: number | null): boolean {
  if (typeof found !== 'number' || wanted === null) return found === wanted;
  return Math.abs(found - wanted) <= 4e-16 * Math.max(Math.abs(found), Math.abs(wanted), 1e-300);
}

describe('a spread declares', () => {
  it.each(ROWS.map((row) => [row[0], row] as const))('%s', (_, [entry, low, nominal, high, rest = {}]) => {
    const sheet = createSheet(`x = ${entry}\n`);
    const cell = sheet.cell('x')!;
    expect(cell.fault).toBeNull();
    const { spread } = cell;
    const ends = [spread?.low, spread?.nominal, spread?.high];
    expect(
      [low, nominal, high].every((wanted, i) => near(ends[i], wanted)),
      ends.join(' | '),
    ).toBe(true);
    expect(spread).toMatchObject({
      law: rest.law ?? 'uniform',
      form: rest.form ?? 'tolerance',
      service: rest.service ?? false,
      nominalChosen: rest.chosen ?? false,
    });
    expect(sheet.value('x')).toBe(spread!.nominal);
    expect(cell.isInput).toBe(true);
    expect(cell.assumptions.length).toBe(rest.chosen ? 1 : 0);
  });

  it('nothing where none is written', () => {
    expect(createSheet('x = 5 V\n').cell('x')).toMatchObject({ spread: null, isInput: true });
  });

  it('what the sheet chose, in the list of assumptions', () => {
    const said = (entry: string): string => createSheet(`x = ${entry}\n`).assumptions()[0].text;
    expect(said('2 mA .. 9 mA')).toBe('x: no nominal is given; the geometric mean of its limits stands in.');
    expect(said('-1 V .. 3 V')).toBe('x: no nominal is given; the middle of its limits stands in.');
    expect(said('5 mA ..')).toBe('x: no nominal is given; its one limit stands in.');
  });

  it('the own draw of a cell behind a formula, around what the formula gives', () => {
    const sheet = createSheet('R_a = 2 kohm\nR_b = E24(R_a * 1.6) ± 1 %\nR_c = R_a + 1 kohm in 2 kohm .. 5 kohm\n');
    expect(sheet.cell('R_b')).toMatchObject({ isInput: false, spread: { low: 3267, nominal: 3300, high: 3333 } });
    expect(sheet.cell('R_c')).toMatchObject({ isInput: false, spread: { low: 2000, nominal: 3000, high: 5000 } });
    sheet.update('R_a = 4 kohm\nR_b = E24(R_a * 1.6) ± 1 %\nR_c = R_a in 2 kohm .. 5 kohm\n');
    expect(sheet.cell('R_b')!.spread).toMatchObject({ low: 6138, nominal: 6200, high: 6262 });
  });

  it('of T_A always what changes in use', () => {
    for (const entry of [
      '25 degC in 0 degC .. 60 degC',
      '25 degC ± 5 K',
      '0 degC .. 60 degC',
      '25 degC ± 5 K service',
    ]) {
      expect(createSheet(`T_A = ${entry}\n`).cell('T_A')!.spread, entry).toMatchObject({ service: true });
    }
    expect(createSheet('T_B = 25 degC ± 5 K\n').cell('T_B')!.spread).toMatchObject({ service: false });
  });
});

describe('the fields of a part and a point declare theirs', () => {
  const sheet = createSheet(`Q1 = n-JFET
  I_DSS: 2 mA .. 9 mA at V_DS = 15 V
  V_GSoff: -4 V .. -1 V at I_D = 10 nA
  g_fs: 2 mS ..
  I_GSS: .. 1 nA
  C_iss: .. 6 pF
  C_rss: 2 pF ± 20 %
  r_s: 20 ohm in .. 40 ohm
P1 = point of Q1
  V_GS: -0.5 V ± 10 mV normal
  V_DS: 10 V in 9 V .. 12 V service
C_x = .. 10 pF
R_x = .. 10 ohm
`);
  const field = (cell: string, name: string): DeclaredSpread | null =>
    sheet.cell(cell)!.fields.find((candidate) => candidate.name === name)!.spread;

  it('with limits alone', () => {
    expect(sheet.cells().map((cell) => cell.fault)).toEqual(sheet.cells().map(() => null));
    expect(field('Q1', 'I_DSS')).toMatchObject({ low: 2e-3, high: 9e-3, form: 'limits', nominalChosen: true });
    expect(field('Q1', 'V_GSoff')).toMatchObject({ low: -4, nominal: -2, high: -1 });
    expect(field('Q1', 'g_fs')).toMatchObject({ low: 2e-3, nominal: 2e-3, high: null });
  });

  it('with an open low end at 0 where nothing lies below, and say so', () => {
    expect(field('Q1', 'I_GSS')).toMatchObject({ low: 0, nominal: 1e-9, high: 1e-9 });
    expect(field('Q1', 'C_iss')).toMatchObject({ low: 0, nominal: 6e-12, high: 6e-12 });
    expect(field('Q1', 'r_s')).toMatchObject({ low: 0, nominal: 20, high: 40 });
    expect(sheet.cell('C_x')!.spread).toMatchObject({ low: 0, nominal: 10e-12, high: 10e-12 });
    expect(sheet.cell('R_x')!.spread).toMatchObject({ low: null, high: 10 });
    const texts = sheet.assumptions().map((assumption) => assumption.text);
    expect(texts).toContain('Q1.I_GSS: no lower limit is given; 0 is taken, below which it cannot lie.');
    expect(texts).toContain('C_x: no lower limit is given; 0 is taken, below which it cannot lie.');
  });

  it('of a point', () => {
    expect(field('P1', 'V_GS')).toMatchObject({ low: -0.51, nominal: -0.5, high: -0.49, law: 'normal' });
    expect(field('P1', 'V_DS')).toMatchObject({ low: 9, nominal: 10, high: 12, service: true });
  });
});

describe('a spread that cannot be', () => {
  it.each([
    ['5 V ± 5 mA', 'tolerance-dimension'],
    ['25 degC ± 5 degC', 'tolerance-dimension'],
    ['25 degC ± 5 %', 'tolerance-dimension'],
    ['5 V ± 5', 'tolerance-dimension'],
    ['5 V ± -5 %', 'tolerance-sign'],
    ['5 V in 1 V .. 5 mA', 'limit-dimension'],
    ['25 degC in 0 K .. 60 K', 'limit-dimension'],
    ['1 V .. 5 mA', 'limits-differ'],
    ['5 V in 6 V .. 7 V', 'nominal-outside'],
    ['5 V in 6 V ..', 'nominal-outside'],
    ['5 V in .. 4 V', 'nominal-outside'],
    ['-5 V in 1 V .. 2 V', 'nominal-outside'],
  ])('%s: %s', (entry, code) => {
    expect(createSheet(`x = ${entry}\n`).error('x')?.code).toBe(code);
  });
});
