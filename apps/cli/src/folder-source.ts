// A study in a folder: files by their relative path, none reached by a link that leaves the folder.
import { type Dirent, readdirSync, readFileSync, realpathSync, statSync } from 'node:fs';
import { dirname, join, relative, sep } from 'node:path';
import { InputFaults, type StudySource } from '@ohmstead/study';
import { systemComplaint } from './system-complaint.ts';

/** Files listed to suggest a name from; a study has a handful, and a home folder must not be walked through. */
const MOST_LISTED = 500;
const DEEPEST_LISTED = 4;

/**
 * The files of a folder as a study's source.
 * @param folder path of the folder that holds study.json
 * @returns the source; its `size` and `read` throw InputFaults where a file is there but may not be read
 */
export function folderSource(folder: string): StudySource {
  const root = realpathSync(folder);
  let listed: readonly string[] | undefined;
  return {
    get paths(): readonly string[] {
      listed ??= list(root);
      return listed;
    },
    size: (path) => asFault(path, () => sizeInside(root, path)),
    read: (path) => asFault(path, () => new Uint8Array(readFileSync(join(root, path)))),
  };
}

function sizeInside(root: string, path: string): number | undefined {
  const place = join(root, path);
  const state = isBelowFile(place) ? undefined : statSync(place, { throwIfNoEntry: false });
  if (state === undefined) return undefined;
  if (relative(root, realpathSync(place)).split(sep)[0] === '..') {
    throw fault(path, 'path-leaves-study', 'is a link out of the study folder; expected a file within it');
  }
  if (!state.isFile()) throw fault(path, 'not-a-file', 'is not a file; expected a table or study.json');
  return state.size;
}

/** `a.csv/b.csv` where a.csv is a file: the system answers with an error instead of "not there". */
function isBelowFile(place: string): boolean {
  return statSync(dirname(place), { throwIfNoEntry: false })?.isFile() === true;
}

function asFault<T>(path: string, act: () => T): T {
  try {
    return act();
  } catch (error) {
    const complaint = systemComplaint(error);
    throw complaint === undefined ? error : fault(path, 'unreadable', `cannot be read: ${complaint}`);
  }
}

function fault(file: string, code: string, message: string): InputFaults {
  return new InputFaults([{ file, code, message }]);
}

/** Files down to a few levels, breadth first and sorted, hidden ones left out. */
function list(root: string): readonly string[] {
  const found: string[] = [];
  let folders = [''];
  for (let depth = 0; depth < DEEPEST_LISTED && found.length < MOST_LISTED; depth++) {
    const deeper: string[] = [];
    for (const folder of folders) {
      for (const entry of entriesOf(join(root, folder))) {
        const path = folder === '' ? entry.name : `${folder}/${entry.name}`;
        if (entry.isFile()) found.push(path);
        if (entry.isDirectory()) deeper.push(path);
      }
    }
    folders = deeper.slice(0, MOST_LISTED);
  }
  return found.slice(0, MOST_LISTED);
}

function entriesOf(folder: string): readonly Dirent[] {
  try {
    const entries = readdirSync(folder, { withFileTypes: true });
    return entries.filter(({ name }) => !name.startsWith('.')).toSorted((a, b) => (a.name < b.name ? -1 : 1));
  } catch {
    return [];
  }
}
