// The spread of the open sheet, as the page shows it.

export { createSpreadFeed } from './spread-feed.ts';
export type { SpreadFeed } from './spread-feed.ts';
