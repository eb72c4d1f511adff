import { expect, test } from 'vitest';
import { typeset } from '../../src/figure/labels.ts';

test('a name that every object has is set like any other', () => {
  expect(typeset('constructor')).toEqual([{ text: 'constructor', style: 'upright' }]);
  expect(typeset('V_toString')).toEqual([
    { text: 'V', style: 'italic' },
    { text: 'toString', style: 'subscript' },
  ]);
  expect(typeset('V_beta')).toEqual([
    { text: 'V', style: 'italic' },
    { text: 'β', style: 'subscript' },
  ]);
});
