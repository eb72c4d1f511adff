// From sheets to figures: what a stage's planes, schematic and plots show is what the sheet computed.

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Chart, Curve } from '../../src/figure/index.ts';
import { drawSchematic, planesOf, schematicOf, searchBands, sheetPlot, sourceLeg } from '../../src/figure/index.ts';
import { requirementsOf } from '../../src/figure/requirements.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { ANALYSES, analyse } from '../../src/spread/index.ts';

const EXAMPLE = readFileSync('public/examples/crevasse-listener.txt', 'utf8');

const FOLLOWER = `V_DD = 15 V
R_S = 1.2 kohm
Q1 = n-JFET
  beta: 1 mA/V^2
  V_TO: -2 V
A1 = stage of Q1
  gate: 1 Mohm to 0 V
  drain: to V_DD
  source: R_S to 0 V
`;

const MIRRORED = FOLLOWER.replace('15 V', '-15 V')
  .replace('n-JFET', 'p-JFET')
  .replace('beta: 1 mA/V^2', 'I_DSS: 4 mA')
  .replace('V_TO: -2 V', 'V_P: 2 V');

function heightsAt({ x, y }: Curve, at: number): number[] {
  const found: number[] = [];
  for (let i = 1; i < x.length; i++) {
    const [a, b] = [x[i - 1]!, x[i]!];
    if (a === b && a === at) found.push(y[i - 1]!, y[i]!);
    else if (at >= Math.min(a, b) && at <= Math.max(a, b)) {
      found.push(y[i - 1]! + ((y[i]! - y[i - 1]!) * (at - a)) / (b - a));
    }
  }
  return found;
}

/** Whether a line passes through a point, within a share of the plane's height. */
function passes(chart: Chart, curve: Curve, mark: { x: number; y: number }, share: number): boolean {
  const heights = heightsAt(curve, mark.x);
  const slack = share * chart.y.high;
  return Math.min(...heights) <= mark.y + slack && Math.max(...heights) >= mark.y - slack;
}

describe('the planes of a stage of a sheet', () => {
  const sheet = createSheet(EXAMPLE);
  const stages = sheet.cells().filter(({ kind }) => kind === 'stage');

  it.each(stages.map(({ name }) => name))('have Q of %s on its line and on its curve', (name) => {
    const planes = planesOf(sheet.stage(name)!, sheet)!;
    for (const [chart, voltage] of [
      [planes.transfer, 'V_GS'],
      [planes.output, 'V_DS'],
    ] as const) {
      const mark = chart.marks[0]!;
      expect(mark).toMatchObject({ x: sheet.value(`${name}.${voltage}`), y: sheet.value(`${name}.I_D`) });
      const line = chart.curves.find(({ role }) => role === 'bias')!;
      const device = chart.curves.find(({ role }) => role === 'nominal')!;
      expect(passes(chart, line, mark, 1e-9)).toBe(true);
      // Chords of a parabola stand off it by less than a thousandth of the plane.
      expect(passes(chart, device, mark, 1e-3)).toBe(true);
    }
  });

  it('have lines that begin where the network says, but for what the leakage of the gate moves them', () => {
    for (const { name } of stages) {
      const stage = sheet.stage(name)!;
      const { transfer } = planesOf(stage, sheet)!;
      const { V_GG, R_m } = stage.lines!;
      const leakage = sheet.value(`${name}.I_G`) as number;
      // Only A1 has a gate resistor that carries the leakage.
      const shift = leakage * (sheet.value('R_G') as number);
      const { x, y } = transfer.curves.find(({ role }) => role === 'bias')!;
      const begins = x[0]! + stage.channel * R_m * y[0]!;
      expect(Math.abs(begins - (V_GG + shift))).toBeLessThan(1e-9);
    }
  });

  it.each(['  r_s: 50 ohm\n', '  r_s: 20 ohm\n  r_d: 40 ohm\n', '  r_d: 1 kohm\n'])(
    'have Q on the curve of a device with resistance in its leads: %s',
    (leads) => {
      for (const text of [FOLLOWER, MIRRORED]) {
        const leaded = createSheet(text.replace('A1 = stage', `${leads}A1 = stage`));
        const { q, law } = leaded.stage('A1')!;
        expect(law(q!.vgs, q!.vds) / q!.id).toBeCloseTo(1, 12);
      }
    },
  );

  it('name the resistor that alone makes a slope', () => {
    const follower = createSheet(FOLLOWER);
    const { transfer, output } = planesOf(follower.stage('A1')!, follower)!;
    expect(transfer.curves.find(({ role }) => role === 'bias')!.label).toBe('bias line, 1/R_S');
    expect(output.curves.find(({ role }) => role === 'bias')!.label).toBe('load line, 1/R_S');
    const split = createSheet(FOLLOWER.replace('source: R_S to 0 V', 'source: R_S to foot\n  foot: 330 ohm to 0 V'));
    expect(planesOf(split.stage('A1')!, split)!.transfer.curves[0]!.label).toBe('bias line');
  });

  it('show the strip of the margin that a check asks for, and none where none does', () => {
    const roles = (text: string): string[] => {
      const checked = createSheet(text);
      return planesOf(checked.stage('A1')!, checked)!.output.areas.map(({ role }) => role);
    };
    expect(roles(FOLLOWER)).toEqual([]);
    expect(roles(`${FOLLOWER}headroom = check A1.margin >= 1 V\n`)).toEqual(['hatch']);
    expect(roles(`${FOLLOWER}headroom = check A1.I_D >= 1 mA\n`)).toEqual([]);
  });

  it('are not drawn where the stage is not solved', () => {
    // A source that drives against the channel.
    const unsolved = createSheet(FOLLOWER.replace('R_S to 0 V', '10 mA from V_DD'));
    expect(unsolved.cell('A1')!.fault?.code).toBe('not-solved');
    const stage = unsolved.stage('A1')!;
    expect(planesOf(stage, unsolved)).toBeNull();
    const { voltages, current, legs } = schematicOf(stage, unsolved);
    expect({ voltages, current, legs: legs.length }).toEqual({ voltages: {}, current: null, legs: 3 });
    expect(drawSchematic(schematicOf(stage, unsolved)).sentence).not.toMatch(/Voltages|Channel current/);
  });
});

describe('the schematic of a stage of a sheet', () => {
  it('says values as they were typed and voltages as they were computed', () => {
    const sheet = createSheet(FOLLOWER);
    const input = schematicOf(sheet.stage('A1')!, sheet);
    expect(input.legs.map(({ label, value, to }) => [label, value, to.name, to.value])).toEqual([
      ['', '1 MΩ', '0 V', ''],
      ['', '', 'V_DD', '15 V'],
      ['R_S', '1.2 kΩ', '0 V', ''],
    ]);
    expect(Object.keys(input.voltages).toSorted()).toEqual(['drain', 'gate', 'source']);
    expect(input.voltages['drain']).toBe('15.0 V');
  });

  it('marks the symbols of cells that a failing check names', () => {
    const failing = (text: string): string[] => {
      const sheet = createSheet(`${FOLLOWER}${text}\n`);
      return schematicOf(sheet.stage('A1')!, sheet)
        .legs.filter(({ fails }) => fails)
        .map(({ label }) => label);
    };
    expect(failing('stock = check R_S <= 1 kohm')).toEqual(['R_S']);
    expect(failing('stock = check R_S <= 2 kohm')).toEqual([]);
  });
});

describe('what checks require of values', () => {
  const requirements = (condition: string): unknown => {
    const sheet = createSheet(`${FOLLOWER}least = 3 V\nc = check ${condition}\n`);
    expect(sheet.error('c')).toBeNull();
    return requirementsOf(sheet);
  };

  it.each([
    ['A1.margin >= 1 V', [{ text: 'A1.margin', value: 1, forbids: 'below' }]],
    ['A1.margin > least', [{ text: 'A1.margin', value: 3, forbids: 'below' }]],
    ['5 mA >= A1.I_D', [{ text: 'A1.I_D', value: 0.005, forbids: 'above' }]],
    ['A1.V_GS < -0.5 V', [{ text: 'A1.V_GS', value: -0.5, forbids: 'above' }]],
    [
      'abs( A1.V_GS ) within 0.1 V .. 2 V',
      [
        { text: 'abs(A1.V_GS)', value: 0.1, forbids: 'below' },
        { text: 'abs(A1.V_GS)', value: 2, forbids: 'above' },
      ],
    ],
    ['A1.region = saturation and (A1.margin >= 2 V)', [{ text: 'A1.margin', value: 2, forbids: 'below' }]],
    ['A1.V_source < A1.V_drain', []],
    ['A1.margin >= 2 V or A1.I_D >= 1 mA', []],
  ])('%s', (condition, expected) => {
    expect(requirements(condition)).toEqual(expected);
  });
});

describe('a plot cell', () => {
  const plot = (text: string, name = 'F1'): ReturnType<typeof sheetPlot> =>
    sheetPlot(createSheet(FOLLOWER + text), name);

  it('draws values against an input, its own entry marked and limits of checks as posts', () => {
    const shown = plot(
      'c = check A1.I_D >= 0.5 mA\nF1 = plot A1.I_D, A1.margin against R_S over 100 ohm .. 10 kohm log\n',
    );
    expect('charts' in shown && shown.charts.length).toBe(2);
    const [current, margin] = (shown as { charts: readonly Chart[] }).charts;
    const sheet = createSheet(FOLLOWER);
    expect(current!.marks[0]).toMatchObject({ x: 1200, y: sheet.value('A1.I_D') });
    expect(current!.posts).toMatchObject([{ value: 0.0005, forbids: 'below', passed: false }]);
    expect(margin!.posts).toEqual([]);
    expect(current!.x).toMatchObject({ symbol: 'R_S', log: true });
  });

  it('draws the planes of a stage as they stand', () => {
    expect(plot('F1 = plot transfer of A1\n')).toMatchObject({ charts: [{ title: 'Transfer plane of A1' }] });
    expect(plot('F1 = plot output of A1\n')).toMatchObject({ charts: [{ title: 'Output plane of A1' }] });
  });

  it('says what it waits for', () => {
    expect(
      sheetPlot(createSheet(`${FOLLOWER}F1 = plot transfer of A1\n`.replace('V_DD = 15 V', 'V_DD = 15 X')), 'F1'),
    ).toEqual({
      message: 'F1 waits for A1.',
    });
  });
});

describe('the resistor that Q turns', () => {
  const legOf = (text: string): ReturnType<typeof sourceLeg> => {
    const sheet = createSheet(text);
    return sourceLeg(sheet.stage('A1')!, sheet);
  };

  it('is what it is where Q stands, and puts Q where it is wanted', () => {
    const leg = legOf(FOLLOWER);
    if ('reason' in leg) throw new Error(leg.reason);
    expect(leg.cell).toBe('R_S');
    const sheet = createSheet(FOLLOWER);
    expect(leg.resistanceAt(sheet.value('A1.V_GS') as number)).toBeCloseTo(1200, 6);
    // Without lambda the curve does not depend on the drain voltage, so Q lands exactly.
    const wanted = -0.9;
    const turned = createSheet(FOLLOWER.replace('1.2 kohm', `${leg.resistanceAt(wanted)} ohm`));
    expect(turned.value('A1.V_GS')).toBeCloseTo(wanted, 9);
  });

  it('is the same on a mirrored stage', () => {
    const leg = legOf(MIRRORED);
    if ('reason' in leg) throw new Error(leg.reason);
    const straight = legOf(FOLLOWER);
    if ('reason' in straight) throw new Error(straight.reason);
    expect(leg.resistanceAt(0.9)).toBeCloseTo(straight.resistanceAt(-0.9)!, 6);
  });

  it('is the largest input of a chain to a rail, whichever end its line names', () => {
    const chain = (lines: string): ReturnType<typeof sourceLeg> =>
      legOf(`R_E = 5 kohm\n${FOLLOWER.replace('source: R_S to 0 V', lines)}`);
    expect(chain('source: R_S to foot\n  foot: R_E to 0 V, 1 uF to 0 V')).toMatchObject({ cell: 'R_E' });
    expect(chain('foot: R_S to source, R_E to 0 V')).toMatchObject({ cell: 'R_E' });
  });

  it('asks for no resistance where the device is off or the line would have to lean back', () => {
    const leg = legOf(FOLLOWER);
    if ('reason' in leg) throw new Error(leg.reason);
    expect(leg.resistanceAt(-3)).toBeNull();
    expect(leg.resistanceAt(0.5)).toBeNull();
  });

  it.each([
    ['source: to 0 V', /does not lead through resistors alone/],
    ['source: R_S to 0 V, 2 kohm to 0 V', /does not lead through resistors alone/],
    ['source: 1 kohm to 0 V', /no resistor with a name stands in its source leg/],
  ])('is none with %s, and it says why', (line, reason) => {
    const leg = legOf(FOLLOWER.replace('source: R_S to 0 V', line));
    expect('reason' in leg && leg.reason).toMatch(reason);
  });

  it('is none where the resistance is computed', () => {
    const leg = legOf(FOLLOWER.replace('R_S = 1.2 kohm', 'R_0 = 2.4 kohm\nR_S = R_0 / 2'));
    expect('reason' in leg && leg.reason).toBe('Q of A1 cannot be dragged: R_S is computed, not entered.');
  });
});

describe('the band of a plot', () => {
  const sheet = createSheet(EXAMPLE, ANALYSES);
  const spread = analyse(sheet.spreadModel(), { samples: 100, seed: 1 })!;
  const bands = searchBands(sheet, 'F3', spread)!;
  const areas = (plot: ReturnType<typeof sheetPlot>): number => ('charts' in plot ? plot.charts[0]!.areas.length : -1);

  it('is drawn around the curve', () => {
    expect(areas(sheetPlot(sheet, 'F3', spread, bands))).toBe(1);
    expect(areas(sheetPlot(sheet, 'F3', spread))).toBe(0);
  });

  it('is not drawn once the sheet is another', () => {
    const edited = createSheet(EXAMPLE.replace('V_DD = 18 V', 'V_DD = 17 V'), ANALYSES);
    expect(areas(sheetPlot(edited, 'F3', spread, bands))).toBe(0);
    const ranged = createSheet(EXAMPLE.replace('over 100 ohm ..', 'over 120 ohm ..'), ANALYSES);
    expect(areas(sheetPlot(ranged, 'F3', spread, bands))).toBe(0);
  });

  it('is not looked for where nothing spreads, and for figures of another kind', () => {
    expect(searchBands(sheet, 'F1', spread)).toBeNull();
    expect(searchBands(sheet, 'F4', spread)).toBeNull();
  });
});
