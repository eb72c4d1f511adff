// What a bench has found, in tables of plain texts: the page, the record and the terminal show the same ones.

import type { BenchReading } from '../sheet/index.ts';
import { fittingTables, matchingTable } from './bench-choices.ts';
import { fitsTable, readingsTable } from './bench-fits.ts';
import type { BenchTable } from './bench-table.ts';

/** The tables of a bench, as far as it asks for them. */
export function benchTables(bench: BenchReading): readonly BenchTable[] {
  return [
    fitsTable(bench),
    readingsTable(bench),
    ...(bench.match ? [matchingTable(bench, bench.match)] : []),
    ...(bench.fitting ? fittingTables(bench, bench.fitting) : []),
  ];
}
