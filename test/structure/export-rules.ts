// Rules on exports: an index only lists names, and every exported name is used by somebody.

import { folderOf, resolveLink } from './import-rules.ts';
import { isCode, readFacts } from './source-facts.ts';
import type { Files } from './project-files.ts';

/** One sentence for each index with logic in it and each name of `sources` that nobody in `sources` or `tests` takes. */
export function checkExports(sources: Files, tests: Files): string[] {
  const used = usedNames(new Map([...sources, ...tests]));
  const faults: string[] = [];
  for (const [file, text] of sources) {
    if (!isCode(file)) continue;
    const { exports, statements } = readFacts(file, text);
    if (file === `src/${folderOf(file)}/index.ts`) {
      for (const { name, line } of statements) faults.push(`${file}:${line} has a ${name}; an index only lists names`);
    }
    for (const { name, line } of exports) {
      if (name === '*') faults.push(`${file}:${line} passes on everything instead of naming it`);
      else if (!used.has(`${file} ${name}`) && !used.has(`${file} *`))
        faults.push(`${file}:${line} exports ${name}, unused`);
    }
  }
  return [...new Set(faults)];
}

/** `file name` for each name that some other file takes from `file`; a name passed on is taken, too. */
function usedNames(files: Files): Set<string> {
  const used = new Set<string>();
  for (const [file, text] of files) {
    if (!isCode(file)) continue;
    for (const link of readFacts(file, text).links) {
      const target = resolveLink(file, link.specifier);
      if (target !== null) for (const name of link.names) used.add(`${target} ${name}`);
    }
  }
  return used;
}
