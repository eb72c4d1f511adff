// The terminal entry: `npm run -s sheet -- FILE [--json] [--workings NAME]`.

import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { EXIT } from './exit-status.ts';
import { run } from './run.ts';

const DEFAULT_WIDTH = 100;
/** Its file descriptor. */
const STANDARD_INPUT = 0;

// npm runs scripts in the package's folder and keeps where the user stands in INIT_CWD.
const here = process.env['INIT_CWD'] ?? process.cwd();

// A reader that has seen enough (`| head`) closes the pipe; that is no fault of the sheet.
process.stdout.on('error', (thrown: NodeJS.ErrnoException) => {
  if (thrown.code === 'EPIPE') return;
  process.stderr.write(`The report could not be written (${thrown.code ?? thrown.message}).\n`);
  process.exitCode = EXIT.ownFault;
});

process.exitCode = run(process.argv.slice(2), {
  read: (file) => readFileSync(file === '-' ? STANDARD_INPUT : resolve(here, file)),
  print: (text) => process.stdout.write(text),
  complain: (text) => process.stderr.write(text),
  width: process.stdout.columns || DEFAULT_WIDTH,
});
