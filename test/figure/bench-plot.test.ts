// The plot of a bench: what was measured stands on the page where it was measured, and the law beside it.

import { describe, expect, it } from 'vitest';
import { benchCharts, chartTable, drawChart, sheetPlot } from '../../src/figure/index.ts';
import { createSheet } from '../../src/sheet/index.ts';

const GATES = [0, -0.5, -1, -1.5];
const bench = (rows: string, columns = 'V_GS [V], I_D [mA], V_DS [V]'): string =>
  `M1 = bench\n  columns: ${columns}\n  lambda: 0 /V\n${rows}F1 = plot bench of M1\n`;
const transfer = (sign: number): string =>
  GATES.map((vgs) => `  ${sign * vgs}, ${(vgs + 2) ** 2 + 0.01 * (vgs === -1 ? 1 : 0)}, ${sign * 10}\n`).join('');

describe.each([1, -1])('the plot of a bench, channel %s', (sign) => {
  const sheet = createSheet(bench(transfer(sign)));
  const [readings, residuals] = benchCharts(sheet.bench('M1')!);
  const measured = readings!.curves.find(({ rings }) => rings === 'only')!;

  it('is what the plot cell shows', () => {
    expect(sheetPlot(sheet, 'F1')).toEqual({ charts: [readings, residuals] });
  });

  it('has the readings as they were measured', () => {
    expect([...measured.x].toSorted((a, b) => a - b)).toEqual(
      GATES.map((vgs) => 0 + sign * vgs).toSorted((a, b) => a - b),
    );
    const at = [...measured.x].indexOf(sign * -0.5);
    expect(measured.y[at]).toBe(2.25e-3);
    expect(readings!.y.low).toBeLessThanOrEqual(0);
    expect(readings!.y.high).toBeGreaterThan(4e-3);
  });

  it('has the fitted law as a line, and what the readings differ from it by below', () => {
    const law = readings!.curves.find(({ rings }) => rings === undefined)!;
    const near = [...law.x].findIndex((x, i) => i > 0 && Math.abs(x - sign * -0.5) < Math.abs(law.x[1]! - law.x[0]!));
    expect(law.y[near]).toBeCloseTo((2 + sign * law.x[near]!) ** 2 * 1e-3, 4);
    const [points] = residuals!.curves;
    const { specimens } = sheet.bench('M1')!;
    expect(new Set(points!.y)).toEqual(new Set(specimens[0]!.residuals));
  });

  it('is drawn with a ring for each reading and no line between them', () => {
    const items = drawChart(residuals!, { width: 300, height: 200 }).items.flatMap((item) =>
      item.kind === 'clip' ? item.items : [],
    );
    expect(items.filter(({ kind }) => kind === 'circle')).toHaveLength(GATES.length);
    expect(items.filter((item) => item.kind === 'line' && item.role === 'nominal')).toEqual([]);
  });

  it('has a table with a row at each reading, and none between', () => {
    const { columns, rows } = chartTable(readings!);
    const column = columns.findIndex((title) => title.includes('measured'));
    expect(rows.filter((row) => row[column] !== '' && row[column] !== '–')).toHaveLength(GATES.length);
  });
});

it('readings along the drain stand over V_DS, with a curve for each V_GS', () => {
  const rows = [0, -1].flatMap((vgs) =>
    [0.5, 1, 2, 4, 8].map((vds) => {
      const drive = vgs + 2;
      return `  ${vgs}, ${vds >= drive ? drive ** 2 : vds * (2 * drive - vds)}, ${vds}\n`;
    }),
  );
  const [chart] = benchCharts(createSheet(bench(rows.join(''))).bench('M1')!);
  expect(chart!.x.symbol).toBe('V_DS');
  expect(chart!.curves.filter(({ rings }) => rings === undefined).map(({ label }) => label)).toEqual([
    '0 V',
    '−1.00 V',
  ]);
});
