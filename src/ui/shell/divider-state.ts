// The state of the dialog for divider pairs: what is wanted, the pairs that come near it, and the lines of the chosen one.

import { createMemo, createSignal } from 'solid-js';
import { dividerPairs, plainText, RESISTANCE, SERIES_NAMES, VOLTAGE } from '../../quantity/index.ts';
import type { DividerPair, SeriesName, ValueKind } from '../../quantity/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import { readEntered } from '../design/index.ts';
import { freeName } from '../rows/index.ts';

/** Tolerances that go with the series. Source: IEC 60063:2015. */
const TOLERANCES: Readonly<Record<SeriesName, string>> = {
  E3: '50 %',
  E6: '20 %',
  E12: '10 %',
  E24: '5 %',
  E48: '2 %',
  E96: '1 %',
  E192: '0.5 %',
};
/** Pairs that are shown. */
const SHOWN = 8;

/** Creates the state. */
export function createDivider(sheet: SheetView) {
  const [top, setTop] = createSignal('');
  const [tap, setTap] = createSignal('');
  const [parallel, setParallel] = createSignal('');
  const [series, setSeriesName] = createSignal<SeriesName>('E24');
  const [tolerance, setTolerance] = createSignal(TOLERANCES.E24);
  const [chosen, choose] = createSignal(0);
  const wanted = createMemo(() => {
    const [whole, part, both] = [
      amount(sheet, top(), VOLTAGE, 'the voltage that is divided, such as 15 V'),
      amount(sheet, tap(), VOLTAGE, 'the voltage at the tap, such as 3 V'),
      amount(sheet, parallel(), RESISTANCE, 'both in parallel, such as 100 kohm'),
    ];
    for (const each of [whole, part, both]) if (typeof each === 'string') return each;
    const ratio = (part as number) / (whole as number);
    if (!(ratio > 0 && ratio < 1)) return 'The tap lies between 0 V and the voltage that is divided.';
    if (!((both as number) > 0)) return 'Both in parallel are more than 0 ohm.';
    return { ratio, parallel: both as number };
  });
  const pairs = createMemo((): readonly DividerPair[] => {
    const asked = wanted();
    return typeof asked === 'string' ? [] : dividerPairs({ ...asked, series: series() }, SHOWN);
  });
  const spread = createMemo(() => {
    const text = tolerance().trim();
    return text === '' || /^\d+(\.\d+)? ?(%|ppm)$/.test(text) ? text : null;
  });
  return {
    fields: [
      ['Voltage that is divided', '15 V', top, setTop],
      ['Voltage at the tap', '3 V', tap, setTap],
      ['Both in parallel', '100 kohm', parallel, setParallel],
      ['Tolerance', '1 %', tolerance, setTolerance],
    ] as const,
    series,
    setSeries(name: SeriesName): void {
      setSeriesName(name);
      setTolerance(TOLERANCES[name]);
      choose(0);
    },
    names: SERIES_NAMES,
    pairs,
    chosen: () => Math.min(chosen(), pairs().length - 1),
    choose,
    voltageAt: ({ ratio }: DividerPair): number => ratio * (amount(sheet, top(), VOLTAGE, '') as number),
    lines(): string[] {
      const pair = pairs()[Math.min(chosen(), pairs().length - 1)];
      if (!pair) return [];
      const first = freeName(sheet, 'R_');
      const second = freeName(sheet, 'R_', new Set([first]));
      const rest = `${spread() ? ` ± ${spread()}` : ''}  [chosen, ${series()}]`;
      return [
        `${first} = ${plainText(pair.upper, RESISTANCE)}${rest}  ; divider, from ${top().trim()} to the tap at ${tap().trim()}`,
        `${second} = ${plainText(pair.lower, RESISTANCE)}${rest}  ; divider, from the tap down`,
      ];
    },
    /** Why no pair can be put in, as a sentence; null where one can. */
    fault(): string | null {
      const asked = wanted();
      if (typeof asked === 'string') return asked;
      return spread() === null
        ? `${tolerance().trim()} is no tolerance. Write one such as 1 %, or leave it empty.`
        : null;
    },
  };
}

/** A typed amount in SI, formulas over the sheet's cells included, or the sentence that says what to type. */
function amount(sheet: SheetView, text: string, kind: ValueKind, what: string): number | string {
  if (text.trim() === '') return `Write ${what}.`;
  const read = readEntered(sheet, text, kind, 'What is wanted here');
  if ('value' in read) return read.value;
  return read.isOther
    ? `${text.trim()} is of another kind. Write ${what}.`
    : `${text.trim()} cannot be read: ${read.fault}`;
}
