// A zip → the study in it, as a source to load it from.
import { type StudySource, sourceFromMap } from '@ohmstead/study';
import { studyFiles } from './study-files.ts';
import { readZip } from './zip-read.ts';

/**
 * Opens the study in a zip: one of a study folder, or a review pack.
 * @param bytes the whole zip
 * @param file what to call it in faults
 * @throws InputFaults where the zip is not sound or holds no study
 */
export async function sourceFromZip(bytes: Uint8Array, file: string = 'study.zip'): Promise<StudySource> {
  return sourceFromMap(studyFiles(await readZip(bytes, file), file));
}
