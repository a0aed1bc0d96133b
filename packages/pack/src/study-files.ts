// Where the study lies inside a zip: at its top, or in the one folder of it that holds a study.json.
import { InputFaults } from '@ohmstead/study';

const STUDY_NAME = 'study.json';

/** Files that desktop systems add to zips unasked; no study names them. */
const DESKTOP_LITTER: RegExp = /(^|\/)(__MACOSX\/|\.DS_Store$|Thumbs\.db$)/;

/**
 * The files of the study in a zip, by their path in the study. In a review pack that is the folder `study/`.
 * @param entries contents by entry name
 * @param file what to call the zip in faults
 * @throws InputFaults where there is no study.json, or more than one to choose from
 */
export function studyFiles(
  entries: ReadonlyMap<string, Uint8Array>,
  file: string,
): ReadonlyMap<string, Uint8Array> {
  const kept = [...entries].filter(([name]) => !DESKTOP_LITTER.test(name));
  const prefix = kept.some(([name]) => name === STUDY_NAME)
    ? ''
    : onlyFolder(
        kept.map(([name]) => name),
        file,
      );
  const inside = kept.filter(([name]) => name.startsWith(prefix));
  return new Map(inside.map(([name, content]) => [name.slice(prefix.length), content]));
}

function onlyFolder(names: readonly string[], file: string): string {
  const found = names.filter((name) => /^[^/]+\/study\.json$/.test(name));
  if (found.length === 1) return found[0].slice(0, -STUDY_NAME.length);
  const message =
    found.length === 0
      ? `no ${STUDY_NAME} in the zip; expected it at the top or in one folder`
      : `${found.length} studies in the zip (${found.join(', ')}); expected one`;
  throw new InputFaults([{ file, code: found.length === 0 ? 'no-study' : 'many-studies', message }]);
}
