// Random sheets and expressions from a seed. The sheets can be read throughout: every kind of cell occurs, names
// are declared, dimensions fit, and each stage is one of the usual shapes. Spelling, blanks, sources and notes vary.

/** A number in [0, 1). */
export type Draw = () => number;

const pick = <T>(draw: Draw, from: readonly T[]): T => from[Math.floor(draw() * from.length)];
const chance = (draw: Draw, share: number): boolean => draw() < share;
const between = (draw: Draw, low: number, high: number): number => low + Math.floor(draw() * (high - low + 1));

const DIGITS = ['1', '1.2', '1.5', '2.2', '3.3', '4.7', '6.8', '8.2'];
const number = (draw: Draw): string => pick(draw, DIGITS);

// ---------------------------------------------------------------- sheets

export interface RandomSheetOptions {
  /** How many further quantity cells stand in the sheet. */
  readonly quantities?: number;
  /** `\n` or `\r\n`. */
  readonly lineEnd?: string;
}

/** The text of a sheet with every kind of cell, about 40 lines and `quantities` more. */
export function randomSheet(draw: Draw, { quantities = 6, lineEnd = '\n' }: RandomSheetOptions = {}): string {
  const lines = [
    ...title(draw),
    '## Supply and resistors',
    `V_DD = ${pick(draw, ['12 V', '15 V', '24 V'])}${spread(draw)}${tail(draw)}`,
    `T_A = 25 degC in 0 degC .. ${pick(draw, ['60 degC', '60 °C'])}${tail(draw)}`,
    `R_G = ${pick(draw, ['1 Mohm', '1M0', '1 MΩ', '470k'])}${spread(draw)}${tail(draw)}`,
    `R_D = ${number(draw)} ${pick(draw, ['kohm', 'kΩ'])}${spread(draw)}${tail(draw)}`,
    `R_S = ${number(draw)} kohm${spread(draw)}${tail(draw)}`,
    `R_Sb = another R_S${tail(draw)}`,
    ...freeQuantities(draw, quantities),
    ...filler(draw),
    '## Device',
    ...part(draw),
    `Q2 = another Q1`,
    `Q3 = ${pick(draw, ['n-JFET', 'p-JFET'])} fitted to M1${tail(draw)}`,
    ...filler(draw),
    ...bench(draw),
    `P1 = point of Q1${tail(draw)}`,
    `  V_GS: ${pick(draw, ['-1 V', '−0.5 V', '0 V'])}${tail(draw)}`,
    `  V_DS: 10 V`,
    '## Stages',
    ...stage(draw),
    ...pair(draw),
    '## Requirements',
    ...checks(draw),
    '## Choosing',
    `R_S0 = R_S such that A1.I_D = ${number(draw)} mA over 100 ohm .. 10 kohm${pick(draw, ['', ' each'])}`,
    `R_Smax = R_S such that low(A1.margin) = 1 V over 100 ohm .. 22 kohm`,
    `R_Sbuy = ${pick(draw, ['E24', 'E96_up', 'E12_down'])}(R_S0)${spread(draw)}`,
    ...plots(draw),
  ];
  return lines.join(lineEnd) + (chance(draw, 0.8) ? lineEnd : '');
}

function title(draw: Draw): string[] {
  const fields = [
    '  project: Tank level sensor',
    '  author: -',
    '  samples: 2000',
    '  checked: R_D, A1.I_D, headroom [AB, May]',
  ];
  return ['# Input stage, rev B', ...fields.filter(() => chance(draw, 0.6)), ...filler(draw)];
}

function filler(draw: Draw): string[] {
  const all = ['', '> R_D stands behind the 1 Mohm piezo.', '; R_D to be settled', '  ; indented note'];
  return all.filter(() => chance(draw, 0.3));
}

function tail(draw: Draw): string {
  const source = pick(draw, ['', '', '  [assumed]', ' [data sheet, p. 2; R_D]', '   [same]']);
  return source + pick(draw, ['', '', '  ; R_D, see above', ' ;']);
}

function spread(draw: Draw): string {
  const tolerance = `${pick(draw, ['±', '+/-'])} ${pick(draw, ['1 %', '5 %', '10%'])}`;
  return pick(draw, [
    '',
    ` ${tolerance}`,
    ` ${tolerance} normal`,
    ` ${tolerance} service`,
    ` ${tolerance} uniform service`,
  ]);
}

function freeQuantities(draw: Draw, count: number): string[] {
  return Array.from({ length: count }, (_, i) => {
    const before = i > 0 ? `r_${between(draw, 0, i - 1)}` : 'R_D';
    const entry = pick(draw, [
      `${number(draw)} kohm${spread(draw)}`,
      `${before} ${pick(draw, ['||', '∥', '//'])} R_G`,
      `(${before} + R_S) * ${number(draw)}`,
      `2 ${pick(draw, ['*', '·', '×'])} ${before}${pick(draw, ['', ' as kohm', ' as kΩ'])}`,
      `${before} in 100 ohm .. 1 Gohm`,
      `if(${before} > R_S, ${before}, R_S)`,
      `${before} * ${pick(draw, ['√4', 'sqrt(4)', '2²', '2^2'])}`,
      '1 kohm .. 2 kohm',
    ]);
    // A formula has limits only if they are its own; the nominal stands inside them.
    return `r_${i} = ${entry}${tail(draw)}`;
  });
}

function part(draw: Draw): string[] {
  return [
    `Q1 = n-JFET${tail(draw)}`,
    `  I_DSS: 2 mA .. 9 mA at V_DS = 15 V${tail(draw)}`,
    ...filler(draw),
    `  V_GSoff: ${pick(draw, ['-4 V .. -1 V', '-1 V .. -4 V', '-4 V … -1 V'])} at I_D = 10 nA, V_DS = 15 V${tail(draw)}`,
    `  ${pick(draw, ['lambda', 'λ'])}: ${pick(draw, ['0.01 /V', '0.01/V'])}`,
    `  I_GSS: .. 1 nA`,
    ...(chance(draw, 0.5) ? ['  C_iss: 5 pF at V_GS = 0 V'] : []),
  ];
}

function bench(draw: Draw): string[] {
  const rows = Array.from(
    { length: between(draw, 3, 6) },
    (_, i) => `  s${1 + (i % 2)}, -0.${i + 1}, ${9 - i}.5, 15${tail(draw)}`,
  );
  return ['M1 = bench', '  columns: specimen, V_GS [V], I_D [mA], V_DS [V] ; taken at 23 degC', ...rows];
}

function stage(draw: Draw): string[] {
  return [
    `A1 = stage of Q1${tail(draw)}`,
    '  gate: R_G to 0 V, 100 nF to signal',
    `  drain: R_D to ${pick(draw, ['V_DD', '(V_DD)', 'V_DD - 1 V'])}, 1 uF to load${tail(draw)}`,
    `  source: R_S to 0 V${pick(draw, ['', ', 47 uF to 0 V', ', 47u to 0 V'])}`,
    ...filler(draw),
    '  load: 100 kohm to 0 V',
    '  output: load',
    ...(chance(draw, 0.5) ? ['  driven: through R_G'] : []),
    ...(chance(draw, 0.5) ? ['  midband: 1 kHz'] : []),
  ];
}

function pair(draw: Draw): string[] {
  return [
    'A2 = stage of Qa = Q1, Qb = Q1',
    '  Qa.gate: to signal',
    '  Qb.gate: to -signal',
    '  Qa.drain: R_D to V_DD',
    `  Qb.drain: R_D ${pick(draw, ['to V_DD', 'to V_DD, 10 pF to 0 V'])}`,
    '  Qa.source: to tail',
    '  Qb.source: to tail',
    '  tail: R_S to 0 V, 1 mA from V_DD',
    '  output: Qa.drain - Qb.drain',
  ];
}

function checks(draw: Draw): string[] {
  return [
    `headroom = check A1.margin ${pick(draw, ['>=', '≥', '>'])} 1 V`,
    'gain_band = check abs(A1.A_v) within 4 .. 12',
    `current = check A1.I_D within ${number(draw)} mA ± 10 %`,
    'heat = check A1.P_D <= 100 mW and (A1.region = saturation or not A1.V_DS < 1 V)',
    `switched = check (A1.I_D with R_S = ${number(draw)} kohm) > 0 A`,
  ];
}

function plots(draw: Draw): string[] {
  const all = [
    'plot transfer of A1',
    'plot output of A1 over 0 V .. 20 V',
    'plot response of A1 over 10 Hz .. 10 MHz',
    'plot noise of A1',
    'plot bench of M1',
    'plot spread of A1.I_D / 1 mA',
    `plot A1.I_D, A1.margin against R_S over 100 ohm .. 10 kohm${pick(draw, ['', ' log'])}`,
  ];
  return all.map((entry, i) => `F${i} = ${entry}${tail(draw)}`);
}

// ---------------------------------------------------------------- expressions

/** The text of an expression that can be read, in any spelling; its dimensions need not fit. */
export function randomExpression(draw: Draw, depth = 4): string {
  const inner = (): string => randomExpression(draw, depth - 1);
  const blank = (): string => pick(draw, [' ', '  ', '\u00a0', '\t']);
  if (depth <= 0) return operand(draw);
  const loose = (text: string): string => `(${pick(draw, ['', ' '])}${text}${pick(draw, ['', ' '])})`;
  switch (between(draw, 0, 11)) {
    case 0:
    case 1:
    case 2: {
      const sign = pick(draw, ['+', '-', '−', '*', '·', '×', '⋅', '/', '||', '//', '∥']);
      return `${closed(draw, depth)}${blank()}${sign}${blank()}${closed(draw, depth)}`;
    }
    case 3:
      return `${pick(draw, ['-', '+', '−', '- -'])}${closed(draw, depth)}`;
    case 4:
      return `${loose(inner())}${pick(draw, ['^2', '²', '⁻¹', '^-1', ' ^ 3', '^0.5', `^${loose(inner())}`])}`;
    case 5:
      return `√${loose(inner())}`;
    case 6:
      return `${pick(draw, ['sqrt', 'max', 'dB', 'gain', 'E24_up'])}(${[inner(), inner(), inner()].slice(between(draw, 0, 2)).join(', ')})`;
    case 7: {
      const relation = pick(draw, ['=', '<', '>', '<=', '>=', '≤', '≥']);
      return loose(`${closed(draw, depth)} ${relation} ${closed(draw, depth)}`);
    }
    case 8:
      return loose(
        `${closed(draw, depth)} ${pick(draw, ['and', 'or'])} ${pick(draw, ['', 'not '])}${closed(draw, depth)}`,
      );
    case 9:
      return loose(
        `${closed(draw, depth)} within ${pick(draw, [`${operand(draw)} .. ${operand(draw)}`, '5 mA ± 10 %', '-4 V … 4 V', '-2 V ± 50 mV', '25 degC ± 5 K'])}`,
      );
    case 10:
      return loose(`${closed(draw, depth)} with ${path(draw)} = ${closed(draw, depth)}`);
    default:
      return loose(inner());
  }
}

/** An operand that any operator may stand beside. */
function closed(draw: Draw, depth: number): string {
  return chance(draw, 0.5) ? operand(draw) : `(${randomExpression(draw, depth - 1)})`;
}

function operand(draw: Draw): string {
  return chance(draw, 0.5) ? literal(draw) : path(draw);
}

function path(draw: Draw): string {
  return pick(draw, [
    'R_S',
    'V_DD',
    'A1.I_D',
    'A1.Qa.g_m',
    'β',
    'beta',
    'λ_1',
    'Q1.K',
    'pi',
    'headroom',
    'µ_r',
    'gain',
    'x',
  ]);
}

function literal(draw: Draw): string {
  const digits = pick(draw, [
    ...DIGITS,
    '10',
    '0',
    '0.001',
    '1e-9',
    '2.5E3',
    '299792458',
    '1000000',
    '1e25',
    '0.1',
    '33.333',
  ]);
  const unit = pick(draw, [
    '',
    ' V',
    ' mA',
    ' kohm',
    ' kΩ',
    ' MΩ',
    ' µF',
    ' uF',
    ' pF',
    'nV/√Hz',
    ' mA/V^2',
    ' mA/V²',
    ' /V',
    '/V',
    ' V^0.5',
    ' %',
    '%',
    ' ppm',
    ' dB',
    ' deg',
    ' °C',
    ' degC',
    ' K/W',
    ' V·s',
  ]);
  const code = pick(draw, ['4k7', '1M0', '470R', '47k', '4n7', '10p', '4K7', '2µ2']);
  return chance(draw, 0.15) ? code : digits + unit;
}
