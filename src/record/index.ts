// What the page, the record and the terminal print: TeX, workings, values, checks and the verdict.
// All of it is text or plain trees; nothing is rendered here.

export { answeredSentence, answeredSentences } from './answered-text.ts';
export { benchTables } from './bench-tables.ts';
export type { BenchTable } from './bench-table.ts';
export { conventionRows, partTables, routesTable } from './part-tables.ts';
export { checkText, reserveText } from './check-text.ts';
export { endsText } from './ends-text.ts';
export { recordHtml } from './html.ts';
export { inputTally, openPoints } from './open-points.ts';
export type { OpenPoint } from './open-points.ts';
export { proseParts } from './prose.ts';
export { recordOf } from './record.ts';
export type { RecordTree } from './record-tree.ts';
export { shownCell, shownOwn, shownReading } from './shown.ts';
export { texOfExpression } from './tex.ts';
export { texOfName, texOfPath } from './tex-name.ts';
export { texOfUnit } from './tex-number.ts';
export { parseSamples, parseSeed, parseShare, samplingOf } from './sampling.ts';
export type { Sampling } from './sampling.ts';
export { TITLE_LABELS } from './title-fields.ts';
export type { TitleField } from './title-fields.ts';
export { failingText, failsCheck, verdictOf } from './verdict.ts';
export type { JudgedSpread, Verdict } from './verdict.ts';
export { countText, shareText, yieldText } from './yield-text.ts';
export { printStep, stepSides, stepText, workingsOf } from './workings.ts';
export type { PrintedStep } from './workings.ts';
export { whereText } from './where-text.ts';
export { stageEnds } from './stage-ends.ts';
export { declaredSentences } from './declared-text.ts';
