// The project's files as texts, from the disk.

import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

/** Texts by path from the top of the project, `/` between the parts. */
export type Files = ReadonlyMap<string, string>;

/** Built or installed, hence not part of the project. */
const NOT_OURS = new Set(['node_modules', 'dist', '.git', '.DS_Store']);
const BINARY = /\.(?:png|wasm|woff2|ico|pdf)$/;

/** Names of what stands at the top of the project. */
export function topLevel(): string[] {
  return readdirSync('.').filter((name) => !NOT_OURS.has(name) && !name.endsWith('.log'));
}

/** All text files of the project below `folder`. */
export function readFiles(folder = ''): Map<string, string> {
  const files = new Map<string, string>();
  for (const entry of readdirSync(folder || '.', { withFileTypes: true })) {
    if (NOT_OURS.has(entry.name) || entry.name.endsWith('.log')) continue;
    const file = path.posix.join(folder, entry.name);
    if (entry.isDirectory()) for (const [name, text] of readFiles(file)) files.set(name, text);
    else if (!BINARY.test(entry.name)) files.set(file, readFileSync(file, 'utf8'));
  }
  return files;
}
