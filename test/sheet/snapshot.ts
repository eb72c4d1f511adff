// Everything that can be read of a sheet, as text in which two readings are equal where every bit of them is.

import type { Sheet } from '../../src/sheet/index.ts';

/** One text per cell, by key: name, or `name (2)` of a second one. Where it stands and its workings are left out on request. */
export function snapshot(sheet: Sheet, { places = true, workings = true } = {}): Map<string, string> {
  const times = new Map<string, number>();
  return new Map(
    sheet.cells().map((cell) => {
      const nth = (times.get(cell.name) ?? 0) + 1;
      times.set(cell.name, nth);
      const { tree: _, ...rest } = cell;
      const isFirst = nth === 1;
      const steps = isFirst && workings ? sheet.workings(cell.name) : [];
      return [isFirst ? cell.name : `${cell.name} (${nth})`, exactText({ ...rest, steps }, places)];
    }),
  );
}

/** JSON that tells -0, NaN and the infinities apart and keeps every digit. */
export function exactText(thing: unknown, places = true): string {
  return JSON.stringify(thing, (key, value: unknown) => {
    if (!places && (key === 'line' || key === 'span')) return undefined;
    if (typeof value !== 'number') return value;
    return Object.is(value, -0) ? '-0' : String(value);
  });
}
