// Bytes → base64 (RFC 4648, section 4).

/** Bytes turned into letters at once; more arguments than some 100 000 overflow an engine's stack. */
const AT_ONCE = 0x8000;

export function base64(bytes: Uint8Array): string {
  const parts: string[] = [];
  for (let from = 0; from < bytes.length; from += AT_ONCE)
    parts.push(String.fromCharCode(...bytes.subarray(from, from + AT_ONCE)));
  return btoa(parts.join(''));
}
