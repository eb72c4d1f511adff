// A drawing as SVG text. Every element has a class (`sq-` and its role) and presentation attributes, so that
// it looks right in a page that styles it, in one that does not, and as a file of its own. There is no
// style attribute and no script in it; text is escaped and characters that XML forbids are dropped.

import type { ClipItem, Drawing, GroupItem, Item, LineItem, Role, Run, TextItem } from './geometry.ts';
import { ROLE_STYLES, TOKENS } from './style.ts';
import type { Token } from './style.ts';

const SANS = 'var(--figure-sans, Inter, system-ui, sans-serif)';
const SERIF = 'var(--figure-serif, KaTeX_Math, Georgia, serif)';
const SUBSCRIPT_SIZE = 0.75;
const SUBSCRIPT_DROP = 0.25;

interface SvgOptions {
  /** Makes the names of the drawing's own parts unique in a document that holds several. */
  readonly id: string;
  /** Whether symbols with a cell are told apart as buttons (`role`, `tabindex`, `data-cell`). */
  readonly interactive?: boolean;
  /** A fixed palette instead of custom properties, for files that leave the page. */
  readonly colors?: Readonly<Partial<Record<Token, string>>>;
}

/** The whole drawing as one `<svg>` element with `<title>` and `<desc>`. Throws RangeError for an id that is not a plain word. */
export function svgText(drawing: Drawing, options: SvgOptions): string {
  if (!/^[A-Za-z][\w-]*$/.test(options.id)) throw new RangeError(`${options.id} cannot be an id`);
  return new Writer(options).document(drawing);
}

/** Text safe inside elements and quoted attributes. */
export function escapeXml(text: string): string {
  return text
    .replace(/[^\t\n\r\u0020-\ud7ff\ue000-\ufffd\u{10000}-\u{10ffff}]/gu, '')
    .replace(/[&<>"']/g, (character) => ESCAPES[character]!);
}

const ESCAPES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

class Writer {
  readonly #options: SvgOptions;
  #clips = 0;
  /** Inside a group that fails, ink is red. */
  #failing = false;

  constructor(options: SvgOptions) {
    this.#options = options;
  }

  document({ width, height, title, sentence, items }: Drawing): string {
    const { id } = this.#options;
    const body = items.map((item) => this.#item(item)).join('');
    return (
      `<svg xmlns="http://www.w3.org/2000/svg" class="sq-figure" viewBox="0 0 ${number(width)} ${number(height)}" ` +
      `width="${number(width)}" height="${number(height)}" role="${this.#options.interactive ? 'group' : 'img'}" ` +
      `aria-labelledby="${id}-title" aria-describedby="${id}-desc" font-family="${escapeXml(SANS)}">` +
      `<title id="${id}-title">${escapeXml(title)}</title><desc id="${id}-desc">${escapeXml(sentence)}</desc>${body}</svg>`
    );
  }

  #item(item: Item): string {
    switch (item.kind) {
      case 'line':
        return this.#line(item);
      case 'rect': {
        const { x, y, width, height, role } = item;
        return `<rect x="${number(x)}" y="${number(y)}" width="${number(width)}" height="${number(height)}"${this.#outline(role)}/>`;
      }
      case 'circle': {
        const { x, y, radius, role, filled } = item;
        const paint = filled ? this.#area(role) : this.#outline(role);
        return `<circle cx="${number(x)}" cy="${number(y)}" r="${number(radius)}"${paint}/>`;
      }
      case 'arcs': {
        const { x, y, radius, count, axis, role } = item;
        const step = axis === 'y' ? `0 ${number(2 * radius)}` : `${number(2 * radius)} 0`;
        const arcs = `a${number(radius)} ${number(radius)} 0 0 1 ${step}`.repeat(count);
        return `<path d="M${number(x)} ${number(y)}${arcs}"${this.#stroke(role)}/>`;
      }
      case 'text':
        return this.#text(item);
      case 'group':
        return this.#group(item);
      case 'clip':
        return this.#clip(item);
    }
  }

  #line({ points, role, closed, filled }: LineItem): string {
    return `<path d="${pathOf(points)}${closed ? 'Z' : ''}"${filled ? this.#area(role) : closed ? this.#outline(role) : this.#stroke(role)}/>`;
  }

  #text({ x, y, anchor, size, runs, role, halo }: TextItem): string {
    const { color, weight } = ROLE_STYLES[role];
    const bold = weight === undefined ? '' : ` font-weight="${weight}"`;
    const rim = halo
      ? ` stroke="${this.#color('paper')}" stroke-width="4" stroke-linejoin="round" paint-order="stroke"`
      : '';
    const open = `<text x="${number(x)}" y="${number(y)}" class="sq-${role}" font-size="${number(size)}" text-anchor="${anchor}" fill="${this.#color(color)}"${bold}${rim}>`;
    return `${open}${runs.map((run, at) => this.#run(run, runs[at - 1], size)).join('')}</text>`;
  }

  #run({ text, style }: Run, before: Run | undefined, size: number): string {
    const lowered = before?.style === 'subscript';
    const shift = style === 'subscript' ? (lowered ? 0 : SUBSCRIPT_DROP) : lowered ? -SUBSCRIPT_DROP : 0;
    const dy = shift === 0 ? '' : ` dy="${number(shift * size)}"`;
    if (style === 'subscript')
      return `<tspan${dy} font-size="${number(size * SUBSCRIPT_SIZE)}">${escapeXml(text)}</tspan>`;
    if (style === 'italic') {
      return `<tspan${dy} font-family="${escapeXml(SERIF)}" font-style="italic" font-size="${number(size * 1.1)}">${escapeXml(text)}</tspan>`;
    }
    return dy === '' ? escapeXml(text) : `<tspan${dy}>${escapeXml(text)}</tspan>`;
  }

  #group({ items, cell, sentence, fails, of, box }: GroupItem): string {
    const button = this.#options.interactive === true && cell !== null;
    const classes = `sq-${of}${fails ? ' sq-fails' : ''}`;
    const access = button
      ? ` role="button" tabindex="-1" data-cell="${escapeXml(cell)}" aria-label="${escapeXml(sentence)}"`
      : '';
    this.#failing = fails;
    const body = items.map((item) => this.#item(item)).join('');
    this.#failing = false;
    const target = button
      ? `<rect class="sq-target" x="${number(box.x0)}" y="${number(box.y0)}" width="${number(box.x1 - box.x0)}" height="${number(box.y1 - box.y0)}" fill="none" pointer-events="all"/>`
      : '';
    return `<g class="${classes}"${access}>${button ? '' : `<title>${escapeXml(sentence)}</title>`}${target}${body}</g>`;
  }

  #clip({ outline, items }: ClipItem): string {
    const name = `${this.#options.id}-clip-${++this.#clips}`;
    const body = items.map((item) => this.#item(item)).join('');
    return `<clipPath id="${name}"><path d="${pathOf(outline)}Z"/></clipPath><g clip-path="url(#${name})">${body}</g>`;
  }

  #stroke(role: Role): string {
    const { color, width, dash, opacity } = ROLE_STYLES[role];
    const pattern = dash === undefined ? '' : ` stroke-dasharray="${dash}"`;
    const veil = opacity === undefined ? '' : ` stroke-opacity="${number(opacity)}"`;
    return ` class="sq-${role}" fill="none" stroke="${this.#color(color)}" stroke-width="${number(width)}"${pattern}${veil}`;
  }

  /** A closed shape of the ground's colour with a line around it. */
  #outline(role: Role): string {
    const { color, width } = ROLE_STYLES[role];
    return ` class="sq-${role}" fill="${this.#color('paper')}" stroke="${this.#color(color)}" stroke-width="${number(width)}"`;
  }

  #area(role: Role): string {
    const { color, opacity } = ROLE_STYLES[role];
    const veil = opacity === undefined ? '' : ` fill-opacity="${number(opacity)}"`;
    return ` class="sq-${role}" fill="${this.#color(color)}"${veil}`;
  }

  #color(asked: Token): string {
    const token = this.#failing && asked === 'ink' ? 'fail' : asked;
    return this.#options.colors?.[token] ?? `var(--${token}, ${TOKENS[token]})`;
  }
}

function pathOf(points: ArrayLike<number>): string {
  let d = '';
  for (let at = 0; at + 1 < points.length; at += 2) {
    d += `${at === 0 ? 'M' : 'L'}${number(points[at]!)} ${number(points[at + 1]!)}`;
  }
  return d;
}

/** At most two decimals, no exponent, no minus zero. */
function number(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`${value} cannot be drawn`);
  const rounded = Math.round(value * 100) / 100;
  return String(rounded === 0 ? 0 : rounded);
}
