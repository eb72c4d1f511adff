// The workings pane, and the tables in which it shows a part.

export { LawTables } from './part-tables.tsx';
export { WorkingsPane } from './workings-pane.tsx';
