// A part that is fitted to a bench computes as one whose rows hold the numbers of that bench.

import { describe, expect, it, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import type { Sheet } from '../../src/sheet/index.ts';
import { analyse } from '../../src/spread/index.ts';
import { number } from './kinds.ts';
import { benchText } from './measured-points.ts';
import type { Place, Truth } from './measured-points.ts';

const SPECIMENS: readonly Truth[] = [
  { name: 's1', beta: 1.1e-3, V_TO: -2.1, lambda: 0.012 },
  { name: 's2', beta: 1.3e-3, V_TO: -1.7, lambda: 0.01 },
  { name: 's3', beta: 1.2e-3, V_TO: -1.9, lambda: 0.011 },
  { name: 's4', beta: 1.25e-3, V_TO: -1.8, lambda: 0.014 },
];
const PLACES: readonly Place[] = [
  [0, 10],
  [-0.4, 10],
  [-0.8, 10],
  [-1.2, 10],
  [0, 4],
  [-0.8, 4],
];

const stageOf = (sign: 1 | -1): string => `R_S = 1 kohm ± 1 %
V_DD = ${sign * 15} V ± 5 %
A1 = stage of Q1
  gate: 1 Mohm to 0 V, 100 nF to signal
  drain: 2.2 kohm to V_DD
  source: R_S to 0 V
  output: drain
current = check A1.I_D within 0.7 mA .. 1.2 mA
`;

/** Every number of the cells beside part and bench. */
function numbersOf(sheet: Sheet): [string, number | string | boolean | null][] {
  return sheet
    .cells()
    .filter(({ kind }) => kind !== 'bench' && kind !== 'part')
    .flatMap((cell) => [
      [cell.name, sheet.value(cell.name)] as [string, ReturnType<Sheet['value']>],
      ...cell.values.map((value) => [`${cell.name}.${value.name}`, value.value] as [string, typeof value.value]),
    ]);
}

/** How many of them are numbers. */
function count(found: ReturnType<typeof numbersOf>): number {
  return found.filter(([, value]) => typeof value === 'number').length;
}

describe('a part fitted to several specimens', () => {
  describe.each([
    ['n-JFET', 1],
    ['p-JFET', -1],
    ['n-MOSFET', 1],
  ] as const)('%s', (kind, channel) => {
    const bench = benchText('M1', SPECIMENS, PLACES, { channel });
    const fitted = createSheet(`${bench}Q1 = ${kind} fitted to M1\n${stageOf(channel)}`);
    const of = (name: string): number => number(fitted, `M1.${name}`);
    const tracking = kind === 'n-MOSFET' ? -of('tracking') : of('tracking');
    const rows = `  V_P: ${of('V_TO')} V in ${of('V_TO_min')} V .. ${of('V_TO_max')} V
  I_DSS: ${of('I_DSS')} A in ${of('I_DSS_min')} A .. ${of('I_DSS_max')} A
  lambda: ${of('lambda')} /V
  tracking: ${tracking}
`;
    const written = createSheet(`Q1 = ${kind}\n${rows}${stageOf(channel)}`);

    it('computes the same nominal values to the last bit', () => {
      const found = numbersOf(fitted);
      expect(found).toEqual(numbersOf(written));
      expect(count(found)).toBeGreaterThan(20);
    });

    it('has the same ends, builds and yield', () => {
      const [a, b] = [fitted, written].map((sheet) => analyse(sheet.spreadModel(), { samples: 500, seed: 7 })!);
      for (const path of ['A1.I_D', 'A1.V_DS', 'A1.A_v']) {
        const [x, y] = [a!.value(path)!, b!.value(path)!];
        expect([x.low.value, x.high.value, x.distribution]).toEqual([y.low.value, y.high.value, y.distribution]);
        expect(x.low.value!).toBeLessThan(x.high.value!);
      }
      expect(a!.report.all).toEqual(b!.report.all);
    });
  });
});

test('a part fitted to one specimen computes as beta and V_TO of that one', () => {
  const bench = benchText('M1', SPECIMENS.slice(0, 1), PLACES);
  const fitted = createSheet(`${bench}Q1 = n-JFET fitted to M1\n${stageOf(1)}`);
  const rows = ['beta: # A/V^2', 'V_TO: # V', 'lambda: # /V'];
  const lines = rows.map((row) => `  ${row.replace('#', String(number(fitted, `M1.${row.split(':')[0]}`)))}\n`);
  const found = numbersOf(fitted);
  expect(found).toEqual(numbersOf(createSheet(`Q1 = n-JFET\n${lines.join('')}${stageOf(1)}`)));
  expect(count(found)).toBeGreaterThan(20);
  expect(fitted.assumptions().map(({ text }) => text)).toContain(
    'Q1: one specimen was measured in M1; what others of its kind spread over is not in it.',
  );
});

test('an enhancement MOSFET takes threshold and constant', () => {
  const truths = SPECIMENS.map((each) => ({ ...each, V_TO: each.V_TO + 4 }));
  const places = PLACES.map(([vgs, vds]): Place => [vgs + 4, vds]);
  const fitted = createSheet(
    `${benchText('M1', truths, places)}Q1 = n-MOSFET fitted to M1\nP1 = point of Q1\n  V_GS: 3.5 V\n  V_DS: 8 V\n`,
  );
  const of = (name: string): number => number(fitted, `M1.${name}`);
  expect(fitted.value('M1.I_DSS')).toBe(0);
  expect(number(fitted, 'P1.I_D')).toBeCloseTo(of('beta') * (3.5 - of('V_TO')) ** 2 * (1 + of('lambda') * 8), 12);
  const { low, high } = analyse(fitted.spreadModel(), { samples: 100, seed: 1 })!.value('Q1.V_TO')!;
  expect([low.value, high.value]).toEqual([of('V_TO_min'), of('V_TO_max')]);
});

describe('rows beside a bench', () => {
  const bench = benchText('M1', SPECIMENS, PLACES);

  it('that have limits cut the set, and those of one number are compared', () => {
    const sheet = createSheet(`${bench}Q1 = n-JFET fitted to M1\n  g_fs0: 4.3 mS .. 4.7 mS\n  I_DSS: 12 mA\n`);
    expect(sheet.error('Q1')).toBeNull();
    expect(sheet.spreadModel().cuts.map(({ name }) => name)).toEqual(['Q1.g_fs0']);
    const said = sheet.cautions().map(({ text }) => text);
    expect(said).toEqual([
      expect.stringMatching(/^I_DSS of the measured law is .* below what is written\. The bench settles the law\.$/),
    ]);
  });

  it('of the leads are counted twice, which is said', () => {
    const sheet = createSheet(`${bench}Q1 = n-JFET fitted to M1\n  r_s: 20 ohm\n`);
    expect(sheet.cautions().map(({ text }) => text)).toEqual([
      'M1 was measured at the terminals, so its numbers hold r_s already: it is counted twice here. Leave it out.',
    ]);
  });

  it('that are no law take the place of what the bench gives', () => {
    const sheet = createSheet(`${bench}Q1 = n-JFET fitted to M1\n  lambda: 0.02 /V\n`);
    expect(sheet.value('Q1.lambda')).toBe(0.02);
    expect(sheet.assumptions().map(({ text }) => text)).toContainEqual(
      expect.stringMatching(/^Q1\.lambda: as written in the part, in the place of what M1 gives, lambda = /),
    );
  });
});

test('a changed reading moves the part and the stage on it', () => {
  const text = `${benchText('M1', SPECIMENS, PLACES)}Q1 = n-JFET fitted to M1\n${stageOf(1)}`;
  const sheet = createSheet(text);
  const before = number(sheet, 'A1.I_D');
  const start = text.indexOf('  s3, ');
  const length = text.indexOf('\n  s4, ') - start;
  sheet.edit([{ start, end: start + length, text: text.slice(start, start + length).replaceAll('s3', 's1') }]);
  expect(sheet.error('M1')).toBeNull();
  expect(number(sheet, 'A1.I_D')).not.toBe(before);
  expect(number(sheet, 'M1.specimens')).toBe(3);
});
