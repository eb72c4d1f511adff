import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { sha256Hex } from '../../src/numeric/index.ts';

describe('sha256Hex', () => {
  it('gives the digests that FIPS 180-4 prints for "abc" and for the empty message', () => {
    expect(sha256Hex(new TextEncoder().encode('abc'))).toBe(
      'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
    );
    expect(sha256Hex(new Uint8Array())).toBe('e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855');
  });

  it('agrees with the platform for every length over several blocks and for a long message', () => {
    const bytes = new Uint8Array(100_000).map((_, k) => (k * 197 + (k >> 3)) & 255);
    const lengths = [...Array(300).keys(), 1023, 65_535, 100_000];
    for (const length of lengths) {
      const message = bytes.subarray(0, length);
      expect({ length, digest: sha256Hex(message) }).toEqual({
        length,
        digest: createHash('sha256').update(message).digest('hex'),
      });
    }
  });
});
