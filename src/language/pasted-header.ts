// The head of a pasted table: what each column is, by the words of the trade, and its unit, in brackets,
// parentheses, behind a slash or a blank, or in a line of its own below.

import type { Unit } from '../quantity/index.ts';
import { CURRENT, VOLTAGE, isUnitFault, parseUnit, sameKind } from '../quantity/index.ts';

export type PastedQuantity = 'V_GS' | 'I_D' | 'V_DS';

export interface PastedColumn {
  /** As it was pasted. */
  readonly heading: string;
  readonly quantity: PastedQuantity | null;
  /** null where none is named. */
  readonly unit: Unit | null;
}

const KINDS = { V_GS: VOLTAGE, V_DS: VOLTAGE, I_D: CURRENT } as const;

/** Headings without case, blanks and marks. */
const WORDS: Readonly<Record<PastedQuantity, readonly string[]>> = {
  V_GS: ['vgs', 'ugs', 'vg', 'ug', 'gatevoltage', 'gatesourcevoltage', 'gatetosourcevoltage'],
  I_D: ['id', 'ids', 'idrain', 'draincurrent'],
  V_DS: ['vds', 'uds', 'vd', 'ud', 'drainvoltage', 'drainsourcevoltage', 'draintosourcevoltage'],
};

/** Reads one heading; a unit stands with it only where it fits the quantity. */
export function pastedColumn(heading: string): PastedColumn {
  const bracketed = /^(.*?)\s*[[(]\s*([^\])]*?)\s*[\])]$/.exec(heading) ?? /^(.*?)\s*(?:\/|\s)\s*(\S+)$/.exec(heading);
  const whole = quantityOf(heading);
  if (whole || !bracketed) return { heading, quantity: whole, unit: null };
  const quantity = quantityOf(bracketed[1]!);
  const unit = quantity && pastedUnit(bracketed[2]!, quantity);
  return quantity ? { heading, quantity, unit } : { heading, quantity: null, unit: null };
}

/** The unit that a text is, where it measures this quantity; null where not. */
export function pastedUnit(text: string, quantity: PastedQuantity): Unit | null {
  const unit = parseUnit(text.trim());
  return !isUnitFault(unit) && sameKind(unit.kind, KINDS[quantity]) ? unit : null;
}

function quantityOf(text: string): PastedQuantity | null {
  const bare = text.toLowerCase().replace(/[^a-z]/g, '');
  if (/\d/.test(text)) return null;
  return (Object.keys(WORDS) as PastedQuantity[]).find((quantity) => WORDS[quantity].includes(bare)) ?? null;
}
