// The operations of the compiled form. Each takes up to two slots and writes one.
//
// An operation is four words of an Int32Array: code, target slot, first operand, second operand.
// `call` is the exception: target is the kernel's index in the table, the first operand is the offset
// of its slot list in `args`, and the second is the length of that list.

/** Words per operation. */
export const STRIDE = 4;

export const OP = {
  copy: 0,
  add: 1,
  sub: 2,
  mul: 3,
  div: 4,
  neg: 5,
  abs: 6,
  sqrt: 7,
  min: 8,
  max: 9,
  /** a b / (a + b): two resistances side by side; 0 where either is 0, the other where one is infinite. */
  parallel: 10,
  sign: 11,
  exp: 12,
  ln: 13,
  log10: 14,
  sin: 15,
  cos: 16,
  tan: 17,
  atan: 18,
  hypot: 19,
  pow: 20,
  less: 21,
  lessOrEqual: 22,
  equal: 23,
  and: 24,
  or: 25,
  not: 26,
  call: 27,
} as const;

export type OperationName = Exclude<keyof typeof OP, 'call'>;
