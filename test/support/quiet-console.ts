// Set up before every unit test: a word on the console fails the test during which it was said.

import { afterEach, beforeEach, expect } from 'vitest';

const METHODS = ['debug', 'info', 'log', 'warn', 'error'] as const;
const originals = METHODS.map((method) => console[method]);
let said: string[] = [];

beforeEach(() => {
  said = [];
  for (const method of METHODS) console[method] = (...words) => void said.push(`${method}: ${words.join(' ')}`);
});
afterEach(() => {
  METHODS.forEach((method, index) => (console[method] = originals[index]));
  expect(said, 'said on the console').toEqual([]);
});
