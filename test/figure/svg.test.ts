import { describe, expect, it } from 'vitest';
import type { Drawing, SchematicInput } from '../../src/figure/index.ts';
import { drawChart, drawSchematic, escapeXml, outputPlane, svgText } from '../../src/figure/index.ts';
import { jfets } from './devices.ts';
import { KNOWN_STAGES, randomStage, stage } from './stages.ts';

/** Checks that tags nest and close, attributes are quoted and no text is left unescaped; gives the names of elements. */
function elementsOf(svg: string): string[] {
  const names: string[] = [];
  const open: string[] = [];
  let end = 0;
  for (const match of svg.matchAll(
    /<(\/?)([A-Za-z]+)((?:\s+[\w:-]+="[^"<>&]*(?:&[a-z#0-9]+;[^"<>&]*)*")*)\s*(\/?)>/g,
  )) {
    const between = svg.slice(end, match.index);
    if (/[<>]|&(?!(?:amp|lt|gt|quot|#39);)/.test(between)) throw new Error(`stray text "${between}"`);
    end = match.index + match[0].length;
    const [, closing, name, attributes, empty] = match;
    const keys = [...attributes!.matchAll(/([\w:-]+)="/g)].map(([, key]) => key);
    if (new Set(keys).size < keys.length) throw new Error(`attribute twice in ${match[0]}`);
    if (closing === '/') {
      if (open.pop() !== name) throw new Error(`</${name}> closes another element`);
    } else {
      names.push(name!);
      if (empty !== '/') open.push(name!);
    }
  }
  if (open.length > 0 || end !== svg.length) throw new Error('not all elements are closed');
  return names;
}

const HOSTILE: SchematicInput = {
  ...stage(['R_S 1 kΩ source 0 V']),
  name: '<script>alert(1)</script>',
  fetName: 'Q"&<b>',
  voltages: { source: '"><image href=x onerror=y>' },
};

describe('a drawing as SVG text', () => {
  it.each(Object.entries(KNOWN_STAGES))('is well-formed for a %s', (_, input) => {
    expect(elementsOf(svgText(drawSchematic(input), { id: 'fig', interactive: true }))[0]).toBe('svg');
  });

  it('is well-formed for any stage and for planes', () => {
    for (let seed = 1; seed < 30; seed++) {
      expect(elementsOf(svgText(drawSchematic(randomStage(seed)), { id: 'fig' }))[0]).toBe('svg');
    }
    const chart = outputPlane({ name: 'A1', channel: 'n', devices: jfets('n'), margin: 2 });
    expect(elementsOf(svgText(drawChart(chart, { width: 268, height: 200 }), { id: 'plane' }))).toContain('clipPath');
  });

  it('lets no markup of its words through', () => {
    const names = elementsOf(svgText(drawSchematic(HOSTILE), { id: 'fig', interactive: true }));
    expect(
      names.filter((name) => !['svg', 'title', 'desc', 'g', 'path', 'rect', 'circle', 'text', 'tspan'].includes(name)),
    ).toEqual([]);
  });

  it('says what it shows in title and description', () => {
    const svg = svgText(drawSchematic(KNOWN_STAGES['common source']!), { id: 'fig' });
    expect(svg).toContain('<title id="fig-title">Schematic of A1</title>');
    expect(svg).toContain('R_S, resistor of 1.2 kΩ, from source to 0 V.');
    expect(svg).toContain('aria-labelledby="fig-title" aria-describedby="fig-desc"');
  });

  it('makes a button of each symbol that has a cell, and only in a page', () => {
    const drawing = drawSchematic(KNOWN_STAGES['common source']!);
    const page = svgText(drawing, { id: 'fig', interactive: true });
    expect(page.match(/role="button"/g)).toHaveLength(4);
    expect(page).toContain('data-cell="R_S" aria-label="R_S, resistor of 1.2 kΩ, from source to 0 V"');
    expect(svgText(drawing, { id: 'fig' })).not.toContain('role="button"');
  });

  it('names its colours by the page and brings the light ones along', () => {
    const drawing: Drawing = {
      width: 10,
      height: 10,
      title: 't',
      sentence: 's',
      items: [{ kind: 'line', role: 'low', points: [0, 0, 5, 5] }],
    };
    const svg = svgText(drawing, { id: 'a' });
    expect(svg).toContain(
      '<path d="M0 0L5 5" class="sq-low" fill="none" stroke="var(--low-device, #8f3fbf)" stroke-width="1.6" stroke-dasharray="6 3"/>',
    );
    expect(svgText(drawing, { id: 'a', colors: { 'low-device': '#000' } })).toContain('stroke="#000"');
  });

  it('draws what fails in red', () => {
    const input = stage(['R_S 1 kΩ source 0 V']);
    const failing = { ...input, legs: input.legs.map((leg) => ({ ...leg, fails: true })) };
    const svg = svgText(drawSchematic(failing), { id: 'fig' });
    expect(svg).toMatch(/class="sq-leg sq-fails">.*?stroke="var\(--fail, #a8201a\)"/);
    expect(svgText(drawSchematic(input), { id: 'fig' })).not.toContain('--fail');
  });

  it('has neither style nor script nor a reference outside itself', () => {
    const svg = svgText(drawSchematic(KNOWN_STAGES['common gate']!), { id: 'fig', interactive: true });
    expect(svg).not.toMatch(/\sstyle=|<style|<script|href|url\((?!#fig-)/);
  });

  it('refuses an id that is no plain word and a coordinate that is no number', () => {
    const drawing = drawSchematic(KNOWN_STAGES['common gate']!);
    expect(() => svgText(drawing, { id: 'a b' })).toThrow(RangeError);
    const broken: Drawing = { ...drawing, items: [{ kind: 'line', role: 'wire', points: [0, NaN] }] };
    expect(() => svgText(broken, { id: 'a' })).toThrow(RangeError);
  });
});

describe('escaping', () => {
  it('covers the five marks of XML and drops what it forbids', () => {
    expect(escapeXml(`<a b="c" d='e'>&\u0000\u0007\ufffe`)).toBe('&lt;a b=&quot;c&quot; d=&#39;e&#39;&gt;&amp;');
    expect(escapeXml('1.2 kΩ −5 µA')).toBe('1.2 kΩ −5 µA');
    expect(escapeXml('\ud800x')).toBe('x');
  });
});
