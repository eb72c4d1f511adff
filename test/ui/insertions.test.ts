// What Insert writes computes as it stands, whatever the sheet has.

import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { INSERTIONS, insertionLines } from '../../src/ui/rows/index.ts';

const example = readFileSync('public/examples/crevasse-listener.txt', 'utf8');
const part = (kind: string): string =>
  insertionLines({ type: 'part', kind: kind as 'n-JFET' }, createSheet('')).join('\n') + '\n';

const SHEETS: Readonly<Record<string, string>> = {
  'an empty sheet': '',
  'the example': example,
  'a sheet with an n-JFET': part('n-JFET'),
  'a sheet with a p-JFET and a supply': `V_DD = 12 V\n${part('p-JFET')}`,
  'a sheet with an n-MOSFET': part('n-MOSFET'),
  'a sheet with a p-MOSFET': part('p-MOSFET'),
};

describe.each(Object.entries(SHEETS))('in %s', (_name, text) => {
  test.each(INSERTIONS.map((choice) => [choice.title, choice.insertion] as const))(
    '%s computes',
    (_title, insertion) => {
      const before = createSheet(text);
      const known = new Set(before.cells().map((cell) => cell.name));
      const sheet = createSheet(`${text}\n${insertionLines(insertion, before).join('\n')}\n`);
      const fresh = sheet.cells().filter((cell) => !known.has(cell.name));
      expect(fresh.length).toBeGreaterThan(0);
      expect(sheet.loose()).toEqual([]);
      expect(fresh.map((cell) => cell.fault?.text ?? null)).toEqual(fresh.map(() => null));
      for (const stage of fresh.filter((cell) => cell.kind === 'stage')) {
        const region = sheet.value(`${stage.name}.region`);
        const isSwitch = insertion.type === 'stage' && insertion.shape === 'switch';
        expect(region).toBe(isSwitch ? 'ohmic' : 'saturation');
      }
    },
  );
});
