// The figures pane.

export { FiguresPane } from './figures-pane.tsx';
export { ChartView } from './chart-view.tsx';
