// Rules on the import lines of src: allowed folders and packages, doors between folders, existing files, no cycle.

import path from 'node:path';
import { FOLDER_IMPORTS, PACKAGE_IMPORTS, WORKER_FILE } from './layers.ts';
import { isCode, readFacts } from './source-facts.ts';
import type { Link } from './source-facts.ts';
import type { Files } from './project-files.ts';

/** Folder of a file of src; `main` for the entry of the page. */
export function folderOf(file: string): string {
  const parts = file.split('/');
  return parts.length === 2 ? 'main' : parts[1];
}

/** The file that `specifier` in `file` means, or null for a package. */
export function resolveLink(file: string, specifier: string): string | null {
  if (!specifier.startsWith('.')) return null;
  return path.posix.join(path.posix.dirname(file), specifier.replace(/\?.*$/, ''));
}

/** One sentence for each import line that breaks a rule. */
export function checkImports(files: Files): string[] {
  const faults: string[] = [];
  const graph = new Map<string, string[]>();
  for (const [file, text] of files) {
    if (!isCode(file)) continue;
    const targets: string[] = [];
    for (const link of readFacts(file, text).links) {
      const target = resolveLink(file, link.specifier);
      const fault = target === null ? checkPackage(file, link) : checkFile(file, link, target, files);
      if (fault !== null) faults.push(`${file}:${link.line} ${fault}`);
      // A worker starts on its own: its file is not imported by the one that names its address.
      if (target !== null && link.kind !== 'address' && files.has(target)) targets.push(target);
    }
    graph.set(file, targets);
  }
  return [...faults, ...findCycles(graph).map((cycle) => `${cycle.join(' -> ')} is a cycle`)];
}

function checkPackage(file: string, { specifier }: Link): string | null {
  const allowed = PACKAGE_IMPORTS[folderOf(file)] ?? [];
  const isAllowed = allowed.some(
    (name) => specifier === name || specifier.startsWith(name.replace(/:?$/, (end) => end || '/')),
  );
  return isAllowed ? null : `imports the package ${specifier}`;
}

function checkFile(file: string, link: Link, target: string, files: Files): string | null {
  const from = folderOf(file);
  if (target.startsWith('public/examples/')) {
    return from === 'ui' && link.specifier.endsWith('.txt?raw') ? null : `imports the public file ${target}`;
  }
  if (!target.startsWith('src/')) return `imports ${target}, outside src`;
  if (!files.has(target)) return `imports ${target}, which is not there`;
  const to = folderOf(target);
  if (to === from) return target === `src/${from}/index.ts` ? `imports the index of its own folder` : null;
  if (!(FOLDER_IMPORTS[from] ?? []).includes(to)) return `imports ${to}, which ${from} may not`;
  const isWorker = WORKER_FILE.test(target) && (link.kind === 'address' || /\?worker\b/.test(link.specifier));
  return target === `src/${to}/index.ts` || isWorker ? null : `imports ${target} past its index.ts`;
}

/** Each cycle once, from its first file in the graph's order back to it. */
export function findCycles(graph: ReadonlyMap<string, readonly string[]>): string[][] {
  const cycles: string[][] = [];
  const done = new Set<string>();
  const trail: string[] = [];
  const walk = (file: string): void => {
    const at = trail.indexOf(file);
    if (at >= 0) {
      cycles.push([...trail.slice(at), file]);
      return;
    }
    if (done.has(file)) return;
    trail.push(file);
    for (const target of graph.get(file) ?? []) walk(target);
    trail.pop();
    done.add(file);
  };
  for (const file of graph.keys()) walk(file);
  return cycles;
}
