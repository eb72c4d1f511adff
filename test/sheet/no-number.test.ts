import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';

const PART = 'Q1 = n-MOSFET\n  V_TO: 2 V\n  K: 1 mA/V^2\n  I_GSS: 1 nA\n  R_thJA: 100 K/W\n  gamma: 0.5 V^0.5\n';

describe('what is no number', () => {
  it.each([
    ['a point', 'P1 = point of Q1\n  V_GS: 1e200 V\n  V_DS: 1e200 V\n', 'P1.g_m'],
    [
      'a stage',
      'A1 = stage of Q1\n  gate: to 5 V\n  drain: 1e300 ohm to 1e300 V\n  source: 1e-300 ohm to 0 V\n',
      'A1.g_m',
    ],
  ])('is never read as one, and %s says why', (_, cell, path) => {
    const sheet = createSheet(`${PART}${cell}x = ${path}\n`);
    const [name, value] = path.split('.');
    const readings = sheet.cell(name!)!.values;
    expect(readings.filter((reading) => Number.isNaN(reading.value))).toEqual([]);
    expect(readings.find((reading) => reading.name === value)).toMatchObject({
      value: null,
      missing: {
        code: 'no-value',
        text: 'g_m comes out as no number here: what it is made of overflows, or is nothing over nothing.',
      },
    });
    expect(sheet.value(path)).toBeNull();
    expect(sheet.error('x')!.code).toBe('no-value');
  });

  it('is told from infinity, which is a value', () => {
    const sheet = createSheet('a = 1/0\nb = 1e300 V * 1e300\nc = -1/0\nd = 1/a\n');
    expect(['a', 'b', 'c', 'd'].map((name) => sheet.value(name))).toEqual([Infinity, Infinity, -Infinity, 0]);
  });
});
