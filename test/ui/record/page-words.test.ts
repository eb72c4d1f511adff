import { describe, expect, it } from 'vitest';
import { recordOf } from '../../../src/record/index.ts';
import { createSheet } from '../../../src/sheet/index.ts';
import { cssString, pageWords } from '../../../src/ui/record/page-words.ts';

/** Reads a string of CSS as a browser does; throws where it ends early or not at all. */
function readCssString(text: string): string {
  const inside = /^"((?:[^"\\\n\r\f]|\\[0-9a-f]{1,6} |\\[^0-9a-f\n])*)"$/.exec(text);
  if (!inside) throw new Error(`${text} is no string of CSS`);
  return inside[1]!.replace(/\\([0-9a-f]{1,6}) |\\(.)/g, (_, hex: string | undefined, character: string | undefined) =>
    hex === undefined ? character! : String.fromCodePoint(Number.parseInt(hex, 16)),
  );
}

describe('the words in the margins', () => {
  it.each([
    'plain',
    'with "quotes" and \'others\'',
    'back\\slash \\"',
    '</style><b>',
    'line\nend',
    '"; } body { display: none',
    'Ω µ 水',
    '',
  ])('take %j for text', (text) => {
    expect(readCssString(cssString(text))).toBe(text);
  });

  it('say title, revision and the head of the digest', () => {
    const sheet = createSheet('# Probe "A"\n  revision: B\n  status: draft\n');
    const words = pageWords(recordOf(sheet, { digest: 'abcd'.repeat(16), printedAt: '2027-03-02 14:05' }));
    expect(Object.fromEntries(Object.entries(words).map(([key, value]) => [key, readCssString(value)]))).toEqual({
      '--record-head': 'Probe "A"',
      '--record-edition': 'revision B, draft',
      '--record-foot': 'Squarelaw, text abcdabcd abcdabcd',
      '--record-when': 'printed 2027-03-02 14:05',
    });
  });

  it('say on every page that the sheet is incomplete', () => {
    const words = pageWords(recordOf(createSheet('# A\n  revision: B\nx = 1 V + 1 A\n'), { digest: 'ab'.repeat(32) }));
    expect(words['--record-edition']).toBe('"incomplete, revision B"');
  });
});
