// The workings pane, and the tables in which it shows a part.

export { formRows } from './part-rows.ts';
export { FormTable } from './part-tables.tsx';
export { WorkingsPane } from './workings-pane.tsx';
