// The sheet grid of the page.

export { SheetGrid } from './sheet-grid.tsx';
