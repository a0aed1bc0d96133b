// SHA-256 of a run of bytes, by the platform's own implementation where it grants one.
import { plainSha256 } from './plain-sha256.ts';

/**
 * SHA-256 digest (FIPS 180-4).
 * @param bytes any length
 * @returns 32 bytes
 */
export async function sha256Bytes(bytes: Uint8Array): Promise<Uint8Array> {
  const subtle: SubtleCrypto | undefined = globalThis.crypto?.subtle;
  if (subtle === undefined) return plainSha256(bytes);
  return new Uint8Array(await subtle.digest('SHA-256', new Uint8Array(bytes)));
}

/** SHA-256 digest as 64 lower-case hexadecimal digits. */
export async function sha256(bytes: Uint8Array): Promise<string> {
  return Array.from(await sha256Bytes(bytes), (byte) => byte.toString(16).padStart(2, '0')).join('');
}
