// Sheets that compute, and edits of them, from a draw: quantities of many kinds that use each other, parts of both
// channels, points, stages, checks. Nearly all of it is sound; the edits break some of it and mend it again.

/** A number in [0, 1). */
type Draw = () => number;

type Kind = 'V' | 'A' | 'ohm' | 'S' | 'plain' | 'W' | 'dB' | 'degC' | 'K' | 'F';

interface Block {
  readonly name: string;
  /** Kind of a quantity; null of every other cell. */
  readonly kind: Kind | null;
  readonly lines: readonly string[];
  /** A stage, point or part whose values others may name, with their kinds. */
  readonly offers: readonly (readonly [string, Kind])[];
}

export interface RandomEngineSheet {
  text(): string;
  /** Changes the sheet by one edit, sound or not, and says which. */
  edit(): string;
}

const KINDS: readonly Kind[] = ['V', 'A', 'ohm', 'S', 'plain', 'W', 'dB', 'degC', 'K', 'F'];
const UNITS: Readonly<Record<Kind, readonly string[]>> = {
  V: ['V', 'mV'],
  A: ['mA', 'uA', 'A'],
  ohm: ['ohm', 'kohm', 'Mohm'],
  S: ['mS', 'uS'],
  plain: ['', '%'],
  W: ['mW', 'W'],
  dB: ['dB'],
  degC: ['degC'],
  K: ['K', 'mK'],
  F: ['nF', 'uF', 'pF'],
};
const FET_OFFERS: Block['offers'] = [
  ['I_D', 'A'],
  ['V_GS', 'V'],
  ['V_DS', 'V'],
  ['margin', 'V'],
  ['V_ov', 'V'],
  ['g_m', 'S'],
  ['g_ds', 'S'],
  ['P_D', 'W'],
  ['T_J', 'degC'],
];

/** A sheet with about `quantities` cells and the devices around them. */
export function randomEngineSheet(draw: Draw, quantities = 14): RandomEngineSheet {
  const pick = <T>(from: readonly T[]): T => from[Math.floor(draw() * from.length)];
  const chance = (share: number): boolean => draw() < share;
  let blocks: Block[] = [];
  let counter = 0;

  const digits = (low: number, high: number): string =>
    (low * (high / low) ** draw()).toPrecision(1 + Math.floor(4 * draw()));
  const literal = (kind: Kind): string => {
    if (kind === 'degC') return `${Math.round(-20 + 100 * draw())} degC`;
    if (kind === 'dB') return `${Math.round(-40 + 80 * draw())} dB`;
    const unit = pick(UNITS[kind]);
    return `${chance(0.1) && kind !== 'ohm' ? '-' : ''}${Number(digits(0.5, 200))}${unit ? ` ${unit}` : ''}`;
  };
  const named = (kind: Kind): string[] => [
    ...blocks.filter((block) => block.kind === kind).map((block) => block.name),
    ...blocks.flatMap((block) => block.offers.filter(([, of]) => of === kind).map(([name]) => `${block.name}.${name}`)),
  ];
  const leaf = (kind: Kind): string => {
    const names = named(kind);
    return names.length > 0 && chance(0.75) ? pick(names) : literal(kind);
  };
  /** An expression that may stand beside any operator. */
  const closed = (kind: Kind, depth: number): string =>
    depth <= 0 || chance(0.4) ? leaf(kind) : `(${expression(kind, depth)})`;

  function expression(kind: Kind, depth: number): string {
    if (depth <= 0) return leaf(kind);
    const e = (of: Kind): string => closed(of, depth - 1);
    if (kind === 'degC')
      return pick([
        () => `${e('degC')} + ${e('K')}`,
        () => `${e('degC')} - ${e('K')}`,
        () => `max(${e('degC')}, ${e('degC')})`,
      ])();
    if (kind === 'dB')
      return pick([() => `dB(${e('plain')})`, () => `${e('dB')} - ${e('dB')}`, () => `${e('dB')} + ${e('dB')}`])();
    const any: (() => string)[] = [
      () => `${e(kind)} + ${e(kind)}`,
      () => `${e(kind)} - ${e(kind)}`,
      () => `${e('plain')} * ${e(kind)}`,
      () => `${e(kind)} / ${e('plain')}`,
      () => `if(${condition(depth - 1)}, ${e(kind)}, ${e(kind)})`,
      () => `min(${e(kind)}, ${e(kind)}, ${leaf(kind)})`,
      () => `abs(${e(kind)})`,
      () => `-${e(kind)}`,
      () => `round(${e(kind)}, ${1 + Math.floor(4 * draw())})`,
      () => `nominal(${e(kind)})`,
      () => `hypot(${e(kind)}, ${e(kind)})`,
      () => `${pick(['E3', 'E6_up', 'E12', 'E24', 'E24_down', 'E48', 'E96_up', 'E192'])}(abs(${e(kind)}))`,
      () => `sqrt(${e(kind)} * ${e(kind)} + ${e(kind)}^2)`,
      () => `(${e(kind)}^2)^(1/2)`,
    ];
    const own: Partial<Record<Kind, (() => string)[]>> = {
      V: [() => `${e('A')} * ${e('ohm')}`, () => `${e('W')} / ${e('A')}`, () => `√(${e('W')} * ${leaf('ohm')})`],
      A: [() => `${e('V')} / ${e('ohm')}`, () => `${e('S')} * ${e('V')}`],
      ohm: [
        () => `${e('V')} / ${e('A')}`,
        () => `${e('ohm')} || ${e('ohm')}`,
        () => `1 / ${e('S')}`,
        () => `par(${e('ohm')}, ${e('ohm')}, ${leaf('ohm')})`,
      ],
      S: [() => `${e('A')} / ${e('V')}`, () => `1 / ${e('ohm')}`, () => `${e('S')} || ${e('S')}`],
      plain: [
        () => `${e('V')} / ${e('V')}`,
        () => `${e('S')} * ${e('ohm')}`,
        () => `ln(1 + ${e('plain')}^2)`,
        () => `exp(-${e('plain')}^2)`,
        () => `atan(${e('plain')})`,
        () => `sin(${e('plain')}) + cos(${leaf('plain')})`,
        () => `sign(${e('V')})`,
        () => `log10(abs(${e('plain')}))`,
        () => `abs(${e('plain')})^${pick(['2', '0.5', '-1', '(1/3)', '2.5'])}`,
      ],
      W: [() => `${e('V')} * ${e('A')}`, () => `${e('V')}^2 / ${e('ohm')}`, () => `${e('A')}² * ${e('ohm')}`],
      K: [() => `${e('degC')} - ${e('degC')}`],
    };
    return pick([...any, ...(own[kind] ?? []), ...(own[kind] ?? [])])();
  }

  function condition(depth: number): string {
    const kind = pick(['V', 'A', 'ohm', 'plain', 'degC'] as const);
    const stages = blocks.filter((block) => block.name.startsWith('A'));
    if (stages.length > 0 && chance(0.1)) return `${pick(stages).name}.region = saturation`;
    const simple = chance(0.25)
      ? `${closed(kind, depth)} within ${literal(kind)} .. ${literal(kind)}`
      : `${closed(kind, depth)} ${pick(['<', '>', '<=', '>='])} ${closed(kind, depth)}`;
    if (depth <= 0 || chance(0.7)) return simple;
    return pick([
      `(${simple}) and ${closedCondition(depth)}`,
      `(${simple}) or ${closedCondition(depth)}`,
      `not (${simple})`,
    ]);
  }
  const closedCondition = (depth: number): string => `(${condition(depth - 1)})`;

  const fresh = (letter: string): string => `${letter}_${++counter}`;
  const input = (kind: Kind, name = fresh('x')): Block => {
    const spread =
      kind === 'ohm' && chance(0.5) ? ` ± ${pick(['1', '5', '10'])} %${pick(['', ' normal', ' service'])}` : '';
    return { name, kind, lines: [`${name} = ${literal(kind)}${spread}`], offers: [] };
  };
  const formula = (kind: Kind, name = fresh('x')): Block => {
    const unit = chance(0.2) && !['dB', 'degC'].includes(kind) ? pick(UNITS[kind]) : '';
    const text = expression(kind, 1 + Math.floor(3 * draw()));
    return { name, kind, lines: [`${name} = ${text}${unit ? ` as ${unit}` : ''}`], offers: [] };
  };
  const check = (): Block => {
    const name = fresh('c');
    return { name, kind: null, lines: [`${name} = check ${condition(2)}`], offers: [] };
  };
  const scale = (low: number, high: number, unit: string): string =>
    `${Number((low * (high / low) ** draw()).toPrecision(3))} ${unit}`;
  const resistance = (low: number, high: number): string => {
    const names = blocks
      .filter((block) => block.kind === 'ohm' && /= \d[\d.]* k?ohm( |$)/.test(block.lines[0]))
      .map((block) => block.name);
    return names.length > 0 && chance(0.4) ? pick(names) : scale(low, high, 'ohm');
  };

  function part(name = fresh('Q')): Block {
    const isJfet = chance(0.5);
    const sign = chance(0.5) ? 1 : -1;
    const volts = (x: number): string => `${Number((sign * x).toPrecision(3))} V`;
    const pinch = 0.5 + 4 * draw();
    const opens = 0.5 + 2 * draw();
    const at = pick(['', ` at V_DS = ${volts(15)}`]);
    const law = isJfet
      ? pick([
          [`I_DSS: ${scale(1e-3, 20e-3, 'A')}${at}`, `V_P: ${volts(-pinch)}`],
          [`I_DSS: ${scale(1, 20, 'mA')}${at}`, `V_GSoff: ${volts(-pinch)} at I_D = ${pick(['10 nA', '1 uA'])}`],
          [`beta: ${scale(0.2, 5, 'mA/V^2')}`, `V_TO: ${Number((-pinch).toPrecision(3))} V`],
          [`I_DSS: ${scale(1, 20, 'mA')}`, `beta: ${scale(0.5, 5, 'mA/V²')}`],
          [`g_fs0: ${scale(1, 9, 'mS')}`, `I_DSS: ${scale(1, 20, 'mA')}`],
          [`V_P: ${volts(-pinch)}`, `g_fs: ${scale(0.5, 3, 'mS')} at I_D = 1 mA`],
          ['I_DSS: 2 mA .. 9 mA', `V_P: ${volts(-4)} .. ${volts(-1)}`],
        ])
      : pick([
          [`V_TO: ${volts(opens)}`, `K: ${scale(0.2, 50, 'mA/V^2')}`],
          [`V_TO: ${volts(opens)}`, `K_P: ${scale(20, 200, 'uA/V^2')}`, 'W: 200 um', 'L: 2 um'],
          [`V_TO: ${volts(opens)}`, `I_on: ${scale(5, 200, 'mA')} at V_GS = ${volts(10)}`],
          [`V_TO: ${volts(opens)}`, `g_fs: ${scale(5, 20, 'mS')} at I_D = 10 mA`],
          [
            `V_GSth: ${volts(opens)} at I_D = ${pick(['1 mA', '250 uA'])}`,
            `I_on: ${scale(50, 200, 'mA')} at V_GS = ${volts(10)}`,
          ],
          [`V_GSth: ${volts(opens)} at I_D = 100 uA`, `K: ${scale(1, 50, 'mA/V^2')}`],
          [`I_DSS: ${scale(1, 20, 'mA')}`, `V_P: ${volts(-pinch)}`],
        ]);
    const extras = [
      `lambda: ${pick(['0.01 /V', '0.02/V', '0 /V', '0.05 /V'])}`,
      `g_os: ${scale(2, 40, 'uS')} at I_D = 2 mA, V_DS = ${volts(10)}`,
      `I_GSS: ${scale(0.1, 5, 'nA')}`,
      `R_thJA: ${scale(100, 400, 'K/W')}`,
      `r_s: ${scale(1, 20, 'ohm')}`,
      `r_d: ${scale(1, 20, 'ohm')}`,
      'tempco: -2.5 mV/K',
      `T_nom: ${pick(['20', '27'])} degC`,
      'doubling: 9 K',
      'C_GS: 4 pF',
      'C_GD: 2 pF',
      ...(isJfet ? [] : ['gamma: 0.5 V^0.5', 'phi: 0.7 V']),
    ].filter((line) => chance(0.25) && !(line.startsWith('g_os') && chance(0.5)));
    const seen = new Set<string>();
    const body = [...law, ...extras].filter((line) => {
      const field = line.split(':')[0];
      return !seen.has(field) && seen.add(field);
    });
    const head = `${name} = ${sign > 0 ? 'n' : 'p'}-${isJfet ? 'JFET' : 'MOSFET'}`;
    return { name, kind: null, lines: [head, ...body.map((line) => `  ${line}`)], offers: [] };
  }

  const isP = (name: string): boolean =>
    blocks.find((block) => block.name === name)?.lines[0].includes('= p-') ?? false;
  const isMosfet = (name: string): boolean =>
    blocks.find((block) => block.name === name)?.lines[0].includes('MOSFET') ?? false;

  function point(of: string): Block {
    const sign = isP(of) ? -1 : 1;
    const name = fresh('P');
    const gate = isMosfet(of) ? 1 + 4 * draw() : -2 * draw();
    const held = chance(0.5) ? `V_GS: ${Number((sign * gate).toPrecision(3))} V` : `I_D: ${scale(0.05, 5, 'mA')}`;
    const lines = [
      `${name} = point of ${of}`,
      `  ${held}`,
      `  V_DS: ${Number((sign * (0.2 + 15 * draw())).toPrecision(3))} V`,
    ];
    if (isMosfet(of) && chance(0.3)) lines.push(`  V_SB: ${sign * 2} V`);
    return { name, kind: null, lines, offers: FET_OFFERS };
  }

  function stage(of: string): Block {
    const sign = isP(of) ? -1 : 1;
    const name = fresh('A');
    const rails = named('V').filter((rail) => /^V_DD$/.test(rail));
    const rail = rails.length > 0 && sign > 0 && chance(0.6) ? 'V_DD' : `${sign * Math.round(9 + 15 * draw())} V`;
    const mosfet = isMosfet(of);
    const gates = mosfet
      ? [
          `${resistance(1e5, 1e6)} to ${rail}, ${resistance(1e5, 1e6)} to 0 V, 1 uF to signal`,
          `${scale(0.5, 5, 'Mohm')} to drain, 100 nF to signal`,
          'to drain',
        ]
      : [
          `${scale(0.1, 5, 'Mohm')} to 0 V, 100 nF to signal`,
          'to signal',
          `${resistance(1e5, 1e6)} to ${sign * -1} V, 100 nF to signal`,
          'to 0 V',
        ];
    const sources = [
      `${resistance(100, 5000)} to 0 V`,
      `${resistance(100, 5000)} to 0 V, 47 uF to 0 V`,
      `${resistance(100, 1000)} to foot`,
      'to 0 V',
      ...(mosfet ? [] : [`${scale(0.1, 1, 'mA')} ${sign > 0 ? 'to' : 'from'} ${sign * -9} V`]),
    ];
    const source = pick(sources);
    const lines = [
      `${name} = stage of ${of}`,
      `  gate: ${pick(gates)}`,
      `  drain: ${chance(0.15) ? `to ${rail}` : `${resistance(300, 9000)} to ${rail}`}, 1 uF to load`,
      `  source: ${source}`,
      ...(source.includes('foot') ? [`  foot: ${resistance(100, 2000)} to 0 V, 10 uF to 0 V`] : []),
      ...(mosfet && chance(0.3) ? ['  bulk: to 0 V'] : []),
      `  load: ${scale(10, 1000, 'kohm')} to 0 V`,
      ...(chance(0.9) ? [`  output: ${pick(['load', 'load', 'drain', 'source'])}`] : []),
    ];
    const offers: Block['offers'] = [
      ...FET_OFFERS,
      ['V_drain', 'V'],
      ['V_source', 'V'],
      ['V_load', 'V'],
      ['P_total', 'W'],
    ];
    return { name, kind: null, lines, offers };
  }

  const partNames = (): string[] =>
    blocks.filter((block) => / = [np]-/.test(block.lines[0])).map((block) => block.name);

  // ---------------------------------------------------------------- the first sheet
  blocks.push({ name: 'V_DD', kind: 'V', lines: ['V_DD = 15 V ± 5 %'], offers: [] });
  if (chance(0.5))
    blocks.push({
      name: 'T_A',
      kind: 'degC',
      lines: [`T_A = ${pick([`${Math.round(-20 + 90 * draw())} degC`, '300 K'])}`],
      offers: [],
    });
  for (const kind of KINDS) if (chance(0.7)) blocks.push(input(kind));
  blocks.push({ name: fresh('R'), kind: 'ohm', lines: [`R_${counter} = ${scale(0.5, 5, 'kohm')}`], offers: [] });
  for (let k = 0; k < 2; k++) blocks.push(part());
  for (const name of partNames()) blocks.push(stage(name));
  blocks.push(point(pick(partNames())));
  for (let k = 0; k < quantities; k++) blocks.push(formula(pick(KINDS)));
  blocks.push(check(), check());

  // ---------------------------------------------------------------- edits
  let sound = [...blocks];
  let sinceSound = 0;
  const at = (): number => Math.floor(draw() * blocks.length);
  const replace = (index: number, block: Block): void => {
    blocks = blocks.map((old, i) => (i === index ? block : old));
  };
  const quantityAt = (): number => {
    const all = blocks.flatMap((block, i) => (block.kind ? [i] : []));
    return all.length > 0 ? pick(all) : -1;
  };
  /** Cells before `index`, so that what is written there makes no circle. */
  const before = <T>(index: number, write: () => T): T => {
    const whole = blocks;
    blocks = whole.slice(0, index);
    const written = write();
    blocks = whole;
    return written;
  };

  const SOUND: Readonly<Record<string, () => void>> = {
    'a number': () => {
      const numbered = blocks.flatMap((block, i) => (block.kind && /= \d/.test(block.lines[0]) ? [i] : []));
      if (numbered.length === 0) return;
      const i = pick(numbered);
      const [line] = blocks[i].lines;
      replace(i, {
        ...blocks[i],
        lines: [line.replace(/= [\d.]+/, `= ${Number((20 * draw() + 0.5).toPrecision(2))}`)],
      });
    },
    'a formula': () => {
      const i = quantityAt();
      if (i >= 0)
        replace(
          i,
          before(i, () => formula(blocks.length > 0 ? pick(KINDS) : 'V', undefined)),
        );
    },
    'a formula of the same kind': () => {
      const i = quantityAt();
      if (i < 0) return;
      const { name, kind } = blocks[i];
      replace(
        i,
        before(i, () => formula(kind!, name)),
      );
    },
    'a new cell': () => {
      const i = at();
      const block = before(i, () => (chance(0.3) ? check() : formula(pick(KINDS))));
      blocks = [...blocks.slice(0, i), block, ...blocks.slice(i)];
    },
    'a part': () => {
      const names = partNames();
      if (names.length === 0) return;
      const name = pick(names);
      replace(
        blocks.findIndex((block) => block.name === name),
        part(name),
      );
    },
    'a stage': () => {
      const names = partNames();
      const stages = blocks.flatMap((block, i) => (/ = stage/.test(block.lines[0]) ? [i] : []));
      if (names.length === 0 || stages.length === 0) return;
      const i = pick(stages);
      const { name } = blocks[i];
      const made = before(i, () => (partNames().length > 0 ? stage(pick(partNames())) : blocks[i]));
      if (made) replace(i, { ...made, name, lines: [made.lines[0].replace(/^\w+/, name), ...made.lines.slice(1)] });
    },
    'two cells change places': () => {
      const [i, j] = [at(), at()];
      blocks = blocks.map((block, k) => (k === i ? blocks[j] : k === j ? blocks[i] : block));
    },
  };
  const UNSOUND: Readonly<Record<string, () => void>> = {
    'a cell is gone': () => {
      const i = at();
      blocks = blocks.filter((_, k) => k !== i);
    },
    'another kind under the same name': () => {
      const i = quantityAt();
      if (i < 0) return;
      const { name } = blocks[i];
      replace(
        i,
        before(i, () => formula(pick(KINDS), name)),
      );
    },
    'a name twice': () => {
      const i = quantityAt();
      if (i >= 0) blocks = [...blocks, { ...blocks[i], lines: [`${blocks[i].name} = ${literal(blocks[i].kind!)}`] }];
    },
    'a circle, perhaps': () => {
      const i = quantityAt();
      if (i >= 0) replace(i, formula(blocks[i].kind!, blocks[i].name));
    },
    'a root of what is negative': () => {
      const i = quantityAt();
      if (i >= 0)
        replace(i, {
          ...blocks[i],
          lines: [`${blocks[i].name} = sqrt(-abs(${literal('plain')})) * ${leaf(blocks[i].kind!)}`],
        });
    },
    'a line of a block is gone': () => {
      const blockish = blocks.flatMap((block, i) => (block.lines.length > 2 ? [i] : []));
      if (blockish.length === 0) return;
      const i = pick(blockish);
      const k = 1 + Math.floor(draw() * (blocks[i].lines.length - 1));
      replace(i, { ...blocks[i], lines: blocks[i].lines.filter((_, n) => n !== k) });
    },
    'a sign of a part': () => {
      const names = partNames();
      if (names.length === 0) return;
      const i = blocks.findIndex((block) => block.name === names[0]);
      const k = 1 + Math.floor(draw() * (blocks[i].lines.length - 1));
      replace(i, {
        ...blocks[i],
        lines: blocks[i].lines.map((line, n) =>
          n === k ? line.replace(/: -?/, (m) => (m === ': ' ? ': -' : ': ')) : line,
        ),
      });
    },
    'a line that cannot be read': () => {
      const i = quantityAt();
      if (i >= 0) replace(i, { ...blocks[i], lines: [`${blocks[i].name} = 3 ${blocks[i].name}`] });
    },
    'an unlike sum': () => {
      const i = quantityAt();
      if (i >= 0) replace(i, { ...blocks[i], lines: [`${blocks[i].name} = ${leaf('V')} + ${leaf('A')}`] });
    },
    'an unlike leg': () => {
      const stages = blocks.flatMap((block, i) => (/ = stage/.test(block.lines[0]) ? [i] : []));
      if (stages.length === 0) return;
      const i = pick(stages);
      replace(i, {
        ...blocks[i],
        lines: blocks[i].lines.map((line) =>
          line.startsWith('  load') ? `  load: ${pick(['3 V', '0 ohm', '-5 ohm', 'q_0'])} to 0 V` : line,
        ),
      });
    },
  };

  return {
    text: () => `# Random sheet\n${blocks.flatMap((block) => block.lines).join('\n')}\n`,
    edit() {
      if (sinceSound >= 4 || (sinceSound > 0 && chance(0.3))) {
        blocks = [...sound];
        sinceSound = 0;
        return 'back to what was sound';
      }
      const isSound = chance(0.7);
      const table = isSound ? SOUND : UNSOUND;
      const what = pick(Object.keys(table));
      table[what]();
      if (isSound && sinceSound === 0) sound = [...blocks];
      else sinceSound++;
      return what;
    },
  };
}
