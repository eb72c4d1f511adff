// The form in which this folder hands its arithmetic to a running program.
//
// A program is a tape over one array of slots. A kernel reads s[a[p]], s[a[p + 1]], .. in the order of
// its inputs and writes its outputs to the slots that follow; it allocates nothing and keeps nothing.

type Kernel = (s: Float64Array, a: Int32Array, p: number) => void;

/** A kernel with the names of its slots. A slot of a test condition that the sheet does not state holds NaN. */
export interface NamedKernel {
  readonly inputs: readonly string[];
  readonly outputs: readonly string[];
  readonly run: Kernel;
}
