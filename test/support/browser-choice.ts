// Which browser the page is tested in: the one CHROME_PATH names, else an installed one, else the one
// that came with the packages, else none, with a sentence that says what to install.

import path from 'node:path';

/** What of a machine decides the choice. */
export interface Machine {
  readonly env: Readonly<Record<string, string | undefined>>;
  readonly platform: string;
  readonly arch: string;
  readonly isFile: (file: string) => boolean;
}

export type BrowserChoice =
  | { readonly kind: 'installed'; readonly file: string }
  | { readonly kind: 'bundled' }
  | { readonly kind: 'none'; readonly reason: string };

const LINUX_COMMANDS = [
  'google-chrome-stable',
  'google-chrome',
  'chromium',
  'chromium-browser',
  'microsoft-edge-stable',
  'microsoft-edge',
];
const MAC_APPLICATIONS = ['Google Chrome', 'Chromium', 'Microsoft Edge'];
const WINDOWS_PROGRAMS = [
  ['Google', 'Chrome', 'Application', 'chrome.exe'],
  ['Chromium', 'Application', 'chrome.exe'],
  ['Microsoft', 'Edge', 'Application', 'msedge.exe'],
];

/** The browser to use on `machine`. SQUARELAW_BROWSER=bundled passes over the installed ones. */
export function chooseBrowser(machine: Machine): BrowserChoice {
  const { env } = machine;
  const hasBundled = machine.platform === 'linux' && machine.arch === 'x64';
  const wanted = env.SQUARELAW_BROWSER;
  if (wanted !== undefined && wanted !== '' && wanted !== 'bundled') {
    return { kind: 'none', reason: `SQUARELAW_BROWSER is "${wanted}"; the one value it may have is "bundled".` };
  }
  if (wanted === 'bundled') {
    if (hasBundled) return { kind: 'bundled' };
    return { kind: 'none', reason: 'The bundled browser runs on Linux x64 only: set CHROME_PATH instead.' };
  }
  if (env.CHROME_PATH) {
    if (machine.isFile(env.CHROME_PATH)) return { kind: 'installed', file: env.CHROME_PATH };
    return { kind: 'none', reason: `CHROME_PATH names ${env.CHROME_PATH}, which is not a file.` };
  }
  const file = usualPlaces(machine).find((place) => machine.isFile(place));
  if (file !== undefined) return { kind: 'installed', file };
  if (hasBundled) return { kind: 'bundled' };
  return {
    kind: 'none',
    reason: 'No browser was found: install Chrome, Chromium or Edge, or set CHROME_PATH to the file of one.',
  };
}

function usualPlaces({ env, platform }: Machine): string[] {
  const folders = (names: (string | undefined)[]) => names.filter((name): name is string => !!name);
  if (platform === 'darwin') {
    const roots = ['/Applications', ...folders([env.HOME]).map((home) => path.posix.join(home, 'Applications'))];
    return MAC_APPLICATIONS.flatMap((name) =>
      roots.map((root) => path.posix.join(root, `${name}.app`, 'Contents', 'MacOS', name)),
    );
  }
  if (platform === 'win32') {
    const roots = folders([env.PROGRAMFILES, env['PROGRAMFILES(X86)'], env.LOCALAPPDATA]);
    return WINDOWS_PROGRAMS.flatMap((parts) => roots.map((root) => path.win32.join(root, ...parts)));
  }
  const roots = folders((env.PATH ?? '').split(':'));
  return LINUX_COMMANDS.flatMap((command) => roots.map((root) => path.posix.join(root, command)));
}
