import { readFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';
import { lineColumn } from '../../src/language/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { MESSAGE_CASES } from './message-cases.ts';

test.each(MESSAGE_CASES)('%s: %j', (code, text, name, line, column, words) => {
  const sheet = createSheet(text);
  const faults = sheet.cells().flatMap((cell) => (cell.name === name && cell.fault ? [cell.fault] : []));
  expect(
    faults.map((fault) => [
      fault.code,
      fault.line + 1,
      lineColumn(sheet.tree.lines[fault.line], fault.span.start),
      fault.text,
    ]),
  ).toEqual([[code, line, column, words]]);
});

/** The codes that the folder gives its messages, as they stand in its text. */
function codesInSource(): string[] {
  const files = readdirSync('src/sheet', { recursive: true, encoding: 'utf8' }).filter((file) => file.endsWith('.ts'));
  const patterns = [/\bstop\(\s*'([^']+)'/g, /\bplace\(\s*'([^']+)'/g, /\bcode: '([^']*)'/g, /\bstop\(`([^$`]+)\$/g];
  const codes = files.flatMap((file) => {
    const source = readFileSync(path.join('src/sheet', file), 'utf8');
    return patterns.flatMap((pattern) => [...source.matchAll(pattern)].map((match) => match[1]));
  });
  return [...new Set(codes)].filter((code) => code !== '').toSorted();
}

test('every code of the folder occurs in the table', () => {
  const codes = codesInSource();
  expect(codes.length).toBeGreaterThan(60);
  // A code that ends in a dash goes on with that of the network.
  const occurs = (code: string): boolean =>
    MESSAGE_CASES.some(([known]) => (code.endsWith('-') ? known.startsWith(code) : known === code));
  expect(codes.filter((code) => !occurs(code))).toEqual([]);
});

test('messages are whole sentences without a scolding word', () => {
  const told = MESSAGE_CASES.filter(([code]) => code !== 'waits-for').map(([, , , , , text]) => text);
  expect(told.filter((text) => !/[.?]$/.test(text))).toEqual([]);
  expect(
    told.filter((text) => /\b(error|invalid|oops|please|illegal|bad)\b|\b(undefined|NaN|null)\b/i.test(text)),
  ).toEqual([]);
});
