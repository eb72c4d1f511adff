// Charts as data: curves, areas and marks in SI between two axes. Planes, plots and histograms all become
// charts; `drawChart` turns one into geometry.

import type { Axis } from './axis.ts';

export type CurveRole = 'nominal' | 'low' | 'high' | 'bias' | 'family' | 'edge' | 'limit' | 'fourth' | 'fifth';

export interface Curve {
  readonly role: CurveRole;
  readonly x: Float64Array;
  /** NaN where the curve has a gap. */
  readonly y: Float64Array;
  /** What stands on the line, names as cells are named; '' for nothing. */
  readonly label: string;
  /** What it is called in a table or a read-out, where the label leans on the figure: `V_GS −1 V`. */
  readonly said?: string;
  /** Where along the curve its label would best stand, 0 to 1. */
  readonly labelAt?: number;
  /** Small rings: at every tenth point beside the line, or at every point instead of it (measured points). */
  readonly rings?: 'tenth' | 'only';
}

/** What lies between two curves over the same x. */
export interface Area {
  readonly role: 'band' | 'hatch';
  readonly x: Float64Array;
  readonly low: Float64Array;
  readonly high: Float64Array;
  /** What it is the reach of, where it is read: `A1.I_D`. */
  readonly said?: string;
}

/** A point that says something: Q as a disc, the low device's point as ▽, the high one's as △. */
export interface Mark {
  readonly role: 'point' | 'low' | 'high';
  readonly shape: 'disc' | 'down' | 'up';
  readonly x: number;
  readonly y: number;
  readonly label: string;
}

/** A line across the whole chart at a limit, hatched on the side that it forbids. */
export interface Post {
  readonly axis: 'x' | 'y';
  readonly value: number;
  readonly forbids: 'below' | 'above' | 'nothing';
  /** Red only where the limit is passed. */
  readonly passed: boolean;
  readonly label: string;
}

export interface Chart {
  readonly title: string;
  readonly sentence: string;
  readonly x: Axis;
  readonly y: Axis;
  /** On which side the numbers of the y axis stand. */
  readonly yAt: 'left' | 'right';
  readonly areas: readonly Area[];
  readonly curves: readonly Curve[];
  readonly posts: readonly Post[];
  readonly marks: readonly Mark[];
}
