// Where a click on the verdict leads.

import { expect, it } from 'vitest';
import { verdictOf } from '../../src/record/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { verdictTarget } from '../../src/ui/verdict/verdict-target.ts';

it.each([
  ['a broken cell before a failing check', 'ok = check 1 V >= 2 V\nV_1 = 3 X\n', { cell: 'V_1' }],
  ['the first failing check', 'a = check 2 V >= 1 V\nb = check 1 V >= 2 V\nc = check 0 V >= 2 V\n', { cell: 'b' }],
  ['the first check where all hold', 'V_1 = 3 V\na = check V_1 >= 1 V\nb = check V_1 >= 2 V\n', { cell: 'a' }],
  ['a broken line without a name', 'V_0 = 1 V\n?? what\nV_1 = 3 X\n', { line: 1 }],
  ['nowhere where nothing is required', 'V_1 = 3 V\n', null],
])('leads to %s', (_, text, target) => {
  const sheet = createSheet(text);
  expect(verdictTarget(verdictOf(sheet), sheet.cells())).toEqual(target);
});
