// Files in memory → zip, byte-identical for the same files.
import { zipSync } from 'fflate';

/** Every entry bears this date, the first a zip can hold, in whatever zone: a clock would make two equal packs differ. */
const FIXED_DATE: Date = new Date(1980, 0, 1);

/** Fixed because other levels give other bytes; 6 is the middle of the scale between small and quick. */
const DEFLATE_LEVEL = 6;

/**
 * Packs files into a zip: sorted names, fixed date and compression, by code of our own runtime and not the platform's,
 * whose bytes differ from one to another.
 * @param files contents by entry name
 * @returns the zip
 */
export function writeZip(files: ReadonlyMap<string, Uint8Array>): Uint8Array {
  const sorted = [...files].toSorted(([a], [b]) => (a < b ? -1 : 1));
  return zipSync(Object.fromEntries(sorted), { level: DEFLATE_LEVEL, mtime: FIXED_DATE });
}
