// The workings pane.

export { WorkingsPane } from './workings-pane.tsx';
