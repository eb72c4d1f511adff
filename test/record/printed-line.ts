// Reading a printed line of workings back: the oracle that what is printed adds up.

import { stepText } from '../../src/record/index.ts';
import type { PrintedStep } from '../../src/record/index.ts';
import { evaluateExpression } from '../../src/sheet/index.ts';

function evaluated(text: string): number | string | boolean {
  const result = evaluateExpression(text);
  if ('code' in result) throw new Error(`${text}: ${result.text}`);
  return result.value;
}

/** Half of the last printed digit, in SI; a value that is printed short is exact to three digits at least. */
function halfDigit(printed: string): number {
  const [, digits, exponent = '', unit = ''] = /^−?([\d.]+)((?:e[-\d]+)?)(.*)$/.exec(printed)!;
  const [whole, decimals = ''] = digits!.split('.');
  const significant = `${whole}${decimals}`.replace(/^0+/, '').length;
  const places = Math.max(decimals.length, decimals.length + 3 - significant);
  const size = `0.${'0'.repeat(places)}5${exponent}${unit.replace('°C', 'K')}`;
  return Number(evaluated(size));
}

/** The printed line where what stands in place of the names does not give what is printed as the result; else null. */
export function wrongLine(printed: PrintedStep): string | null {
  const { formula, substitution, result } = printed.text;
  // Without names in the formula it is computed as it stands; a lone name's value is the result itself.
  const isLoneName = substitution === null && /^[A-Za-z][\w.]*$/.test(formula);
  const value = evaluated(substitution ?? (isLoneName ? result : formula));
  let adds: boolean;
  if (typeof value === 'boolean') adds = result === (value ? 'holds' : 'does not hold');
  else if (typeof value === 'string') adds = result === value;
  else adds = Math.abs(value - Number(evaluated(result))) <= halfDigit(result) * (1 + 1e-9);
  return adds ? null : stepText(printed);
}
