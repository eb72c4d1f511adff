// A band designed: what the three ways to bias come to, against the sheet that is written, against builds, and mirrored.

import { describe, expect, test } from 'vitest';
import { createSheet } from '../../../src/sheet/index.ts';
import { analyse } from '../../../src/spread/index.ts';
import { lookFor } from '../../../src/ui/design/band-choice.ts';
import { biasForms } from '../../../src/ui/design/band-forms.ts';
import type { BiasForm } from '../../../src/ui/design/band-forms.ts';
import { bandPoints } from '../../../src/ui/design/band-points.ts';
import { reachedBand } from '../../../src/ui/design/band-reached.ts';
import type { Reached } from '../../../src/ui/design/band-reached.ts';
import { firstEntries, readWish } from '../../../src/ui/design/band-wish.ts';
import type { BandEntries, BandWish } from '../../../src/ui/design/band-wish.ts';
import { createDraw } from '../../support/counter-random.ts';

const CLIMATE = 'T_A = 25 degC in 0 degC .. 60 degC';
const SHEETS = {
  'an n-JFET': `V_DD = 18 V ± 5 %\n${CLIMATE}\nQ1 = n-JFET\n  I_DSS: 2 mA .. 9 mA at V_DS = 15 V\n  V_GSoff: -4 V .. -1 V at I_D = 10 nA\n  lambda: 0.01 /V\n  tracking: 0.8`,
  'a p-JFET on a negative supply': `V_DD = -18 V ± 5 %\n${CLIMATE}\nQ1 = p-JFET\n  I_DSS: 2 mA .. 9 mA at V_DS = -15 V\n  V_GSoff: 1 V .. 4 V at I_D = 10 nA\n  lambda: 0.01 /V\n  tracking: 0.8`,
  'a p-JFET on a positive supply': `V_DD = 18 V ± 5 %\nQ1 = p-JFET\n  I_DSS: 3 mA .. 9 mA\n  V_GSoff: 1.5 V .. 4 V at I_D = 10 nA\n  g_fs: 2 mS .. 5 mS`,
  'an n-MOSFET of enhancement': `V_DD = 15 V ± 5 % service\n${CLIMATE}\nQ1 = n-MOSFET\n  V_GSth: 1 V .. 2.5 V at I_D = 1 mA\n  K: 50 mA/V^2 ± 30 %\n  lambda: 0.02 /V`,
  'a p-MOSFET of enhancement': `V_DD = 15 V ± 5 %\n${CLIMATE}\nQ1 = p-MOSFET\n  V_GSth: -2.5 V .. -1 V at I_D = 1 mA\n  K: 50 mA/V^2 ± 30 %`,
  'an n-MOSFET of depletion': `V_DD = 15 V ± 5 %\nQ1 = n-MOSFET\n  I_DSS: 5 mA .. 12 mA\n  V_P: -4 V .. -2 V`,
} as const;
type SheetName = keyof typeof SHEETS;

function wishFor(text: string, entries: Partial<BandEntries>): BandWish {
  const sheet = createSheet(text);
  const wish = readWish(sheet, { ...firstEntries(sheet), ...entries });
  if (typeof wish === 'string') throw new Error(wish);
  return wish;
}

function formsFor(wish: BandWish): Record<'self' | 'fixed' | 'source', BiasForm> {
  const forms = biasForms(wish);
  if (typeof forms === 'string') throw new Error(forms);
  const [self, fixed, source] = forms;
  return { self: self!, fixed: fixed!, source: source! };
}

function reached(wish: BandWish, form: BiasForm): Reached {
  const found = reachedBand(wish, form);
  if (typeof found === 'string') throw new Error(found);
  return found;
}

describe.each(Object.keys(SHEETS) as SheetName[])('for %s', (name) => {
  const text = SHEETS[name];

  test.each([
    ['1 mA', '1.5 mA'],
    ['1.5 mA', '2.5 mA'],
    ['0.5 mA', '2.5 mA'],
  ])('fixed plus self holds from %s to %s at every extreme, in preferred values', (least, most) => {
    for (const series of ['E24', 'E96'] as const) {
      const wish = wishFor(text, { least, most, series });
      const { I_D } = reached(wish, formsFor(wish).fixed);
      expect({ series, low: I_D.low! >= wish.least, high: I_D.high! <= wish.most }).toEqual({
        series,
        low: true,
        high: true,
      });
    }
  });

  test('what is written computes beside the sheet, and builds stay in the band that was said', () => {
    const wish = wishFor(text, { least: '1 mA', most: '1.6 mA' });
    for (const found of lookFor(wish) as Exclude<ReturnType<typeof lookFor>, string>) {
      if (found.lines.length === 0) continue;
      const sheet = createSheet([text, ...found.lines].join('\n'));
      expect(sheet.cells().map((cell) => cell.fault?.text ?? null)).toEqual(sheet.cells().map(() => null));
      const spread = analyse(sheet.spreadModel(), { samples: 4096, seed: 5 })!;
      const current = spread.value('A1.I_D')!;
      const { row } = found;
      const check = spread.check('band')!;
      expect({ form: row.form, holds: row.verdict }).toEqual({
        form: row.form,
        holds: check.holds && spread.check('saturated')!.holds ? 'holds' : 'misses',
      });
      const form = formsFor(wish)[row.form];
      const { I_D } = reached(wish, form);
      const near = (a: number, b: number): boolean => Math.abs(a / b - 1) < 1e-6;
      expect([row.form, near(I_D.low!, current.low.value!), near(I_D.high!, current.high.value!)]).toEqual([
        row.form,
        true,
        true,
      ]);
    }
  });
});

test('without room for tolerances both limit devices stand exactly at the ends of the band', () => {
  // Exact resistors on an exact supply: what is left to spread is the part alone.
  const part = 'Q1 = n-JFET\n  I_DSS: 3 mA .. 9 mA\n  V_P: -4 V .. -1.5 V';
  const wish = wishFor(`V_DD = 20 V\n${part}`, { least: '1 mA', most: '1.6 mA', roomy: false, tolerance: '' });
  const { exact } = formsFor(wish).fixed.bias!;
  const sheet = createSheet(
    `${part}\nA1 = stage of Q1\n  gate: to ${exact.V_GG} V\n  drain: to 20 V\n  source: ${exact.ohms} ohm to 0 V`,
  );
  const { low, high } = analyse(sheet.spreadModel(), { samples: 0, seed: 1 })!.value('A1.I_D')!;
  expect(low.value! / 1e-3).toBeCloseTo(1, 9);
  expect(high.value! / 1.6e-3).toBeCloseTo(1, 9);
});

test('the points of a band bound every device of a part whose limits are cut, and some device stands at each', () => {
  const text = 'V_DD = 18 V\nQ1 = p-JFET\n  I_DSS: 3 mA .. 9 mA\n  V_P: 1.5 V .. 4 V\n  g_fs: 2 mS .. 5 mS';
  const points = bandPoints(wishFor(text, { least: '1 mA', most: '2 mA' }), 1000);
  if (typeof points === 'string') throw new Error(points);
  let [least, most] = [-Infinity, Infinity];
  const look = (idss: number, off: number): void => {
    const beta = idss / (off * off);
    const g_fs = (2 * idss) / off;
    const inside = idss >= 3e-3 && idss <= 9e-3 && off >= 1.5 && off <= 4 && g_fs >= 2e-3 && g_fs <= 5e-3;
    if (!inside) return;
    least = Math.max(least, -off + Math.sqrt(1e-3 / beta));
    most = Math.min(most, -off + Math.sqrt(2e-3 / beta));
  };
  const steps = 400;
  for (let i = 0; i <= steps; i++) {
    for (let k = 0; k <= steps; k++) look(3e-3 + (6e-3 * i) / steps, 1.5 + (2.5 * k) / steps);
    // The borders of the cut themselves.
    for (const g_fs of [2e-3, 5e-3]) {
      const off = 1.5 + (2.5 * i) / steps;
      look((g_fs * off) / 2, off);
      const idss = 3e-3 + (6e-3 * i) / steps;
      look(idss, (2 * idss) / g_fs);
    }
  }
  expect(points.vgsLeast).toBeGreaterThan(least - 1e-9);
  expect(points.vgsLeast).toBeLessThan(least + 2e-3);
  expect(points.vgsMost).toBeLessThan(most + 1e-9);
  expect(points.vgsMost).toBeGreaterThan(most - 2e-3);
});

test('a mirrored sheet gives the same bias and the same band to the last bit', () => {
  const [n, p] = (['an n-JFET', 'a p-JFET on a negative supply'] as const).map((name) => {
    const wish = wishFor(SHEETS[name], { least: '1 mA', most: '1.5 mA' });
    const forms = formsFor(wish);
    return Object.values(forms).map((form) => ({
      bias: form.bias,
      I_D: form.bias && reached(wish, form).I_D,
      margin: form.bias && reached(wish, form).margin,
    }));
  });
  expect(p).toEqual(n);
});

describe('for parts and wants at random', () => {
  const draw = createDraw(4711);
  const cases = Array.from({ length: 24 }, (_, n) => [n, drawCase(draw)] as const);

  test.each(cases)(
    'number %i of seed 4711: fixed plus self holds at every extreme, or says why not',
    (_n, { text, entries }) => {
      const wish = wishFor(text, entries);
      const { fixed } = formsFor(wish);
      const found = fixed.bias && reached(wish, fixed);
      const holds = found !== null && found.I_D.low! >= wish.least && found.I_D.high! <= wish.most;
      const isExplained = fixed.reasons.length > 0 || (found !== null && found.margin.low! < 0);
      expect({ text, entries, isFine: holds || isExplained }).toEqual({ text, entries, isFine: true });
    },
  );

  test('most of them hold', () => {
    const held = cases.filter(([, { text, entries }]) => {
      const wish = wishFor(text, entries);
      return formsFor(wish).fixed.reasons.length === 0;
    });
    expect(held.length).toBeGreaterThan(8);
  });
});

/** A part of either channel and kind, a supply of either sign, a band. */
function drawCase(draw: () => number): { readonly text: string; readonly entries: Partial<BandEntries> } {
  const pick = <Value>(of: readonly Value[]): Value => of[Math.floor(draw() * of.length)]!;
  const [isP, kind] = [draw() < 0.5, pick(['JFET', 'depletion', 'enhancement'])];
  const limits = (low: number, high: number): string =>
    isP
      ? `${(-high).toPrecision(4)} V .. ${(-low).toPrecision(4)} V`
      : `${low.toPrecision(4)} V .. ${high.toPrecision(4)} V`;
  const opening = 0.6 + 2 * draw();
  const current = 1 + 4 * draw();
  const rows =
    kind === 'enhancement'
      ? [
          `  V_GSth: ${limits(opening, opening + 0.2 + draw())} at I_D = 1 mA`,
          `  K: ${(2 + 50 * draw()).toFixed(1)} mA/V^2 ± 20 %`,
        ]
      : [
          `  I_DSS: ${current.toFixed(2)} mA .. ${(current * (1.5 + 2 * draw())).toFixed(2)} mA`,
          `  V_P: ${limits(-opening * (1.3 + draw()), -opening)}`,
        ];
  const least = 0.1 + 1.5 * draw();
  return {
    text: [
      `V_DD = ${(pick([1, -1]) * (15 + 15 * draw())).toFixed(1)} V ± ${pick([0.5, 2, 5])} %`,
      pick([CLIMATE, '> at room temperature']),
      `Q1 = ${isP ? 'p' : 'n'}-${kind === 'JFET' ? 'JFET' : 'MOSFET'}`,
      ...rows,
      pick(['  lambda: 0.02 /V', '  lambda: 0 /V']),
    ].join('\n'),
    entries: {
      least: `${least.toFixed(3)} mA`,
      most: `${(least * (1.15 + draw())).toFixed(3)} mA`,
      drain: pick(['', '1 kohm']),
      series: pick(['E12', 'E24', 'E96']),
      tolerance: pick(['1 %', '0.1 %', '']),
    },
  };
}

describe('what cannot be held is said with its number', () => {
  const said = (text: string, entries: Partial<BandEntries>, form: 'self' | 'fixed' | 'source'): string => {
    const found = lookFor(wishFor(text, entries));
    if (typeof found === 'string') return found;
    return found.find(({ row }) => row.form === form)!.row.sentences.join(' ');
  };
  const exactPart = 'Q1 = n-JFET\n  I_DSS: 4 mA .. 8 mA\n  V_P: -6 V .. -3 V';

  test('self-bias that misses both ends', () => {
    const text = said(`V_DD = 25 V\n${exactPart}`, { least: '2 mA', most: '2.5 mA', tolerance: '' }, 'self');
    expect(text).toMatch(
      /^With V_GG at 0 V the high end asks for 1\.\d\d kΩ or more in the source, the low end for \d+ Ω or less\./,
    );
    expect(text).toMatch(/The low end misses by \d+ µA: a unit may carry 1\.\d\d mA\./);
    expect(text).toMatch(/The high end misses by \d+ µA: a unit may carry \d\.\d\d mA\./);
  });

  test('an enhancement FET has no self-bias', () => {
    expect(said('V_DD = 15 V\nQ1 = n-MOSFET\n  V_TO: 1 V .. 2 V\n  K: 2 mA/V^2', {}, 'self')).toBe(
      'With the gate at its rail V_GS lies below 0 V; a high device needs 2.00 V for 2 mA. The bias line starts at V_GG 3.41 V, not at 0 V.',
    );
    // By hand: 2.707 V at 1 mA from a threshold of 2 V, 2 V at 2 mA from one of 1 V; 707 ohm.
  });

  test('a gate voltage above the supply', () => {
    const text = said(`V_DD = 12 V\n${exactPart}`, { least: '2 mA', most: '2.1 mA', roomy: false }, 'fixed');
    expect(text).toMatch(/The line asks for V_GG of \d+\.\d V, \d+\.\d V beyond the supply of 12\.0 V/);
    expect(text).toMatch(/(low|high) end misses by/);
  });

  test('a negative R_S: the band is wider than the part spreads at a fixed gate voltage', () => {
    expect(said(`V_DD = 25 V\n${exactPart}`, { least: '0.2 mA', most: '7 mA', roomy: false }, 'fixed')).toMatch(
      /asks for −\d+ Ω, a negative R_S: the band is wider than the part spreads/,
    );
  });

  test('a current source that is too coarse', () => {
    expect(
      said(`V_DD = 25 V\n${exactPart}`, { least: '2 mA', most: '2.1 mA', sourceTolerance: '10 %' }, 'source'),
    ).toMatch(/A source of ±10 % alone moves the current by more than the band\./);
  });

  test('a limit that the data sheet leaves open', () => {
    const open = 'V_DD = 15 V\nQ1 = n-JFET\n  I_DSS: 2 mA ..\n  V_P: -3 V .. -1 V';
    expect(said(open, {}, 'fixed')).toMatch(/The high end of the band is not known: Q1\.I_DSS has an open limit\./);
  });
});

test('names that the sheet bears are numbered on, and a supply and a drain resistor that are typed become cells', () => {
  const wish = wishFor('R_S = 1 kohm\nband = 3\nA1 = 2\nQ1 = n-JFET\n  I_DSS: 3 mA .. 6 mA\n  V_P: -3 V .. -2 V', {
    supply: '24 V ± 2 %',
    drain: '1k5',
  });
  const found = lookFor(wish);
  if (typeof found === 'string') throw new Error(found);
  const [, fixed] = found;
  expect(fixed!.lines.map((line) => line.split(/\s*=|\s*;/)[0]!)).toEqual([
    'V_DD',
    'R_D',
    'R_S1',
    'R_1',
    'R_2',
    'A2',
    '  gate: R_1 to V_DD, R_2 to 0 V',
    '  drain: R_D to V_DD',
    '  source: R_S1 to 0 V',
    'band1',
    'saturated',
  ]);
  expect(fixed!.lines[1]).toBe('R_D = 1k5 ± 1 %  [assumed]');
});

test.each([
  [{ least: '2 mA', most: '1 mA' }, 'The largest current is larger than the least one.'],
  [{ least: '0 mA' }, 'The least current is larger than 0.'],
  [{ least: '' }, 'The least current is not given yet.'],
  [{ most: '2 V' }, 'The largest current is a current; 2 V is a voltage.'],
  [{ supply: '0 V' }, 'The supply is 0 V: nothing flows.'],
  [{ supply: '' }, 'The supply is not given yet.'],
  [{ drain: '3 mA' }, 'The drain resistor is a resistance; R_D is a current.'],
  [{ tolerance: '60 %' }, 'The tolerance of the resistors lies between 0 and 50 %.'],
  [{ part: '' }, 'The sheet has no part yet. Insert one from its data sheet first.'],
] as const)('%o is answered: %s', (entries, said) => {
  const sheet = createSheet(SHEETS['an n-JFET']);
  expect(readWish(sheet, { ...firstEntries(sheet), ...entries })).toBe(said);
});
