// Share links: what is shared comes back unchanged, and what did not arrive whole never opens.

import { constants, deflateRawSync } from 'node:zlib';
import fc from 'fast-check';
import { afterEach, expect, test, vi } from 'vitest';
import { sha256Hex } from '../../src/numeric/index.ts';
import { LINK_LIMIT, readLink, TEXT_LIMIT, writeLink } from '../../src/storage/index.ts';
import { fromBase64url, toBase64url } from '../../src/storage/base64url.ts';
import { createDraw } from '../support/counter-random.ts';
import { randomSheet } from '../support/random-sheet.ts';

afterEach(() => void vi.unstubAllGlobals());

const SHEET = '# Stage\nV_DD = 15 V ± 5 %  [assumed]\nR_D = 3.3 kΩ ± 1 %\n';

async function fragmentOf(text: string): Promise<string> {
  const written = await writeLink(text, sha256Hex);
  if ('fault' in written) throw new Error(written.fault.text);
  return written.fragment;
}

/** The text, or the code of the fault. */
async function opened(fragment: string): Promise<{ text: string } | string | null> {
  const read = await readLink(fragment, sha256Hex);
  return read && 'fault' in read ? read.fault.code : read;
}

async function sentence(fragment: string): Promise<string> {
  const read = await readLink(fragment, sha256Hex);
  return read && 'fault' in read ? read.fault.text : 'no fault';
}

/** A link as another program might make it. */
function forge(bytes: Uint8Array, packed: Uint8Array = deflateRawSync(bytes)): string {
  const body = toBase64url(packed);
  return `sheet-1.${body.length}.${body}.${sha256Hex(bytes).slice(0, 12)}`;
}

test('every text comes back unchanged: any characters, line ends, byte order marks, nothing at all', async () => {
  for (const text of ['', '\uFEFF', '\uFEFF# A\r\nb\rc\n', '\0', '# Ünïcödé Ω µ 𝛽 👩‍🔬\n', SHEET, 'x'.repeat(100_000)]) {
    expect(await opened(await fragmentOf(text))).toEqual({ text });
  }
  await fc.assert(
    fc.asyncProperty(fc.string({ unit: 'binary', maxLength: 300 }), async (text) => {
      expect(await opened(`#${await fragmentOf(text)}`)).toEqual({ text });
    }),
    { seed: 1907, numRuns: 150 },
  );
  for (let seed = 0; seed < 10; seed++) {
    const text = randomSheet(createDraw(seed), { lineEnd: seed % 2 ? '\n' : '\r\n' });
    expect(await opened(await fragmentOf(text))).toEqual({ text });
  }
});

test('half a surrogate pair, which no text file can hold either, comes back as the replacement character', async () => {
  expect(await opened(await fragmentOf('a\uD800b'))).toEqual({ text: 'a\uFFFDb' });
});

test('a link has only characters that need no escape in an address, and ends in one that is not punctuation', async () => {
  for (let seed = 0; seed < 20; seed++) {
    const fragment = await fragmentOf(randomSheet(createDraw(seed)));
    expect(fragment).toMatch(/^sheet-1\.\d+\.[\w-]+\.[0-9a-f]{12}$/);
    expect(new URL(`https://example.org/#${fragment}`).hash).toBe(`#${fragment}`);
  }
});

test('a link made when its form was settled opens', async () => {
  const link = 'sheet-1.28.U1YILklMT-XlClKwVTBUyD63kgsA.3932520cf9cb';
  expect(await opened(link)).toEqual({ text: '# Stage\r\nR = 1 kΩ\n' });
});

test('an address without fragment holds no link', async () => {
  expect(await opened('')).toBeNull();
  expect(await opened('#')).toBeNull();
});

test('a link that was cut opens nothing, whatever is left of it, and says how much arrived', async () => {
  const fragment = await fragmentOf(randomSheet(createDraw(7)));
  for (let length = 1; length < fragment.length; length++) {
    const cut = fragment.slice(0, length);
    expect(await opened(cut), cut).toBe('link-cut');
  }
  const headerEnds = /^sheet-1\.\d+\./.exec(fragment)![0].length;
  const total = fragment.length;
  expect(total).toBeGreaterThan(1000);
  const grouped = (n: number) => String(n).replace(/(\d)(\d{3})$/, '$1\u2009$2');
  expect(await sentence(fragment.slice(0, total - 1))).toBe(
    `This link ends in the middle: ${grouped(total - 1)} of about ${grouped(total)} characters arrived, ` +
      'as happens in some mail programs. Nothing was opened. Ask for the file instead.',
  );
  expect(await sentence(fragment.slice(0, headerEnds))).toContain(
    `: ${headerEnds} of about ${grouped(total)} characters`,
  );
  expect(await sentence(fragment.slice(0, headerEnds - 1))).toContain(
    `: ${headerEnds - 1} of an unknown number of characters arrived, `,
  );
});

test('a link with characters changed at random never opens as another text', async () => {
  const fragment = await fragmentOf(SHEET);
  const characters = 'ABCxyz0189-_.%=+/ #&~\u00e9\n';
  await fc.assert(
    fc.asyncProperty(
      fc.array(fc.record({ at: fc.nat(fragment.length - 1), to: fc.constantFrom(...characters) }), {
        minLength: 1,
        maxLength: 4,
      }),
      async (changes) => {
        const altered = [...fragment];
        for (const { at, to } of changes) altered[at] = to;
        const found = await opened(altered.join(''));
        const faults = ['link-cut', 'link-damaged', 'link-newer', 'link-foreign'];
        const isSame = altered.join('') === fragment;
        expect(isSame ? [{ text: SHEET }] : faults).toContainEqual(found);
      },
    ),
    { seed: 1907, numRuns: 1500 },
  );
});

test('each single character of a link counts', async () => {
  const fragment = await fragmentOf('V = 1 V');
  const found = new Set<unknown>();
  for (let at = 0; at < fragment.length; at++) {
    for (const other of 'Ab7-_.') {
      if (other === fragment[at]) continue;
      found.add(await opened(fragment.slice(0, at) + other + fragment.slice(at + 1)));
    }
  }
  expect(found).toEqual(new Set(['link-cut', 'link-damaged', 'link-newer', 'link-foreign']));
});

test('two characters that changed places do not pass', async () => {
  const fragment = await fragmentOf(SHEET);
  for (let at = 8; at + 1 < fragment.length; at++) {
    const [a, b] = [fragment[at], fragment[at + 1]];
    if (a === b) continue;
    expect(['link-cut', 'link-damaged']).toContain(
      await opened(fragment.slice(0, at) + b + a + fragment.slice(at + 2)),
    );
  }
});

test('what mail programs put between or behind the characters does no harm', async () => {
  const fragment = await fragmentOf(SHEET);
  const broken = fragment.replace(/.{40}/g, '$&=\r\n');
  const escaped = fragment.replace(/.{40}/g, '$&%0D%0A%20');
  for (const arrived of [broken, escaped, ` ${fragment}\n`, `${fragment}.`, `${fragment})`, `${fragment}&from=mail`]) {
    expect(await opened(arrived), arrived).toEqual({ text: SHEET });
  }
});

test('a fragment that was never a sheet is said not to be one', async () => {
  for (const fragment of [
    'figures',
    'sheet',
    'sheet-',
    'sheet-music',
    'Sheet-1.3.AAA',
    'she',
    '%E4',
    '/sheet-1',
    '1',
  ]) {
    const expected = 'sheet-'.startsWith(fragment) ? 'link-cut' : 'link-foreign';
    expect(await opened(fragment), fragment).toBe(expected);
  }
  expect(await sentence('figures')).toBe(
    'What stands behind # in this address is not a sheet of this program. Nothing was opened.',
  );
});

test('a link of a newer version is said to be one, before anything else in it is looked at', async () => {
  for (const fragment of ['sheet-2.', 'sheet-2.abc', 'sheet-17.3.AAA.0', 'sheet-2.9999999.x']) {
    expect(await opened(fragment)).toBe('link-newer');
  }
  expect(await sentence('sheet-2.x')).toBe(
    'This link was made by a newer version of this program. Nothing was opened. Load this page again, or ask for the file.',
  );
  for (const fragment of [
    'sheet-0.4.AAAA.000000000000',
    'sheet-01.4.AAAA.000000000000',
    'sheet-1.04.AAAA.000000000000',
  ]) {
    expect(await opened(fragment), fragment).toBe('link-damaged');
  }
});

test('a damaged link says so', async () => {
  const fragment = await fragmentOf(SHEET);
  expect(await sentence(fragment.replace(/.$/, (digit) => (digit === '0' ? '1' : '0')))).toBe(
    'This link was altered on its way: its text does not fit its digest. Nothing was opened. ' +
      'Ask for the link again, or for the file.',
  );
});

test('packed bytes that are cut, or are none at all, are damage', async () => {
  const bytes = new TextEncoder().encode(SHEET);
  const packed = deflateRawSync(bytes);
  expect(await opened(forge(bytes, packed))).toEqual({ text: SHEET });
  expect(await opened(forge(bytes, packed.subarray(0, -3)))).toBe('link-damaged');
  expect(await opened(forge(bytes, new Uint8Array(0)))).toBe('link-damaged');
  expect(await opened(forge(bytes, new Uint8Array(40).fill(255)))).toBe('link-damaged');
  expect(await opened(forge(bytes, deflateRawSync(bytes, { finishFlush: constants.Z_SYNC_FLUSH })))).toBe(
    'link-damaged',
  );
});

test('a link that holds no UTF-8 is damaged, even with the right digest', async () => {
  for (const bytes of [[0xff], [0xc0, 0x80], [0xed, 0xa0, 0x80], [0xe2, 0x82]]) {
    expect(await opened(forge(Uint8Array.from(bytes)))).toBe('link-damaged');
  }
});

test('a small link that unpacks to a huge text is stopped at the limit', async () => {
  const huge = new Uint8Array(20_000_000).fill(0x61);
  const fragment = forge(huge);
  expect(fragment.length).toBeLessThan(LINK_LIMIT);
  expect(await opened(fragment)).toBe('link-too-large');
  expect(await sentence(fragment)).toBe(
    'This link unpacks to more than 2\u2009097\u2009152 bytes, the most a sheet may have. Nothing was opened.',
  );
  const largest = 'a'.repeat(TEXT_LIMIT);
  expect(await opened(await fragmentOf(largest))).toEqual({ text: largest });
});

test('a text that a link could not bring back is refused a link', async () => {
  expect(await writeLink('a'.repeat(TEXT_LIMIT + 1), sha256Hex)).toEqual({
    fault: {
      code: 'link-too-large',
      text:
        'This sheet has 2\u2009097\u2009153 bytes, more than the 2\u2009097\u2009152 that a link may hold. ' +
        'Save it as a file and send that instead.',
    },
  });
});

test('a link too long to be passed on is refused, and a file is proposed', async () => {
  const draw = createDraw(3);
  const noise = (length: number) =>
    Array.from({ length }, () => String.fromCharCode(33 + Math.floor(draw() * 90))).join('');
  const written = await writeLink(noise(120_000), sha256Hex);
  expect(written).toMatchObject({ fault: { code: 'link-too-long' } });
  expect('fault' in written && written.fault.text).toMatch(
    /^As a link this sheet has 1\d\d\u2009\d{3} characters, more than the 100\u2009000 that can be passed on safely\. Save it as a file and send that instead\.$/,
  );
  expect(await writeLink(noise(80_000), sha256Hex)).toHaveProperty('fragment');
});

test('a link that claims to be longer than any is damaged, not cut', async () => {
  expect(await opened('sheet-1.100001.AAAA')).toBe('link-damaged');
  expect(await opened('sheet-1.99999999999999999999.AAAA')).toBe('link-damaged');
});

test('a browser without the compressor says so, either way', async () => {
  const fragment = await fragmentOf(SHEET);
  vi.stubGlobal('CompressionStream', undefined);
  expect(await opened(fragment)).toBe('link-unsupported');
  expect(await opened(fragment.slice(0, -1))).toBe('link-cut');
  expect(await writeLink(SHEET, sha256Hex)).toEqual({
    fault: {
      code: 'link-unsupported',
      text: 'This browser cannot pack a sheet into a link. Save it as a file and send that instead.',
    },
  });
});

test('bytes written as characters come back, and no other characters stand for them', () => {
  fc.assert(
    fc.property(fc.uint8Array({ maxLength: 40 }), (bytes) => {
      const text = toBase64url(bytes);
      expect(text).toBe(Buffer.from(bytes).toString('base64url'));
      expect(fromBase64url(text)).toEqual(bytes);
    }),
    { seed: 1907 },
  );
  const large = new Uint8Array(100_000).map((_, index) => index * 7);
  expect(fromBase64url(toBase64url(large))).toEqual(large);
  // Too few characters for a byte; bits behind the last byte; padding; characters of the other alphabet, or of none.
  for (const text of ['A', 'AB', 'AAB', 'AA==', 'AA+A', 'AA/A', 'AAé', 'A A'])
    expect(fromBase64url(text), text).toBeNull();
});
