// The built files: reached from wherever the page stands, and nothing in them that its policy refuses.

import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { expect, test } from 'vitest';

const built = readdirSync('dist', { recursive: true, encoding: 'utf8' });
const read = (file: string) => readFileSync(path.join('dist', file), 'utf8');

test('the page names its files relative to itself', () => {
  const addresses = [...read('index.html').matchAll(/(?:href|src)="([^"]*)"/g)].map(([, address]) => address);
  expect(addresses.length).toBeGreaterThan(2);
  expect(addresses.filter((address) => !address.startsWith('./'))).toEqual([]);
});

test('the page keeps the policy it was written with', () => {
  const policyOf = (html: string) => /content="(default-src[^"]*)"/.exec(html)?.[1];
  expect(policyOf(read('index.html'))).toBe(policyOf(readFileSync('index.html', 'utf8')));
  expect(policyOf(read('index.html'))).toContain("default-src 'none'");
});

test('faces come as woff2 alone, and no style holds a file in itself', () => {
  expect(built.filter((file) => /\.(?:woff|ttf|eot)$/.test(file))).toEqual([]);
  const styles = built.filter((file) => file.endsWith('.css'));
  expect(styles.length).toBeGreaterThan(0);
  for (const file of styles) expect(read(file)).not.toContain('url(data:');
});
