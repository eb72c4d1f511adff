// Charts in words and as tables.

import { describe, expect, it } from 'vitest';
import type { Chart, Curve } from '../../src/figure/index.ts';
import { chartTable, createAxis, readOut } from '../../src/figure/index.ts';
import { CURRENT, VOLTAGE } from '../../src/quantity/index.ts';

function curve(role: Curve['role'], label: string, points: readonly (readonly [number, number])[]): Curve {
  return { role, label, x: Float64Array.from(points, ([x]) => x), y: Float64Array.from(points, ([, y]) => y) };
}

function chart(curves: readonly Curve[]): Chart {
  return {
    title: 'Chart',
    sentence: '',
    x: createAxis('V_GS', VOLTAGE, { low: -4, high: 0 }),
    y: createAxis('I_D', CURRENT, { low: 0, high: 0.004 }),
    yAt: 'right',
    areas: [],
    curves,
    posts: [],
    marks: [{ role: 'point', shape: 'disc', x: -1.5, y: 0.001, label: 'Q' }],
  };
}

const LINE = curve('bias', 'bias line', [
  [-4, 0.004],
  [0, 0],
]);

describe('the read-out', () => {
  it('says the place and each lone curve there, in the units of the axes', () => {
    expect(
      readOut(
        chart([
          LINE,
          curve('nominal', '', [
            [-2, 0],
            [0, 0.002],
          ]),
        ]),
        -1,
      ),
    ).toBe('V_GS −1.00 V: bias line 1.00 mA, I_D 1.00 mA');
  });

  it('leaves out families, edges, and curves that have no value there', () => {
    const short = curve('nominal', 'nominal', [
      [-2, 0],
      [0, 0.002],
    ]);
    const family = curve('family', '−1 V', [
      [-4, 0.001],
      [0, 0.001],
    ]);
    expect(readOut(chart([short, family, { ...LINE, role: 'edge' }]), -3)).toBe('V_GS −3.00 V: no curve here');
  });

  it('reads curves that run from right to left and knows their gaps', () => {
    const gap = curve('nominal', 'nominal', [
      [0, 0.004],
      [-1, 0.003],
      [-2, NaN],
      [-3, 0.001],
      [-4, 0],
    ]);
    expect(readOut(chart([gap]), -0.5)).toBe('V_GS −0.500 V: nominal 3.50 mA');
    expect(readOut(chart([gap]), -1.5)).toBe('V_GS −1.50 V: no curve here');
    expect(readOut(chart([gap]), -3.5)).toBe('V_GS −3.50 V: nominal 0.500 mA');
  });
});

describe('the table', () => {
  it('has a row for every tick and every marked point, in order, and a column for every curve with its unit', () => {
    const family = {
      ...curve('family', '−1 V', [
        [-2, 0.002],
        [0, 0.002],
      ]),
      said: 'V_GS −1 V',
    };
    expect(chartTable(chart([LINE, family]))).toEqual({
      columns: ['V_GS (V)', 'bias line (mA)', 'V_GS −1 V (mA)'],
      rows: [
        ['−4', '4', '–'],
        ['−3', '3', '–'],
        ['−2', '2', '2'],
        ['−1.5', '1.5', '2'],
        ['−1', '1', '2'],
        ['0', '0', '2'],
      ],
    });
  });
});
