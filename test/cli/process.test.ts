import { spawnSync } from 'node:child_process';
import { closeSync, existsSync, mkdtempSync, openSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { afterAll, describe, expect, it } from 'vitest';

const folder = mkdtempSync(path.join(tmpdir(), 'sheet-'));
afterAll(() => rmSync(folder, { recursive: true }));

function npmSheet(args: readonly string[], input?: string): { status: number | null; stdout: string; stderr: string } {
  const { INIT_CWD: _, ...env } = process.env;
  return spawnSync('npm', ['run', '-s', '--prefix', process.cwd(), 'sheet', '--', ...args], {
    cwd: folder,
    env,
    input,
    encoding: 'utf8',
  });
}

describe('npm run -s sheet', () => {
  it('finds FILE from where the user stands and ends with the status of its checks', () => {
    writeFileSync(path.join(folder, 'mine.txt'), 'a = check 1 V > 2 V\n');
    const { status, stdout, stderr } = npmSheet(['mine.txt', '--json']);
    expect(stderr).toBe('');
    expect(JSON.parse(stdout).checks).toEqual({ a: { holds: false, reserve: -1 } });
    expect(status).toBe(1);
  }, 60_000);

  it('reads standard input', () => {
    const { status, stdout } = npmSheet(['-'], '# From a pipe\n');
    expect(stdout).toBe('From a pipe\nNothing is required of this sheet yet.\n');
    expect(status).toBe(0);
  }, 60_000);

  it('says in one line what it cannot read', () => {
    expect(npmSheet(['.'])).toMatchObject({ status: 3, stdout: '', stderr: '. is a directory, not a sheet file.\n' });
  }, 60_000);

  it.runIf(existsSync('/dev/full'))(
    'tells a report that could not be written from a check that fails',
    () => {
      writeFileSync(path.join(folder, 'mine.txt'), 'a = check 1 V > 2 V\n');
      const full = openSync('/dev/full', 'w');
      const { status, stderr } = spawnSync('npx', ['tsx', 'src/cli/main.ts', path.join(folder, 'mine.txt')], {
        stdio: ['ignore', full, 'pipe'],
        encoding: 'utf8',
      });
      closeSync(full);
      expect(stderr).toBe('The report could not be written (ENOSPC).\n');
      expect(status).toBe(70);
    },
    60_000,
  );
});
