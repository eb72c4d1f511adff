// The whole test of the project, in order: types, lint, format, unit tests, the build, and the built page in a browser.
// The last line is the count; the exit code is 1 when anything failed.

import { spawnSync } from 'node:child_process';
import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { addTallies, tallyStep, tallyTests } from './tally.ts';
import type { Tally, TestReport } from './tally.ts';

const REPORTS = path.join('node_modules', '.cache', 'squarelaw');

function run(command: string): number {
  console.log(`\n> ${command}`);
  return spawnSync(command, { shell: true, stdio: 'inherit' }).status ?? 1;
}

function runTests(project: string): Tally {
  const file = path.join(REPORTS, `${project}.json`);
  rmSync(file, { force: true });
  const exitCode = run(
    `npx vitest run --project ${project} --reporter=default --reporter=json --outputFile.json=${file}`,
  );
  return tallyTests(`The ${project} tests`, readReport(file), exitCode);
}

function readReport(file: string): TestReport | null {
  try {
    return JSON.parse(readFileSync(file, 'utf8')) as TestReport;
  } catch {
    return null;
  }
}

mkdirSync(REPORTS, { recursive: true });
// A page built earlier must not stand in for one that cannot be built now.
rmSync('dist', { recursive: true, force: true });
const tallies = [
  tallyStep('The type check', run('npm run -s check:types')),
  tallyStep('Lint', run('npm run -s check:lint')),
  tallyStep('The format check', run('npm run -s check:format')),
  runTests('unit'),
  tallyStep('The build', run('npm run -s build')),
  runTests('browser'),
];
const { passed, failed, remarks } = addTallies(tallies);
console.log('');
for (const remark of remarks) console.log(remark);
console.log(`${passed} passed, ${failed} failed`);
process.exitCode = failed > 0 ? 1 : 0;
