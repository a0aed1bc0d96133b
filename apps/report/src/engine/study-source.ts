// Files as the page has them → the study's files: a single zip is unpacked, anything else is taken as it is.
import { sourceFromZip } from '@ohmstead/pack';
import { type StudySource, sourceFromMap } from '@ohmstead/study';

/**
 * @param files bytes by path; one zip alone is a study or a review pack
 * @throws InputFaults where a zip is not sound or holds no study
 */
export async function studySource(files: ReadonlyMap<string, Uint8Array>): Promise<StudySource> {
  const [only] = files;
  if (files.size === 1 && only !== undefined && /\.zip$/i.test(only[0]))
    return sourceFromZip(only[1], only[0]);
  return sourceFromMap(files);
}
