// Rules on what code below the page may touch: not the outside world, and no function whose last digit depends on the
// browser.

import { folderOf } from './import-rules.ts';
import { EXACT_MATH, LOCALE_METHODS, OUTER_FOLDERS, OUTSIDE_NAMES, WORKER_FILE, WORKER_NAMES } from './layers.ts';
import { isCode, readFacts } from './source-facts.ts';
import type { Mention } from './source-facts.ts';
import type { Files } from './project-files.ts';

/** One sentence for each word of src that its folder must not use. */
export function checkWords(files: Files): string[] {
  const faults: string[] = [];
  for (const [file, text] of files) {
    if (!isCode(file)) continue;
    const folder = folderOf(file);
    const facts = readFacts(file, text);
    const report = (mentions: readonly Mention[], says: (name: string) => string) => {
      for (const { name, line } of mentions) faults.push(`${file}:${line} ${says(name)}`);
    };
    if (!OUTER_FOLDERS.includes(folder)) {
      const allowed = WORKER_FILE.test(file) ? WORKER_NAMES : new Set<string>();
      const outside = facts.freeNames.filter(({ name }) => OUTSIDE_NAMES.has(name) && !allowed.has(name));
      report(outside, (name) => `uses ${name}`);
      report(
        facts.members.filter(({ name }) => LOCALE_METHODS.has(name)),
        (name) => `uses ${name}`,
      );
    }
    if (folder !== 'ui' && folder !== 'main') {
      const inexact = facts.math.filter(({ name }) => !EXACT_MATH.has(name));
      report(inexact, (name) => (name === '?' ? 'uses Math without naming the function' : `uses Math.${name}`));
      report(facts.powers, () => 'uses ** with an exponent that is not a whole number written out');
    }
  }
  return faults;
}
