// SHA-256 of a run of bytes as lower-case hex, by the platform's own implementation (Node 20 and browsers).

/**
 * SHA-256 digest (FIPS 180-4).
 * @param bytes any length
 * @returns 64 lower-case hexadecimal digits
 */
export async function sha256(bytes: Uint8Array): Promise<string> {
  const digest = await crypto.subtle.digest('SHA-256', new Uint8Array(bytes));
  return Array.from(new Uint8Array(digest), (byte) => byte.toString(16).padStart(2, '0')).join('');
}
