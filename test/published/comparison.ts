// The published cases as data, and how a quantity of a case is compared with the sheet that computes it.

import { readFileSync, readdirSync } from 'node:fs';

/** One expected quantity of a case. */
export interface PublishedQuantity {
  /** As it stands in the source. */
  readonly printed: string;
  readonly unit: string;
  /** Worked out again with the source's own model, unrounded to seven digits; a region is a word. */
  readonly recomputed: number | string;
  /** The printed figure in `unit`, where it agrees with `recomputed` to its own rounding, and half of its last digit. */
  readonly value?: number;
  readonly halfDigit?: number;
  /** Said where no number is published. */
  readonly origin?: string;
}

/** One worked example of a published source. */
export interface PublishedCase {
  readonly id: string;
  readonly source: string;
  readonly url?: string;
  /** How much of the source was seen. */
  readonly seen: string;
  readonly topic: string;
  readonly given: Readonly<Record<string, string>>;
  /** In our words; it fits the numbers. */
  readonly circuit: string;
  readonly expect: Readonly<Record<string, PublishedQuantity>>;
  readonly verdict: string;
  readonly note?: string;
}

/** What a quantity waits for until the sheet can compute it. */
export type Waiting = 'several FETs' | 'frequency' | 'noise';

/** Where the quantities of a case stand in its sheet. */
export interface Comparison {
  /** Name of the quantity to a path of the sheet; a leading `-` turns the sign (V_SD is -V_DS, a printed gain a magnitude). */
  readonly quantities: Readonly<Record<string, string>>;
  /** Quantities that the sheet states but cannot compute yet. */
  readonly waits?: Readonly<Record<string, Waiting>>;
  /** Values of our own that belong to the example: the designed stage gives back what was asked, a side the source leaves out. */
  readonly own?: readonly {
    readonly path: string;
    readonly value: number | string | boolean;
    readonly unit: string;
    readonly because: string;
  }[];
}

/** Limits and typical values of one row of a data sheet; null where it prints none. */
export interface PublishedRow {
  /** Smaller magnitude. */
  readonly min: number | null;
  readonly typ: number | null;
  /** Larger magnitude. */
  readonly max: number | null;
  readonly origin: string;
}

/** One JEDEC-numbered part. */
export interface PublishedPart {
  readonly part: string;
  readonly polarity: 'n' | 'p';
  readonly source?: string;
  readonly url?: string;
  readonly how_found: string;
  readonly note?: string;
  readonly data: Readonly<Record<string, PublishedRow>>;
}

const HERE = new URL('.', import.meta.url);

/** The cases of cases/<name>.json. */
export function publishedCases(name: 'jfet' | 'mosfet'): readonly PublishedCase[] {
  return JSON.parse(text(`cases/${name}.json`)) as PublishedCase[];
}

/** The parts of cases/parts.json and the unit of each of their rows. */
export function publishedParts(): {
  readonly units: Readonly<Record<string, string>>;
  readonly parts: readonly PublishedPart[];
} {
  return JSON.parse(text('cases/parts.json')) as ReturnType<typeof publishedParts>;
}

/** The text of sheets/<name>.txt. */
export function sheetText(name: string): string {
  return text(`sheets/${name}.txt`);
}

/** The names of the sheets in a folder of sheets/, sorted; '' for the cases, 'parts' for the parts. */
export function sheetNames(folder: '' | 'parts'): string[] {
  return readdirSync(new URL(`sheets/${folder}`, HERE))
    .filter((name) => name.endsWith('.txt'))
    .map((name) => name.slice(0, -'.txt'.length))
    .toSorted();
}

function text(path: string): string {
  return readFileSync(new URL(path, HERE), 'utf8');
}
