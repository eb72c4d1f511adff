// What was asked on the command line.

interface ComputeCall {
  readonly kind: 'compute';
  /** Path as given; `-` is standard input. */
  readonly file: string;
  readonly json: boolean;
  /** The cell whose workings are wanted. */
  readonly workings: string | null;
}

type Call = ComputeCall | { readonly kind: 'help' } | { readonly kind: 'wrong'; readonly text: string };

export const USAGE = 'Usage: npm run -s sheet -- FILE [--json] [--workings NAME]';

export const HELP = `${USAGE}

Computes a sheet file and prints its values, checks and cautions.

  FILE             a sheet text in UTF-8; - reads standard input
  --json           print one JSON object instead of a table
  --workings NAME  print formula, numbers and result behind the cell NAME
  --help           print this

Exit status
  0  every check holds
  1  a check fails
  2  a cell is broken or has no value, whatever the checks say
  3  the file cannot be read, or the call is wrong
 70  the program failed or could not write its report; no word on the sheet
`;

/** Reads the arguments behind the program's name. Flags may stand before or behind FILE; behind `--` nothing is a flag. */
export function parseArguments(args: readonly string[]): Call {
  const files: string[] = [];
  let json = false;
  let workings: string | null = null;
  let flagsEnded = false;
  for (let i = 0; i < args.length; i++) {
    const arg = args[i]!;
    if (flagsEnded || arg === '-' || !arg.startsWith('-')) {
      files.push(arg);
    } else if (arg === '--') {
      flagsEnded = true;
    } else if (arg === '--help') {
      return { kind: 'help' };
    } else if (arg === '--json') {
      json = true;
    } else if (arg === '--workings' || arg.startsWith('--workings=')) {
      if (workings !== null) return wrong('--workings stands twice; the workings of one cell are printed at a time.');
      const name: string | undefined = arg === '--workings' ? args[++i] : arg.slice('--workings='.length);
      if (name === undefined || name === '' || name.startsWith('-'))
        return wrong('--workings wants the name of a cell behind it.');
      workings = name;
    } else {
      return wrong(`${arg} is not known; there are --json, --workings NAME and --help.`);
    }
  }
  if (files.length === 0) return wrong('The name of a sheet file is missing; - reads standard input.');
  if (files.length > 1)
    return wrong(`One sheet is computed at a time; ${files.length} were named: ${files.join(', ')}.`);
  return { kind: 'compute', file: files[0]!, json, workings };
}

function wrong(text: string): Call {
  return { kind: 'wrong', text };
}
