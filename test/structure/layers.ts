// The rules of the source tree as data: who may import whom, which packages, and which words a folder must not use.

const BELOW_MEASURED = ['fet', 'quantity', 'numeric'];
const BELOW_SHEET = ['language', 'measured', 'program', 'network', 'fet', 'quantity', 'numeric'];
const BELOW_CLI = ['record', 'figure', 'spread', 'sheet', ...BELOW_SHEET];

/** Folder of src to the folders it may import. The entry of the page counts as the folder `main`. */
export const FOLDER_IMPORTS: Readonly<Record<string, readonly string[]>> = {
  main: ['ui', 'cli', 'storage', ...BELOW_CLI],
  ui: ['cli', 'storage', ...BELOW_CLI],
  cli: BELOW_CLI,
  storage: ['language'],
  record: ['figure', 'spread', 'sheet', 'language', 'quantity'],
  figure: ['spread', 'sheet', 'quantity'],
  spread: ['sheet', 'program', 'numeric'],
  sheet: BELOW_SHEET,
  measured: BELOW_MEASURED,
  program: ['network', 'fet', 'numeric'],
  network: ['fet', 'numeric'],
  fet: ['numeric'],
  language: ['quantity'],
  quantity: [],
  numeric: [],
};

/** Folder of src to the packages it may import; what is not listed may import none. `node:` stands for Node's own. */
export const PACKAGE_IMPORTS: Readonly<Record<string, readonly string[]>> = {
  main: ['solid-js'],
  ui: ['solid-js', 'katex', 'uplot'],
  storage: ['idb-keyval'],
  cli: ['node:'],
};

/** Folders that touch the outside world; all others are told what they need of it. */
export const OUTER_FOLDERS: readonly string[] = ['main', 'ui', 'storage', 'cli'];

/** Names of the outside world: page, network, clock, chance, console, locale. */
export const OUTSIDE_NAMES: ReadonlySet<string> = setOf(`
  window document navigator location history self globalThis screen matchMedia Document Element HTMLElement
  SVGElement DOMParser getComputedStyle alert confirm prompt localStorage sessionStorage indexedDB IDBDatabase
  caches Blob File FileReader fetch XMLHttpRequest WebSocket EventSource Worker BroadcastChannel MessageChannel
  postMessage addEventListener removeEventListener requestAnimationFrame requestIdleCallback Date performance
  setTimeout setInterval setImmediate queueMicrotask crypto console process Buffer require Intl
`);

/** Methods whose result depends on where the program runs. */
export const LOCALE_METHODS: ReadonlySet<string> = setOf(`
  toLocaleString toLocaleUpperCase toLocaleLowerCase localeCompare
`);

/** The entry of a worker speaks with its maker; nothing else below the page does. */
export const WORKER_FILE = /(?:^|\/|-)worker\.ts$/;
export const WORKER_NAMES: ReadonlySet<string> = setOf('self postMessage addEventListener');

/** The functions of Math that are exact, and so the same everywhere; the others differ between browsers. */
export const EXACT_MATH: ReadonlySet<string> = setOf(`
  abs ceil clz32 floor fround imul max min round sign sqrt trunc E LN10 LN2 LOG10E LOG2E PI SQRT1_2 SQRT2
`);

/** What may stand at the top of the project, beside files whose name begins with a dot. */
export const TOP_LEVEL: ReadonlySet<string> = setOf(`
  package.json package-lock.json vite.config.ts tsconfig.json index.html README.md DEVELOPERS.md src test public
`);

function setOf(words: string): ReadonlySet<string> {
  return new Set(words.trim().split(/\s+/));
}
