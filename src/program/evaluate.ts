// The scalar evaluator: one switch over the operations, no allocation.
//
// The codes are written out as numbers, because only then is the switch compiled to a jump table (a full pass
// takes a tenth less); `OP` names them, and a test holds each to its name.

import { atan, cos, exp, hypot, ln, log10, pow, sin, tan } from '../numeric/index.ts';
import { STRIDE } from './operations.ts';
import type { KernelTable } from './segment.ts';

/** Runs the operations [from, to) (counted in words) on `s`; `argsAt` is added to every call's argument offset. */
export function runOperations(
  ops: Int32Array,
  from: number,
  to: number,
  args: Int32Array,
  argsAt: number,
  s: Float64Array,
  kernels: KernelTable,
): void {
  for (let i = from; i < to; i += STRIDE) {
    const target = ops[i + 1];
    const a = ops[i + 2];
    const b = ops[i + 3];
    switch (ops[i]) {
      case 0: // copy
        s[target] = s[a];
        break;
      case 1: // add
        s[target] = s[a] + s[b];
        break;
      case 2: // sub
        s[target] = s[a] - s[b];
        break;
      case 3: // mul
        s[target] = s[a] * s[b];
        break;
      case 4: // div
        s[target] = s[a] / s[b];
        break;
      case 5: // neg
        s[target] = -s[a];
        break;
      case 6: // abs
        s[target] = Math.abs(s[a]);
        break;
      case 7: // sqrt
        s[target] = Math.sqrt(s[a]);
        break;
      case 8: // min
        s[target] = Math.min(s[a], s[b]);
        break;
      case 9: // max
        s[target] = Math.max(s[a], s[b]);
        break;
      case 10: // parallel
        s[target] = parallel(s[a], s[b]);
        break;
      case 11: // sign
        s[target] = Math.sign(s[a]);
        break;
      case 12: // exp
        s[target] = exp(s[a]);
        break;
      case 13: // ln
        s[target] = ln(s[a]);
        break;
      case 14: // log10
        s[target] = log10(s[a]);
        break;
      case 15: // sin
        s[target] = sin(s[a]);
        break;
      case 16: // cos
        s[target] = cos(s[a]);
        break;
      case 17: // tan
        s[target] = tan(s[a]);
        break;
      case 18: // atan
        s[target] = atan(s[a]);
        break;
      case 19: // hypot
        s[target] = hypot(s[a], s[b]);
        break;
      case 20: // pow
        s[target] = pow(s[a], s[b]);
        break;
      case 21: // less
        s[target] = s[a] < s[b] ? 1 : 0;
        break;
      case 22: // lessOrEqual
        s[target] = s[a] <= s[b] ? 1 : 0;
        break;
      case 23: // equal
        s[target] = s[a] === s[b] ? 1 : 0;
        break;
      case 24: // and
        s[target] = s[a] * s[b];
        break;
      case 25: // or
        s[target] = Math.max(s[a], s[b]);
        break;
      case 26: // not
        s[target] = 1 - s[a];
        break;
      case 27: // call
        kernels[target].run(s, args, argsAt + a);
        break;
    }
  }
}

/** Two resistances side by side. */
export function parallel(a: number, b: number): number {
  if (a === Infinity) return b;
  if (b === Infinity) return a;
  if (a === 0 || b === 0) return 0;
  return (a * b) / (a + b);
}
