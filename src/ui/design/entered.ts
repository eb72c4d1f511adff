// A number typed into a dialog, read as the sheet would read it: units, codes, formulas over the sheet's own cells.

import { parseExpression, pathsOf } from '../../language/index.ts';
import { dimensionName, sameKind } from '../../quantity/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import { createSheet } from '../../sheet/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import { freeName } from '../rows/index.ts';
import { linesBehind } from './behind.ts';

/** The SI number, or why there is none, as a sentence; and whether the entry computes, to something of another kind. */
type Entered = { readonly value: number } | { readonly fault: string; readonly isOther: boolean };

/** Reads an entry that is to be of this kind; `what` names it in sentences: `The ratio`. */
export function readEntered(sheet: SheetView, text: string, kind: ValueKind, what: string): Entered {
  if (text.trim() === '') return { fault: `${what} is not given yet.`, isOther: false };
  const expr = parseExpression(text);
  if ('code' in expr) return { fault: expr.text, isOther: false };
  const used = pathsOf(expr).map(({ names }) => names[0]!.name);
  const name = freeName(sheet, 'x_');
  const trial = createSheet([...linesBehind(sheet, used), `${name} = ${text}`].join('\n'));
  const cell = trial.cell(name);
  if (!cell || cell.fault) return { fault: cell?.fault?.text ?? `${what} cannot be read.`, isOther: false };
  const { type, value } = cell.reading ?? {};
  if (type === undefined || typeof type === 'string' || typeof value !== 'number')
    return { fault: `${what} is ${dimensionName(kind)}; ${text.trim()} is none.`, isOther: true };
  if (!sameKind(type, kind))
    return { fault: `${what} is ${dimensionName(kind)}; ${text.trim()} is ${dimensionName(type)}.`, isOther: true };
  return { value };
}
