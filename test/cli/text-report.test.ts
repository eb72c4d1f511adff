import { describe, expect, it } from 'vitest';
import { AMPLIFIER } from '../record/sheets.ts';
import { runOn, runSheet } from './run.ts';

const SMALL = `# Small
## Supply
V_DD = 15 V ± 5 %   [power note 7] ; main
R_long_name = 4.7 kohm
  ; a note between
I_1 = V_DD / R_long_name
## Requirements
enough = check I_1 > 5 mA
much = check I_1 > 1 mA
broken = 1 V + 2 mA
half = broken / 2
`;

describe('the plain report', () => {
  it('is a title, the verdict, failing checks, and the sheet with its columns aligned', () => {
    expect(runSheet(SMALL)).toEqual({
      status: 2,
      complaints: '',
      out: `Small
1 cell is broken: broken. 1 cell has no value: half. 1 of 2 checks holds at every extreme. enough
fails, 1.81 mA short. None of 10 000 builds (at most 0.0369 %) hold all of them.

Failing checks
  enough  check I_1 > 5 mA  fails, 1.81 mA short  0 %  line 8

Supply
  V_DD         15 V ± 5 %            15 V                   power note 7; main
  R_long_name  4.7 kohm             4.7 kΩ                  no source
  I_1          V_DD / R_long_name  3.19 mA                  3.03 mA .. 3.36 mA

Requirements
  enough       check I_1 > 5 mA    fails, 1.81 mA short     0 %
  much         check I_1 > 1 mA    holds, 2.19 mA to spare  100 %
  broken       1 V + 2 mA
    line 10, column 10: 1 V is a voltage and 2 mA is a current: they cannot be added. Multiply the
    current by a resistance first.
  half         broken / 2          waits for broken, which is broken in line 10
`,
    });
  });

  it('keeps to the width where names and values leave room, cutting only with a mark', () => {
    for (const width of [60, 80, 100, 140]) {
      const { out } = runOn({ a: AMPLIFIER }, ['a'], width);
      for (const line of out.split('\n')) expect([...line].length, line).toBeLessThanOrEqual(width);
    }
    const { out } = runOn({ a: `R = 1 kohm [${'a long source '.repeat(9)}]` }, ['a'], 60);
    expect(out).toContain('…');
  });

  it('wraps a long entry instead of cutting it', () => {
    const terms = Array.from({ length: 30 }, (_, i) => `${i + 1} V`);
    const { out } = runOn({ a: `x_1 = ${terms.join(' + ')}` }, ['a'], 60);
    for (const term of terms) expect(out).toContain(term);
  });

  it('shows the values of parts and stages under them', () => {
    const { out } = runSheet(AMPLIFIER);
    expect(out).toMatch(/^ {4}I_DSS +6 mA in 3 mA .* 6 mA .*no source$/m);
    expect(out).toMatch(/^ {4}gate +R_G to 0 V, 22 nF to\s+signal$/m);
    expect(out).toMatch(/^ {4}region +saturation$/m);
    expect(out).toMatch(/^ {4}I_D +1\.\d\d mA .+ \.\. .+$/m);
  });

  it('says what an empty sheet comes to', () => {
    expect(runSheet('')).toEqual({
      status: 0,
      complaints: '',
      out: 'Sheet without a title\nNothing is required of this sheet yet.\n',
    });
  });

  it('lists a line that belongs to no cell with its message', () => {
    const { status, out } = runSheet('# T\n??? what\n');
    expect(status).toBe(2);
    expect(out).toMatch(/^ {2}line 2 +\?\?\? what\n {4}line 2, column \d+: /m);
  });
});

describe('the exit status', () => {
  it.each([
    ['a = check 2 V > 1 V', 0],
    ['R = 1 kohm', 0],
    ['a = check 2 V > 1 V\nb = check 1 V > 2 V', 1],
    ['b = check 1 V > 2 V\nx = 1 V + 1 A', 2],
    ['a = check 2 V > 1 V\n???', 2],
    ['a = check 2 V > 1 V\nx = e_n(A1, 1 kHz)', 2],
    ['R = 1 kohm ± 5 %\na = check R > 900 ohm', 0],
    ['R = 1 kohm ± 5 %\na = check R > 960 ohm', 1],
    ['R = 1 kohm ..\na = check R > 900 ohm', 0],
    ['R = 1 kohm ..\na = check R < 9 kohm', 1],
    ['# T\n  yield: 85 %\nR = 1 kohm ± 5 %\na = check R > 960 ohm', 0],
  ])('of %j is %d, with and without --json', (text, status) => {
    expect(runSheet(text).status).toBe(status);
    expect(runSheet(text, '--json').status).toBe(status);
  });
});

describe('the printed workings', () => {
  it('are formula, numbers and result', () => {
    expect(runSheet('R_S = 3 kohm\nR_2 = R_S / 2', '--workings', 'R_2').out).toBe(
      'Workings of R_2\n  R_2 = R_S / 2 = 3 kΩ / 2 = 1.5 kΩ\n',
    );
  });

  it('of a part end with its law in every convention, and with its routes side by side', () => {
    const part = 'Q1 = n-JFET\n  I_DSS: 8 mA\n  V_P: -2 V\n  g_fs0: 10 mS\n';
    const { out } = runSheet(part, '--workings', 'Q1');
    expect(out.slice(out.indexOf('The law in every'))).toBe(`The law in every convention.
  form        nominal  as written  condition
  beta     2.00 mA/V²
  V_TO        −2.00 V
  I_DSS       8.00 mA
  V_P         −2.00 V
  V_GSoff     −2.18 V              at I_D = 10 nA
  g_fs0       8.00 mS       10 mS
  R_DSon        125 Ω              at V_GS = 0 V
  g_fs        2.83 mS              at I_D = 1 mA
  lambda         0 /V

Routes to the law. The difference is that of beta.
  rows                    beta     V_TO  difference
  I_DSS with V_P    2.00 mA/V²  −2.00 V    computes
  g_fs0 with I_DSS  3.13 mA/V²  −1.60 V  56 % above
`);
  });

  it('of a broken cell are its message', () => {
    const { status, out } = runSheet('x_1 = 1 V + 2 mA', '--workings', 'x_1');
    expect(status).toBe(2);
    expect(out).toMatch(/^Workings of x_1\n {2}line 1, column 7: 1 V is a voltage and 2 mA is a current/);
  });
});

describe('the declared set in the plain report', () => {
  const part = 'Q1 = n-JFET\n  I_DSS: 4 mA in 2 mA .. 6 mA\n  V_P: -2 V in -3 V .. -1 V\n';

  it('says which share of the specimens further limits leave', () => {
    const { out } = runSheet(`${part}  g_fs0: 3 mS .. 5 mS\n`, '--samples', '2000');
    expect(out).toMatch(/^Declared set\n {2}g_fs0 of Q1 cuts the declared set: [3-6]\d(\.\d)? % of the specimens/m);
  });

  it('says that limits contradict each other, and gives no ends', () => {
    const { out, status } = runSheet(`${part}  g_fs0: 20 mS .. 30 mS\nx = Q1.I_DSS * 1\na = check x > 0 A\n`);
    expect(out).toContain('The limits of Q1 (g_fs0) contradict each other');
    expect(out).toContain('– .. –');
    expect(status).toBe(1);
  });
});
