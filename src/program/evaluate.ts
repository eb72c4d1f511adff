// The scalar evaluator: one switch over the operations, no allocation.

import { atan, cos, exp, hypot, ln, log10, pow, sin, tan } from '../numeric/index.ts';
import { OP, STRIDE } from './operations.ts';
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
    const target = ops[i + 1]!;
    const a = ops[i + 2]!;
    const b = ops[i + 3]!;
    switch (ops[i]) {
      case OP.copy:
        s[target] = s[a]!;
        break;
      case OP.add:
        s[target] = s[a]! + s[b]!;
        break;
      case OP.sub:
        s[target] = s[a]! - s[b]!;
        break;
      case OP.mul:
        s[target] = s[a]! * s[b]!;
        break;
      case OP.div:
        s[target] = s[a]! / s[b]!;
        break;
      case OP.neg:
        s[target] = -s[a]!;
        break;
      case OP.abs:
        s[target] = Math.abs(s[a]!);
        break;
      case OP.sqrt:
        s[target] = Math.sqrt(s[a]!);
        break;
      case OP.min:
        s[target] = Math.min(s[a]!, s[b]!);
        break;
      case OP.max:
        s[target] = Math.max(s[a]!, s[b]!);
        break;
      case OP.parallel:
        s[target] = parallel(s[a]!, s[b]!);
        break;
      case OP.sign:
        s[target] = Math.sign(s[a]!);
        break;
      case OP.exp:
        s[target] = exp(s[a]!);
        break;
      case OP.ln:
        s[target] = ln(s[a]!);
        break;
      case OP.log10:
        s[target] = log10(s[a]!);
        break;
      case OP.sin:
        s[target] = sin(s[a]!);
        break;
      case OP.cos:
        s[target] = cos(s[a]!);
        break;
      case OP.tan:
        s[target] = tan(s[a]!);
        break;
      case OP.atan:
        s[target] = atan(s[a]!);
        break;
      case OP.hypot:
        s[target] = hypot(s[a]!, s[b]!);
        break;
      case OP.pow:
        s[target] = pow(s[a]!, s[b]!);
        break;
      case OP.less:
        s[target] = s[a]! < s[b]! ? 1 : 0;
        break;
      case OP.lessOrEqual:
        s[target] = s[a]! <= s[b]! ? 1 : 0;
        break;
      case OP.equal:
        s[target] = s[a]! === s[b]! ? 1 : 0;
        break;
      case OP.and:
        s[target] = s[a]! * s[b]!;
        break;
      case OP.or:
        s[target] = Math.max(s[a]!, s[b]!);
        break;
      case OP.not:
        s[target] = 1 - s[a]!;
        break;
      case OP.call:
        kernels[target]!.run(s, args, argsAt + a);
        break;
    }
  }
}

function parallel(a: number, b: number): number {
  if (a === Infinity) return b;
  if (b === Infinity) return a;
  if (a === 0 || b === 0) return 0;
  return (a * b) / (a + b);
}
