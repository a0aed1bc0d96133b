// One file named on the command line as a source to read it from; its name in faults is the path as given.
import { readFileSync, statSync } from 'node:fs';
import { InputFaults, type StudySource } from '@ohmstead/study';
import { systemComplaint } from './system-complaint.ts';

/** @throws InputFaults, from `size` and `read`, where the file is missing or may not be read */
export function fileSource(path: string): StudySource {
  return {
    paths: [path],
    size: () => {
      const state = readable(path, () => statSync(path));
      if (state.isFile()) return state.size;
      throw unreadable(path, 'is not a file');
    },
    read: () => readable(path, () => new Uint8Array(readFileSync(path))),
  };
}

function readable<T>(path: string, act: () => T): T {
  try {
    return act();
  } catch (error) {
    const complaint = systemComplaint(error);
    throw complaint === undefined ? error : unreadable(path, complaint);
  }
}

function unreadable(file: string, complaint: string): InputFaults {
  return new InputFaults([{ file, code: 'unreadable', message: complaint }]);
}
