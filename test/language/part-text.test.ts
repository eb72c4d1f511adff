// Parts as texts of their own: what points out of them is said, and another name changes nothing else.

import { describe, expect, it } from 'vitest';
import { parseSheet, partsOfText, partText, renamedPart } from '../../src/language/index.ts';

const SHEET = `R_S = 1 kohm  [stock list]
Q1 = n-JFET  ; the first
  I_DSS: 2 mA .. 6 mA  [same]
  V_P: -3 V .. -1 V  [same]
  lambda: 0.01 /V  [assumed]
  r_s: 5 ohm  [same]

Q2 = p-MOSFET  [same]
  V_TO: -2 V
  K: 10 mA/V^2  [data sheet, p. 3]
A1 = stage of Q1
  source: R_S to 0 V
`;

describe('the text of a part', () => {
  const tree = parseSheet(SHEET);
  const textOf = (name: string): string =>
    partText(
      tree,
      tree.cells.find((cell) => cell.name.name === name)!,
    );

  it('says the source that `same` meant where that stands outside of it', () => {
    expect(textOf('Q1')).toBe(
      'Q1 = n-JFET  ; the first\n  I_DSS: 2 mA .. 6 mA  [stock list]\n  V_P: -3 V .. -1 V  [same]\n  lambda: 0.01 /V  [assumed]\n  r_s: 5 ohm  [same]',
    );
    expect(textOf('Q2')).toBe('Q2 = p-MOSFET  [assumed]\n  V_TO: -2 V\n  K: 10 mA/V^2  [data sheet, p. 3]');
  });

  it('is had of every part of a text, and of nothing else', () => {
    expect(partsOfText(SHEET)).toEqual([textOf('Q1'), textOf('Q2')]);
    expect(partsOfText('R = 1 kohm\n')).toEqual([]);
  });

  it('keeps all but its name under another one', () => {
    expect(renamedPart(textOf('Q2'), 'Q_out')).toBe(textOf('Q2').replace('Q2', 'Q_out'));
  });
});
