// The record on the screen and in print.

export { installPrint } from './print.ts';
export { RecordView } from './record-view.tsx';
