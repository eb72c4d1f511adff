// The rules of structure see faults that are planted in small trees, and let good trees pass.

import { describe, expect, test } from 'vitest';
import { checkExports } from './export-rules.ts';
import { checkImports } from './import-rules.ts';
import { checkFileHeads, checkFileNames, checkMentions, checkPackages, checkTopLevel } from './text-rules.ts';
import { checkWords } from './word-rules.ts';

const tree = (files: Record<string, string>) => new Map(Object.entries(files));
const NUMERIC = {
  'src/numeric/index.ts': "export { ln } from './ln.ts';",
  'src/numeric/ln.ts': 'export const ln = 1;',
};

describe('imports', () => {
  const fet = (text: string) => checkImports(tree({ ...NUMERIC, 'src/ui/index.ts': '', 'src/fet/a.ts': text }));

  test('down, through the index, passes', () => {
    expect(fet("import { ln } from '../numeric/index.ts';")).toEqual([]);
  });
  test.each([
    ['a folder above', "import '../ui/index.ts';", 'src/fet/a.ts:1 imports ui, which fet may not'],
    [
      'a folder above, for a type',
      "\nimport type { A } from '../ui/index.ts';",
      'src/fet/a.ts:2 imports ui, which fet may not',
    ],
    [
      'a folder above, passed on',
      "export { A } from '../ui/index.ts';",
      'src/fet/a.ts:1 imports ui, which fet may not',
    ],
    ['a folder above, later', "import('../ui/index.ts');", 'src/fet/a.ts:1 imports ui, which fet may not'],
    [
      'a folder above, as a type',
      "type A = import('../ui/index.ts').A;",
      'src/fet/a.ts:1 imports ui, which fet may not',
    ],
    [
      'past the index',
      "import { ln } from '../numeric/ln.ts';",
      'src/fet/a.ts:1 imports src/numeric/ln.ts past its index.ts',
    ],
    [
      'without the ending',
      "import { ln } from '../numeric';",
      'src/fet/a.ts:1 imports src/numeric, which is not there',
    ],
    ['a package', "import 'katex';", 'src/fet/a.ts:1 imports the package katex'],
    ['Node', "import 'node:fs';", 'src/fet/a.ts:1 imports the package node:fs'],
    ['a test', "import '../../test/a.ts';", 'src/fet/a.ts:1 imports test/a.ts, outside src'],
    [
      'an example',
      "import '../../public/examples/a.txt?raw';",
      'src/fet/a.ts:1 imports the public file public/examples/a.txt',
    ],
  ])('%s is seen', (_, text, fault) => {
    expect(fet(text)).toEqual([fault]);
  });

  test('the index of the own folder is seen', () => {
    expect(checkImports(tree({ 'src/fet/index.ts': '', 'src/fet/a.ts': "import './index.ts';" }))).toEqual([
      'src/fet/a.ts:1 imports the index of its own folder',
    ]);
  });
  test('an import in a comment or a text is none', () => {
    expect(fet("// import '../ui/index.ts';\nconst a = \"import '../ui/index.ts';\";")).toEqual([]);
  });
  test('a package that only begins like an allowed one is seen', () => {
    expect(checkImports(tree({ 'src/ui/a.ts': "import 'solid-js/web';\nimport 'solid-json';" }))).toEqual([
      'src/ui/a.ts:2 imports the package solid-json',
    ]);
  });
  test('a worker is reached by its file, anything else through the index', () => {
    const files = (file: string) =>
      tree({
        'src/spread/index.ts': '',
        [`src/spread/${file}`]: '',
        'src/ui/a.ts': `new Worker(new URL('../spread/${file}', import.meta.url));`,
      });
    expect(checkImports(files('worker.ts'))).toEqual([]);
    expect(checkImports(files('draws.ts'))).toEqual(['src/ui/a.ts:1 imports src/spread/draws.ts past its index.ts']);
  });
  test('a cycle of two and a cycle of three are seen, types included', () => {
    const files = tree({
      'src/fet/a.ts': "import './b.ts';",
      'src/fet/b.ts': "import type { A } from './a.ts';",
      'src/fet/c.ts': "import './d.ts';",
      'src/fet/d.ts': "import './e.ts';",
      'src/fet/e.ts': "export { c } from './c.ts';",
    });
    expect(checkImports(files)).toEqual([
      'src/fet/a.ts -> src/fet/b.ts -> src/fet/a.ts is a cycle',
      'src/fet/c.ts -> src/fet/d.ts -> src/fet/e.ts -> src/fet/c.ts is a cycle',
    ]);
  });
  test('two ways to one file are no cycle', () => {
    const files = {
      'src/fet/a.ts': "import './b.ts';\nimport './c.ts';",
      'src/fet/b.ts': "import './c.ts';",
      'src/fet/c.ts': '',
    };
    expect(checkImports(tree(files))).toEqual([]);
  });
});

describe('words', () => {
  const words = (text: string, file = 'src/fet/a.ts') => checkWords(tree({ [file]: text }));

  test.each([
    ['document.title;', 'uses document'],
    ['const now = () => Date.now();', 'uses Date'],
    ['setTimeout(() => 1);', 'uses setTimeout'],
    ['console.log(1);', 'uses console'],
    ['const a = { console };', 'uses console'],
    ['let a: HTMLElement;', 'uses HTMLElement'],
    ['const a = (1).toLocaleString();', 'uses toLocaleString'],
    ['const a = Math.random();', 'uses Math.random'],
    ['const a = Math.exp(1);', 'uses Math.exp'],
    ['const a = `${Math.log10(1)}`;', 'uses Math.log10'],
    ['const { exp } = Math;', 'uses Math without naming the function'],
    ["const a = Math['exp'](1);", 'uses Math without naming the function'],
    ['const a = 2 ** 0.5;', 'uses ** with an exponent that is not a whole number written out'],
    ['let a = 2;\na **= a;', 'uses ** with an exponent that is not a whole number written out'],
  ])('%s is seen', (text, fault) => {
    const line = text.includes('\n') ? 2 : 1;
    expect(words(text)).toEqual([`src/fet/a.ts:${line} ${fault}`]);
  });
  test.each([
    'const a = (n: bigint) => 10n ** n + n ** 2n;',
    'const a = Math.sqrt(Math.abs(Math.PI)) + 2 ** 3 + 2 ** -1;',
    '// Math.exp, console, document\nconst a = "Math.exp(console)";',
    'const a = { document: 1, Date: 2 };\nconst b = a.document;',
    'function f(document: number, { console }: { console: number }) {\n  return document + console;\n}',
    'interface A {\n  window: number;\n  fetch(location: string): void;\n}',
  ])('%s passes', (text) => {
    expect(words(text)).toEqual([]);
  });
  test('the page may use all of them, the terminal all but inexact functions', () => {
    expect(words('document.title = String(Math.exp(1));', 'src/ui/a.ts')).toEqual([]);
    expect(words('console.log(Math.exp(1));', 'src/cli/a.ts')).toEqual(['src/cli/a.ts:1 uses Math.exp']);
  });
  test("a worker's entry may answer, and no more", () => {
    expect(words('self.onmessage = () => postMessage(Date.now());', 'src/spread/worker.ts')).toEqual([
      'src/spread/worker.ts:1 uses Date',
    ]);
  });
});

describe('exports', () => {
  const user = { 'src/fet/a.ts': "import { ln } from '../numeric/index.ts';" };

  test('a name that is passed on and taken passes', () => {
    expect(checkExports(tree({ ...NUMERIC, ...user }), tree({}))).toEqual([]);
  });
  test('a name that is passed on and not taken is seen', () => {
    expect(checkExports(tree(NUMERIC), tree({}))).toEqual(['src/numeric/index.ts:1 exports ln, unused']);
  });
  test('a name that nobody passes on is seen', () => {
    const files = {
      ...NUMERIC,
      ...user,
      'src/numeric/exp.ts': 'const a = 1;\nexport { a as exp };\nexport type B = 1;',
    };
    expect(checkExports(tree(files), tree({}))).toEqual([
      'src/numeric/exp.ts:2 exports exp, unused',
      'src/numeric/exp.ts:3 exports B, unused',
    ]);
  });
  test('a test is a user', () => {
    const testFile = { 'test/numeric/ln.test.ts': "import { ln } from '../../src/numeric/index.ts';" };
    expect(checkExports(tree(NUMERIC), tree(testFile))).toEqual([]);
  });
  test('a name reached through a namespace is used, the others are not', () => {
    const files = {
      'src/numeric/a.ts': 'export const one = 1;\nexport const two = 2;\nexport type Three = 3;',
      'src/numeric/b.ts': "import * as a from './a.ts';\nlet three: a.Three;\na.one;",
    };
    expect(checkExports(tree(files), tree({}))).toEqual(['src/numeric/a.ts:2 exports two, unused']);
  });
  test('logic in an index and a wholesale export are seen', () => {
    const files = {
      'src/fet/index.ts': "export * from './a.ts';\nconst a = 1;",
      'src/fet/a.ts': 'export const b = 1;',
    };
    expect(checkExports(tree(files), tree({}))).toEqual([
      'src/fet/index.ts:2 has a VariableDeclaration; an index only lists names',
      'src/fet/index.ts:1 passes on everything instead of naming it',
    ]);
  });
});

describe('texts', () => {
  test('a stranger at the top is seen', () => {
    expect(checkTopLevel(['src', '.ci', 'README.md', 'notes.txt'])).toEqual(['notes.txt stands at the top']);
  });
  test.each([
    ['a path of some machine', ['', 'home', 'ann', 'a.txt'].join('/')],
    ['a path of some machine', ['', 'work', 'a.txt'].join('/')],
    ['a path of some machine', ['C:', 'Users', 'ann'].join('\\')],
    ['a registry', ['https://registry', 'npmjs', 'org'].join('.')],
    [`${['grammar', 'md'].join('.')}, which is not there`, ['see grammar', 'md'].join('.')],
  ])('%s is seen', (what, text) => {
    expect(checkMentions(tree({ 'src/a.ts': `\n// ${text}` }))).toEqual([`src/a.ts:2 mentions ${what}`]);
  });
  test('addresses of the page itself pass', () => {
    expect(checkMentions(tree({ 'src/a.ts': "// README.md\nimport './work/home.ts';" }))).toEqual([]);
  });
  test('names in other cases are seen', () => {
    expect(
      checkFileNames(
        tree({ 'src/fet/biasLine.ts': '', 'test/fet/bias-line.test.ts': '', 'test/sheets/2N5457.txt': '' }),
      ),
    ).toEqual(['src/fet/biasLine.ts is not in kebab-case']);
  });
  test('headless files are seen', () => {
    expect(checkFileHeads(tree({ 'src/fet/a.ts': '\n// Late.', 'src/fet/b.ts': '// B.', 'src/ui/a.css': '' }))).toEqual(
      ['src/fet/a.ts does not say at its head what it is about'],
    );
  });
  test('loose versions and addresses of packages are seen', () => {
    const manifest = JSON.stringify({ dependencies: { a: '1.2.3', b: '^1.2.3' }, devDependencies: { c: '1.x' } });
    expect(checkPackages(manifest, '{ "resolved": "somewhere" }')).toEqual([
      'package.json asks for b ^1.2.3, not for one version',
      'package.json asks for c 1.x, not for one version',
      'package-lock.json has addresses of packages',
    ]);
  });
});
