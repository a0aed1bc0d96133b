// Files that the reader opens or drops, to a draft: a folder, a zip, a review pack or bare tables.
import { sourceFromZip } from '@ohmstead/pack';
import { InputFaults } from '@ohmstead/study';
import { openDraft } from '../desk/open-draft.ts';
import type { Opening } from '../desk/opening.ts';
import { studyFiles } from './study-files.ts';

/** A single zip is a study or a review pack; anything else is the files of a study. */
export async function openFiles(list: readonly File[]): Promise<Opening> {
  const files = await studyFiles(list);
  const [only] = files;
  if (files.size !== 1 || only === undefined || !only[0].toLowerCase().endsWith('.zip'))
    return openDraft(files);
  try {
    const source = await sourceFromZip(only[1], only[0]);
    const inside = source.paths.map((path): [string, Uint8Array] => [path, source.read(path)]);
    return openDraft(new Map(inside));
  } catch (error) {
    if (error instanceof InputFaults) return { kind: 'faults', faults: error.faults };
    throw error;
  }
}
