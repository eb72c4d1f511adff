// The codes by which a kernel says how it ended. A value counts only beside code 0.

/** What a status code means: `POINT_STATUS[code]`. */
export const POINT_STATUS = ['solved', 'cannot carry it', 'thermal runaway', 'not a number', 'left open'] as const;

export const SOLVED = 0;
/** No terminal voltages of this FET give the current that is forced upon it. */
export const CANNOT_CARRY = 1;
/** No thermal balance below the ceiling of the search. */
export const RUNAWAY = 2;
/** An input is not a finite number, or lies outside the law (beta not above 0). */
export const NOT_A_NUMBER = 3;
/** A forced current of 0 A, or one met by a range of voltages, leaves the voltages open. */
export const LEFT_OPEN = 4;

/** What a status code says about the stage, as a whole sentence about the FET; empty for `solved`. */
export const POINT_STATUS_SENTENCES: readonly string[] = [
  '',
  'The current source drives a current that this FET cannot carry at any voltage of its terminals.',
  'No junction temperature below 600 K balances the heat: the FET runs away (thermal runaway). Lower R_thJA or the dissipation.',
  'A value that the operating point needs is not a finite number, or a resistance or beta is not above zero.',
  'The current source leaves the voltage of its place open: give it a resistor to a rail.',
];

/** What a code of the swing means: `SWING_LIMIT[code]`. */
export const SWING_LIMIT = ['none', 'cutoff', 'ohmic', 'gate conduction'] as const;
