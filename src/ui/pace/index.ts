// Following values at an easy pace.

export { createRested } from './rested.ts';
export type { Pace } from './rested.ts';
export { createBehindPaint } from './behind-paint.ts';
