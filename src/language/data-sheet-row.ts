// Rows as data sheets print them (parameter, condition, min, typ, max, unit), written as the rows of a part.

/** A row as it was typed; every text may be empty. */
export interface DataSheetRow {
  /** As the sheet calls it: `I_DSS`, `V_GSoff`. */
  readonly field: string;
  readonly condition: string;
  readonly min: string;
  readonly typ: string;
  readonly max: string;
  readonly unit: string;
}

/** Where a row cannot be written, and why. */
interface RowFault {
  readonly place: 'min' | 'typ' | 'max' | 'condition' | 'unit';
  readonly text: string;
}

/** Names of conditions as data sheets print them. */
const CONDITIONS: Readonly<Record<string, string>> = {
  vds: 'V_DS',
  vgs: 'V_GS',
  vdg: 'V_DG',
  id: 'I_D',
  f: 'f',
  ta: 'T_A',
  tj: 'T_J',
};

/**
 * The row of a part, such as `I_DSS: 3 mA in 1 mA .. 5 mA at V_DS = 15 V`; null of a row without a number. Currents that a
 * sheet of a p-channel part prints negative are written positive, as they are of either channel here.
 */
export function dataSheetLine(
  { field, condition, min, typ, max, unit }: DataSheetRow,
  channel: 'n' | 'p',
): string | RowFault | null {
  const isPrintedNegative = channel === 'p' && field.startsWith('I_');
  const numbers: (string | null)[] = [];
  for (const [place, text] of [
    ['min', min],
    ['typ', typ],
    ['max', max],
  ] as const) {
    const number = numberOf(text);
    if (number === undefined) return { place, text: `${text.trim()} is no number. Write one such as 2.5 or -0.5e-3.` };
    numbers.push(isPrintedNegative && number !== null ? number.replace(/^-/, '') : number);
  }
  const [least, usual, most] = numbers as [string | null, string | null, string | null];
  if (least === null && usual === null && most === null) return null;
  const limits = [least, most].filter((each) => each !== null).map(Number);
  // Of negative values some sheets print the larger magnitude as max, others as min: either is an order.
  if (limits.length === 2 && limits[0]! > limits[1]! && !isPrintedNegative && !limits.every((each) => each <= 0)) {
    return { place: 'max', text: `The max of ${field}, ${most}, is below its min, ${least}. Exchange them.` };
  }
  const conditions = conditionsOf(condition, channel);
  if (typeof conditions !== 'string') return conditions;
  const value = (text: string): string => (unit.trim() === '' ? text : `${text} ${unit.trim()}`);
  const range =
    least === null && most === null
      ? ''
      : [least === null ? '' : value(least), '..', most === null ? '' : value(most)].filter(Boolean).join(' ');
  // A limit is a number, in whatever column it is printed.
  const only = field.endsWith('max') && limits.length === 1 && usual === null ? (least ?? most) : null;
  const entry =
    only !== null ? value(only) : usual === null ? range : range === '' ? value(usual) : `${value(usual)} in ${range}`;
  return `${field}: ${entry}${conditions === '' ? '' : ` at ${conditions}`}`;
}

/** A number as the language writes it; null of an empty text, undefined of what is none. */
function numberOf(text: string): string | null | undefined {
  const plain = text.trim().replace(/^[−–]/, '-').replace(/^\+/, '');
  if (plain === '' || plain === '-') return null;
  const point = /^-?\d+,\d+$/.test(plain) ? plain.replace(',', '.') : plain;
  return /^-?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(point)
    ? point.replace(/^(-?)\./, '$10.').replace(/\.$/, '')
    : undefined;
}

/** `VDS=15V, ID = 10 nA` as the language writes it. */
function conditionsOf(text: string, channel: 'n' | 'p'): string | RowFault {
  const parts = text.split(/[,;]/).map((part) => part.trim());
  const written: string[] = [];
  for (const part of parts) {
    if (part === '') continue;
    const [, name, value] = /^([A-Za-z]+(?:_[A-Za-z]+)?|[A-Za-z]_?\w+)\s*=\s*(\S.*)$/.exec(part) ?? [];
    const known = name === undefined ? undefined : CONDITIONS[name.replace('_', '').toLowerCase()];
    if (known === undefined) {
      return {
        place: 'condition',
        text: `${part} is no condition that a row can have. Conditions are V_DS, V_GS, V_DG, I_D, f, T_A and T_J, such as V_DS = 15 V.`,
      };
    }
    const plain = value!.replace(/^[−–]/, '-');
    const signed = channel === 'p' && known === 'I_D' ? plain.replace(/^-/, '') : plain;
    const spaced = signed.replace(/^([-+]?[\d.]+(?:e[-+]?\d+)?)\s*(?=[A-Za-zµΩ°])/i, '$1 ');
    written.push(`${known} = ${spaced}`);
  }
  return written.join(', ');
}
