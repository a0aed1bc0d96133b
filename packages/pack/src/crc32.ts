// CRC-32 as zip files carry it.

/** Table of the reflected polynomial 0xEDB88320 (PKWARE APPNOTE.TXT 6.3.10, 4.4.7), shape [256]. */
const TABLE: Uint32Array = Uint32Array.from({ length: 256 }, (_, byte) => {
  let remainder = byte;
  for (let bit = 0; bit < 8; bit++) {
    remainder = remainder & 1 ? (remainder >>> 1) ^ 0xedb88320 : remainder >>> 1;
  }
  return remainder;
});

/**
 * CRC-32 of a run of bytes.
 * @param bytes any length
 * @returns unsigned 32-bit number
 */
export function crc32(bytes: Uint8Array): number {
  let crc = 0xffffffff;
  for (const byte of bytes) crc = TABLE[(crc ^ byte) & 0xff] ^ (crc >>> 8);
  return (crc ^ 0xffffffff) >>> 0;
}
