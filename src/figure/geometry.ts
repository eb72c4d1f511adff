// Figures as plain data: what is drawn, where, and in which role; nothing of how it reaches a screen
// or a page. Drawing units are CSS pixels at full size, y grows downwards. Colour and pattern follow
// from the role alone, so that one table serves screen, print and forced colours.

/** What a line, area or text stands for. */
export type Role =
  // schematic
  | 'wire'
  | 'channel'
  | 'symbol'
  | 'dot'
  | 'bar'
  | 'terminal'
  | 'label'
  | 'voltage'
  | 'current'
  | 'note'
  // planes and plots
  | 'axis'
  | 'grid'
  | 'tick'
  | 'nominal'
  | 'low'
  | 'high'
  | 'bias'
  | 'family'
  | 'edge'
  | 'limit'
  | 'band'
  | 'hatch'
  | 'fourth'
  | 'fifth'
  | 'point';

export interface Box {
  readonly x0: number;
  readonly y0: number;
  readonly x1: number;
  readonly y1: number;
}

/** A stretch of text in one style: a quantity's letter is italic, its subscript upright and lowered. */
export interface Run {
  readonly text: string;
  readonly style: 'upright' | 'italic' | 'subscript';
}

export interface LineItem {
  readonly kind: 'line';
  readonly role: Role;
  /** x, y, x, y, .. */
  readonly points: ArrayLike<number>;
  readonly closed?: boolean;
  /** Closed and painted with the role's colour. */
  readonly filled?: boolean;
}
export interface RectItem {
  readonly kind: 'rect';
  readonly role: Role;
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}
export interface CircleItem {
  readonly kind: 'circle';
  readonly role: Role;
  readonly x: number;
  readonly y: number;
  readonly radius: number;
  readonly filled: boolean;
}
/** A chain of half circles from (x, y), each `radius` wide, along +x or +y, bulging to the right or upwards. */
export interface ArcsItem {
  readonly kind: 'arcs';
  readonly role: Role;
  readonly x: number;
  readonly y: number;
  readonly radius: number;
  readonly count: number;
  readonly axis: 'x' | 'y';
}
export interface TextItem {
  readonly kind: 'text';
  readonly role: Role;
  /** Anchor point on the base line. */
  readonly x: number;
  readonly y: number;
  readonly anchor: 'start' | 'middle' | 'end';
  readonly size: number;
  readonly runs: readonly Run[];
  /** Painted over a rim of the ground's colour, for labels that stand on lines. */
  readonly halo?: boolean;
}
/** Items that are one thing to the reader; with a cell it can be followed there. */
export interface GroupItem {
  readonly kind: 'group';
  /** What the group is: a leg of the stage, the FET, a place. */
  readonly of: 'leg' | 'fet' | 'place';
  /** Index of the leg in the input; null for other groups. */
  readonly leg: number | null;
  readonly cell: string | null;
  readonly sentence: string;
  readonly fails: boolean;
  readonly box: Box;
  readonly items: readonly Item[];
}
/** Items of which only what lies inside the outline (x, y, x, y, ..) is seen. */
export interface ClipItem {
  readonly kind: 'clip';
  readonly outline: ArrayLike<number>;
  readonly items: readonly Item[];
}
export type Item = LineItem | RectItem | CircleItem | ArcsItem | TextItem | GroupItem | ClipItem;

/** A finished drawing with its accessible name and description. */
export interface Drawing {
  readonly width: number;
  readonly height: number;
  readonly title: string;
  readonly sentence: string;
  readonly items: readonly Item[];
}

/** Whether two boxes share more than an edge. */
export function boxesOverlap(a: Box, b: Box): boolean {
  return a.x0 < b.x1 && b.x0 < a.x1 && a.y0 < b.y1 && b.y0 < a.y1;
}

/** The smallest box around boxes; throws RangeError for none. */
export function boxAround(boxes: readonly Box[]): Box {
  if (boxes.length === 0) throw new RangeError('no box to go around');
  return {
    x0: Math.min(...boxes.map((box) => box.x0)),
    y0: Math.min(...boxes.map((box) => box.y0)),
    x1: Math.max(...boxes.map((box) => box.x1)),
    y1: Math.max(...boxes.map((box) => box.y1)),
  };
}
