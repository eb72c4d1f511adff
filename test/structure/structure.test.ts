// The project keeps the rules of its own structure.

import { expect, test } from 'vitest';
import { checkExports } from './export-rules.ts';
import { checkImports, folderOf } from './import-rules.ts';
import { FOLDER_IMPORTS } from './layers.ts';
import { readFiles, topLevel } from './project-files.ts';
import { isCode } from './source-facts.ts';
import { checkFileHeads, checkFileNames, checkMentions, checkPackages, checkTopLevel } from './text-rules.ts';
import { checkWords } from './word-rules.ts';

const all = readFiles();
const within = (folder: string) => new Map([...all].filter(([file]) => file.startsWith(folder)));
const sources = within('src/');
const tests = within('test/');

test('the source tree was read', () => {
  expect([...sources.keys()].filter(isCode).length).toBeGreaterThan(20);
  for (const file of sources.keys()) expect(Object.keys(FOLDER_IMPORTS), file).toContain(folderOf(file));
});

test('folders import only what stands below them, through its index, and in no cycle', () => {
  expect(checkImports(sources)).toEqual([]);
});

test('below the page nothing touches the outside world or an inexact function', () => {
  expect(checkWords(sources)).toEqual([]);
});

test('an index only lists names, and every export is used', () => {
  expect(checkExports(sources, tests)).toEqual([]);
});

test('files are called in kebab-case, and those of src say what they are about', () => {
  expect(checkFileNames(new Map([...sources, ...tests]))).toEqual([]);
  expect(checkFileHeads(sources)).toEqual([]);
});

test('nothing else stands at the top', () => {
  expect(checkTopLevel(topLevel())).toEqual([]);
});

test('no file speaks of a machine, a registry or a document that is not there', () => {
  expect(checkMentions(all)).toEqual([]);
});

test('packages are settled to the last digit and without addresses', () => {
  expect(checkPackages(all.get('package.json')!, all.get('package-lock.json')!)).toEqual([]);
});
