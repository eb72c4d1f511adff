// One run of the terminal entry on texts instead of files.

import type { JsonReport } from '../../src/cli/json-report.ts';
import { run } from '../../src/cli/run.ts';

export interface Ran {
  readonly status: number;
  readonly out: string;
  readonly complaints: string;
}

/** Runs with `files` as the file system (`-` is standard input) and 100 characters in a line. */
export function runOn(files: Readonly<Record<string, string | Uint8Array>>, args: readonly string[], width = 100): Ran {
  let out = '';
  let complaints = '';
  const status = run(args, {
    read(file) {
      const content = files[file];
      if (content === undefined) throw Object.assign(new Error(`no ${file}`), { code: 'ENOENT' });
      return typeof content === 'string' ? new TextEncoder().encode(content) : content;
    },
    print: (text) => (out += text),
    complain: (text) => (complaints += text),
    width,
  });
  return { status, out, complaints };
}

/** Runs on one sheet text. */
export function runSheet(text: string, ...flags: string[]): Ran {
  return runOn({ 'a.txt': text }, ['a.txt', ...flags]);
}

/** The JSON report of a sheet text. */
export function report(text: string, ...flags: string[]): JsonReport {
  return JSON.parse(runSheet(text, '--json', ...flags).out) as JsonReport;
}
