import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { AMPLIFIER, MIRRORED } from '../record/sheets.ts';
import { report, runOn, runSheet } from './run.ts';

describe('the JSON report', () => {
  it('of a quantity has its entry, its value in SI and its text', () => {
    const { title, cells, checks, cautions } = report(
      '# Title, rev B\nR_S = 1.2 kohm  [stock] ; note\nR_2 = R_S / 3 as ohm',
    );
    expect({ title, checks, cautions }).toEqual({ title: 'Title, rev B', checks: {}, cautions: [] });
    expect(cells).toEqual({
      R_S: {
        kind: 'quantity',
        line: 2,
        entry: '1.2 kohm',
        value: 1200,
        unit: 'ohm',
        text: '1.2 kΩ',
        error: null,
      },
      R_2: { kind: 'quantity', line: 3, entry: 'R_S / 3 as ohm', value: 400, unit: 'ohm', text: '400 Ω', error: null },
    });
  });

  it('has what a bench found, what matches in it, and the table of resistors', () => {
    const rows = [-2, -1.9].flatMap((cutoff, k) =>
      [0, -0.5, -1].map((vgs) => `  s${k + 1}, ${vgs}, ${(vgs - cutoff) ** 2}`),
    );
    const { cells } = report(
      `M1 = bench\n  columns: unit, V_GS [V], I_D [mA]\n  V_DS: 10 V\n  lambda: 0 /V\n  match: pairs at I_D = 1 mA\n  fitting: I_D = 1 mA\n${rows.join('\n')}`,
    );
    const { values, match, fitting } = cells.M1!;
    expect(values!['s2.V_TO']).toMatchObject({ value: expect.closeTo(-1.9, 6), unit: 'V' });
    expect(values!['s1.R_S']).toMatchObject({ value: expect.closeTo(1000, 2), unit: 'ohm' });
    expect(match).toMatchObject([{ difference: expect.closeTo(0.1, 6), members: [{ name: 's1' }, { name: 's2' }] }]);
    expect(fitting!.map(({ R_S }) => R_S)).toEqual([910, 1000]);
  });

  it('has the spread of a value, where its ends are, and the yield of a check', () => {
    const {
      cells,
      checks,
      yield: all,
    } = report('R_1 = 1 kohm ± 10 %\nR_2 = 1 kohm\nx = R_2 / (R_1 + R_2)\na = check x > 0.49', '--samples', '4000');
    const { spread } = cells.x;
    expect(spread!.low).toBeCloseTo(1 / 2.1, 14);
    expect(spread!.high).toBeCloseTo(1 / 1.9, 14);
    expect(spread!.low_at).toEqual({ R_1: 1100 });
    expect(spread!.high_at).toEqual({ R_1: 900 });
    expect(spread!.open).toEqual([]);
    // R_1 is even in 900 .. 1100 ohm, so the share of builds below a value is that of R_1 above what gives it.
    for (const [key, share] of [
      ['p05', 0.05],
      ['p50', 0.5],
      ['p95', 0.95],
    ] as const) {
      expect(Math.abs(spread![key]! - 1000 / (2000 + 100 - 200 * share))).toBeLessThan(1e-3);
    }
    expect(cells.R_2.spread).toBeUndefined();
    // x > 0.49 where R_1 < 1040.8 ohm.
    const share = (1000 / 0.49 - 1000 - 900) / 200;
    expect(checks.a.holds).toBe(true);
    expect(checks.a.holds_at_extremes).toBe(false);
    expect(checks.a.least_reserve).toBeCloseTo(1 / 2.1 - 0.49, 14);
    expect(checks.a.fails_at).toEqual({ R_1: 1100 });
    expect(checks.a.yield!.n).toBe(4000);
    expect(checks.a.yield!.low).toBeLessThan(share);
    expect(checks.a.yield!.high).toBeGreaterThan(share);
    expect(all).toEqual(checks.a.yield);
  });

  it('is the same for the same seed, and another for another', () => {
    const text = 'R_1 = 1 kohm ± 10 %\nx = R_1 * 2';
    expect(report(text, '--seed', '5')).toEqual(report(text, '--seed', '5'));
    expect(report(text, '--seed', '5').cells.x.spread!.mean).not.toBe(report(text).cells.x.spread!.mean);
    expect(report(`# T\n  seed: 5\n${text}`).cells.x.spread!.mean).toBe(
      report(text, '--seed', '5').cells.x.spread!.mean,
    );
  });

  it('names the input whose open end leaves a value open', () => {
    const { cells, checks } = report('R_1 = 1 kohm ..\nx = R_1 * 2\na = check x > 1 kohm\nb = check x < 9 kohm');
    expect(cells.x.spread).toMatchObject({ low: 2000, high: null, mean: null, open: ['R_1'] });
    expect(checks.a).toMatchObject({ holds_at_extremes: true, yield: null });
    expect(checks.b).toMatchObject({ holds_at_extremes: null, yield: null });
  });

  it('has the digest of the text as it stands in the file', () => {
    const text = '# Ω and 😀\r\nR = 1 kohm\r\n\n';
    expect(report(text).digest).toBe(createHash('sha256').update(text).digest('hex'));
  });

  it('leaves a byte order mark out of the text', () => {
    const ran = runOn({ a: '\uFEFF# Title\n' }, ['a', '--json']);
    expect(JSON.parse(ran.out)).toMatchObject({
      title: 'Title',
      digest: createHash('sha256').update('# Title\n').digest('hex'),
    });
  });

  it('tells temperatures in kelvin, levels in dB, plain numbers as 1 and infinity as null', () => {
    const { cells } = report('T_A = 25 degC\nx = 20 dB\nn = 3\nr = 1 ohm / 0');
    const three = (name: string): unknown[] => [cells[name].value, cells[name].unit, cells[name].text];
    expect(three('T_A')).toEqual([298.15, 'K', '25 °C']);
    expect(three('x')).toEqual([20, 'dB', '20 dB']);
    expect(three('n')).toEqual([3, '1', '3']);
    expect(three('r')).toEqual([null, 'ohm', '∞']);
  });

  it('counts lines from 1 and columns in characters from 1', () => {
    const { cells } = report('\nx_1 = 3 V ; 😀\nΩ_1 = 1 V + 2 mA');
    expect(Object.keys(cells)).toEqual(['x_1', 'Omega_1']);
    expect(cells.Omega_1).toMatchObject({ line: 3, entry: '1 V + 2 mA', value: null, text: null });
    expect(cells.Omega_1.error).toMatchObject({ line: 3, column: 7 });
    expect(cells.Omega_1.error!.message).toContain('cannot be added');
    expect(Object.keys(cells.Omega_1.error!)).toEqual(['code', 'message', 'line', 'column']);
  });

  it('says which cell another one waits for', () => {
    const { cells } = report('a_1 = 1 V + 2 mA\nb_1 = a_1 / 2');
    expect(cells.b_1.error).toMatchObject({
      code: 'waits-for',
      message: 'waits for a_1, which is broken in line 1',
      line: 2,
    });
  });

  it('keys a line without a name, and the second of two cells of one name, by its number', () => {
    const { cells } = report('a_1 = 1 V\n??? what\na_1 = 2 V');
    expect(Object.keys(cells)).toEqual(['a_1', 'line 2', 'line 3']);
    expect(cells['line 2']).toMatchObject({ kind: 'broken', line: 2, entry: '??? what', value: null });
    expect(cells['line 2'].error!.line).toBe(2);
    expect(cells['line 3'].error).not.toBeNull();
  });

  it('has checks with what they hold and their reserve in SI', () => {
    const { checks, cells } = report(
      'a = check 3 mA > 2 mA\nb = check 1 V > 2 V\nc = check nowhere > 1 V\nd = check 1 ohm / 0 > 1 ohm',
    );
    expect(checks.a).toEqual({ holds: true, reserve: 0.001 });
    expect(checks.b).toEqual({ holds: false, reserve: -1 });
    expect(checks.c).toEqual({ holds: null, reserve: null });
    expect(checks.d).toEqual({ holds: true, reserve: null });
    expect(cells.b).toMatchObject({
      kind: 'check',
      entry: 'check 1 V > 2 V',
      value: null,
      text: 'fails, 1.00 V short',
    });
  });

  it('has the values of parts, points and stages, a region as text, infinity as null', () => {
    const { cells } = report(AMPLIFIER);
    const values = cells.A1.values!;
    expect(values.region).toEqual({ value: 'saturation', unit: null, text: 'saturation' });
    expect(values.I_D.unit).toBe('A');
    expect(values.I_D.text).toMatch(/^\d\.\d\d mA$/);
    expect(values.V_drain.value).toBeCloseTo(18 - 5100 * Number(values.I_D.value), 9);
    expect(report(MIRRORED).cells.A1.values!.r_o).toEqual({ value: null, unit: 'ohm', text: '∞' });
    expect(cells.Q1.values).toBeTypeOf('object');
    expect(cells.R_D.values).toBeUndefined();
  });

  it('keeps its numbers for names that objects are born with', () => {
    const { cells } = report('constructor = 1 V\ntoString = 2 V\nhasOwnProperty = 3 V');
    expect(Object.entries(cells).map(([name, { value }]) => [name, value])).toEqual([
      ['constructor', 1],
      ['toString', 2],
      ['hasOwnProperty', 3],
    ]);
  });

  it('has the cautions with cell, line and text', () => {
    const { cautions } = report(AMPLIFIER);
    for (const caution of cautions) expect(Object.keys(caution)).toEqual(['cell', 'line', 'text']);
  });

  it('has the workings of a cell on request', () => {
    expect(report('R_S = 3 kohm\nR_2 = R_S / 2', '--workings', 'R_2').workings).toEqual([
      { name: 'R_2', formula: 'R_S / 2', substitution: '3 kΩ / 2', result: '1.5 kΩ', sentence: '' },
    ]);
    expect(report('R_S = 3 kohm').workings).toBeUndefined();
  });

  it('is one object even for an empty file', () => {
    const { status, out } = runSheet('', '--json');
    expect(status).toBe(0);
    expect(JSON.parse(out)).toMatchObject({ title: null, cells: {}, checks: {}, cautions: [] });
  });
});
