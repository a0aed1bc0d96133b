// Review pack → its manifest and entries, nothing trusted and nothing recomputed yet.
import { MANIFEST_NAME, type Manifest, readManifest } from './manifest.ts';
import { readZip } from './zip-read.ts';

export interface Pack {
  readonly manifest: Manifest;
  /** contents by path, the manifest left out */
  readonly entries: ReadonlyMap<string, Uint8Array>;
}

/**
 * Unpacks a review pack.
 * @param bytes the zip
 * @param file what to call it in faults
 * @throws InputFaults where it is not a sound zip or not a review pack
 */
export async function readPack(bytes: Uint8Array, file: string = 'pack.zip'): Promise<Pack> {
  const entries = new Map(await readZip(bytes, file));
  const manifest = readManifest(entries.get(MANIFEST_NAME), file);
  entries.delete(MANIFEST_NAME);
  return { manifest, entries };
}
