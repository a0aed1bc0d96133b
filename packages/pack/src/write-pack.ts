// Study and outcome → review pack: one zip with the sheet, its figures and tables, the inputs and their digests.
import type { LoadedStudy, Outcome } from '@ohmstead/study';
import { jsonText } from './json-text.ts';
import { MANIFEST_NAME, makeManifest } from './manifest.ts';
import { packEntries } from './pack-entries.ts';
import { type PageScripts, pageProgram } from './page-program.ts';
import type { Renderer } from './renderer.ts';
import { sheetRenderer } from './sheet-renderer.ts';
import { writeZip } from './zip-write.ts';

export interface PackOptions {
  readonly renderer?: Renderer | undefined;
  readonly scripts?: PageScripts | undefined;
}

/**
 * Writes a review pack; the same study gives the same bytes.
 * @param loaded the study with its files as read
 * @param outcome of solving it
 * @param version of the program
 * @param options the sheet is drawn as ever where left out; with scripts it can compute itself anew
 * @returns the zip
 */
export async function writePack(
  loaded: LoadedStudy,
  outcome: Outcome,
  version: string,
  { renderer = sheetRenderer, scripts }: PackOptions = {},
): Promise<Uint8Array> {
  const program = scripts && (await pageProgram(scripts, loaded, outcome.results));
  const entries = packEntries(loaded, outcome, { renderer, program });
  const manifest = jsonText(await makeManifest(entries, version));
  return writeZip(new Map([...entries, [MANIFEST_NAME, new TextEncoder().encode(manifest)]]));
}
