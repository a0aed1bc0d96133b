// STUDY on the command line → its files: a folder, a zip, or the path of a study.json.
import { closeSync, openSync, readFileSync, readSync, type Stats, statSync } from 'node:fs';
import { basename, dirname } from 'node:path';
import { MAX_TOTAL_BYTES } from '@ohmstead/pack';
import { InputFaults, type StudySource } from '@ohmstead/study';
import { folderSource } from './folder-source.ts';
import { whatAStudyIs } from './minimal-study.ts';
import { systemComplaint } from './system-complaint.ts';

/** A fault of the input that needs more words than a line. */
export class ExplainedFaults extends InputFaults {
  readonly explanation: string;
  constructor(faults: ConstructorParameters<typeof InputFaults>[0], explanation: string) {
    super(faults);
    this.explanation = explanation;
  }
}

/**
 * Opens a study.
 * @param path as given on the command line
 * @throws InputFaults where there is no study; for a bare table with an explanation of what a study is
 */
export async function openStudy(path: string): Promise<StudySource> {
  const state = stateOf(path);
  if (state.isDirectory()) return withStudyJson(path);
  if (!state.isFile()) throw refused(path, 'neither a folder nor a file; expected a study');
  if (beginsAsZip(path) || /\.zip$/i.test(path)) {
    const { sourceFromZip } = await import('@ohmstead/pack');
    return sourceFromZip(readZipFile(path), path);
  }
  if (basename(path) === 'study.json') return folderSource(dirname(path));
  if (/\.json$/i.test(path))
    throw refused(path, 'expected a file named study.json, the folder it is in, or a zip');
  throw new ExplainedFaults(
    refused(path, 'a table alone is not a study').faults,
    whatAStudyIs(basename(path)),
  );
}

function withStudyJson(folder: string): StudySource {
  const source = folderSource(folder);
  if (source.size('study.json') !== undefined) return source;
  const table = source.paths.find((name) => /\.csv$/i.test(name)) ?? 'conductors.csv';
  throw new ExplainedFaults(refused(folder, 'no study.json in this folder').faults, whatAStudyIs(table));
}

/**
 * Reads a zip file that is not too large to be a study or a review pack.
 * @throws InputFaults where it is missing, unreadable or too large
 */
export function readZipFile(path: string): Uint8Array {
  const { size } = stateOf(path);
  if (size > MAX_TOTAL_BYTES) throw refused(path, `${size} bytes; expected at most ${MAX_TOTAL_BYTES}`);
  return readable(path, () => new Uint8Array(readFileSync(path)));
}

function stateOf(path: string): Stats {
  return readable(path, () => statSync(path));
}

function beginsAsZip(path: string): boolean {
  return readable(path, () => {
    const file = openSync(path, 'r');
    try {
      const start = Buffer.alloc(4);
      readSync(file, start, 0, 4, 0);
      return start.toString('latin1') === 'PK\u0003\u0004';
    } finally {
      closeSync(file);
    }
  });
}

function readable<T>(path: string, act: () => T): T {
  try {
    return act();
  } catch (error) {
    const complaint = systemComplaint(error);
    throw complaint === undefined ? error : refused(path, complaint);
  }
}

function refused(file: string, message: string): InputFaults {
  return new InputFaults([{ file, code: 'no-study', message }]);
}
