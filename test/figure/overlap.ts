// Finds what covers what in a drawn schematic: words, symbols and wires. One sentence per finding.

import type { Box, Drawing, GroupItem, Item } from '../../src/figure/index.ts';
import { textBox } from '../../src/figure/labels.ts';
import type { ReadBack } from './read-back.ts';
import { isTie } from './read-back.ts';

interface Thing {
  readonly what: string;
  readonly box: Box;
}

export function findOverlaps(drawing: Drawing, { wires, netOf, dots, loose }: ReadBack): string[] {
  const texts: Thing[] = [];
  const symbols: Thing[] = [];
  const collect = (items: readonly Item[], group: GroupItem | null): void => {
    const own: Box[] = [];
    for (const item of items) {
      if (item.kind === 'group') collect(item.items, item);
      else if (item.kind === 'text')
        texts.push({ what: `text "${item.runs.map(({ text }) => text).join('')}"`, box: textBox(item) });
      else if (item.kind === 'line' && item.role === 'bar')
        symbols.push({ what: `bar of ${group!.leg}`, box: boxOf(item, 1.4) });
      else if (group !== null && !(isTie(group) && item.kind === 'line')) own.push(boxOf(item, 0));
      else if (item.kind === 'line' && item.role === 'current')
        symbols.push({ what: 'arrow of the current', box: boxOf(item, 1) });
    }
    if (group !== null && own.length > 0) symbols.push({ what: group.sentence, box: around(own) });
  };
  collect(drawing.items, null);
  const found: string[] = [];
  const pairs = (list: readonly Thing[], other: readonly Thing[]): void => {
    list.forEach((a, i) => {
      other.forEach((b, j) => {
        if (list === other && j <= i) return;
        if (a.what.startsWith('arrow') && b.what.startsWith('arrow')) return;
        if (meet(a.box, b.box)) found.push(`${a.what} covers ${b.what}`);
      });
    });
  };
  // The FET's name stands in the corner of its own box, which its gate lead makes wide.
  const fet = symbols.find(({ what }) => / [np]?-?[np]-(JFET|MOSFET)|, [np]-(JFET|MOSFET)/.test(what))!;
  const others = symbols.filter((each) => each !== fet);
  pairs(texts, texts);
  pairs(texts, others);
  pairs(others, others);
  for (const group of drawing.items) {
    if (group.kind !== 'group' || group.of !== 'fet') continue;
    for (const item of group.items) {
      if (item.kind === 'text') continue;
      const part: Thing = { what: 'part of the FET', box: boxOf(item, 0.5) };
      if (item.kind === 'line' && item.role === 'wire' && item.points.length > 4) continue;
      pairs([part], texts);
      pairs([part], others);
    }
  }
  wires.forEach(({ a, b }, index) => {
    const line: Box = {
      x0: Math.min(a.x, b.x),
      y0: Math.min(a.y, b.y),
      x1: Math.max(a.x, b.x),
      y1: Math.max(a.y, b.y),
    };
    for (const text of texts) if (meet(widen(line, 0.7), text.box)) found.push(`a wire covers ${text.what}`);
    for (const symbol of symbols) {
      if (symbol === fet) continue;
      // Ends of wires touch a symbol at its pins, and circles are a rim around the end.
      if (meet(line, widen(symbol.box, symbol.what.startsWith('place') ? -3.5 : -1.5)))
        found.push(`a wire covers ${symbol.what}`);
    }
    wires.forEach((other, far) => {
      if (far <= index || netOf[far] === netOf[index]) return;
      const along = a.x === b.x ? 'x' : 'y';
      const across = along === 'x' ? 'y' : 'x';
      if (other.a[along] !== other.b[along] || Math.abs(other.a[along] - a[along]) > 3) return;
      const low = Math.max(Math.min(a[across], b[across]), Math.min(other.a[across], other.b[across]));
      const high = Math.min(Math.max(a[across], b[across]), Math.max(other.a[across], other.b[across]));
      if (high > low) found.push(`two wires of different nets run on each other at ${along} ${a[along]}`);
    });
  });
  wires.forEach(({ a, b }, index) => {
    for (const dot of dots) {
      const near =
        dot.x >= Math.min(a.x, b.x) - 2 &&
        dot.x <= Math.max(a.x, b.x) + 2 &&
        dot.y >= Math.min(a.y, b.y) - 2 &&
        dot.y <= Math.max(a.y, b.y) + 2;
      const owners = new Set(
        wires.flatMap((wire, at) =>
          [wire.a, wire.b].some((end) => end.x === dot.x && end.y === dot.y) ? [netOf[at]] : [],
        ),
      );
      if (near && !owners.has(netOf[index])) found.push(`a dot joins a wire of another net at ${dot.x} ${dot.y}`);
    }
  });
  for (const { x, y } of loose) found.push(`a wire ends in nothing at ${x} ${y}`);
  for (const { what, box } of [...texts, ...symbols]) {
    if (box.x0 < 0 || box.y0 < 0 || box.x1 > drawing.width || box.y1 > drawing.height) found.push(`${what} is cut off`);
  }
  return found;
}

function meet(a: Box, b: Box): boolean {
  return a.x0 < b.x1 && b.x0 < a.x1 && a.y0 < b.y1 && b.y0 < a.y1;
}

function widen(box: Box, by: number): Box {
  return { x0: box.x0 - by, y0: box.y0 - by, x1: box.x1 + by, y1: box.y1 + by };
}

function around(boxes: readonly Box[]): Box {
  return {
    x0: Math.min(...boxes.map(({ x0 }) => x0)),
    y0: Math.min(...boxes.map(({ y0 }) => y0)),
    x1: Math.max(...boxes.map(({ x1 }) => x1)),
    y1: Math.max(...boxes.map(({ y1 }) => y1)),
  };
}

function boxOf(item: Item, rim: number): Box {
  switch (item.kind) {
    case 'rect':
      return { x0: item.x, y0: item.y, x1: item.x + item.width, y1: item.y + item.height };
    case 'circle':
      return { x0: item.x - item.radius, y0: item.y - item.radius, x1: item.x + item.radius, y1: item.y + item.radius };
    case 'arcs': {
      const length = 2 * item.radius * item.count;
      return item.axis === 'y'
        ? { x0: item.x, y0: item.y, x1: item.x + item.radius, y1: item.y + length }
        : { x0: item.x, y0: item.y - item.radius, x1: item.x + length, y1: item.y };
    }
    case 'line': {
      const xs = Array.from(item.points).filter((_, at) => at % 2 === 0);
      const ys = Array.from(item.points).filter((_, at) => at % 2 === 1);
      return {
        x0: Math.min(...xs) - rim,
        y0: Math.min(...ys) - rim,
        x1: Math.max(...xs) + rim,
        y1: Math.max(...ys) + rim,
      };
    }
    default:
      throw new Error(`${item.kind} has no box here`);
  }
}
