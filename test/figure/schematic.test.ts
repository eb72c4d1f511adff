import { describe, expect, it } from 'vitest';
import type { GroupItem, Item, SchematicInput } from '../../src/figure/index.ts';
import { drawSchematic } from '../../src/figure/index.ts';
import { findOverlaps } from './overlap.ts';
import { readBack } from './read-back.ts';
import { KNOWN_STAGES, randomStage } from './stages.ts';

const RANDOM_STAGES = 400;

/** What is wrong with the drawing of a stage, as sentences. */
function faultsOf(input: SchematicInput): string[] {
  const drawing = drawSchematic(input);
  const read = readBack(drawing);
  const drawn = drawing.items.flatMap((item) => (item.kind === 'group' && item.of === 'leg' ? [item.leg!] : []));
  const faults = findOverlaps(drawing, read);
  if (drawn.toSorted((a, b) => a - b).join() !== input.legs.map((_, at) => at).join())
    faults.push(`legs ${drawn.join()} are drawn`);
  return [...faults, ...wrongConnections(input, read)];
}

/** Compares the nets that the drawing shows with those of the stage. */
function wrongConnections(input: SchematicInput, { fet, legs, netOf }: ReturnType<typeof readBack>): string[] {
  const parent = new Map<string, string>();
  const find = (node: string): string => {
    const up = parent.get(node);
    return up === undefined ? node : find(up);
  };
  for (const { kind, from, to } of input.legs) {
    if (kind === 'tie' && to.kind === 'node' && find(from) !== find(to.name)) parent.set(find(to.name), find(from));
  }
  const shown = new Map<string, Set<number>>();
  const see = (node: string, net: number): void => {
    shown.set(find(node), (shown.get(find(node)) ?? new Set()).add(net));
  };
  const faults: string[] = [];
  const pair = [fet.upper, fet.lower];
  const legNets = (index: number): Set<number> => new Set(legs.get(index));
  see('gate', fet.gate);
  if (fet.bulk !== null) see('bulk', fet.bulk);
  // Either channel terminal may stand up; the legs must agree with one of the two.
  const ways = [pair, pair.toReversed()].map(([drain, source]) => {
    const seen = new Map([...shown].map(([node, nets]) => [node, new Set(nets)]));
    const note = (node: string, net: number): void => {
      seen.set(find(node), (seen.get(find(node)) ?? new Set()).add(net));
    };
    note('drain', drain!);
    note('source', source!);
    const single = (node: string): number | undefined => [...(seen.get(find(node)) ?? [])][0];
    // Repeated until every node reached from the FET has a net: a leg with one known end tells the other.
    for (let round = 0; round < input.legs.length; round++) {
      input.legs.forEach(({ from, to }, index) => {
        if (to.kind !== 'node' || find(from) === find(to.name)) return;
        const nets = [...legNets(index)];
        for (const [near, far] of [
          [from, to.name],
          [to.name, from],
        ] as const) {
          const known = single(near);
          if (known === undefined || !nets.includes(known)) continue;
          const other = nets.find((net) => net !== known);
          if (other !== undefined) note(far, other);
        }
      });
    }
    const wrong: string[] = [];
    for (const [node, nets] of seen) if (nets.size > 1) wrong.push(`node ${node} is drawn as ${nets.size} nets`);
    const owners = new Map<number, string>();
    for (const [node, nets] of seen) {
      for (const net of nets) {
        if (owners.has(net) && owners.get(net) !== node) wrong.push(`nodes ${node} and ${owners.get(net)} are joined`);
        owners.set(net, node);
      }
    }
    input.legs.forEach(({ from, to }, index) => {
      const nets = legNets(index);
      const near = single(from);
      if (near !== undefined && !nets.has(near)) wrong.push(`leg ${index} does not reach ${from}`);
      if (to.kind !== 'node' || find(from) === find(to.name)) return;
      const far = single(to.name);
      if (far !== undefined && !nets.has(far)) wrong.push(`leg ${index} does not reach ${to.name}`);
    });
    return wrong;
  });
  if (netOf.length === 0 && input.legs.length > 0) faults.push('there are no wires');
  return [...faults, ...ways.toSorted((a, b) => a.length - b.length)[0]!];
}

describe('the schematic of a stage', () => {
  it.each(Object.entries(KNOWN_STAGES))('of a %s covers nothing and shows the stage as it is wired', (_, input) => {
    expect(faultsOf(input)).toEqual([]);
  });

  it(`covers nothing and shows every leg where it hangs, for ${RANDOM_STAGES} stages of any kind`, () => {
    const faults: string[] = [];
    for (let seed = 1; seed <= RANDOM_STAGES; seed++) {
      for (const fault of faultsOf(randomStage(seed))) faults.push(`seed ${seed}: ${fault}`);
    }
    expect(faults).toEqual([]);
  }, 60_000);
});

describe('the search for overlaps', () => {
  const drawing = drawSchematic(KNOWN_STAGES['common source']!);
  const planted = (item: Item): string[] => {
    const changed = { ...drawing, items: [...drawing.items, item] };
    return findOverlaps(changed, readBack(changed));
  };
  const resistor = drawing.items.find((item): item is GroupItem => item.kind === 'group' && item.cell === 'R_D')!;

  it('finds a wire across a symbol and its words', () => {
    const { x0, x1 } = resistor.box;
    const words = resistor.items.findLast((item) => item.kind === 'text')!;
    const y = words.kind === 'text' ? words.y - 4 : NaN;
    const found = planted({ kind: 'line', role: 'wire', points: [x0 - 20, y, x1 + 20, y] });
    expect(found).toContain(`a wire covers ${resistor.sentence}`);
    expect(found.some((each) => each.startsWith('a wire covers text'))).toBe(true);
    expect(found.some((each) => each.startsWith('a wire ends in nothing'))).toBe(true);
  });

  it('finds words upon words', () => {
    const text = resistor.items.find((item) => item.kind === 'text')!;
    expect(planted(text)[0]).toMatch(/^text ".*" covers text/);
  });

  it('finds what is cut off', () => {
    const text: Item = {
      kind: 'text',
      role: 'label',
      x: -3,
      y: 20,
      anchor: 'start',
      size: 12,
      runs: [{ text: 'out', style: 'upright' }],
    };
    expect(planted(text)).toContain('text "out" is cut off');
  });

  it('finds a leg that is joined to the wrong node', () => {
    const input = KNOWN_STAGES['common source']!;
    const wrong = {
      ...input,
      legs: input.legs.map((each) => (each.label === 'R_D' ? { ...each, from: 'source' } : each)),
    };
    expect(wrongConnections(wrong, readBack(drawing))).not.toEqual([]);
  });
});

describe('what a schematic says', () => {
  it('is one sentence for each symbol', () => {
    const { items, sentence } = drawSchematic(KNOWN_STAGES['current source load']!);
    const said = items.flatMap((item) => (item.kind === 'group' ? [item.sentence] : []));
    expect(said).toContain('I_0, current source of 2 mA, from V_DD, 18 V to drain');
    expect(said).toContain('Q1, n-JFET');
    expect(sentence).toContain('Channel current 1.16 mA. Output at drain.');
  });

  it('shows no underscore', () => {
    const texts: string[] = [];
    const collect = (list: readonly Item[]): void => {
      for (const item of list) {
        if (item.kind === 'group') collect(item.items);
        if (item.kind === 'text') texts.push(item.runs.map(({ text }) => text).join(''));
      }
    };
    collect(drawSchematic(KNOWN_STAGES['current source load']!).items);
    expect(texts.filter((text) => text.includes('_'))).toEqual([]);
    expect(texts).toContain('RG');
  });
});
