// A bench in tables: the same on the page, in the record and in the terminal.

import { describe, expect, it } from 'vitest';
import { benchTables, recordOf } from '../../src/record/index.ts';
import { CURRENT, VOLTAGE } from '../../src/quantity/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { columnTexts, columnWithErrors } from '../../src/record/column-texts.ts';
import { textOf } from './record-text.ts';

// 4 mA at a cutoff of -2 V, 3.61 mA at -1.9 V, 4.41 mA at -2.1 V: beta is 1 mA/V² in all.
const readings = [-2, -1.9, -2.1].flatMap((cutoff, k) =>
  [0, -0.5, -1, -1.5].map((vgs) => `  s${k + 1}, ${vgs}, ${(vgs - cutoff) ** 2}\n`),
);
const sheet = createSheet(`M1 = bench
  columns: unit, V_GS [V], I_D [mA]
  V_DS: 10 V
  lambda: 0 /V
  keep: V_P in -2.05 V .. -1.8 V
  match: pairs at I_D = 1 mA and 0.25 mA
  fitting: I_D = 1 mA, V_DS = 10 V
${readings.join('')}Q1 = n-JFET fitted to M1
`);
const tables = benchTables(sheet.bench('M1')!);
const table = (name: string) => tables.find((each) => each.name === name)!;

describe('the tables of a bench', () => {
  it('are those that it asks for', () => {
    expect(tables.map(({ name }) => name)).toEqual(['fits', 'readings', 'matching', 'specimens', 'fitting']);
    const bare = createSheet(`M1 = bench\n  columns: unit, V_GS [V], I_D [mA]\n  V_DS: 10 V\n${readings.join('')}`);
    expect(benchTables(bare.bench('M1')!).map(({ name }) => name)).toEqual(['fits', 'readings']);
  });

  it('have the law of each specimen and whether it is kept', () => {
    const { columns, rows, caption } = table('fits');
    expect(columns.map(({ title }) => title)).toEqual(['specimen', 'readings', 'beta', 'V_TO', 'I_DSS', 'rms', 'kept']);
    expect(rows.map(([name, count, , threshold, , , kept]) => [name, count, threshold!.split(' ')[0], kept])).toEqual([
      ['s1', '4', '−2.0000', 'yes'],
      ['s2', '4', '−1.9000', 'yes'],
      ['s3', '4', '−2.1000', 'no'],
    ]);
    // Exact limits of Clopper and Pearson for 2 of 3: 9.43 % and 99.16 %.
    expect(caption).toBe(
      'The fitted square law of each specimen; ± is one standard error. lambda is 0 /V. 2 of 3 are kept, 67 %; of a batch from which they were taken at random it would be 9.4 to 100 %.',
    );
  });

  it('have a row without numbers for a specimen that no law fits', () => {
    const text = sheet.tree.text.replace('Q1 =', '  s4, 0, 0\nQ1 =');
    const { rows } = benchTables(createSheet(text).bench('M1')!)[0]!;
    expect(rows.at(-1)).toEqual(['s4', '1', '–', '–', '–', '–', 'no']);
  });

  it('have every reading with its region', () => {
    expect(table('readings').rows).toHaveLength(12);
    expect(table('readings').rows[1]).toEqual([
      's1',
      '−0.500 V',
      '10.0 V',
      '2.250 mA',
      '2.250 mA',
      expect.any(String),
      'saturation',
    ]);
  });

  it('have the pair with its offset and what takes it away', () => {
    const [row] = table('matching').rows;
    expect(row!.slice(0, 5)).toEqual(['s1, s2', '−1.000 V, −0.900 V', '100 mV', '100 mV', '100 Ω at s1']);
    // Of 100 mV the resistor takes 25 mV away at a quarter of the current.
    expect(row![5]).toBe('75.0 mV');
  });

  it('have the resistor of each, and what is to be fitted at the bench', () => {
    expect(table('specimens').rows).toEqual([
      ['s1', '−1.000 V', '1.00 kΩ', '1 kΩ', '1.00 mA'],
      ['s2', '−0.900 V', '0.90 kΩ', '910 Ω', '0.99 mA'],
    ]);
    // Each resistor reaches to the geometric mean with its neighbour: √(820·910), √(910·1000), √(1000·1100).
    expect(table('fitting').rows).toEqual([
      ['−0.864 V', '−0.954 V', '910 Ω'],
      ['−0.954 V', '−1.049 V', '1 kΩ'],
    ]);
  });
});

describe('the record', () => {
  const record = recordOf(sheet, { digest: '0'.repeat(64) });
  const blocks = record.sections.flatMap((section) => section.blocks);

  it('prints them, the readings standing in its figure and in the text of the sheet', () => {
    const named = blocks.flatMap((block) => (block.type === 'table' ? [block.name] : []));
    expect(named.filter((name) => name.startsWith('bench'))).toEqual([
      'bench-fits',
      'bench-matching',
      'bench-specimens',
      'bench-fitting',
    ]);
    const figures = blocks.flatMap((block) => (block.type === 'figures' ? block.figures : []));
    expect(textOf(figures[0]!.caption)).toMatch(
      /^Figure 1\. Bench M1: 12 readings and the fitted square law of 3 specimens/,
    );
  });

  it('has the rows that a part takes from its bench between their ends', () => {
    const part = blocks.find((block) => block.type === 'table' && block.name === 'part');
    expect(textOf(part)).toMatch(
      /V_P −1\.9\d* −1\.95 V −2(\.\d+)? bench M1 I_DSS 3\.6\d* 3\.8[01] mA 4(\.\d+)? bench M1/,
    );
  });
});

describe('numbers below each other', () => {
  it('share prefix and last digit', () => {
    expect(columnTexts([1.25e-3, 0.04e-3, 0, null, -0.9996e-3], CURRENT)).toEqual([
      '1.25 mA',
      '0.04 mA',
      '0 mA',
      '–',
      '−1.00 mA',
    ]);
    expect(columnTexts([0.0006, 1], VOLTAGE, 3)).toEqual(['0 V', '1.00 V']);
    expect(columnTexts([0.006, 1], VOLTAGE, 3)).toEqual(['0.01 V', '1.00 V']);
  });

  it('end where the least error does, which has two digits', () => {
    expect(columnWithErrors([-2.0132, -1.9], [0.011, 0.25], VOLTAGE)).toEqual(['−2.013 ± 0.011 V', '−1.900 ± 0.250 V']);
    expect(columnWithErrors([2, 1.5], [null, 0.1], VOLTAGE)).toEqual(['2 V', '1.50 ± 0.10 V']);
  });
});
