// Zip → files in memory, refusing whatever is damaged, oversized or tries to leave its folder.
import { type Fault, InputFaults } from '@ohmstead/study';
import { crc32 } from './crc32.ts';
import { inflate } from './inflate.ts';
import { zipDirectory } from './zip-directory.ts';
import type { ZipEntry } from './zip-entry.ts';

/**
 * Unpacks a zip.
 * @param bytes the whole zip
 * @param file what to call the zip in faults
 * @returns contents by entry name, sorted by name; folders are left out
 * @throws InputFaults with everything that is wrong with the zip
 */
export async function readZip(bytes: Uint8Array, file: string): Promise<ReadonlyMap<string, Uint8Array>> {
  const directory = zipDirectory(bytes, file);
  if (directory.kind === 'faults') throw new InputFaults(directory.faults);
  const faults: Fault[] = [];
  const files = new Map<string, Uint8Array>();
  const entries = directory.entries.filter((entry) => !entry.folder);
  for (const entry of entries.toSorted((a, b) => (a.name < b.name ? -1 : 1))) {
    const content = await unpack(bytes, entry);
    if (content === undefined) {
      const message = 'entry is damaged: its bytes do not unpack to the size and checksum stated';
      faults.push({ file, place: entry.name, code: 'damaged-zip', message });
    } else {
      files.set(entry.name, content);
    }
  }
  if (faults.length > 0) throw new InputFaults(faults);
  return files;
}

async function unpack(bytes: Uint8Array, entry: ZipEntry): Promise<Uint8Array | undefined> {
  const packed = bytes.subarray(entry.start, entry.start + entry.packedSize);
  const content = entry.method === 'stored' ? packed.slice() : await inflate(packed, entry);
  return content !== undefined && crc32(content) === entry.crc ? content : undefined;
}
