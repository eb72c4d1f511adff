// Which rows of a long sheet stand in the page.

import { describe, expect, test } from 'vitest';
import { itemOf, itemText, MOST_ROWS, ROW_HEIGHT, windowItems } from '../../src/ui/grid/row-window.ts';

const keys = Array.from({ length: 5000 }, (_, k) => `cell:x_${k}`);
const seen = { top: 2500 * ROW_HEIGHT, height: 20 * ROW_HEIGHT };

describe('the window of rows', () => {
  test('holds every row up to the limit', () => {
    expect(windowItems(keys.slice(0, MOST_ROWS), seen, null)).toHaveLength(MOST_ROWS);
  });

  test.each([[null], ['cell:x_2'], ['cell:x_2505'], ['cell:x_4990']])(
    'holds what is seen and %s, and the height of all others',
    (kept) => {
      const items = windowItems(keys, seen, kept);
      const shown = items.flatMap((item) => ('key' in item ? [item.key] : []));
      expect(shown).toEqual(expect.arrayContaining(['cell:x_2500', 'cell:x_2519', ...(kept ? [kept] : [])]));
      expect(shown.length).toBeLessThan(200);
      expect(shown).toEqual(shown.toSorted((a, b) => keys.indexOf(a) - keys.indexOf(b)));
      const height = items.reduce((sum, item) => sum + ('gap' in item ? item.gap : ROW_HEIGHT), 0);
      expect(height).toBe(keys.length * ROW_HEIGHT);
    },
  );

  test('an item is read back from its text', () => {
    for (const item of [{ key: 'section:1' }, { key: 'cell:x y' }, { gap: 520 }]) {
      expect(itemOf(itemText(item, 3))).toEqual(item);
    }
  });
});
