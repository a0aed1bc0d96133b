// Writes an output file whole or not at all: into a temporary folder beside it first, then moved into place.
import { accessSync, constants, mkdtempSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { dirname, join, resolve } from 'node:path';
import { type Fault, InputFaults } from '@ohmstead/study';
import { systemComplaint } from './system-complaint.ts';

/**
 * What stands in the way of writing a file, found before long work is done for it.
 * @param path of the file to come
 * @returns a fault, or undefined where it can be written as far as one can tell
 */
export function outputFault(path: string): Fault | undefined {
  const folder = dirname(resolve(path));
  try {
    if (statSync(path, { throwIfNoEntry: false })?.isDirectory()) return cannot(path, 'is a folder');
    accessSync(folder, constants.F_OK);
    if (!statSync(folder).isDirectory()) return cannot(path, `${folder} is not a folder`);
    accessSync(folder, constants.W_OK);
    return undefined;
  } catch (error) {
    const complaint = systemComplaint(error);
    if (complaint === undefined) throw error;
    return cannot(path, `folder ${folder}: ${complaint}`);
  }
}

/**
 * Writes a file atomically; an existing one is replaced.
 * @throws InputFaults where the system refuses
 */
export function writeWhole(path: string, bytes: Uint8Array): void {
  let temporary: string | undefined;
  try {
    temporary = mkdtempSync(join(dirname(resolve(path)), '.ohmstead-'));
    const whole = join(temporary, 'whole');
    writeFileSync(whole, bytes);
    renameSync(whole, path);
  } catch (error) {
    const complaint = systemComplaint(error);
    throw complaint === undefined ? error : new InputFaults([cannot(path, complaint)]);
  } finally {
    if (temporary !== undefined) rmSync(temporary, { recursive: true, force: true });
  }
}

function cannot(file: string, complaint: string): Fault {
  return { file, code: 'unwritable', message: `cannot be written: ${complaint}` };
}
