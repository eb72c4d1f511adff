// Items of a drawing as attributes of SVG elements. Colours are custom properties of the page.

import { ROLE_STYLES } from '../../figure/index.ts';
import type { ArcsItem, Box, CircleItem, LineItem, RectItem, Role, Run, TextItem, Token } from '../../figure/index.ts';

type Attributes = Readonly<Record<string, string | number | undefined>>;

/** A run of a text with its own size and its distance from the base line of the run before. */
interface PlacedRun {
  readonly text: string;
  readonly attributes: Attributes;
}

const SUBSCRIPT_SIZE = 0.75;
const SUBSCRIPT_DROP = 0.25;
const ITALIC_SIZE = 1.1;

export function lineAttributes({ points, role, closed, filled }: LineItem, failing: boolean): Attributes {
  const d = `${pathData(points)}${closed ? 'Z' : ''}`;
  return { d, ...(filled ? area(role, failing) : closed ? outline(role, failing) : stroke(role, failing)) };
}

/** What answers to the pointer around a symbol. */
export function boxAttributes({ x0, y0, x1, y1 }: Box): Attributes {
  return { x: x0, y: y0, width: x1 - x0, height: y1 - y0 };
}

export function rectAttributes({ x, y, width, height, role }: RectItem, failing: boolean): Attributes {
  return { x, y, width, height, ...outline(role, failing) };
}

export function circleAttributes({ x, y, radius, role, filled }: CircleItem, failing: boolean): Attributes {
  return { cx: x, cy: y, r: radius, ...(filled ? area(role, failing) : outline(role, failing)) };
}

export function arcsAttributes({ x, y, radius, count, axis, role }: ArcsItem, failing: boolean): Attributes {
  const step = axis === 'y' ? `0 ${2 * radius}` : `${2 * radius} 0`;
  return { d: `M${x} ${y}${`a${radius} ${radius} 0 0 1 ${step}`.repeat(count)}`, ...stroke(role, failing) };
}

export function textAttributes({ x, y, anchor, size, role, halo }: TextItem, failing: boolean): Attributes {
  const { color, weight } = ROLE_STYLES[role];
  const rim = { stroke: 'var(--paper)', 'stroke-width': 4, 'stroke-linejoin': 'round', 'paint-order': 'stroke' };
  return {
    x,
    y,
    'text-anchor': anchor,
    'font-size': size,
    'font-weight': weight,
    fill: colorOf(color, failing),
    ...(halo ? rim : {}),
  };
}

export function placedRuns({ runs, size }: TextItem): readonly PlacedRun[] {
  return runs.map((run, at) => {
    const drop = dropOf(run) - dropOf(runs[at - 1]);
    const dy = drop === 0 ? undefined : drop * size;
    switch (run.style) {
      case 'subscript':
        return { text: run.text, attributes: { dy, 'font-size': size * SUBSCRIPT_SIZE } };
      case 'italic': {
        const face = { 'font-family': 'var(--figure-serif)', 'font-style': 'italic' };
        return { text: run.text, attributes: { dy, 'font-size': size * ITALIC_SIZE, ...face } };
      }
      default:
        return { text: run.text, attributes: { dy } };
    }
  });
}

/** `M x y L x y ..` to a hundredth of a pixel. */
export function pathData(points: ArrayLike<number>): string {
  let d = '';
  for (let at = 0; at + 1 < points.length; at += 2) {
    d += `${at === 0 ? 'M' : 'L'}${hundredth(points[at]!)} ${hundredth(points[at + 1]!)}`;
  }
  return d;
}

function hundredth(value: number): number {
  return Math.round(value * 100) / 100;
}

function dropOf(run: Run | undefined): number {
  return run?.style === 'subscript' ? SUBSCRIPT_DROP : 0;
}

function stroke(role: Role, failing: boolean): Attributes {
  const { color, width, dash, opacity } = ROLE_STYLES[role];
  return {
    fill: 'none',
    stroke: colorOf(color, failing),
    'stroke-width': width,
    'stroke-dasharray': dash,
    'stroke-opacity': opacity,
  };
}

/** A closed shape of the ground's colour with a line around it. */
function outline(role: Role, failing: boolean): Attributes {
  const { color, width } = ROLE_STYLES[role];
  return { fill: 'var(--paper)', stroke: colorOf(color, failing), 'stroke-width': width };
}

function area(role: Role, failing: boolean): Attributes {
  const { color, opacity } = ROLE_STYLES[role];
  return { fill: colorOf(color, failing), 'fill-opacity': opacity };
}

/** Inside a symbol that a failing check names, ink is red. */
function colorOf(token: Token, failing: boolean): string {
  return `var(--${failing && token === 'ink' ? 'fail' : token})`;
}
