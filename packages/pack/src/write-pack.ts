// Study and outcome → review pack: one zip with the sheet, its figures and tables, the inputs and their digests.
import type { LoadedStudy, Outcome } from '@ohmstead/study';
import { jsonText } from './json-text.ts';
import { MANIFEST_NAME, makeManifest } from './manifest.ts';
import { packEntries } from './pack-entries.ts';
import type { Renderer } from './renderer.ts';
import { sheetRenderer } from './sheet-renderer.ts';
import { writeZip } from './zip-write.ts';

/**
 * Writes a review pack; the same study gives the same bytes.
 * @param loaded the study with its files as read
 * @param outcome of solving it
 * @param version of the program
 * @param renderer draws sheet, figures and tables
 * @returns the zip
 */
export async function writePack(
  loaded: LoadedStudy,
  outcome: Outcome,
  version: string,
  renderer: Renderer = sheetRenderer,
): Promise<Uint8Array> {
  const entries = packEntries(loaded, outcome, renderer);
  const manifest = jsonText(await makeManifest(entries, version));
  return writeZip(new Map([...entries, [MANIFEST_NAME, new TextEncoder().encode(manifest)]]));
}
