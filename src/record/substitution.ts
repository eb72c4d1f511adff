// Putting values in place of names in a formula: a splice of its text, so that the author's spelling
// stays, with the parentheses and blanks that the sheet language wants around a value.

import { printExpr } from '../language/index.ts';
import type { Expr } from '../language/index.ts';

/** The printed value of an operand by its name: a path (`A1.I_D`), or a call or setting as `printExpr` spells it. */
export type OperandTexts = ReadonlyMap<string, string>;

interface Edit {
  readonly start: number;
  readonly end: number;
  readonly text: string;
}

/** The operand's text that stands for this part of an expression; null where the part is none. */
export function operandFor(expr: Expr, operands: OperandTexts): string | null {
  if (expr.type === 'path') return operands.get(expr.names.map((name) => name.name).join('.')) ?? null;
  if (expr.type === 'call' || expr.type === 'with') return operands.get(printExpr(expr)) ?? null;
  return null;
}

/** `formula`, whose tree is `tree`, with every operand's text in place of it. */
export function substitute(formula: string, tree: Expr, operands: OperandTexts): string {
  const edits: Edit[] = [];
  visit(tree, 'leading', formula, operands, edits);
  edits.sort((a, b) => a.start - b.start || a.end - b.end);
  let text = '';
  let at = 0;
  for (const edit of edits) {
    text += formula.slice(at, edit.start) + edit.text;
    at = edit.end;
  }
  return text + formula.slice(at);
}

/**
 * Where a part stands: `leading`, with nothing of the same expression in front of it, so that a sign may
 * begin it; `inner`, where a sign wants parentheses; `tight`, under a power or a root, where a unit does, too.
 */
type Position = 'leading' | 'inner' | 'tight';

function visit(expr: Expr, position: Position, formula: string, operands: OperandTexts, edits: Edit[]): void {
  const operand = operandFor(expr, operands);
  if (operand !== null) {
    const bare = /^[\d.]+$/.test(operand) || /^[A-Za-z]\w*$/.test(operand);
    const wrapped = position === 'tight' ? !bare : position === 'inner' && /^[-−+]/.test(operand);
    edits.push({ start: expr.span.start, end: expr.span.end, text: wrapped ? `(${operand})` : operand });
    return;
  }
  const go = (part: Expr, where: Position): void => visit(part, where, formula, operands, edits);
  switch (expr.type) {
    case 'number':
    case 'path':
      return;
    case 'group':
      return go(expr.inner, 'leading');
    case 'call':
      return expr.args.forEach((arg) => go(arg, 'leading'));
    case 'unary':
      return go(expr.operand, expr.operator === '√' ? 'tight' : expr.operator === 'not' ? 'leading' : 'inner');
    case 'within':
      return [expr.value, expr.low, expr.high].forEach((part) => go(part, 'leading'));
    case 'with':
      go(expr.value, 'leading');
      return go(expr.setting, 'leading');
    case 'binary':
      switch (expr.operator) {
        case '^':
          go(expr.left, 'tight');
          return go(expr.right, 'tight');
        case '+':
        case '-':
        case '*':
        case '/':
        case '||': {
          go(expr.left, position);
          go(expr.right, 'inner');
          // Glued to a unit, these signs would belong to it.
          const { start, end } = expr.operatorSpan;
          if (!/\s/.test(formula[start - 1] ?? ' ')) edits.push({ start, end: start, text: ' ' });
          if (!/\s/.test(formula[end] ?? ' ')) edits.push({ start: end, end, text: ' ' });
          return;
        }
        default:
          go(expr.left, 'leading');
          return go(expr.right, 'leading');
      }
  }
}
