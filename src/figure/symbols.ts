// Graphic symbols of the elements, of the FETs and of the places where a leg ends, after the rules of
// IEC 60617: rectangles for resistors, the arrow from P to N, the channel of an enhancement FET in three
// pieces, a JFET's gate at the source end. All two-pole symbols are equally long, so that rows line up.

import type { Box, Item, LineItem, Role } from './geometry.ts';
import type { LegKind } from './stage-input.ts';

/** From the middle of a two-pole symbol to either pin. */
export const HALF_LENGTH = 17;

interface TwoPole {
  readonly items: readonly Item[];
  readonly box: Box;
  /** From the axis to the side on which the label stands. */
  readonly half: number;
}

/** How far the arrow of a source stands off its axis. */
const SOURCE_ARROW = 19;

/**
 * A two-pole symbol around (x, y) with its pins HALF_LENGTH away along `axis`; `forward` is true where a source drives
 * along +x or +y. Throws RangeError for a tie, which has no symbol.
 */
export function twoPole(kind: LegKind, x: number, y: number, axis: 'x' | 'y', forward: boolean): TwoPole {
  const place = (u: number, v: number): [number, number] => (axis === 'y' ? [x + v, y + u] : [x + u, y - v]);
  const line = (role: Role, ...pairs: readonly (readonly [number, number])[]): LineItem => ({
    kind: 'line',
    role,
    points: pairs.flatMap(([u, v]) => place(u, v)),
  });
  const box = (along: number, low: number, high: number): Box => {
    const [ax, ay] = place(-along, low);
    const [bx, by] = place(along, high);
    return { x0: Math.min(ax, bx), y0: Math.min(ay, by), x1: Math.max(ax, bx), y1: Math.max(ay, by) };
  };
  const L = HALF_LENGTH;
  switch (kind) {
    case 'resistor': {
      const [ax, ay] = place(-L, axis === 'y' ? -6 : 6);
      const [width, height] = axis === 'y' ? [12, 2 * L] : [2 * L, 12];
      return { items: [{ kind: 'rect', role: 'symbol', x: ax, y: ay, width, height }], box: box(L, -6, 6), half: 6 };
    }
    case 'capacitor':
      return {
        items: [
          line('symbol', [-3.5, -11], [-3.5, 11]),
          line('symbol', [3.5, -11], [3.5, 11]),
          line('wire', [-L, 0], [-3.5, 0]),
          line('wire', [3.5, 0], [L, 0]),
        ],
        box: box(L, -11, 11),
        half: 11,
      };
    case 'inductor': {
      const [ax, ay] = place(-16, 0);
      return {
        items: [
          { kind: 'arcs', role: 'symbol', x: ax, y: ay, radius: 4, count: 4, axis },
          line('wire', [-L, 0], [-16, 0]),
          line('wire', [16, 0], [L, 0]),
        ],
        box: box(L, -3, 6),
        half: 6,
      };
    }
    case 'source': {
      const tip = forward ? 9 : -9;
      return {
        items: [
          { kind: 'circle', role: 'symbol', x, y, radius: 11, filled: false },
          line('symbol', [0, -11], [0, 11]),
          line('wire', [-L, 0], [-11, 0]),
          line('wire', [11, 0], [L, 0]),
          line('current', [-tip, -SOURCE_ARROW], [tip - Math.sign(tip) * 6, -SOURCE_ARROW]),
          ...arrowHead(place(tip, -SOURCE_ARROW), place(0, -SOURCE_ARROW), 'current'),
        ],
        box: box(L, -SOURCE_ARROW - 4, 11),
        half: 11,
      };
    }
    case 'tie':
      throw new RangeError('a tie has no symbol');
  }
}

/** A filled arrow head with its tip at `tip`, pointing away from `from`; both on one horizontal or vertical. */
export function arrowHead(
  [tx, ty]: readonly [number, number],
  [fx, fy]: readonly [number, number],
  role: Role,
): readonly Item[] {
  const dx = Math.sign(tx - fx);
  const dy = Math.sign(ty - fy);
  const points = [
    tx,
    ty,
    tx - 7 * dx + 3.2 * dy,
    ty - 7 * dy + 3.2 * dx,
    tx - 7 * dx - 3.2 * dy,
    ty - 7 * dy - 3.2 * dx,
  ];
  return [{ kind: 'line', role, points, closed: true, filled: true }];
}

// ---------------------------------------------------------------- the FET

/** How a FET's pins stand around its middle (0, 0): the channel's terminals above and below x = 0. */
export const FET = {
  /** Pins of the upper and lower terminal: (0, -20) and (0, 20). */
  reach: 20,
  /** The level of the contacts, and of the gate at the source's end. */
  contact: 13,
  gateX: -40,
  bulkX: 8,
} as const;

interface FetSymbol {
  readonly items: readonly Item[];
  readonly boxes: readonly Box[];
}

/** The symbol of a FET with its middle at (x, y); `sourceUp` says at which end the gate stands, `bulkOut` that the body is a lead of its own. */
export function fetSymbol(
  fet: { readonly channel: 'n' | 'p'; readonly family: 'JFET' | 'MOSFET'; readonly enhancement: boolean },
  x: number,
  y: number,
  sourceUp: boolean,
  bulkOut: boolean,
): FetSymbol {
  const { reach, contact, gateX, bulkX } = FET;
  const cx = x - 16;
  const gateY = y + (sourceUp ? -contact : contact);
  const items: Item[] = [
    { kind: 'line', role: 'wire', points: [x, y - reach, x, y - contact, cx, y - contact] },
    { kind: 'line', role: 'wire', points: [x, y + reach, x, y + contact, cx, y + contact] },
  ];
  const pieces =
    fet.family === 'MOSFET' && fet.enhancement
      ? [
          [-18, -8],
          [-5, 5],
          [8, 18],
        ]
      : [[-18, 18]];
  for (const [from, to] of pieces) items.push({ kind: 'line', role: 'channel', points: [cx, y + from!, cx, y + to!] });
  const boxes: Box[] = [{ x0: cx - 7, y0: y - reach, x1: x + 1, y1: y + reach }];
  if (fet.family === 'JFET') {
    items.push({ kind: 'line', role: 'wire', points: [x + gateX, gateY, cx, gateY] });
    items.push(
      ...(fet.channel === 'n'
        ? arrowHead([cx - 1, gateY], [cx - 9, gateY], 'dot')
        : arrowHead([cx - 9, gateY], [cx, gateY], 'dot')),
    );
  } else {
    const gx = cx - 6;
    items.push({ kind: 'line', role: 'symbol', points: [gx, y - contact, gx, y + contact] });
    items.push({ kind: 'line', role: 'wire', points: [x + gateX, gateY, gx, gateY] });
    items.push(
      ...(fet.channel === 'n' ? arrowHead([cx + 2, y], [cx + 9, y], 'dot') : arrowHead([x - 3, y], [cx, y], 'dot')),
    );
    if (bulkOut) items.push({ kind: 'line', role: 'wire', points: [cx, y, x + bulkX, y] });
    else {
      items.push({ kind: 'line', role: 'wire', points: [cx, y, x, y, x, gateY] });
      items.push({ kind: 'circle', role: 'dot', x, y: gateY, radius: 2.4, filled: true });
    }
    boxes[0] = { ...boxes[0]!, x1: bulkOut ? x + bulkX : x + 3 };
  }
  boxes.push({ x0: x + gateX, y0: gateY - 6, x1: cx - 7, y1: gateY + 6 });
  return { items, boxes };
}
