// Kinds of lines, the block a line stands in, line ends, and the reuse of trees.

import { expect, test } from 'vitest';
import { lineColumn, parseSheet } from '../../src/language/index.ts';
import type { Condition, SheetTree } from '../../src/language/index.ts';

/** One word for each line: its kind, and for cells and fields what is inside. */
function kinds(sheet: SheetTree): string[] {
  return sheet.lines.map(({ tree }) => {
    if (tree.type === 'cell') return `cell ${tree.name.name} ${tree.entry.type}`;
    if (tree.type === 'field') return `field ${tree.label.map((each) => each.name).join('.')} ${tree.body.type}`;
    if (tree.type === 'heading') return `heading ${tree.level} ${tree.text}`;
    if (tree.type === 'row') return `row ${tree.values.length}`;
    return tree.type;
  });
}

test('each line is of the kind that its first characters say', () => {
  const text = [
    '# Input stage',
    '  project: Tank',
    '> prose',
    '  > indented prose',
    '; note',
    '  ; indented note',
    '',
    '   ',
    '## Section',
    'x = 1',
    'Q1 = n-JFET',
    '  I_DSS: 5 mA',
    'M1 = bench',
    '  columns: part, V_GS [V]',
    '  s1, -0.5',
    'nothing of these',
  ].join('\n');
  expect(kinds(parseSheet(text))).toEqual([
    'heading 1 Input stage',
    'field project text',
    'prose',
    'prose',
    'note',
    'note',
    'blank',
    'blank',
    'heading 2 Section',
    'cell x quantity',
    'cell Q1 part',
    'field I_DSS quantity',
    'cell M1 bench',
    'field columns columns',
    'row 2',
    'broken',
  ]);
});

test('only the first # is the title, a later one is a section', () => {
  const sheet = parseSheet('x = 1\n# First\n  author: A\n# Second\n## Third\n#\n');
  expect(kinds(sheet)).toEqual([
    'cell x quantity',
    'heading 1 First',
    'field author text',
    'heading 2 Second',
    'heading 2 Third',
    'heading 2 ',
  ]);
  expect(sheet.title?.text).toBe('First');
  expect(sheet.title?.fields.map((field) => field.line.index)).toEqual([2]);
});

test('the entry of each kind of cell is read whole', () => {
  const entries = [
    ['5 V', 'quantity'],
    ['n-JFET', 'part'],
    ['p-JFET', 'part'],
    ['n-MOSFET', 'part'],
    ['p-MOSFET fitted to M1', 'part'],
    ['another Q1', 'another'],
    ['point of Q1', 'point'],
    ['stage of Q1', 'stage'],
    ['stage of Qa = Q1, Qb = Q2', 'stage'],
    ['bench', 'bench'],
    ['check a >= b and not c = d', 'check'],
    ['plot transfer of A1', 'plot'],
    ['plot output of A1 over 0 V .. 20 V', 'plot'],
    ['plot response of A1 over 1 Hz .. 1 MHz log', 'plot'],
    ['plot noise of A1', 'plot'],
    ['plot bench of M1', 'plot'],
    ['plot spread of A1.I_D', 'plot'],
    ['plot A1.I_D, 2 * x against R_S over 1 ohm .. 2 ohm', 'plot'],
    ['plot noise against noise.x over 1 .. 2 log', 'plot'],
    ['R_S such that A1.I_D = 1 mA over 100 ohm .. 10 kohm', 'inverse'],
    ['Q1.V_P such that low(A1.margin) = 1 V over -4 V .. -1 V each', 'inverse'],
  ] as const;
  for (const [entry, type] of entries) {
    const { entry: read } = parseSheet(`x = ${entry} [s]`).cells[0];
    expect([entry, read.type, read.span]).toEqual([entry, type, { start: 4, end: 4 + entry.length }]);
  }
});

test('what an entry says is in its tree', () => {
  const entry = (text: string): unknown => parseSheet(`x = ${text}`).cells[0].entry;
  expect(entry('p-MOSFET fitted to M1')).toMatchObject({ channel: 'p', family: 'MOSFET', fittedTo: { name: 'M1' } });
  expect(entry('stage of Qa = Q1, Qb = Q2')).toMatchObject({
    fets: [
      { name: { name: 'Qa' }, part: { name: 'Q1' } },
      { name: { name: 'Qb' }, part: { name: 'Q2' } },
    ],
  });
  expect(entry('stage of Q1')).toMatchObject({ fets: [{ name: null, part: { name: 'Q1' } }] });
  expect(entry('plot spread of x')).toMatchObject({ figure: 'spread', of: null, over: null, against: null });
  expect(entry('plot response of A1 over 1 Hz .. 1 MHz log')).toMatchObject({
    figure: 'response',
    of: { name: 'A1' },
    over: { log: true },
    values: [],
  });
  expect(entry('plot a, b against Q1.V_P over 1 .. 2')).toMatchObject({
    figure: 'against',
    values: [{}, {}],
    against: { names: [{ name: 'Q1' }, { name: 'V_P' }] },
    over: { log: false },
  });
  expect(entry('R_S such that a = 1 over 1 .. 2 each')).toMatchObject({ each: true, over: { log: false } });
});

test('a stage has legs, an output, a driven resistor and a midband', () => {
  const sheet = parseSheet(
    [
      'A1 = stage of Q1',
      '  gate: R_G to 0 V, 100 nF to signal',
      '  Qb.gate: 1 uF to -signal',
      '  tail: 1 mA from V_DD, to common',
      '  in: to in',
      '  empty:',
      '  output: drain - out',
      '  driven: through R_G + 1 kohm',
      '  midband: 1 kHz',
      '  load: 10 kohm to V_DD / 2',
    ].join('\n'),
  );
  const legs = (index: number): unknown => {
    const { body } = sheet.cells[0].fields[index];
    return body.type === 'legs'
      ? body.legs.map(({ element, direction, place }) => [
          element !== null,
          direction,
          place.type === 'signal' ? (place.inverted ? '-signal' : 'signal') : place.type,
        ])
      : body.type;
  };
  expect(sheet.cells[0].fields.map((_, index) => legs(index))).toEqual([
    [
      [true, 'to', 'expr'],
      [true, 'to', 'signal'],
    ],
    [[true, 'to', '-signal']],
    [
      [true, 'from', 'expr'],
      [false, 'to', 'common'],
    ],
    [[false, 'to', 'expr']],
    [],
    'output',
    'driven',
    'midband',
    [[true, 'to', 'expr']],
  ]);
  expect(sheet.cells[0].fields[1].label.map((each) => each.name)).toEqual(['Qb', 'gate']);
  expect(sheet.cells[0].fields[5].body).toMatchObject({
    plus: { names: [{ name: 'drain' }] },
    minus: { names: [{ name: 'out' }] },
  });
});

test('a bench has columns with units, and rows of numbers and names', () => {
  const sheet = parseSheet(
    'M1 = bench\n  columns: specimen, V_GS [V], I_D [mA] [notebook 3] ; at 23 degC\n  s1, -0.5 V, 2.1 [page 4]\n  2, −1,3.5\n',
  );
  const [{ fields, rows }] = sheet.cells;
  expect(fields[0].body).toMatchObject({
    columns: [
      { name: { name: 'specimen' }, unit: null },
      { name: { name: 'V_GS' }, unit: { symbol: 'V' } },
      { name: { name: 'I_D' }, unit: { symbol: 'mA' } },
    ],
  });
  expect([fields[0].source?.text, fields[0].note?.text]).toEqual(['notebook 3', 'at 23 degC']);
  expect(rows.map((row) => row.values.map((value) => ('name' in value ? value.name : value.value)))).toEqual([
    ['s1', -0.5, 2.1],
    [2, -1, 3.5],
  ]);
  expect(sheet.lines[2].tree).toMatchObject({ source: { text: 'page 4' } });
});

test('a bench says what is asked of its rows: the exponent, what is kept, groups that match, a current to fit for', () => {
  const fields = [
    'exponent: free',
    'exponent: 2',
    'V_DS: 10 V',
    'keep: V_GS in -1.2 V .. at I_D = 1 mA, V_DS = 5 V  [agreed]',
    'match: quads at V_DS = 5 V, I_D = 1 mA and 3 mA',
    'fitting: I_D = 1 mA, V_DS = 10 V',
  ];
  const [cell] = parseSheet(`M1 = bench\n${fields.map((field) => `  ${field}\n`).join('')}`).cells;
  const conditions = (body: object): unknown =>
    'conditions' in body ? (body.conditions as Condition[]).map(({ name, literal }) => [name.name, literal.value]) : [];
  expect(cell.fields.map(({ body }) => [body.type, conditions(body)])).toEqual([
    ['exponent', []],
    ['exponent', []],
    ['quantity', []],
    [
      'keep',
      [
        ['I_D', 1e-3],
        ['V_DS', 5],
      ],
    ],
    [
      'match',
      [
        ['V_DS', 5],
        ['I_D', 1e-3],
      ],
    ],
    [
      'fitting',
      [
        ['I_D', 1e-3],
        ['V_DS', 10],
      ],
    ],
  ]);
  expect(cell.fields.slice(0, 2).map(({ body }) => body)).toMatchObject([{ isFree: true }, { isFree: false }]);
  expect(cell.fields[3].body).toMatchObject({
    quantity: { name: 'V_GS' },
    bounds: { first: { value: -1.2 }, last: null },
  });
  expect(cell.fields[4].body).toMatchObject({ size: 4, second: { value: 3e-3 } });
});

test('a source, then a note, may stand behind an entry', () => {
  const tail = (text: string): unknown[] => {
    const { source, note, entry } = parseSheet(text).cells[0];
    return [entry.type, source?.text ?? null, note?.text ?? null];
  };
  expect(tail('x = 15 V [see https://x, p. 2] ; [3]')).toEqual(['quantity', 'see https://x, p. 2', '[3]']);
  expect(tail('x = 15 V;note')).toEqual(['quantity', null, 'note']);
  expect(tail('x = 15 V[ a; b ]')).toEqual(['quantity', 'a; b', null]);
  expect(tail('x = 15 V [] ;')).toEqual(['quantity', '', '']);
  expect(tail('x = 15 V [a] b')).toEqual(['broken', 'a', null]);
  expect(tail('x = [a] ; b')).toEqual(['broken', 'a', 'b']);
});

test('the fields of the title are free text', () => {
  const text = (field: string): unknown => {
    const { body, source, note } = parseSheet(`# T\n  ${field}`).title!.fields[0];
    return [body.type === 'text' && body.text, source?.text ?? null, note?.text ?? null];
  };
  expect(text('project: Tank 10 V/R = (level')).toEqual(['Tank 10 V/R = (level', null, null]);
  expect(text('author: -')).toEqual(['-', null, null]);
  expect(text('checked: A1.I_D, headroom [AB, May] ; twice')).toEqual(['A1.I_D, headroom', 'AB, May', 'twice']);
  expect(text('reason: part [old] replaced')).toEqual(['part [old] replaced', null, null]);
  expect(text('reason: open [bracket')).toEqual(['open [bracket', null, null]);
  const { title, loose } = parseSheet('# T\n  checked: a\n  checked: b\n  status: x\n  status: y\n');
  expect(title?.fields.map((field) => field.line.index)).toEqual([1, 2, 3]);
  expect(loose.map(({ line, message }) => [line.index, message.code])).toEqual([[4, 'title-field-doubled']]);
});

test('blank lines, notes and prose end no block; the next cell or heading does', () => {
  const sheet = parseSheet(
    'Q1 = n-JFET\n  I_DSS: 5 mA\n\n> prose\n; note\n  V_P: -2 V\n## S\n  gate: 5 V\nx = 1\n  a: 2\n',
  );
  expect(sheet.cells[0].fields.map((field) => field.label[0].name)).toEqual(['I_DSS', 'V_P']);
  expect(sheet.loose.map(({ line, message }) => [line.index, message.code])).toEqual([[7, 'field-without-cell']]);
  expect(sheet.cells[1].fields.map(({ body }) => body.type === 'broken' && body.message.code)).toEqual([
    'field-not-taken',
  ]);
});

test('a line of a block that cannot be read is a broken field, so that no stage loses a leg unseen', () => {
  const broken = (line: string): unknown => {
    const { cells } = parseSheet(`A1 = stage of Q1\n  gate: to signal\n${line}\n  drain: R_D to V_DD\n`);
    return [cells.length, cells[0].fields.length, cells[0].fields[1].body.type];
  };
  for (const line of [
    '  source R_S to 0 V',
    '  source = R_S to 0 V',
    '  (',
    'source: R_S to 0 V',
    '  source: R_S too 0 V',
    '  1, 2',
  ])
    expect([line, broken(line)]).toEqual([line, [1, 3, 'broken']]);
});

test('a slip at the margin leaves the block above whole, and one with = begins another cell', () => {
  const sheet = parseSheet('Q1 = n-JFET\nforgotten prose\n  I_DSS: 5 mA\n2N = n-JFET\n  V_P: 3 V\n');
  expect(sheet.cells.map((cell) => cell.fields.length)).toEqual([1]);
  expect(sheet.loose.map(({ line, message }) => [line.index, message.code])).toEqual([
    [1, 'line-unknown'],
    [3, 'name-form'],
    [4, 'field-of-unread-line'],
  ]);
});

test('the fields below a head that cannot be read are kept, and read where its kind is plain', () => {
  const sheet = parseSheet(
    'A1 = stage of\n  gate: R_G to 0 V\nQ1 = n-JFTE\n  I_DSS: 5 mA\nR_S 5\n  a: b\nx = 5 +\n  a: b\n',
  );
  expect(sheet.cells.map(({ name, entry, fields }) => [name.name, entry.type, fields[0].body.type])).toEqual([
    ['A1', 'broken', 'legs'],
    ['Q1', 'quantity', 'broken'],
    ['R_S', 'broken', 'text'],
    ['x', 'broken', 'text'],
  ]);
});

test('two cells of one name both stand in the tree', () => {
  expect(parseSheet('β = 1\nbeta = 2\n').cells.map((cell) => cell.name.name)).toEqual(['beta', 'beta']);
});

test('words are words only in their place', () => {
  const text =
    'normal = 1\nlog = normal\ntransfer = plot log against normal over 1 .. 2 log\nuniform = 5 ± 1 uniform\ngain = gain(log, 1 Hz)\n';
  expect(parseSheet(text).cells.map((cell) => cell.entry.type)).toEqual([
    'quantity',
    'quantity',
    'plot',
    'quantity',
    'quantity',
  ]);
});

test.each([
  ['a = 1\nb = 2\n', ['a = 1', 'b = 2'], [0, 6]],
  ['a = 1\r\nb = 2\r\n', ['a = 1', 'b = 2'], [0, 7]],
  ['a = 1\n\nb = 2', ['a = 1', '', 'b = 2'], [0, 6, 7]],
  ['a = 1\r', ['a = 1\r'], [0]],
  ['\n', [''], [0]],
  ['', [], []],
])('%j has the lines %j', (text, lines, offsets) => {
  const sheet = parseSheet(text);
  expect(sheet.lines.map((line) => line.text)).toEqual(lines);
  expect(sheet.lines.map((line) => line.offset)).toEqual(offsets);
  expect(sheet.text).toBe(text);
  expect(sheet.loose).toEqual([]);
});

test('a byte order mark at the start is no part of the first line', () => {
  expect(kinds(parseSheet('\ufeff# T\nx = 1'))).toEqual(['heading 1 T', 'cell x quantity']);
  expect(kinds(parseSheet('\ufeffx = 1'))).toEqual(['cell x quantity']);
});

test('an edit reads anew only the lines it touched', () => {
  const lines = [
    '# T',
    '  author: A',
    'Q1 = n-JFET',
    '  I_DSS: 5 mA',
    'A1 = stage of Q1',
    '  gate: R_G to 0 V',
    'x = 5 V',
  ];
  const before = parseSheet(lines.join('\n'));
  const changed = lines.with(3, '  I_DSS: 6 mA').toSpliced(5, 0, '; a note');
  const after = parseSheet(changed.join('\n'), before);
  const same = after.lines.filter(({ tree }) => before.lines.some((line) => line.tree === tree));
  expect(same.map((line) => line.text)).toEqual(lines.filter((_, index) => index !== 3));
  expect(after.lines.map((line) => line.offset)).toEqual(parseSheet(after.text).lines.map((line) => line.offset));
});

test('a line that comes to stand in another block is read anew', () => {
  const before = parseSheet('Q1 = n-JFET\n  gate: 5 V\n');
  const after = parseSheet('Q1 = stage of Q2\n  gate: 5 V\n', before);
  expect(after.cells[0].fields[0].body).toMatchObject({ type: 'broken', message: { code: 'leg-form' } });
  const late = parseSheet('# a\n# b', parseSheet('# b'));
  expect(kinds(late)).toEqual(['heading 1 a', 'heading 2 b']);
});

test('columns are counted in characters from 1', () => {
  const line = { text: '𝛼 = β' };
  expect([0, 2, 3, 5].map((at) => lineColumn(line, at))).toEqual([1, 2, 3, 5]);
});
