// Files in memory → zip, byte-identical for the same files.
import JSZip from 'jszip';

/** Every entry bears this date, the first a zip can hold: a clock would make two equal packs differ. */
const FIXED_DATE: Date = new Date(Date.UTC(1980, 0, 1));

/** Fixed because other levels give other bytes; 6 is the middle of the scale between small and quick. */
const DEFLATE_LEVEL = 6;

/**
 * Packs files into a zip: sorted names, fixed date, platform and compression.
 * @param files contents by entry name
 * @returns the zip
 */
export async function writeZip(files: ReadonlyMap<string, Uint8Array>): Promise<Uint8Array> {
  const zip = new JSZip();
  for (const name of [...files.keys()].toSorted()) {
    zip.file(name, files.get(name) ?? new Uint8Array(), {
      date: FIXED_DATE,
      createFolders: false,
      binary: true,
    });
  }
  return zip.generateAsync({
    type: 'uint8array',
    platform: 'DOS',
    compression: 'DEFLATE',
    compressionOptions: { level: DEFLATE_LEVEL },
  });
}
