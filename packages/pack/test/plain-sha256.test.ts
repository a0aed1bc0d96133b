import { describe, expect, it } from 'vitest';
import { plainSha256 } from '../src/plain-sha256.ts';

const hex = (bytes: Uint8Array): string => Buffer.from(bytes).toString('hex');
const digest = (text: string): string => hex(plainSha256(new TextEncoder().encode(text)));

describe('SHA-256 without crypto.subtle', () => {
  // NIST, FIPS 180-2 (2002), appendix B.1 and B.2 (from memory)
  it.each([
    ['abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
    [
      'abcdbcdecdefdefgefghfghighijhijkijkljklmklmnlmnomnopnopq',
      '248d6a61d20638b8e5c026930c3e6039a33ce45964ff2167f6ecedd419db06c1',
    ],
  ])('%s', (text, expected) => {
    expect(digest(text)).toBe(expected);
  });
  it('agrees with crypto.subtle at every length about a block', async () => {
    for (let length = 0; length < 200; length++) {
      const bytes = Uint8Array.from({ length }, (_, i) => (i * 37 + length) & 255);
      expect(hex(plainSha256(bytes))).toBe(hex(new Uint8Array(await crypto.subtle.digest('SHA-256', bytes))));
    }
  });
});
