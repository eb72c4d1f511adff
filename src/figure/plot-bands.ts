// The bands of a plot `VALUE, .. against INPUT`: how far each value reaches over the declared set at places of the input.

import type { SheetView } from '../sheet/index.ts';
import { bandsOver } from '../spread/index.ts';
import type { Band, SheetSpread } from '../spread/index.ts';

/** Bands by the label of their series. */
export type PlotBands = ReadonlyMap<string, Band & { readonly x: Float64Array }>;

/** What a search for the bands of a plot has to know. */
interface WantedBands {
  /** The slot of the input, and its values, SI. */
  readonly input: number;
  readonly places: Float64Array;
  readonly labels: readonly string[];
  /** The slots of the values, in the order of their labels. */
  readonly slots: readonly number[];
}

/** Places at which a band is searched: a fifth of the steps of a curve. */
const PLACES = 33;

/** What to search for a plot cell; null where nothing in it spreads, and for figures of another kind. */
export function wantedBands(sheet: SheetView, name: string, spread: SheetSpread): WantedBands | null {
  const { entry } = sheet.cell(name)?.tree ?? {};
  if (entry?.type !== 'plot' || entry.figure !== 'against') return null;
  const labels = entry.values.flatMap((value) =>
    value.type === 'path' ? [value.names.map((part) => part.name).join('.')] : [],
  );
  const found = labels.flatMap((label) => {
    const value = spread.model.values.find(({ path }) => path === label);
    const isNumber = value !== undefined && typeof value.type !== 'string' && !value.isAnswer;
    return isNumber && spread.value(label)?.moves ? [{ label, slot: value.slot }] : [];
  });
  const sweep = found.length === 0 ? null : sheet.sweep(name, PLACES);
  if (sweep === null) return null;
  const { slot, values } = sweep.input;
  return {
    input: slot,
    places: values,
    labels: found.map(({ label }) => label),
    slots: found.map((each) => each.slot),
  };
}

/** The bands that were found. */
export function plotBands({ labels, places }: WantedBands, bands: readonly Band[]): PlotBands {
  return new Map(labels.map((label, k) => [label, { ...bands[k]!, x: places }]));
}

/** The bands of a plot cell, searched at once. */
export function searchBands(sheet: SheetView, name: string, spread: SheetSpread): PlotBands | null {
  const wanted = wantedBands(sheet, name, spread);
  return wanted && plotBands(wanted, bandsOver(spread.model, wanted.input, wanted.places, wanted.slots));
}
