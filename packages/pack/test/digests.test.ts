// Checksums against their published check values.
import { expect, test } from 'vitest';
import { crc32 } from '../src/crc32.ts';
import { sha256 } from '../src/sha256.ts';

test('crc-32 of "123456789"', () => {
  // Catalogue of parametrised CRC algorithms, CRC-32/ISO-HDLC, check value, from memory
  expect(crc32(new TextEncoder().encode('123456789'))).toBe(0xcbf43926);
  expect(crc32(new Uint8Array())).toBe(0);
});

test('sha-256 of "abc"', async () => {
  // FIPS 180-2 (2002), Appendix B.1, from memory
  expect(await sha256(new TextEncoder().encode('abc'))).toBe(
    'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
  );
});
