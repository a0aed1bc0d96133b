// SHA-256 of a run of bytes, by the platform's own implementation (Node 20 and browsers).

/**
 * SHA-256 digest (FIPS 180-4).
 * @param bytes any length
 * @returns 32 bytes
 */
export async function sha256Bytes(bytes: Uint8Array): Promise<Uint8Array> {
  return new Uint8Array(await crypto.subtle.digest('SHA-256', new Uint8Array(bytes)));
}

/** SHA-256 digest as 64 lower-case hexadecimal digits. */
export async function sha256(bytes: Uint8Array): Promise<string> {
  return Array.from(await sha256Bytes(bytes), (byte) => byte.toString(16).padStart(2, '0')).join('');
}
