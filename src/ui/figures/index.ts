// The figures pane.

export { FiguresPane } from './figures-pane.tsx';
