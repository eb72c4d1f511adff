// What the dialog for divider pairs reads of its entries.

import { createRoot } from 'solid-js';
import { expect, test } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { createDivider } from '../../src/ui/shell/divider-state.ts';

/** The state with these entries: the voltage divided, the tap, both in parallel. */
function withEntries(
  text: string,
  entries: readonly string[],
  look: (state: ReturnType<typeof createDivider>) => void,
) {
  createRoot((dispose) => {
    const state = createDivider(createSheet(text));
    entries.forEach((entry, k) => state.fields[k]![3](entry));
    look(state);
    dispose();
  });
}

test('entries may be cells of the sheet and formulas over them', () => {
  const text = 'V_DD = 12 V ± 5 %\nR_1 = 1 kohm\nV_G = V_DD / 4';
  withEntries(text, ['V_DD', 'V_G', '75 * R_1'], (state) => {
    expect(state.fault()).toBeNull();
    expect(state.pairs()[0]).toMatchObject({ upper: 300e3, lower: 100e3, ratioError: 0, parallelError: 0 });
    const sheet = createSheet(`${text}\n${state.lines().join('\n')}\nV_tap = V_DD * R_3 / (R_2 + R_3)`);
    expect(sheet.value('V_tap')).toBe(3);
  });
});

test.each([
  [['15 V', '5 mA', '10 kohm'], '5 mA is of another kind. Write the voltage at the tap, such as 3 V.'],
  [['15 V', 'V_X', '10 kohm'], 'V_X cannot be read: There is no cell V_X.'],
  [['15 V', '15 V', '10 kohm'], 'The tap lies between 0 V and the voltage that is divided.'],
  [['', '', ''], 'Write the voltage that is divided, such as 15 V.'],
])('%j is answered: %s', (entries, said) => {
  withEntries('', entries, (state) => expect(state.fault()).toBe(said));
});
