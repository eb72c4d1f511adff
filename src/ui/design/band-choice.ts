// The state of the dialog for a band: its entries, the three ways to bias that follow from them, and the lines of one.

import { createEffect, createMemo, createSignal, on, onCleanup } from 'solid-js';
import type { Chart } from '../../figure/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import { createRested } from '../pace/index.ts';
import { biasForms } from './band-forms.ts';
import type { BiasForm, FormName } from './band-forms.ts';
import { bandLines } from './band-lines.ts';
import { reachedBand } from './band-reached.ts';
import { firstEntries, partNames, readWish } from './band-wish.ts';
import type { BandEntries, BandWish } from './band-wish.ts';
import { formRow } from './band-words.ts';
import type { FormRow } from './band-words.ts';

/** One way to bias with what it comes to. */
interface FoundForm {
  readonly row: FormRow;
  readonly transfer: Chart | null;
  /** What would be written; none where the form has no bias. */
  readonly lines: readonly string[];
}

/** Entries are followed once typing rests, in ms. */
const REST = 300;

/** Creates the state. */
export function createBandChoice(sheet: SheetView) {
  const [entries, setEntries] = createSignal<BandEntries>(firstEntries(sheet));
  const [picked, setPicked] = createSignal<FormName | null>(null);
  const [found, setFound] = createSignal<readonly FoundForm[] | string | null>(null);
  const wish = createMemo(() => readWish(sheet, entries()));
  const rested = createRested(wish, { rest: REST });
  let timer: ReturnType<typeof setTimeout> | undefined;
  // What is found is looked for behind the frame that shows the entry.
  createEffect(
    on(rested, (present) => {
      clearTimeout(timer);
      if (typeof present === 'string') setFound(null);
      else timer = setTimeout(() => setFound(lookFor(present)));
    }),
  );
  onCleanup(() => clearTimeout(timer));
  const forms = (): readonly FoundForm[] => {
    const present = found();
    return present === null || typeof present === 'string' ? [] : present;
  };
  /** The one picked, else the simplest that holds, else the simplest that can be written. */
  const chosen = createMemo<FoundForm | null>(() => {
    const all = forms();
    const asked = all.find(({ row, lines }) => row.form === picked() && lines.length > 0);
    return asked ?? all.find(({ row }) => row.verdict === 'holds') ?? all.find(({ lines }) => lines.length > 0) ?? null;
  });
  const isStale = (): boolean => rested() !== wish();
  return {
    entries,
    set<Name extends keyof BandEntries>(name: Name, value: BandEntries[Name]): void {
      setEntries((present) => ({ ...present, [name]: value }));
    },
    parts: partNames(sheet),
    forms,
    chosen,
    pick: setPicked,
    /** Whether what is shown is that of earlier entries. */
    isStale,
    /** Why nothing can be put in, as a sentence; null where a form can. */
    fault(): string | null {
      const [present, result] = [wish(), found()];
      if (typeof present === 'string') return present;
      if (typeof result === 'string') return result;
      if (result === null || isStale()) return 'Looking for the bias.';
      return chosen() === null ? 'No way to bias holds any part of this band.' : null;
    },
  };
}

export type BandChoice = ReturnType<typeof createBandChoice>;

/** The three forms with what they come to; a sentence where the part has no points for such a band. */
export function lookFor(wish: BandWish): readonly FoundForm[] | string {
  const forms = biasForms(wish);
  return typeof forms === 'string' ? forms : forms.map((form) => foundForm(wish, form));
}

function foundForm(wish: BandWish, form: BiasForm): FoundForm {
  const reached = form.bias === null ? null : reachedBand(wish, form);
  return {
    row: formRow(wish, form, reached),
    transfer: reached === null || typeof reached === 'string' ? null : reached.transfer,
    lines: form.bias === null ? [] : bandLines(wish, form).lines,
  };
}
