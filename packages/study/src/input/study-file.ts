// One text file of a study: its size judged before reading, its bytes decoded.
import type { Fault } from '../fault.ts';
import { nearestName } from './nearest-name.ts';
import { shown } from './shown-value.ts';
import type { StudySource } from './source.ts';
import { decodeText } from './text-encoding.ts';

export interface StudyFile {
  readonly bytes: Uint8Array;
  /** line ends are `\n` */
  readonly text: string;
}

const BYTES_PER_MB = 1e6;

function megabytes(bytes: number): string {
  return `${(bytes / BYTES_PER_MB).toFixed(1)} MB`;
}

function missing(source: StudySource, path: string): Fault {
  const near = nearestName(path, source.paths);
  const nested = source.paths.find((other) => other.endsWith(`/${path}`));
  const other = nested ?? near;
  const hint = other === undefined ? '' : `; there is ${shown(other)}`;
  return { file: path, code: 'file-missing', message: `no such file in the study folder${hint}` };
}

/**
 * Reads one text file of a study.
 * @param source the study
 * @param path relative to its folder
 * @param largest bytes above which the file is refused without reading it
 * @param faults gets what is wrong with the file
 * @returns bytes and text, or `undefined` after a fault
 */
export function readStudyFile(
  source: StudySource,
  path: string,
  largest: number,
  faults: Fault[],
): StudyFile | undefined {
  const size = source.size(path);
  if (size === undefined) {
    faults.push(missing(source, path));
    return undefined;
  }
  if (size > largest) {
    const message = `the file has ${megabytes(size)}; at most ${megabytes(largest)} are read`;
    faults.push({ file: path, code: 'file-too-large', message });
    return undefined;
  }
  const bytes = source.read(path);
  const reading = decodeText(bytes);
  if (reading.kind === 'fault') {
    const line = reading.line === undefined ? {} : { line: reading.line };
    faults.push({ file: path, ...line, code: reading.code, message: reading.message });
    return undefined;
  }
  return { bytes, text: reading.text };
}
