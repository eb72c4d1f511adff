// A share of builds in words. Yields are rounded down: 100 % stands only where no build failed.

import { formatValue, PLAIN } from '../quantity/index.ts';
import type { Share } from '../spread/index.ts';

/** `98.5 %`; never more than was counted. */
export function shareText(share: number, rounding: 'down' | 'up' = 'down'): string {
  const percent = formatValue(share * 100, PLAIN, { digits: share >= 0.9 ? 4 : 3, rounding, zeros: 'drop' }).text;
  return `${percent} %`;
}

/** `98.5 % of 10 000 builds (98.2 % to 98.8 %)`, the interval being that of sampling alone. */
export function yieldText({ share, low, high, n }: Share): string {
  if (share === 1) return `all of ${countText(n)} builds (at least ${shareText(low)})`;
  if (share === 0) return `none of ${countText(n)} builds (at most ${shareText(high, 'up')})`;
  return `${shareText(share)} of ${countText(n)} builds (${shareText(low)} to ${shareText(high, 'up')})`;
}

/** A whole number with its thousands apart. */
export function countText(n: number): string {
  return String(n).replace(/\B(?=(\d{3})+$)/g, ' ');
}
