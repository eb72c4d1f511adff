// The one place where the tables meet the engine.

import { createSheet } from '../../src/sheet/index.ts';

/** A computed sheet as the comparisons read it. */
export interface ComputedSheet {
  /** SI value of a path, a region's word, whether a check holds, or null where there is none; `-A1.V_DS` turns the sign. */
  value(path: string): number | string | boolean | null;
  /** Every fault of the sheet as `NAME: text`. */
  faults(): string[];
  /** Declared ends of a cell or of a field of a part (`Q1.I_DSS`), in SI, or null without spread. */
  spread(path: string): { low: number | null; nominal: number; high: number | null; nominalChosen: boolean } | null;
}

/** Computes a sheet's text. */
export function readSheet(text: string): ComputedSheet {
  const sheet = createSheet(text);
  return {
    value(path) {
      const turned = path.startsWith('-');
      const value = sheet.value(turned ? path.slice(1) : path);
      return turned && typeof value === 'number' ? -value : value;
    },
    faults: () => [
      ...sheet.loose().map((fault) => `line ${fault.line + 1}: ${fault.text}`),
      ...sheet.cells().flatMap((cell) => (cell.fault ? [`${cell.name}: ${cell.fault.text}`] : [])),
    ],
    spread(path) {
      const [name, field] = path.split('.') as [string, string | undefined];
      const cell = sheet.cell(name);
      return field === undefined
        ? (cell?.spread ?? null)
        : (cell?.fields.find((candidate) => candidate.name === field)?.spread ?? null);
    },
  };
}
