// The central directory of a zip, read and distrusted: all its entries, or all the faults found.
// Layout: PKWARE APPNOTE.TXT 6.3.10, 4.3.16 (end record).
import type { Fault } from '@ohmstead/study';
import { CENTRAL_SIGNATURE, CENTRAL_SIZE, LOCAL_SIGNATURE, type ZipEntry, zipEntry } from './zip-entry.ts';
import { MAX_ENTRIES, MAX_TOTAL_BYTES } from './zip-limits.ts';

export type ZipDirectory =
  | { readonly kind: 'entries'; readonly entries: readonly ZipEntry[] }
  | { readonly kind: 'faults'; readonly faults: readonly Fault[] };

const END_SIGNATURE = 0x06054b50;
const END_SIZE = 22;
/** A comment's length is a 16-bit number, so the end record stands within this many bytes of the end. */
const LONGEST_COMMENT = 0xffff;

/**
 * Reads the directory of a zip without unpacking anything.
 * @param bytes the whole zip
 * @param file what to call the zip in faults
 * @returns entries in the order of the directory, or all faults
 */
export function zipDirectory(bytes: Uint8Array, file: string): ZipDirectory {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const refuse = (code: string, message: string): ZipDirectory => ({
    kind: 'faults',
    faults: [{ file, code, message }],
  });
  const end = endRecord(view);
  if (end === undefined) return refuse('not-a-zip', whyNoEnd(view));
  const count = view.getUint16(end + 10, true);
  const begin = view.getUint32(end + 16, true);
  const stop = begin + view.getUint32(end + 12, true);
  if (count > MAX_ENTRIES) {
    return refuse('too-many-entries', `${count} entries; expected at most ${MAX_ENTRIES}`);
  }
  if (stop > end) {
    return refuse('damaged-zip', 'the zip directory does not lie within the file; cut short or damaged');
  }
  const entries: ZipEntry[] = [];
  const faults: Fault[] = [];
  let at = begin;
  while (at + CENTRAL_SIZE <= stop && view.getUint32(at, true) === CENTRAL_SIGNATURE) {
    const read = zipEntry(view, at);
    if ('complaint' in read) {
      faults.push({ file, place: printable(read.name), code: read.code, message: read.complaint });
    } else {
      entries.push(read);
    }
    at += centralLength(view, at);
  }
  if (at !== stop || entries.length + faults.length !== count) {
    faults.push({
      file,
      code: 'damaged-zip',
      message: `the zip directory does not hold the ${count} entries stated`,
    });
  }
  faults.push(...repeated(entries, file), ...tooLarge(entries, file));
  return faults.length > 0 ? { kind: 'faults', faults } : { kind: 'entries', entries };
}

/** Header, name, extra field and comment of one entry, bytes. */
function centralLength(view: DataView, at: number): number {
  return (
    CENTRAL_SIZE +
    view.getUint16(at + 28, true) +
    view.getUint16(at + 30, true) +
    view.getUint16(at + 32, true)
  );
}

function repeated(entries: readonly ZipEntry[], file: string): readonly Fault[] {
  const seen = new Set<string>();
  const again = entries.filter(({ name }) => seen.has(name) || !seen.add(name));
  const message = 'entry name stands twice in the zip';
  return again.map(({ name }) => ({ file, place: name, code: 'duplicate-entry', message }));
}

function tooLarge(entries: readonly ZipEntry[], file: string): readonly Fault[] {
  const total = entries.reduce((sum, { size }) => sum + size, 0);
  if (total <= MAX_TOTAL_BYTES) return [];
  return [
    { file, code: 'too-large', message: `${total} bytes unpacked; expected at most ${MAX_TOTAL_BYTES}` },
  ];
}

/** Place of the end record, looked for from the back; its comment must end where the file ends. */
function endRecord(view: DataView): number | undefined {
  const first = Math.max(0, view.byteLength - END_SIZE - LONGEST_COMMENT);
  for (let at = view.byteLength - END_SIZE; at >= first; at--) {
    if (view.getUint32(at, true) !== END_SIGNATURE) continue;
    if (at + END_SIZE + view.getUint16(at + 20, true) === view.byteLength) return at;
  }
  return undefined;
}

function whyNoEnd(view: DataView): string {
  if (view.byteLength === 0) return 'the file is empty; expected a zip';
  const begins = view.byteLength >= 4 && view.getUint32(0, true) === LOCAL_SIGNATURE;
  return begins ? 'the zip is cut short: its directory is missing' : 'not a zip file';
}

/** A name that is at fault may hold anything; control characters are shown by their number. */
function printable(name: string): string {
  const shown = name.replace(
    /\p{Cc}/gu,
    (character) => `\\u${character.charCodeAt(0).toString(16).padStart(4, '0')}`,
  );
  return shown.length > 80 ? `${shown.slice(0, 80)}…` : shown;
}
