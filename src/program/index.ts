// The compiled form of a sheet: plain data that one evaluation, an incremental one, a sweep and many samples share.

export { planColumns } from './column-plan.ts';
export { createColumns } from './columns.ts';
export { createBuilder } from './builder.ts';
export type { Builder } from './builder.ts';
export { runOperations } from './evaluate.ts';
export { PROGRAM_KERNELS } from './kernels.ts';
export type { OperationName } from './operations.ts';
export { assemble, createPropagation, createSlots, markDependents, propagate, runAll } from './program.ts';
export type { Program } from './program.ts';
export { reachOf, reaches, resultsOf } from './reach.ts';
export type { Kernel, KernelTable, Segment } from './segment.ts';
