// The rows that a data sheet of each kind of FET prints, with the units it prints them in.

/** Kinds of parts, in the order in which they are offered. */
export const PART_KINDS = ['n-JFET', 'p-JFET', 'n-MOSFET', 'p-MOSFET'] as const;
export type PartKind = (typeof PART_KINDS)[number];

interface PrintedRow {
  readonly field: string;
  readonly unit: string;
  /** The condition that is mostly printed. */
  readonly condition: string;
}

const CAPACITANCES: readonly PrintedRow[] = [
  { field: 'C_iss', unit: 'pF', condition: 'V_DS = 15 V' },
  { field: 'C_rss', unit: 'pF', condition: 'V_DS = 15 V' },
];
const LIMITS: readonly PrintedRow[] = [
  { field: 'V_DSmax', unit: 'V', condition: '' },
  { field: 'R_thJA', unit: 'K/W', condition: '' },
  { field: 'T_Jmax', unit: 'degC', condition: '' },
];

const ROWS: Readonly<Record<'JFET' | 'MOSFET', readonly PrintedRow[]>> = {
  JFET: [
    { field: 'I_DSS', unit: 'mA', condition: 'V_DS = 15 V' },
    { field: 'V_GSoff', unit: 'V', condition: 'V_DS = 15 V, I_D = 10 nA' },
    { field: 'g_fs', unit: 'mS', condition: 'V_DS = 15 V' },
    { field: 'g_os', unit: 'uS', condition: 'V_DS = 15 V, I_D = 1 mA' },
    { field: 'R_DSon', unit: 'ohm', condition: '' },
    { field: 'I_GSS', unit: 'nA', condition: 'V_GS = -15 V' },
    ...CAPACITANCES,
    ...LIMITS,
  ],
  MOSFET: [
    { field: 'V_GSth', unit: 'V', condition: 'I_D = 250 uA' },
    { field: 'I_on', unit: 'mA', condition: 'V_GS = 10 V' },
    { field: 'R_DSon', unit: 'ohm', condition: 'V_GS = 10 V, I_D = 100 mA' },
    { field: 'g_fs', unit: 'mS', condition: 'I_D = 100 mA' },
    { field: 'g_os', unit: 'uS', condition: 'V_DS = 15 V, I_D = 1 mA' },
    ...CAPACITANCES,
    { field: 'C_oss', unit: 'pF', condition: 'V_DS = 15 V' },
    ...LIMITS,
  ],
};

/** The rows to fill in for a kind; of a p-channel part the voltages of their conditions are negative. */
export function printedRows(kind: PartKind): readonly PrintedRow[] {
  const rows = ROWS[kind.endsWith('JFET') ? 'JFET' : 'MOSFET'];
  if (kind.startsWith('n')) return rows;
  const mirrored = (text: string): string =>
    text.replace(/(V_\w+ = )(-?)/g, (_, name: string, sign: string) => name + (sign === '' ? '-' : ''));
  return rows.map((row) => ({ ...row, condition: mirrored(row.condition) }));
}
