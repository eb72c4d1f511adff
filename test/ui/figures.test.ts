// What the figures pane works out before anything is drawn.

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { Drawing, Item } from '../../src/figure/index.ts';
import { drawChart, drawSchematic, planesOf, schematicOf, svgText } from '../../src/figure/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { isFollowed, plotTitle } from '../../src/ui/figures/plot-title.ts';
import { stageValues } from '../../src/ui/figures/stage-values.ts';
import { lineAttributes, placedRuns, textAttributes } from '../../src/ui/figures/svg-attributes.ts';
import { groupKey, linkedGroups, stepTo } from '../../src/ui/figures/symbol-focus.ts';

const sheet = createSheet(readFileSync('public/examples/crevasse-listener.txt', 'utf8'));
const schematic = drawSchematic(schematicOf(sheet.stage('A1')!, sheet));

describe('the symbols of a schematic', () => {
  const groups = linkedGroups(schematic);
  const keys = groups.map(groupKey);

  it('are those that lead to cells, each with a key of its own', () => {
    expect(new Set(groups.map(({ cell }) => cell))).toEqual(new Set(['Q1', 'R_G', 'R_D', 'R_S1', 'R_S2']));
    expect(new Set(keys).size).toBe(keys.length);
  });

  it('are walked through by arrows, to either end and no further', () => {
    const walk = (key: string): string[] => {
      const met = [keys[key === 'ArrowRight' ? 0 : keys.length - 1]!];
      for (let next = stepTo(key, met[0]!, groups); next !== null; next = stepTo(key, next, groups)) met.push(next);
      return met;
    };
    expect(walk('ArrowRight')).toEqual(keys);
    expect(walk('ArrowLeft')).toEqual(keys.toReversed());
    expect(stepTo('Home', keys[2]!, groups)).toBe(keys[0]);
    expect(stepTo('End', keys[2]!, groups)).toBe(keys.at(-1));
    expect(stepTo('Tab', keys[2]!, groups)).toBeNull();
  });
});

describe('a drawing on the page', () => {
  it('has the lines and texts of its SVG text', () => {
    const plane = drawChart(planesOf(sheet.stage('A1')!, sheet)!.output, { width: 320, height: 240 });
    for (const drawing of [schematic, plane]) {
      const svg = svgText(drawing, { id: 'x' });
      const lines = itemsOf(drawing).filter((item) => item.kind === 'line' && !item.filled && !item.closed);
      expect(lines.length).toBeGreaterThan(10);
      for (const line of lines) {
        if (line.kind !== 'line') continue;
        const { d, stroke: color, 'stroke-width': width } = lineAttributes(line, false);
        const token = /--([\w-]+)\)/.exec(String(color))![1];
        const elements = svg.split('<').filter((each) => each.startsWith(`path d="${d}"`));
        const look = `stroke="var(--${token}, `;
        expect(elements.filter((each) => each.includes(look) && each.includes(`stroke-width="${width}"`))).not.toEqual(
          [],
        );
      }
      for (const text of itemsOf(drawing)) {
        if (text.kind !== 'text') continue;
        const { x, y } = textAttributes(text, false);
        expect(placedRuns(text).map((run) => run.text)).toEqual(text.runs.map((run) => run.text));
        expect(svg).toContain(
          `<text x="${Math.round(Number(x) * 100) / 100}" y="${Math.round(Number(y) * 100) / 100}"`,
        );
      }
    }
  });

  it('lowers subscripts and returns to the base line behind them', () => {
    const runs = placedRuns({
      kind: 'text',
      role: 'label',
      x: 0,
      y: 0,
      anchor: 'start',
      size: 12,
      runs: [
        { text: 'V', style: 'italic' },
        { text: 'DD', style: 'subscript' },
        { text: ' 15 V', style: 'upright' },
      ],
    });
    expect(runs.map(({ attributes }) => attributes['dy'])).toEqual([undefined, 3, -3]);
  });
});

describe('the values beside a schematic', () => {
  it('are voltages and operating point first, then gain; a bulk tied to the source is not said', () => {
    const { atRest, inMotion } = stageValues(sheet.cell('A2')!);
    expect(atRest.slice(0, 4).map(({ name }) => name)).toEqual(['V_gate', 'V_drain', 'V_source', 'V_load']);
    expect(atRest.find(({ name }) => name === 'region')).toMatchObject({ number: 'saturation', unit: '' });
    expect(atRest.find(({ name }) => name === 'I_D')).toMatchObject({ number: '3.61', unit: 'mA' });
    expect(inMotion.map(({ name }) => name)).toContain('A_v');
  });

  it('are none where the stage has none', () => {
    const broken = createSheet('Q1 = n-JFET\n  beta: 1 mA/V^2\n  V_TO: -2 V\nA1 = stage of Q1\n  gate: X to 0 V\n');
    expect(stageValues(broken.cell('A1')!)).toEqual({ atRest: [], inMotion: [] });
  });
});

it('a plot is followed where it is a plane of the stage in hand', () => {
  const followed = (stage: string): boolean[] =>
    ['F1', 'F2', 'F3'].map((name) => isFollowed(sheet.cell(name), stage, null));
  expect([followed('A1'), followed('A2')]).toEqual([
    [true, true, false],
    [false, false, false],
  ]);
});

it('a plot of a bench is followed where that bench is selected', () => {
  const measured = createSheet('F1 = plot bench of M1\nM1 = bench\n');
  const followed = ['M1', 'M2', null].map((bench) => isFollowed(measured.cell('F1'), null, bench));
  expect(followed).toEqual([true, false, false]);
});

describe('the title of a plot', () => {
  it.each([
    ['F1', 'transfer of A1'],
    ['F2', 'output of A1'],
    ['F3', 'A1.I_D against R_S2'],
  ])('%s', (name, title) => {
    expect(plotTitle(sheet.cell(name))).toBe(title);
  });
});

function itemsOf({ items }: Pick<Drawing, 'items'>): Item[] {
  return items.flatMap((item) => (item.kind === 'group' || item.kind === 'clip' ? itemsOf(item) : [item]));
}
