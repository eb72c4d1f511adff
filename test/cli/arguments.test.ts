import { describe, expect, it } from 'vitest';
import { parseArguments } from '../../src/cli/arguments.ts';
import { runOn, runSheet } from './run.ts';

describe('the arguments', () => {
  it('name a file, with flags before or behind it', () => {
    const call = {
      kind: 'compute',
      file: 'a.txt',
      json: true,
      workings: 'A1',
      samples: null,
      seed: null,
      leastYield: null,
    };
    expect(parseArguments(['a.txt', '--json', '--workings', 'A1'])).toEqual(call);
    expect(parseArguments(['--workings', 'A1', '--json', 'a.txt'])).toEqual(call);
    expect(parseArguments(['--workings=A1', '--json', 'a.txt'])).toEqual(call);
  });

  it('take how many builds, by which seed, and the share that is enough', () => {
    expect(parseArguments(['a', '--samples', '500', '--seed=7', '--yield', '95 %'])).toMatchObject({
      samples: 500,
      seed: 7,
      leastYield: 0.95,
    });
  });

  it('take - as standard input and what follows -- as a file', () => {
    expect(parseArguments(['-'])).toMatchObject({ file: '-' });
    expect(parseArguments(['--', '--json'])).toMatchObject({ file: '--json', json: false });
  });

  it.each([
    [[], 'The name of a sheet file is missing; - reads standard input.'],
    [['a', 'b'], 'One sheet is computed at a time; 2 were named: a, b.'],
    [['a', '--jsno'], '--jsno is not known; there are --json, --workings, --samples, --seed, --yield and --help.'],
    [['a', '-j'], '-j is not known; there are --json, --workings, --samples, --seed, --yield and --help.'],
    [['a', '--json=1'], '--json=1 is not known; there are --json, --workings, --samples, --seed, --yield and --help.'],
    [['a', '--samples', 'many'], '--samples wants a whole number from 1 to 10 000 000 behind it.'],
    [['a', '--seed', '1.5'], '--seed wants a whole number from 0 to 4 294 967 295 behind it.'],
    [['a', '--yield', '95'], '--yield wants a share from 0 to 1 behind it, such as 0.95.'],
    [['a', '--seed', '1', '--seed', '2'], '--seed stands twice; give one seed.'],
    [['a', '--workings'], '--workings wants the name of a cell behind it.'],
    [['--workings', '--json', 'a'], '--workings wants the name of a cell behind it.'],
    [['a', '--workings='], '--workings wants the name of a cell behind it.'],
    [
      ['a', '--workings', 'A', '--workings', 'B'],
      '--workings stands twice; the workings of one cell are printed at a time.',
    ],
  ])('%j is a wrong call, said in one line with the usage behind it', (args, text) => {
    const ran = runOn({ a: '' }, args);
    expect(ran).toEqual({
      status: 3,
      out: '',
      complaints: `${text}\nUsage: npm run -s sheet -- FILE [FLAG ..]; --help lists the flags\n`,
    });
  });

  it('print the help on request, whatever else stands there', () => {
    const { status, out, complaints } = runOn({}, ['nothing.txt', '--help']);
    expect([status, complaints]).toEqual([0, '']);
    expect(out).toContain('--workings NAME');
    expect(out.split('\n').every((line) => line.length <= 80)).toBe(true);
  });
});

describe('the name behind --workings', () => {
  const text = 'headroom = check 3 V > 2 V\nbeta = 2 mA/V^2\nA1 = 3 V';
  it('may be any cell, in any spelling of Greek letters', () => {
    expect(runSheet(text, '--workings', 'β')).toMatchObject({ status: 0, complaints: '' });
  });
  it.each([
    ['headrom', 'There is no cell headrom. Did you mean headroom?'],
    ['zzz', 'There is no cell zzz.'],
    ['A1.I_D', 'A1.I_D is a value of A1; name the cell: --workings A1.'],
  ])('%s is a wrong call', (name, complaint) => {
    const ran = runSheet(text, '--workings', name);
    expect([ran.status, ran.out]).toEqual([3, '']);
    expect(ran.complaints.split('\n')[0]).toBe(complaint);
  });
});

describe('a file that cannot be read', () => {
  it.each([
    ['ENOENT', 'There is no file a.txt.'],
    ['EISDIR', 'a.txt is a directory, not a sheet file.'],
    ['EACCES', 'a.txt may not be read: permission is denied.'],
    ['EIO', 'a.txt cannot be read (EIO).'],
  ])('%s ends with status 3 and one sentence', async (code, sentence) => {
    const { run } = await import('../../src/cli/run.ts');
    let complaints = '';
    const status = run(['a.txt', '--json'], {
      read: () => {
        throw Object.assign(new Error(code), { code });
      },
      print: () => expect.unreachable(),
      complain: (text) => (complaints += text),
      width: 80,
    });
    expect([status, complaints]).toEqual([3, `${sentence}\n`]);
  });

  it('may be no text in UTF-8', () => {
    const ran = runOn({ a: Uint8Array.of(0x52, 0x3d, 0xff) }, ['a']);
    expect(ran).toEqual({ status: 3, out: '', complaints: 'a is not UTF-8 text. Save it as UTF-8 and try again.\n' });
  });
});

describe('a fault of the program itself', () => {
  it('has a status of its own and says where it arose', async () => {
    const { run } = await import('../../src/cli/run.ts');
    let complaints = '';
    const status = run(['a.txt'], {
      read: () => new TextEncoder().encode('a = check 1 V < 2 V'),
      print: () => {
        throw new RangeError('no such column');
      },
      complain: (text) => (complaints += text),
      width: 80,
    });
    expect(status).toBe(70);
    expect(complaints).toMatch(/^The program failed; this says nothing of the sheet\.\nRangeError: no such column\n/);
  });
});
