// A kernel is an operation with several results: a root solve, a device law. It reads and writes the
// slots of a running program: `s` holds the values, `a[p], a[p + 1], ..` are slot numbers, those of the
// inputs first, then those of the outputs, in the order of the kernel's two lists.

/** One multi-result operation and the names of what it takes and gives. */
export interface Kernel {
  readonly inputs: readonly string[];
  readonly outputs: readonly string[];
  /** Reads the input slots, writes the output slots, allocates nothing. */
  readonly run: (s: Float64Array, a: Int32Array, p: number) => void;
  /**
   * The same for many samples at once, to the last bit: place `at + n` is where the column of the n-th argument begins in
   * `all`. Columns of results overlap no column of an input.
   */
  readonly columns?: (all: Float64Array, places: Int32Array, at: number, count: number) => void;
  /**
   * The same in the language of lanes, from the names of the inputs to those of the outputs. An output that bears the name
   * of an input has `_out` behind it.
   */
  readonly lanes?: string;
  /** An input that must be 0 for the lanes. */
  readonly zeroInLanes?: string;
}
