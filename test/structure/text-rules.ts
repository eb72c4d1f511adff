// Rules on names and texts of all files: how files are called, where they stand, and that nothing in them speaks of the
// machine on which they were written.

import { TOP_LEVEL } from './layers.ts';
import { isCode } from './source-facts.ts';
import type { Files } from './project-files.ts';

const FOREIGN: readonly (readonly [what: string, pattern: RegExp])[] = [
  ['a path of some machine', /(?<![\w.@-])\/(?:work|root|home|Users|mnt|srv)\/[\w.]/],
  ['a path of some machine', /\b[A-Z]:\\Users\\/],
  ['a registry', /registry\.(?:npmjs|yarnpkg)|npmjs\.(?:org|com)|npm\.pkg\.github|[a]rtifactory|[v]erdaccio/i],
];
const DOCUMENT = /[\w-]+\.md\b/g;
const OWN_DOCUMENTS = new Set(['README.md', 'DEVELOPERS.md']);

/** One sentence for each entry of the top level that does not belong there. */
export function checkTopLevel(names: readonly string[]): string[] {
  return names
    .filter((name) => !TOP_LEVEL.has(name) && !name.startsWith('.'))
    .map((name) => `${name} stands at the top`);
}

/** One sentence for each mention of a machine, a registry or a document that the project does not have. */
export function checkMentions(files: Files): string[] {
  const faults: string[] = [];
  for (const [file, text] of files) {
    text.split('\n').forEach((line, index) => {
      for (const [what, pattern] of FOREIGN)
        if (pattern.test(line)) faults.push(`${file}:${index + 1} mentions ${what}`);
      if (file === 'package-lock.json' || file.startsWith('.')) return;
      for (const [name] of line.matchAll(DOCUMENT)) {
        if (!OWN_DOCUMENTS.has(name)) faults.push(`${file}:${index + 1} mentions ${name}, which is not there`);
      }
    });
  }
  return faults;
}

/** One sentence for each file of code or style that is called otherwise than in kebab-case. */
export function checkFileNames(files: Files): string[] {
  return [...files.keys()]
    .filter(
      (file) =>
        /\.(?:tsx?|css)$/.test(file) &&
        !file.split('/').every((part) => /^[a-z0-9]+(?:-[a-z0-9]+)*(?:\.[a-z0-9]+)*$/.test(part)),
    )
    .map((file) => `${file} is not in kebab-case`);
}

/** One sentence for each source file that begins without a comment. */
export function checkFileHeads(sources: Files): string[] {
  return [...sources]
    .filter(([file, text]) => isCode(file) && !/^(?:\/\/|\/\*)/.test(text))
    .map(([file]) => `${file} does not say at its head what it is about`);
}

/** One sentence for each way in which the packages are not settled to the last digit, or name where they came from. */
export function checkPackages(manifest: string, lock: string): string[] {
  const faults: string[] = [];
  const { dependencies, devDependencies } = JSON.parse(manifest) as Record<string, Record<string, string>>;
  for (const [name, version] of Object.entries({ ...dependencies, ...devDependencies })) {
    if (!/^\d+\.\d+\.\d+$/.test(version)) faults.push(`package.json asks for ${name} ${version}, not for one version`);
  }
  if (lock.includes('"resolved"')) faults.push('package-lock.json has addresses of packages');
  return faults;
}
