// The figures pane.

export { FiguresPane } from './figures-pane.tsx';
export type { PaneControls } from './figures-pane.tsx';
