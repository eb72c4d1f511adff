// Which browser is chosen, on machines that are only described.

import { expect, test } from 'vitest';
import { chooseBrowser } from './browser-choice.ts';

function choose(platform: string, env: Record<string, string>, files: string[], arch = 'x64') {
  return chooseBrowser({ platform, arch, env, isFile: (file) => files.includes(file) });
}

test('CHROME_PATH goes before an installed browser', () => {
  const env = { CHROME_PATH: '/opt/own', PATH: '/bin' };
  expect(choose('linux', env, ['/opt/own', '/bin/chromium'])).toEqual({ kind: 'installed', file: '/opt/own' });
});

test('a CHROME_PATH without a file is said, not passed over', () => {
  expect(choose('linux', { CHROME_PATH: '/opt/own', PATH: '/bin' }, ['/bin/chromium'])).toEqual({
    kind: 'none',
    reason: 'CHROME_PATH names /opt/own, which is not a file.',
  });
});

test.each([
  ['linux', { PATH: '/bin:/opt/bin' }, '/opt/bin/microsoft-edge'],
  ['darwin', {}, '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome'],
  ['win32', { PROGRAMFILES: 'P:\\Files' }, 'P:\\Files\\Microsoft\\Edge\\Application\\msedge.exe'],
])('an installed browser is found on %s', (platform, env, file) => {
  expect(choose(platform, env, [file])).toEqual({ kind: 'installed', file });
});

test('the bundled browser stands in on Linux x64', () => {
  expect(choose('linux', { PATH: '/bin' }, [])).toEqual({ kind: 'bundled' });
});

test('the bundled browser can be asked for where another is installed', () => {
  expect(choose('linux', { PATH: '/bin', SQUARELAW_BROWSER: 'bundled' }, ['/bin/chromium'])).toEqual({
    kind: 'bundled',
  });
});

test.each([
  ['linux', 'arm64'],
  ['darwin', 'arm64'],
  ['win32', 'x64'],
])('on %s %s without a browser it is said what to install', (platform, arch) => {
  expect(choose(platform, { PATH: '/bin' }, [], arch)).toEqual({
    kind: 'none',
    reason: 'No browser was found: install Chrome, Chromium or Edge, or set CHROME_PATH to the file of one.',
  });
});

test('an unknown wish is said', () => {
  expect(choose('linux', { SQUARELAW_BROWSER: 'firefox' }, [])).toMatchObject({ kind: 'none' });
});
