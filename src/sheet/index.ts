// A sheet that computes. Conventions: values are SI numbers (kelvin for a point of the temperature
// scale, dB for levels), voltages true node differences, I_D and margin in the device's own sense.

export { evaluateExpression } from './evaluate-expression.ts';
export { FUNCTIONS } from './functions.ts';
export type {
  Asked,
  Analyses,
  CellKind,
  CellReading,
  DeclaredSpread,
  Fault,
  StageReading,
  FieldReading,
  OfferedReading,
  PartReading,
  Reading,
  Sheet,
  SheetView,
  SpreadModel,
  Drawn,
  Tie,
  ValueType,
  WorkingStep,
} from './model.ts';
export type { BenchReading } from './bench/bench-reading.ts';
export { PART_FIELDS } from './part-fields.ts';
export { KERNELS, isChoice } from './kernels.ts';
export { createSheet } from './sheet.ts';
