// How many builds are counted and what is asked of them, as the title of a sheet says.

import type { SheetTree } from '../language/index.ts';
import { titleField } from './title-fields.ts';

export interface Sampling {
  /** Builds. */
  readonly samples: number;
  readonly seed: number;
  /** The share of builds that is enough; null where a check must hold at every extreme. */
  readonly leastYield: number | null;
}

const SAMPLES = { usual: 10_000, most: 10_000_000 };
const SEED = { usual: 1, most: 2 ** 32 - 1 };

/** What the title asks for, and a sentence for each field that cannot be read. */
export function samplingOf(tree: SheetTree): Sampling & { readonly faults: readonly string[] } {
  const faults: string[] = [];
  const read = <T extends number | null>(
    label: string,
    parse: (text: string) => T | null,
    usual: T,
    wanted: string,
  ): T => {
    const text = titleField(tree, label);
    if (text === null) return usual;
    const found = parse(text);
    if (found === null) faults.push(`${label}: ${text} cannot be read; write ${wanted}. ${usualText(usual)}`);
    return found ?? usual;
  };
  return {
    samples: read('samples', parseSamples, SAMPLES.usual, 'a whole number from 1 to 10 000 000'),
    seed: read('seed', parseSeed, SEED.usual, 'a whole number from 0 to 4 294 967 295'),
    leastYield: read<number | null>('yield', parseShare, null, 'a share such as 95 % or 0.95'),
    faults,
  };
}

function usualText(usual: number | null): string {
  return usual === null ? 'Checks are held at every extreme.' : `${usual} is taken.`;
}

/** A number of builds; null where the text is none. */
export function parseSamples(text: string): number | null {
  return wholeNumber(text, 1, SAMPLES.most);
}

/** A seed; null where the text is none. */
export function parseSeed(text: string): number | null {
  return wholeNumber(text, 0, SEED.most);
}

/** A share in 0..1 from `95 %` or `0.95`; null where the text is none. */
export function parseShare(text: string): number | null {
  const found = /^(\d+(?:\.\d+)?|\.\d+)\s*(%?)$/.exec(text.trim());
  if (!found) return null;
  const share = Number(found[1]) / (found[2] === '%' ? 100 : 1);
  return share <= 1 ? share : null;
}

function wholeNumber(text: string, least: number, most: number): number | null {
  const digits = text.trim().replace(/[\s\u2009_]/g, '');
  if (!/^\d+$/.test(digits)) return null;
  const value = Number(digits);
  return value >= least && value <= most ? value : null;
}
