// Rows of data sheets: how each print becomes a row of a part, and the published rows typed as printed.

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { dataSheetLine } from '../../src/language/index.ts';
import type { DataSheetRow } from '../../src/language/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { PART_SHEETS } from '../published/part-sheets.ts';

const row = (changes: Partial<DataSheetRow>): DataSheetRow => ({
  field: 'I_DSS',
  condition: '',
  min: '',
  typ: '',
  max: '',
  unit: 'mA',
  ...changes,
});

describe('a row', () => {
  it.each<[Partial<DataSheetRow>, string | null]>([
    [{}, null],
    [{ min: '-', max: '–' }, null],
    [{ min: '1', typ: '3', max: '5' }, 'I_DSS: 3 mA in 1 mA .. 5 mA'],
    [{ min: '1', max: '5' }, 'I_DSS: 1 mA .. 5 mA'],
    [{ min: '1' }, 'I_DSS: 1 mA ..'],
    [{ max: '5' }, 'I_DSS: .. 5 mA'],
    [{ typ: '3' }, 'I_DSS: 3 mA'],
    [{ typ: '3', max: '5' }, 'I_DSS: 3 mA in .. 5 mA'],
    [{ typ: '2,5' }, 'I_DSS: 2.5 mA'],
    [{ typ: '.5' }, 'I_DSS: 0.5 mA'],
    [{ field: 'V_GSoff', unit: 'V', min: '−0.5', max: '−6' }, 'V_GSoff: -0.5 V .. -6 V'],
    [{ typ: '3', condition: 'VDS=15V' }, 'I_DSS: 3 mA at V_DS = 15 V'],
    [{ typ: '3', condition: 'V_DS = 15 V; ID=10nA' }, 'I_DSS: 3 mA at V_DS = 15 V, I_D = 10 nA'],
    [{ typ: '3', unit: '' }, 'I_DSS: 3'],
  ])('%j is %s', (typed, line) => {
    expect(dataSheetLine(row(typed), 'n')).toBe(line);
  });

  it('of a p-channel part has its currents positive, however they are printed', () => {
    expect(dataSheetLine(row({ min: '-1', max: '-5', condition: 'VDS = -15 V, ID = -1 mA' }), 'p')).toBe(
      'I_DSS: 1 mA .. 5 mA at V_DS = -15 V, I_D = 1 mA',
    );
  });

  it.each<[Partial<DataSheetRow>, object]>([
    [{ min: 'abc' }, { place: 'min', text: 'abc is no number. Write one such as 2.5 or -0.5e-3.' }],
    [
      { min: '5', max: '1' },
      { place: 'max', text: 'The max of I_DSS, 1, is below its min, 5. Exchange them.' },
    ],
    [
      { typ: '3', condition: 'warm' },
      {
        place: 'condition',
        text: 'warm is no condition that a row can have. Conditions are V_DS, V_GS, V_DG, I_D, f, T_A and T_J, such as V_DS = 15 V.',
      },
    ],
  ])('%j is refused with what is wrong', (typed, fault) => {
    expect(dataSheetLine(row(typed), 'n')).toEqual(fault);
  });
});

interface Published {
  readonly units: Readonly<Record<string, string>>;
  readonly parts: readonly {
    readonly part: string;
    readonly polarity: 'n' | 'p';
    readonly data: Readonly<Record<string, { min: number | null; typ: number | null; max: number | null }>>;
  }[];
}
// Source: the data sheets named in the collection, as it says beside each part.
const { units, parts } = JSON.parse(readFileSync('test/published/cases/parts.json', 'utf8')) as Published;

/** Rows that are no rows of a part here, and why. */
const OUTSIDE: Readonly<Record<string, string>> = {
  PD: 'a power at a temperature: R_thJA and T_Jmax say it',
  derate: 'its reciprocal is R_thJA',
  VGSoff: 'of the parts that have a second one, at a test current',
  en: 'e_n wants its frequency beside it, and a second row at another',
};

describe.each(parts)('the published rows of $part', ({ part, polarity, data }) => {
  const { rows, sheet } = PART_SHEETS.find((each) => each.part === part)!;
  const own = readFileSync(`test/published/sheets/parts/${sheet}.txt`, 'utf8');

  it('are typed as printed, or it is said why not', () => {
    const lines: string[] = [];
    const unwritten: string[] = [];
    for (const [key, printed] of Object.entries(data)) {
      const field = rows[key]?.startsWith('Q1.') ? rows[key].slice(3) : null;
      if (field === null) {
        unwritten.push(key);
        continue;
      }
      // Their test conditions stand in the part's own sheet.
      const condition = new RegExp(`^  ${field}: .*? at (.*?)\\s*(?:\\[|$)`, 'm').exec(own)?.[1] ?? '';
      const text = (value: number | null): string => (value === null ? '' : String(value));
      const { min, typ, max } = printed;
      const typed = {
        field,
        condition,
        min: text(min),
        typ: text(typ),
        max: text(max),
        unit: units[key] ?? unitOf(key),
      };
      const line = dataSheetLine(typed, polarity);
      expect(typeof line, `${key}: ${JSON.stringify(line)}`).toBe('string');
      lines.push(line as string);
    }
    expect(unwritten.filter((key) => !(key in OUTSIDE))).toEqual([]);
    const computed = createSheet(`Q1 = ${polarity}-JFET\n${lines.map((line) => `  ${line}`).join('\n')}\n`);
    expect(computed.loose()).toEqual([]);
    const cell = computed.cell('Q1')!;
    // What is one part's rows in print computes as that part's own sheet does.
    const reference = createSheet(own).cell('Q1')!;
    const [fault, known] = [cell.fault?.text ?? null, reference.fault?.text ?? null];
    expect(fault).toBe(known);
    for (const field of cell.fields) {
      const wanted = reference.fields.find(({ name }) => name === field.name);
      if (!wanted?.isInput) continue;
      expect([field.spread?.low, field.value, field.spread?.high], field.name).toEqual([
        wanted.spread?.low,
        wanted.value,
        wanted.spread?.high,
      ]);
    }
  });
});

/** Capacitances and voltages that the collection lists under names of their own. */
function unitOf(key: string): string {
  return key.startsWith('C') ? 'pF' : 'V';
}
