// What was asked on the command line.

import { parseSamples, parseSeed, parseShare } from '../record/index.ts';

interface ComputeCall {
  readonly kind: 'compute';
  /** Path as given; `-` is standard input. */
  readonly file: string;
  readonly json: boolean;
  /** The cell whose workings are wanted. */
  readonly workings: string | null;
  /** As asked for; null where the sheet decides. */
  readonly samples: number | null;
  readonly seed: number | null;
  readonly leastYield: number | null;
}

type Call = ComputeCall | { readonly kind: 'help' } | { readonly kind: 'wrong'; readonly text: string };

export const USAGE = 'Usage: npm run -s sheet -- FILE [FLAG ..]; --help lists the flags';

export const HELP = `${USAGE}

Computes a sheet file and prints its values, their spread, checks and cautions.

  FILE             a sheet text in UTF-8; - reads standard input
  --json           print one JSON object instead of a table
  --workings NAME  print formula, numbers and result behind the cell NAME
  --samples N      count N builds (10000 unless the sheet says otherwise)
  --seed S         draw them by the seed S (1 unless the sheet says otherwise)
  --yield SHARE    ask for a share of builds, such as 0.95, not every extreme
  --help           print this

Exit status
  0  every check holds, at the nominal values and at every extreme
  1  a check fails
  2  a cell is broken or has no value, whatever the checks say
  3  the file cannot be read, or the call is wrong
 70  the program failed or could not write its report; no word on the sheet
`;

/** Reads the arguments behind the program's name. Flags may stand before or behind FILE; behind `--` nothing is a flag. */
export function parseArguments(args: readonly string[]): Call {
  const files: string[] = [];
  const values = new Map<string, string>();
  let json = false;
  let flagsEnded = false;
  for (let i = 0; i < args.length; i++) {
    const arg = args[i]!;
    const equals = arg.indexOf('=');
    const flag = equals < 0 ? arg : arg.slice(0, equals);
    if (flagsEnded || arg === '-' || !arg.startsWith('-')) {
      files.push(arg);
    } else if (arg === '--') {
      flagsEnded = true;
    } else if (arg === '--help') {
      return { kind: 'help' };
    } else if (arg === '--json') {
      json = true;
    } else if (Object.hasOwn(VALUED, flag)) {
      const { once, wanted } = VALUED[flag as keyof typeof VALUED];
      if (values.has(flag)) return wrong(`${flag} stands twice; ${once}`);
      const value: string | undefined = equals < 0 ? args[++i] : arg.slice(equals + 1);
      if (value === undefined || value === '' || value.startsWith('-'))
        return wrong(`${flag} wants ${wanted} behind it.`);
      values.set(flag, value);
    } else {
      return wrong(`${arg} is not known; there are --json, ${Object.keys(VALUED).join(', ')} and --help.`);
    }
  }
  if (files.length === 0) return wrong('The name of a sheet file is missing; - reads standard input.');
  if (files.length > 1)
    return wrong(`One sheet is computed at a time; ${files.length} were named: ${files.join(', ')}.`);
  const samples = values.has('--samples') ? parseSamples(values.get('--samples')!) : undefined;
  const seed = values.has('--seed') ? parseSeed(values.get('--seed')!) : undefined;
  const leastYield = values.has('--yield') ? parseShare(values.get('--yield')!) : undefined;
  if (samples === null) return wrong('--samples wants a whole number from 1 to 10 000 000 behind it.');
  if (seed === null) return wrong('--seed wants a whole number from 0 to 4 294 967 295 behind it.');
  if (leastYield === null) return wrong('--yield wants a share from 0 to 1 behind it, such as 0.95.');
  return {
    kind: 'compute',
    file: files[0]!,
    json,
    workings: values.get('--workings') ?? null,
    samples: samples ?? null,
    seed: seed ?? null,
    leastYield: leastYield ?? null,
  };
}

/** Flags with a value, and what is said where it stands twice or lacks it. */
const VALUED = {
  '--workings': {
    once: 'the workings of one cell are printed at a time.',
    wanted: 'the name of a cell',
  },
  '--samples': { once: 'give one number of builds.', wanted: 'a number of builds' },
  '--seed': { once: 'give one seed.', wanted: 'a seed' },
  '--yield': { once: 'give one share.', wanted: 'a share of builds' },
} as const;

function wrong(text: string): Call {
  return { kind: 'wrong', text };
}
