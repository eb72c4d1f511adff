// How each role looks: colour by token, width and dash of its line, weight and colour of its text. A colour is
// a custom property of the page with the light colour behind it, so that a drawing prints alone.

import type { Role } from './geometry.ts';

interface RoleStyle {
  readonly color: Token;
  /** Stroke width; 0 for areas without a rim. */
  readonly width: number;
  readonly dash?: string;
  /** Text weight. */
  readonly weight?: 600;
  /** Share of the colour that an area lets through. */
  readonly opacity?: number;
}

/** Colours of the page by name, light ones; the page overrides them. */
export const TOKENS = {
  paper: '#ffffff',
  ink: '#1a1f24',
  soft: '#56606a',
  edit: '#0b5c86',
  fail: '#a8201a',
  hair: '#dde2e6',
  band: '#cfe0ea',
  'band-edge': '#5b88a2',
  'low-device': '#8f3fbf',
  'high-device': '#86660a',
} as const;
export type Token = keyof typeof TOKENS;

export const ROLE_STYLES: Readonly<Record<Role, RoleStyle>> = {
  wire: { color: 'ink', width: 1.3 },
  channel: { color: 'ink', width: 2.4 },
  symbol: { color: 'ink', width: 1.5 },
  dot: { color: 'ink', width: 0 },
  bar: { color: 'ink', width: 2.8 },
  terminal: { color: 'ink', width: 1.3 },
  label: { color: 'ink', width: 0 },
  voltage: { color: 'ink', width: 0, weight: 600 },
  current: { color: 'ink', width: 1.3, weight: 600 },
  note: { color: 'soft', width: 0 },
  axis: { color: 'soft', width: 1 },
  grid: { color: 'hair', width: 1 },
  tick: { color: 'soft', width: 0 },
  nominal: { color: 'ink', width: 1.9 },
  low: { color: 'low-device', width: 1.6, dash: '6 3' },
  high: { color: 'high-device', width: 1.7, dash: '10 3 2 3' },
  bias: { color: 'edit', width: 1.5 },
  family: { color: 'soft', width: 0.9 },
  edge: { color: 'soft', width: 1.2, dash: '1.5 3' },
  limit: { color: 'fail', width: 1.3 },
  band: { color: 'band', width: 0, opacity: 0.55 },
  hatch: { color: 'fail', width: 0.8, opacity: 0.6 },
  fourth: { color: 'ink', width: 1.5, dash: '2 2' },
  fifth: { color: 'ink', width: 1.5, dash: '8 2' },
  point: { color: 'edit', width: 0 },
};
