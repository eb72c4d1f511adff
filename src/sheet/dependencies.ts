// Which cells a cell reads, by name, from its syntax alone.

import { pathsOf } from '../language/index.ts';
import type { CellTree, Expr, FieldTree } from '../language/index.ts';

/** The names that occur in a cell where another cell may stand, in order of appearance; T_A for stages and points. */
export function namesUsed(cell: CellTree, treeOf: (name: string) => CellTree | null): string[] {
  const names = new Set<string>();
  collect(cell, names, treeOf);
  return [...names];
}

function collect(cell: CellTree, names: Set<string>, treeOf: (name: string) => CellTree | null): void {
  const fromExpr = (expr: Expr | null): void => {
    if (expr) for (const path of pathsOf(expr)) names.add(path.names[0]!.name);
  };
  const { entry } = cell;
  switch (entry.type) {
    case 'quantity':
      fromExpr(entry.value);
      break;
    case 'part':
      if (entry.fittedTo) names.add(entry.fittedTo.name);
      break;
    case 'another': {
      // What its first piece reads it reads, too.
      const first = names.has(entry.of.name) ? null : treeOf(entry.of.name);
      names.add(entry.of.name);
      if (first) collect(first, names, treeOf);
      break;
    }
    case 'point':
      names.add(entry.of.name).add('T_A');
      break;
    case 'stage':
      for (const { part } of entry.fets) names.add(part.name);
      names.add('T_A');
      break;
    case 'check':
      fromExpr(entry.condition);
      break;
    case 'plot':
      if (entry.of) names.add(entry.of.name);
      entry.values.forEach(fromExpr);
      fromExpr(entry.against);
      if (entry.over) [entry.over.low, entry.over.high].forEach(fromExpr);
      break;
    case 'inverse':
      [entry.input, entry.target, entry.value, entry.over.low, entry.over.high].forEach(fromExpr);
      break;
  }
  for (const field of cell.fields) fieldNames(field, fromExpr);
}

function fieldNames(field: FieldTree, fromExpr: (expr: Expr | null) => void): void {
  const { body } = field;
  switch (body.type) {
    case 'quantity':
      fromExpr(body.value);
      break;
    case 'legs':
      for (const leg of body.legs) {
        fromExpr(leg.element);
        if (leg.place.type === 'expr') fromExpr(leg.place.expr);
      }
      break;
    case 'driven':
      fromExpr(body.through);
      break;
    case 'midband':
      fromExpr(body.frequency);
      break;
  }
}
