// Which kind of value is wanted at a place of an entry: what the operand before the sign is, or what the field or
// cell itself is where nothing stands before.

import { literalOf, parseExpression } from '../../language/index.ts';
import type { SheetView, ValueType } from '../../sheet/index.ts';
import { PART_FIELDS } from '../../sheet/index.ts';
import type { ValueKind } from '../../quantity/index.ts';
import type { EditPlace } from './row-edits.ts';

/** Signs whose two sides are of one kind, and the operand in front of one at the end of a text. */
const BEFORE_SIGN =
  /([A-Za-zͰ-Ͽ_][\w.Ͱ-Ͽ]*|[\d.]+(?:[eE][-+]?\d+)?(?:\s*[^\s\d()[\],+*]+)?)\s*\)?\s*(?:[-+−,]|\|\||>=|<=|[<>=≤≥±]|\bwithin\b|\bin\b|\.\.)\s*$/u;

/** The kind that `before`, the text up to the token being typed, leads to; null where anything may stand. */
export function expectedKind(before: string, place: EditPlace, sheet: SheetView): ValueKind | null {
  const operand = BEFORE_SIGN.exec(before)?.[1];
  if (operand !== undefined) return kindOf(operand, sheet);
  return before.trim() === '' ? ownKind(place, sheet) : null;
}

/** The kind of a name, a path or a number. */
function kindOf(operand: string, sheet: SheetView): ValueKind | null {
  if (/^\d/.test(operand)) {
    const expr = parseExpression(operand);
    return 'code' in expr ? null : (literalOf(expr)?.kind ?? null);
  }
  const [name, ...rest] = operand.split('.');
  const cell = sheet.cell(name!);
  const reading = rest.length === 0 ? cell?.reading : cell?.values.find((value) => value.name === rest.join('.'));
  return reading ? quantityKind(reading.type) : null;
}

function ownKind({ row }: EditPlace, sheet: SheetView): ValueKind | null {
  const cell = row.cell === null ? null : sheet.cell(row.cell);
  if (row.type === 'field') return cell?.kind === 'part' ? (PART_FIELDS[row.name?.text ?? '']?.kind ?? null) : null;
  return cell?.reading ? quantityKind(cell.reading.type) : null;
}

function quantityKind(type: ValueType): ValueKind | null {
  return typeof type === 'string' ? null : type;
}
