// What a sheet has to build on: free names, its parts, a supply.

import { dimensionName, RESISTANCE, sameKind } from '../../quantity/index.ts';
import type { CellReading, SheetView } from '../../sheet/index.ts';

/** A part with the constants of its square law, in the frame of an n-channel FET. */
export interface StockPart {
  readonly name: string;
  readonly channel: 'n' | 'p';
  readonly family: 'JFET' | 'MOSFET';
  /** A/V². */
  readonly beta: number;
  /** V; negative for depletion. */
  readonly threshold: number;
}

/** The first name of a kind that no cell bears: `R_1`, `Q2`. */
export function freeName(sheet: SheetView, stem: string, taken: ReadonlySet<string> = new Set()): string {
  const names = new Set([...sheet.tree.cells.map((cell) => cell.name.name), ...taken]);
  let k = 1;
  while (names.has(`${stem}${k}`)) k++;
  return `${stem}${k}`;
}

/** The first part that computes; null where there is none. */
export function partOf(sheet: SheetView): StockPart | null {
  for (const cell of sheet.cells()) {
    const { entry } = cell.tree;
    if (entry.type !== 'part' || cell.fault !== null || cell.waitsFor !== null) continue;
    const value = (name: string): number | null => numberOf(cell, name);
    const beta = value('beta') ?? value('K');
    const threshold = value('V_TO');
    if (beta === null || threshold === null) continue;
    const mirrored = entry.channel === 'p' && entry.family === 'MOSFET';
    return {
      name: cell.name,
      channel: entry.channel,
      family: entry.family,
      beta,
      threshold: mirrored ? -threshold : threshold,
    };
  }
  return null;
}

/** The margin of the first stage that computes, as a path; null where there is none. */
export function firstStage(sheet: SheetView): string | null {
  const stage = sheet.cells().find((cell) => cell.kind === 'stage' && cell.fault === null && cell.waitsFor === null);
  return stage ? `${stage.name}.margin` : null;
}

/** The first resistor of its own name between the source of a stage's FET and anything else, and the current it carries; null where there is none. */
export function sourceResistor(
  sheet: SheetView,
): { readonly stage: string; readonly resistor: string; readonly ohms: number; readonly current: number } | null {
  for (const stage of sheet.cells()) {
    const current = stage.kind === 'stage' && stage.fault === null ? numberOf(stage, 'I_D') : null;
    const line = stage.tree.fields.find(({ label }) => label.length === 1 && label[0]!.name === 'source');
    if (current === null || !(current > 0) || line?.body.type !== 'legs') continue;
    for (const { element } of line.body.legs) {
      const cell = element?.type === 'path' && element.names.length === 1 ? sheet.cell(element.names[0]!.name) : null;
      const { reading, isInput } = cell ?? {};
      if (!isInput || !reading || typeof reading.type === 'string' || typeof reading.value !== 'number') continue;
      if (!sameKind(reading.type, RESISTANCE)) continue;
      return { stage: stage.name, resistor: cell!.name, ohms: reading.value, current };
    }
  }
  return null;
}

/** A supply: an input in volts of a few volts at least, those called V_DD and the like first; null where there is none. */
export function supplyOf(sheet: SheetView): { readonly name: string; readonly volts: number } | null {
  const found = sheet.cells().flatMap((cell) => {
    const { reading, isInput } = cell;
    if (!isInput || !reading || typeof reading.type === 'string' || typeof reading.value !== 'number') return [];
    if (dimensionName(reading.type) !== 'a voltage' || reading.value < LEAST_SUPPLY) return [];
    return [{ name: cell.name, volts: reading.value }];
  });
  return found.find(({ name }) => /^V_(?:DD|CC|S|\+)$/.test(name)) ?? found[0] ?? null;
}

const LEAST_SUPPLY = 3;

function numberOf(cell: CellReading, name: string): number | null {
  const value = cell.values.find((each) => each.name === name)?.value;
  return typeof value === 'number' && Number.isFinite(value) ? value : null;
}
