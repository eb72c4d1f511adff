// Sheets of many small cells: each is a sum of two multiples of others. Made by rule, the same at every call.

/** Values 0 .. inputs - 1 are inputs, the others cells: value = left value * scale + right value * 0.25. */
export interface CellGraph {
  readonly inputs: number;
  readonly left: Int32Array;
  readonly right: Int32Array;
  readonly scale: Float64Array;
}

type Operands = (cell: number, draw: () => number) => readonly [left: number, right: number];

function createGraph(inputs: number, cells: number, operands: Operands): CellGraph {
  let state = 1;
  const draw = () => {
    state = (Math.imul(state, 1664525) + 1013904223) | 0;
    return (state >>> 0) / 2 ** 32;
  };
  const pairs = Array.from({ length: cells }, (_, cell) => operands(cell, draw));
  return {
    inputs,
    left: Int32Array.from(pairs, ([left]) => left),
    right: Int32Array.from(pairs, ([, right]) => right),
    scale: Float64Array.from(pairs, () => 0.5 + 0.25 * draw()),
  };
}

/** Each cell reads the one before it. */
export const createChain = (cells: number) => createGraph(1, cells, (cell) => [cell, 0]);

/** Each cell reads two of those before it. */
export const createWeb = (cells: number) =>
  createGraph(1, cells, (cell, draw) => [Math.floor(draw() * (cell + 1)), Math.floor(draw() * (cell + 1))]);

/** The first input is read by one cell, the second by a hundred, the third by all. */
export const createFans = (cells: number) => createGraph(3, cells, (cell) => [cell < 1 ? 0 : cell <= 100 ? 1 : 2, 2]);
