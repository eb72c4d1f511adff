// Items of a drawing on a canvas: the same picture as the SVG one, item by item.

import { ROLE_STYLES } from '../../figure/index.ts';
import type { Item, LineItem, Role, Run, TextItem, Token } from '../../figure/index.ts';

/** Colours and faces as they stand on the page now. */
export interface Palette {
  color(token: Token): string;
  readonly sans: string;
  readonly serif: string;
}

const SUBSCRIPT_SIZE = 0.75;
const SUBSCRIPT_DROP = 0.25;
const ITALIC_SIZE = 1.1;
const HALO = 4;

/** Paints items in their own units; the caller sets the scale of the context. */
export function paintItems(context: CanvasRenderingContext2D, items: readonly Item[], palette: Palette): void {
  for (const item of items) {
    context.save();
    paintItem(context, item, palette);
    context.restore();
  }
}

function paintItem(context: CanvasRenderingContext2D, item: Item, palette: Palette): void {
  switch (item.kind) {
    case 'line':
      return paintLine(context, item, palette);
    case 'rect':
      context.beginPath();
      context.rect(item.x, item.y, item.width, item.height);
      return outline(context, item.role, palette);
    case 'circle':
      context.beginPath();
      context.arc(item.x, item.y, item.radius, 0, 2 * Math.PI);
      return item.filled ? fill(context, item.role, palette) : outline(context, item.role, palette);
    case 'text':
      return paintText(context, item, palette);
    case 'clip':
      trace(context, item.outline);
      context.closePath();
      context.clip();
      return paintItems(context, item.items, palette);
    case 'group':
      return paintItems(context, item.items, palette);
    case 'arcs':
      throw new Error('charts have no arcs');
  }
}

function paintLine(
  context: CanvasRenderingContext2D,
  { points, role, closed, filled }: LineItem,
  palette: Palette,
): void {
  trace(context, points);
  if (closed) context.closePath();
  if (filled) fill(context, role, palette);
  else if (closed) outline(context, role, palette);
  else stroke(context, role, palette);
}

function paintText(context: CanvasRenderingContext2D, item: TextItem, palette: Palette): void {
  const { x, y, anchor, size, runs, role, halo } = item;
  const { color, weight } = ROLE_STYLES[role];
  const fonts = runs.map((run) => fontOf(run, size, weight ?? 400, palette));
  const widths = runs.map((run, at) => widthOf(context, run.text, fonts[at]!, palette));
  const total = widths.reduce((sum, width) => sum + width, 0);
  const start = anchor === 'start' ? x : anchor === 'end' ? x - total : x - total / 2;
  const each = (draw: (text: string, at: number, base: number) => void): void => {
    let at = start;
    runs.forEach((run, index) => {
      context.font = fonts[index]!;
      draw(run.text, at, run.style === 'subscript' ? y + SUBSCRIPT_DROP * size : y);
      at += widths[index]!;
    });
  };
  context.textAlign = 'left';
  context.textBaseline = 'alphabetic';
  if (halo) {
    context.strokeStyle = palette.color('paper');
    context.lineWidth = HALO;
    context.lineJoin = 'round';
    each((text, at, base) => context.strokeText(text, at, base));
  }
  context.fillStyle = palette.color(color);
  each((text, at, base) => context.fillText(text, at, base));
}

/** Widths by font and text. Measuring costs more than drawing; faces that come later come with another palette. */
const WIDTHS = new WeakMap<Palette, Map<string, number>>();
/** Texts that are remembered at most: those of some dozen charts. */
const MOST_WIDTHS = 2000;

function widthOf(context: CanvasRenderingContext2D, text: string, font: string, palette: Palette): number {
  let known = WIDTHS.get(palette);
  if (!known || known.size >= MOST_WIDTHS) WIDTHS.set(palette, (known = new Map()));
  const key = `${font} ${text}`;
  let width = known.get(key);
  if (width === undefined) {
    context.font = font;
    known.set(key, (width = context.measureText(text).width));
  }
  return width;
}

function fontOf({ style }: Run, size: number, weight: number, { sans, serif }: Palette): string {
  if (style === 'italic') return `italic ${weight} ${size * ITALIC_SIZE}px ${serif}`;
  return `${weight} ${style === 'subscript' ? size * SUBSCRIPT_SIZE : size}px ${sans}`;
}

function trace(context: CanvasRenderingContext2D, points: ArrayLike<number>): void {
  context.beginPath();
  for (let at = 0; at + 1 < points.length; at += 2) context.lineTo(points[at]!, points[at + 1]!);
}

function stroke(context: CanvasRenderingContext2D, role: Role, palette: Palette): void {
  const { color, width, dash, opacity } = ROLE_STYLES[role];
  context.strokeStyle = palette.color(color);
  context.lineWidth = width;
  context.globalAlpha = opacity ?? 1;
  context.setLineDash(dashOf(dash));
  context.stroke();
}

function outline(context: CanvasRenderingContext2D, role: Role, palette: Palette): void {
  context.fillStyle = palette.color('paper');
  context.fill();
  const { color, width } = ROLE_STYLES[role];
  context.strokeStyle = palette.color(color);
  context.lineWidth = width;
  context.stroke();
}

function fill(context: CanvasRenderingContext2D, role: Role, palette: Palette): void {
  const { color, opacity } = ROLE_STYLES[role];
  context.fillStyle = palette.color(color);
  context.globalAlpha = opacity ?? 1;
  context.fill();
}

/** A dash pattern as numbers. */
export function dashOf(dash: string | undefined): number[] {
  return dash === undefined ? [] : dash.split(' ').map(Number);
}
