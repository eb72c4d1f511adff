import { describe, expect, it } from 'vitest';
import type { PlotInput } from '../../src/figure/index.ts';
import { chartTable, drawChart, histogramChart, plotCharts, readOut, stackCharts } from '../../src/figure/index.ts';
import { CURRENT, RESISTANCE, VOLTAGE } from '../../src/quantity/index.ts';

const X = Float64Array.of(100, 1000, 10_000);

function plot(changes: Partial<PlotInput> = {}): PlotInput {
  return {
    name: 'F2',
    input: { label: 'R_S', kind: RESISTANCE, values: X, log: true },
    present: 1000,
    series: [
      { label: 'A1.I_D', kind: CURRENT, values: Float64Array.of(3e-3, 1e-3, 2e-4), present: 1e-3, limits: [] },
      {
        label: 'A1.margin',
        kind: VOLTAGE,
        values: Float64Array.of(1, 9, 14),
        present: 9,
        limits: [{ value: 10, forbids: 'below' }],
      },
      { label: 'A1.V_ov', kind: VOLTAGE, values: Float64Array.of(2, NaN, 0.5), present: null, limits: [] },
    ],
    ...changes,
  };
}

describe('a plot of a sheet', () => {
  it('has one panel for each kind of value, over the same axis', () => {
    const charts = plotCharts(plot());
    expect(charts.map(({ curves }) => curves.map(({ label }) => label))).toEqual([[''], ['A1.margin', 'A1.V_ov']]);
    expect(charts[0]!.x).toBe(charts[1]!.x);
    expect(charts.map(({ y }) => y.unit)).toEqual(['mA', 'V']);
  });

  it('marks the values at the entry and the limit that is passed there', () => {
    const [, volts] = plotCharts(plot());
    expect(volts!.marks).toMatchObject([{ x: 1000, y: 9, label: '9.00 V' }]);
    expect(volts!.posts).toMatchObject([{ axis: 'y', value: 10, forbids: 'below', passed: true, label: 'limit 10 V' }]);
  });

  it('draws a gap where a value is unknown', () => {
    const values = Float64Array.of(1, 2, NaN, 3, 4);
    const x = Float64Array.of(1, 2, 3, 4, 5);
    const series = [{ label: 'V_x', kind: VOLTAGE, values, present: null, limits: [] }];
    const [chart] = plotCharts(
      plot({ input: { label: 'R_S', kind: RESISTANCE, values: x, log: false }, present: 9, series }),
    );
    const pieces = drawChart(chart!, { width: 300, height: 200 })
      .items.flatMap((item) => (item.kind === 'clip' ? item.items : []))
      .filter((item) => item.kind === 'line' && item.role === 'nominal');
    expect(pieces).toHaveLength(2);
  });

  it('of a value that does not move is a level line with room around it', () => {
    const series = [{ label: 'V_x', kind: VOLTAGE, values: Float64Array.of(5, 5, 5), present: 5, limits: [] }];
    const [chart] = plotCharts(plot({ series }));
    expect(chart!.y.low).toBeLessThan(5);
    expect(chart!.y.high).toBeGreaterThan(5);
  });

  it('of a value known nowhere says so', () => {
    const series = [{ label: 'V_x', kind: VOLTAGE, values: Float64Array.of(NaN, NaN, NaN), present: null, limits: [] }];
    expect(plotCharts(plot({ series }))[0]!.sentence).toContain('V_x has no value');
  });

  it('stacks its panels below each other', () => {
    const drawing = stackCharts(plotCharts(plot()), { width: 300, height: 200 });
    expect([drawing.width, drawing.height]).toEqual([300, 400]);
    const lowest = drawing.items.flatMap((item) => (item.kind === 'text' ? [item.y] : []));
    expect(Math.max(...lowest)).toBeGreaterThan(380);
  });

  it('refuses arrays of unequal length', () => {
    const series = [{ label: 'V_x', kind: VOLTAGE, values: Float64Array.of(1), present: null, limits: [] }];
    expect(() => plotCharts(plot({ series }))).toThrow(RangeError);
  });
});

describe('a histogram', () => {
  const input = {
    label: 'A1.I_D',
    kind: CURRENT,
    edges: Float64Array.of(1e-3, 2e-3, 3e-3),
    counts: [30, 10],
    nominal: 1.8e-3,
    limits: [{ value: 0.9e-3, forbids: 'below' as const, passed: false }],
  };

  it('is an outline of its bins with limits and nominal', () => {
    const { curves, posts, marks, sentence } = histogramChart(input);
    expect(Array.from(curves[0]!.y)).toEqual([0, 30, 30, 0, 0, 10, 10, 0]);
    expect(posts).toMatchObject([{ axis: 'x', value: 0.9e-3, passed: false, label: 'limit 0.9 mA' }]);
    expect(marks).toMatchObject([{ x: 1.8e-3, y: 0 }]);
    expect(sentence).toBe('Spread of A1.I_D over 40 builds: from 1.00 mA to 3.00 mA, nominal 1.80 mA.');
  });

  it('refuses borders that do not fit', () => {
    expect(() => histogramChart({ ...input, counts: [1] })).toThrow(RangeError);
  });
});

describe('a band', () => {
  const input = { label: 'R', kind: RESISTANCE, values: Float64Array.of(1, 2, 3, 4, 5), log: false };
  const chart = (low: number[], high: number[]) =>
    plotCharts({
      name: 'F1',
      input,
      present: 2,
      series: [
        {
          label: 'I',
          kind: CURRENT,
          values: Float64Array.of(5, 4, 3, 2, 1),
          present: 4,
          limits: [],
          band: { x: Float64Array.of(1, 3, 5), low: Float64Array.from(low), high: Float64Array.from(high) },
        },
      ],
    })[0]!;

  it('is drawn around its curve, within the axes, and read in numbers', () => {
    const drawn = chart([4, 2, 0.5], [7, 5, 2]);
    expect(drawn.areas).toHaveLength(1);
    expect(drawn.y.high).toBeGreaterThan(7);
    expect(readOut(drawn, 3)).toBe('R 3.00 Ω: I 3.00 A (2.00 A to 5.00 A)');
    expect(readOut(drawn, 2)).toBe('R 2.00 Ω: I 4.00 A (3.00 A to 6.00 A)');
    const { columns, rows } = chartTable(drawn);
    expect(columns).toEqual(['R (Ω)', 'I (A)', 'low I (A)', 'high I (A)']);
    expect(rows.find(([place]) => place === '3')).toEqual(['3', '3', '2', '5']);
    expect(drawn.sentence).toMatch(/with its band over the declared set/);
  });

  it('ends where it is not known', () => {
    expect(chart([4, NaN, 0.5], [7, 5, 2]).areas).toEqual([]);
    const drawn = chart([4, 2, NaN], [7, 5, 2]);
    expect(drawn.areas.map(({ x }) => [...x])).toEqual([[1, 3]]);
    expect(readOut(drawn, 4.5)).toBe('R 4.50 Ω: I 1.50 A');
  });
});
