// The entries of a pack against its manifest: missing, extra, changed.
import type { Difference } from './difference.ts';
import type { Pack } from './read-pack.ts';
import { sha256 } from './sha256.ts';

/** All differences between what the manifest lists and what the pack holds, sorted by path. */
export async function checkDigests(pack: Pack): Promise<readonly Difference[]> {
  const differences: Difference[] = [];
  const listed = new Map(pack.manifest.entries.map((entry) => [entry.path, entry]));
  for (const path of [...new Set([...listed.keys(), ...pack.entries.keys()])].toSorted()) {
    const entry = listed.get(path);
    const content = pack.entries.get(path);
    if (content === undefined) {
      differences.push({ kind: 'missing', path });
    } else if (entry === undefined) {
      differences.push({ kind: 'extra', path });
    } else {
      const stated = `${entry.bytes} bytes, sha256 ${entry.sha256}`;
      const found = `${content.length} bytes, sha256 ${await sha256(content)}`;
      if (stated !== found) differences.push({ kind: 'digest', path, stated, found });
    }
  }
  return differences;
}
