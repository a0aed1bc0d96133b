// Deflated bytes → plain bytes through the platform's own decompressor, never past the size that was stated.

/** Gzip header without name, time or flags (RFC 1952, 2.3); operating system 255, unknown. */
const GZIP_HEADER: Uint8Array = Uint8Array.of(0x1f, 0x8b, 8, 0, 0, 0, 0, 0, 0, 255);

export interface Stated {
  readonly crc: number;
  /** bytes, unpacked */
  readonly size: number;
}

/**
 * Inflates raw deflate data (RFC 1951). It is dressed as gzip because early Node 20 has no `deflate-raw`.
 * @param packed raw deflate stream
 * @param stated checksum and size that the unpacked bytes must have
 * @returns the bytes, or undefined where the data are damaged or do not have the stated size
 */
export async function inflate(packed: Uint8Array, stated: Stated): Promise<Uint8Array | undefined> {
  const trailer = new DataView(new ArrayBuffer(8));
  trailer.setUint32(0, stated.crc, true);
  trailer.setUint32(4, stated.size, true);
  const stream = new DecompressionStream('gzip');
  const writer = stream.writable.getWriter();
  const feed = async (): Promise<void> => {
    for (const part of [GZIP_HEADER, packed, new Uint8Array(trailer.buffer)])
      await writer.write(new Uint8Array(part));
    await writer.close();
  };
  // A failure of the feed is seen by the reader below as well, which is where it is answered.
  const feeding = feed().catch(() => undefined);
  const content = await collect(stream.readable.getReader(), stated.size);
  await feeding;
  return content;
}

/** Reads until the end; gives up, and stops the source, as soon as more than `size` bytes arrive. */
async function collect(
  reader: ReadableStreamDefaultReader<Uint8Array>,
  size: number,
): Promise<Uint8Array | undefined> {
  const content = new Uint8Array(size);
  let filled = 0;
  try {
    for (;;) {
      const { done, value } = await reader.read();
      if (done) return filled === size ? content : undefined;
      if (filled + value.length > size) {
        await reader.cancel();
        return undefined;
      }
      content.set(value, filled);
      filled += value.length;
    }
  } catch {
    return undefined;
  }
}
