// The spread of the open sheet as it becomes known, and the corners of it at which the page can stand.

export { endCorner, stageCorners } from './corners.ts';
export type { Corner } from './corners.ts';
export { createSpreadFeed } from './spread-feed.ts';
export type { SpreadFeed } from './spread-feed.ts';
export { startWorker } from './page-worker.ts';
