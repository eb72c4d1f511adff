// Benches: what is measured of invented specimens is found again, with its standard errors, and what is asked of them.

import { describe, expect, it, test } from 'vitest';
import { pastedBench, readPastedRows } from '../../src/language/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import type { BenchReading, Sheet } from '../../src/sheet/index.ts';
import { number } from './kinds.ts';
import { createDraw } from '../support/counter-random.ts';
import { benchText, lawCurrent, noiseFrom } from './measured-points.ts';
import type { Place, Truth } from './measured-points.ts';

const S1: Truth = { name: 's1', beta: 1.1e-3, V_TO: -2.1, lambda: 0.012 };
const TRUTHS: readonly Truth[] = [
  S1,
  { name: 's2', beta: 1.3e-3, V_TO: -1.7, lambda: 0.012 },
  { name: 's3', beta: 1.2e-3, V_TO: -1.9, lambda: 0.012 },
  { name: 's4', beta: 1.25e-3, V_TO: -1.85, lambda: 0.012 },
  { name: 's5', beta: 1.05e-3, V_TO: -2.4, lambda: 0.012 },
];
/** Closed, ohmic and saturated ones among them. */
const PLACES: readonly Place[] = [
  [0, 10],
  [-0.4, 10],
  [-0.8, 10],
  [-1.2, 10],
  [0, 3],
  [-0.8, 4],
  [0, 1],
  [-0.4, 0.5],
  [-2.6, 10],
];

function benchOf(sheet: Sheet): BenchReading {
  const found = sheet.bench('M1');
  if (!found) throw new Error(sheet.error('M1')?.text ?? 'no bench');
  return found;
}

function cautionsOf(text: string): string[] {
  return createSheet(text)
    .cautions()
    .map((caution) => caution.text);
}

describe('a bench of one specimen', () => {
  const sheet = createSheet(benchText('M1', [S1], PLACES));
  const [specimen] = benchOf(sheet).specimens;

  it('without noise gives the constants that the readings were made from', () => {
    for (const path of ['M1', 'M1.s1']) {
      expect(number(sheet, `${path}.beta`) / S1.beta).toBeCloseTo(1, 6);
      expect(number(sheet, `${path}.V_TO`)).toBeCloseTo(S1.V_TO, 6);
      expect(number(sheet, `${path}.lambda`)).toBeCloseTo(S1.lambda, 6);
      expect(number(sheet, `${path}.I_DSS`) / (S1.beta * S1.V_TO ** 2)).toBeCloseTo(1, 6);
    }
    expect(number(sheet, 'M1.rms')).toBeLessThan(1e-9);
    expect(number(sheet, 'M1.specimens')).toBe(1);
  });

  it('says of each reading in which region it lies', () => {
    const of = ([vgs, vds]: Place): string =>
      vgs <= S1.V_TO ? 'cutoff' : vds < vgs - S1.V_TO ? 'ohmic' : 'saturation';
    expect(specimen!.regions).toEqual(PLACES.map(of));
    expect(new Set(specimen!.regions).size).toBe(3);
  });

  it('gives the current of the fitted law anywhere', () => {
    for (const place of PLACES) expect(specimen!.law(...place)).toBeCloseTo(lawCurrent(S1, place), 8);
  });

  it('is the same in whatever unit its columns are', () => {
    const rows = PLACES.map(([vgs, vds]) => [vgs, vds, lawCurrent(S1, [vgs, vds])] as const);
    const sheets = [
      ['V', 'V', 'A', 1, 1],
      ['mV', 'V', 'mA', 1e3, 1e3],
      ['V', 'V', 'uA', 1, 1e6],
    ].map(([gate, drain, current, volts, amperes]) => {
      const lines = rows.map(([vgs, vds, id]) => `  ${vgs * Number(volts)}, ${vds}, ${id * Number(amperes)}\n`);
      return createSheet(`M1 = bench\n  columns: V_GS [${gate}], V_DS [${drain}], I_D [${current}]\n${lines.join('')}`);
    });
    for (const name of ['beta', 'V_TO', 'lambda']) {
      const [first, ...others] = sheets.map((each) => number(each, `M1.${name}`));
      for (const other of others) expect(other / first!).toBeCloseTo(1, 7);
    }
  });

  it('lies within what its standard errors say, as noise goes', () => {
    const outside = { beta: 0, V_TO: 0, lambda: 0 };
    const runs = 60;
    for (let seed = 1; seed <= runs; seed++) {
      const noise = noiseFrom(seed);
      const noisy = createSheet(benchText('M1', [S1], PLACES.slice(0, 6), { noise: () => 0.004 * noise() }));
      for (const name of ['beta', 'V_TO', 'lambda'] as const) {
        const miss = Math.abs(number(noisy, `M1.${name}`) - S1[name]);
        if (miss > 3 * number(noisy, `M1.s_${name}`)) outside[name]++;
      }
    }
    // Three readings more than constants: the tails of Student's law with 3 degrees leave 6 % outside.
    for (const count of Object.values(outside)) expect(count).toBeLessThan(runs / 5);
  });

  it('of a p-channel FET is mirrored to the last bit', () => {
    const mirrored = createSheet(benchText('M1', [S1], PLACES, { channel: -1 }));
    expect(number(mirrored, 'M1.V_TO')).toBe(-number(sheet, 'M1.V_TO'));
    for (const name of ['beta', 'lambda', 'I_DSS', 's_beta', 's_V_TO', 'rms'])
      expect(number(mirrored, `M1.${name}`), name).toBe(number(sheet, `M1.${name}`));
    expect(benchOf(mirrored).specimens[0]!.regions).toEqual(specimen!.regions);
  });
});

describe('what a bench warns of', () => {
  it('a reading that heated the specimen by more than 2 K, at its line', () => {
    const text = benchText('M1', [S1], PLACES.slice(0, 4), { fields: '  R_thJA: 300 K/W\n' });
    const heat = createSheet(text)
      .cautions()
      .filter(({ text: said }) => said.includes('above ambient'));
    const rise = lawCurrent(S1, [0, 10]) * 10 * 300;
    expect(rise).toBeGreaterThan(2);
    expect(heat.map(({ text: said, line }) => [said, line])).toEqual([
      [expect.stringMatching(new RegExp(`^s1 was ${rise.toFixed(1)} K above ambient`)), 3],
    ]);
    const cool = benchText('M1', [S1], PLACES.slice(2, 4), { fields: '  R_thJA: 10 K/W\n' });
    expect(
      cautionsOf(`${cool}  s1, -1, 10, ${lawCurrent(S1, [-1, 10])}\n`).filter((said) => said.includes('above ambient')),
    ).toEqual([]);
  });

  it('readings that no square law fits', () => {
    const straight = [0, -0.4, -0.8, -1.2, -1.6].map((vgs) => `  ${vgs}, ${4e-3 * (1 + vgs / 2)}\n`).join('');
    const text = `M1 = bench\n  columns: V_GS [V], I_D [A]\n  V_DS: 10 V\n  lambda: 0 /V\n${straight}`;
    expect(cautionsOf(text).join(' ')).toMatch(/square law/);
    const square = [0, -0.4, -0.8, -1.2, -1.6].map((vgs) => `  ${vgs}, ${4e-3 * (1 + vgs / 2) ** 2}\n`).join('');
    expect(cautionsOf(text.replace(straight, square)).join(' ')).not.toMatch(/square law/);
  });

  it('readings that lie too close together to tell the constants apart', () => {
    const near: Place[] = [
      [-1, 10],
      [-1.01, 10],
      [-1.02, 10],
      [-1.03, 10],
    ];
    const noise = noiseFrom(5);
    const text = benchText('M1', [S1], near, { fields: '  lambda: 0.012 /V\n', noise: () => 0.002 * noise() });
    expect(cautionsOf(text).length).toBeGreaterThan(0);
    const wide = benchText('M1', [S1], PLACES.slice(0, 4), { fields: '  lambda: 0.012 /V\n' });
    expect(cautionsOf(wide)).toEqual([]);
  });
});

test('a bench warns where a specimen carries the current that is asked for only in another way', () => {
  const readings = benchText('M1', TRUTHS.slice(0, 2), PLACES.slice(0, 6), {
    fields: '  match: pairs at I_D = 4.5 mA, V_DS = 5 V\n  fitting: I_D = 1 mA, V_DS = 0.5 V\n',
  });
  const sheet = createSheet(readings);
  expect(sheet.cautions().map(({ text, line }) => [text, line])).toEqual([
    ['More than I_DSS is asked of s2 at 4.50 mA: V_GS lies beyond 0 V there, where the gate of a JFET conducts.', 2],
    [
      'A V_DS of 500 mV leaves s1, s2 ohmic at 1.00 mA, and the law of saturation is taken. Write a V_DS above V_DSsat.',
      3,
    ],
  ]);
});

test('a free exponent is fitted beside the square law and leaves less', () => {
  const rows = [0, -0.4, -0.8, -1.2, -1.6].map((vgs) => `  ${vgs}, ${4e-3 * (1 + vgs / 2.1) ** 1.8}\n`).join('');
  const sheet = createSheet(
    `M1 = bench\n  columns: V_GS [V], I_D [A]\n  V_DS: 10 V\n  lambda: 0 /V\n  exponent: free\n${rows}`,
  );
  expect(number(sheet, 'M1.exponent')).toBeCloseTo(1.8, 4);
  expect(number(sheet, 'M1.s_exponent')).toBeGreaterThanOrEqual(0);
});

describe('a bench of several specimens', () => {
  const KEEP = '  keep: V_P in -2.2 V .. -1.8 V\n';
  const POINT = '  match: pairs at I_D = 1 mA and 0.3 mA, V_DS = 5 V\n  fitting: I_D = 1 mA, V_DS = 5 V\n';
  const sheet = createSheet(benchText('M1', TRUTHS, PLACES.slice(0, 6), { fields: KEEP + POINT }));
  const kept = TRUTHS.filter(({ V_TO }) => V_TO >= -2.2 && V_TO <= -1.8);
  const gate = ({ beta, V_TO, lambda }: Truth, current: number): number =>
    V_TO + Math.sqrt(current / (beta * (1 + lambda * 5)));

  it('keeps those in the range, and says which share that is', () => {
    const names = benchOf(sheet).specimens.filter(({ isKept }) => isKept);
    expect(names.map(({ name }) => name)).toEqual(kept.map(({ name }) => name));
    expect(number(sheet, 'M1.share')).toBe(kept.length / TRUTHS.length);
  });

  it('comes to the least, the median and the largest of those that are kept', () => {
    const sorted = kept.map(({ V_TO }) => V_TO).toSorted((a, b) => a - b);
    const found = ['V_TO_min', 'V_TO', 'V_TO_max'].map((name) => number(sheet, `M1.${name}`));
    const wanted = [sorted[0]!, sorted[1]!, sorted[2]!];
    found.forEach((value, i) => expect(value).toBeCloseTo(wanted[i]!, 6));
    expect(Math.abs(number(sheet, 'M1.tracking'))).toBeLessThanOrEqual(1);
  });

  it('keeps by V_GS at a current, too, and by more than one line', () => {
    const lines =
      '  keep: V_GS in -1.2 V .. -0.9 V at I_D = 1 mA, V_DS = 5 V\n  keep: beta in 1 mA/V^2 .. 1.22 mA/V^2\n';
    const both = createSheet(benchText('M1', TRUTHS, PLACES.slice(0, 6), { fields: lines }));
    const wanted = TRUTHS.filter((each) => {
      const volts = gate(each, 1e-3);
      return volts >= -1.2 && volts <= -0.9 && each.beta <= 1.22e-3;
    });
    expect(wanted.length).toBeGreaterThan(0);
    expect(number(both, 'M1.share')).toBe(wanted.length / TRUTHS.length);
  });

  it('pairs those whose V_GS are nearest at the current of their stage, the best pair first', () => {
    const all = createSheet(benchText('M1', TRUTHS.slice(0, 4), PLACES.slice(0, 6), { fields: POINT }));
    const { groups, single } = benchOf(all).match!;
    expect(single).toEqual([]);
    const of = (name: string): Truth => TRUTHS.find((each) => each.name === name)!;
    let before = 0;
    for (const { members, difference, second, equalised } of groups) {
      const [a, b] = members.map(({ name }) => of(name)) as [Truth, Truth];
      expect(difference).toBeCloseTo(Math.abs(gate(a, 1e-3) - gate(b, 1e-3)), 6);
      expect(second).toBeCloseTo(Math.abs(gate(a, 3e-4) - gate(b, 3e-4)), 6);
      expect(difference).toBeGreaterThanOrEqual(before);
      before = difference;
      // With its resistor the specimen of the lower V_GS looks like the other one at the current, and less so at the second.
      const seen = (current: number): number[] =>
        members.map(({ R_S, name }) => gate(of(name), current) + R_S * current);
      expect(seen(1e-3)[0]).toBeCloseTo(seen(1e-3)[1]!, 6);
      expect(equalised).toBeCloseTo(Math.abs(seen(3e-4)[0]! - seen(3e-4)[1]!), 6);
      expect(members.filter(({ R_S }) => R_S === 0)).toHaveLength(1);
    }
    // No other way of pairing four has a smaller sum of differences.
    const volts = TRUTHS.slice(0, 4).map((each) => gate(each, 1e-3));
    const apart = (i: number, j: number): number => Math.abs(volts[i]! - volts[j]!);
    const least = Math.min(apart(0, 1) + apart(2, 3), apart(0, 2) + apart(1, 3), apart(0, 3) + apart(1, 2));
    expect(groups.reduce((sum, { difference }) => sum + difference, 0)).toBeCloseTo(least, 6);
  });

  it('leaves out of its groups what is not kept', () => {
    const { groups, single } = benchOf(sheet).match!;
    const named = [...groups.flatMap(({ members }) => members.map(({ name }) => name)), ...single];
    expect(named.toSorted()).toEqual(kept.map(({ name }) => name).toSorted());
  });

  it('gives each specimen the resistor with which a stage of it carries the current', () => {
    for (const each of kept) {
      const fitted = number(sheet, `M1.${each.name}.R_S`);
      const stage = createSheet(
        `Q1 = n-JFET\n  beta: ${each.beta} A/V^2\n  V_TO: ${each.V_TO} V\n  lambda: ${each.lambda} /V\nR = ${fitted} ohm\nA1 = stage of Q1\n  gate: to 0 V\n  source: R to 0 V\n  drain: to 5 V + A1_S\nA1_S = ${fitted * 1e-3} V\n`,
      );
      expect(number(stage, 'A1.I_D')).toBeCloseTo(1e-3, 8);
    }
  });

  it('has a row in the table of the bench for each specimen, whose resistor is the one that is bought', () => {
    const { specimens, table } = benchOf(sheet).fitting!;
    for (const { V_GS, bought } of specimens) {
      const rows = table.filter(({ from, to }) => V_GS <= from && V_GS > to);
      expect(rows.map(({ R_S }) => R_S)).toEqual([bought!.R_S]);
    }
    // Row follows row without a gap.
    table.slice(1).forEach(({ from }, k) => expect(from).toBeCloseTo(table[k]!.to, 12));
  });

  it('says what the current is with the resistor that is bought', () => {
    for (const { name, bought } of benchOf(sheet).fitting!.specimens) {
      const law = benchOf(sheet).specimens.find((each) => each.name === name)!;
      const { R_S, I_D } = bought!;
      expect(law.beta * (-R_S * I_D - law.V_TO) ** 2 * (1 + law.lambda * 5)).toBeCloseTo(I_D, 10);
    }
  });
});

test.each([
  ['tabs', 'unit\tVGS (V)\tID (mA)\ns1\t-0.5\t2.25\ns1\t-1\t1\ns1\t-1.5\t0.25\ns1\t0\t4\n'],
  ['semicolons and decimal commas', 'unit;VGS (V);ID (mA)\ns1;-0,5;2,25\ns1;-1;1\ns1;-1,5;0,25\ns1;0;4\n'],
  ['commas and another unit', 'unit,VGS (mV),ID (µA)\ns1,-500,2250\ns1,-1000,1000\ns1,-1500,250\ns1,0,4000\n'],
])('rows pasted with %s are fitted as they would be typed', (_, pasted) => {
  const table = readPastedRows(pasted);
  expect(table.faults).toEqual([]);
  const sheet = createSheet(pastedBench('M1', table, '10 V').join('\n'));
  expect(sheet.error('M1')).toBeNull();
  expect(number(sheet, 'M1.V_TO')).toBeCloseTo(-2, 6);
  const typed = createSheet(
    'M1 = bench\n  columns: unit, V_GS [V], I_D [mA]\n  V_DS: 10 V\n  s1, -0.5, 2.25\n  s1, -1, 1\n  s1, -1.5, 0.25\n  s1, 0, 4\n',
  );
  expect(number(sheet, 'M1.beta')).toBe(number(typed, 'M1.beta'));
  expect(number(sheet, 'M1.V_TO')).toBe(number(typed, 'M1.V_TO'));
});

test('a bench that is edited line by line is what it would be at once', () => {
  const next = createDraw(11);
  const sheet = createSheet(benchText('M1', TRUTHS, PLACES.slice(0, 6), { fields: '  lambda: 0.012 /V\n' }));
  for (let k = 0; k < 40; k++) {
    const lines = sheet.tree.text.split('\n');
    const at = 3 + Math.floor(next() * (lines.length - 4));
    const how = next();
    if (how < 0.3) lines.splice(at, 1);
    else if (how < 0.6) lines.splice(at, 0, lines[3 + Math.floor(next() * (lines.length - 4))]!);
    else if (how < 0.9) lines[at] = lines[at]!.replace(/, [^,]*$/, `, ${next() * 4e-3}`);
    else lines[2] = `  lambda: ${0.01 + next() / 100} /V`;
    sheet.update(lines.join('\n'));
    const fresh = createSheet(lines.join('\n'));
    const valuesOf = (each: Sheet): unknown => [each.error('M1')?.text ?? null, each.cell('M1')!.values];
    expect(valuesOf(sheet), `edit ${k}`).toEqual(valuesOf(fresh));
  }
});

test('a dead specimen among others is left out, which is said, and counts as not kept', () => {
  const text = benchText('M1', TRUTHS.slice(0, 3), PLACES.slice(0, 6), { fields: '  lambda: 0.012 /V\n' });
  const sheet = createSheet(`${text}  s9, 0, 10, 0\n  s9, -1, 10, 0\nx = M1.s9.V_TO\n`);
  expect(sheet.error('M1')).toBeNull();
  expect(sheet.cautions().map(({ text: said, line }) => [said, line])).toEqual([
    [expect.stringMatching(/^s9 is left out, since it cannot be fitted\. No reading carries current\./), 21],
  ]);
  expect(number(sheet, 'M1.share')).toBe(3 / 4);
  expect(number(sheet, 'M1.V_TO')).toBe(number(createSheet(text), 'M1.V_TO'));
  expect(sheet.error('x')).toMatchObject({
    code: 'not-fitted',
    text: expect.stringMatching(/No reading carries current/),
  });
});

test('a bench is fitted again only when its own lines change', () => {
  const text = `R_1 = 1 kohm\n${benchText('M1', [S1], PLACES)}`;
  const sheet = createSheet(text);
  const before = sheet.bench('M1');
  sheet.edit([{ start: 6, end: 7, text: '2' }]);
  expect(sheet.value('R_1')).toBe(2000);
  expect(sheet.bench('M1')).toBe(before);
});
