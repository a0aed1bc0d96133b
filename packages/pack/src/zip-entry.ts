// One entry of a zip's central directory, checked against its local header: name, sizes and place, or what is wrong.
// Layout: PKWARE APPNOTE.TXT 6.3.10, 4.3.7 (local header), 4.3.12 (central directory header).
import { entryNameComplaint } from './entry-name.ts';

export interface ZipEntry {
  readonly name: string;
  readonly folder: boolean;
  readonly method: 'stored' | 'deflated';
  readonly crc: number;
  /** bytes */
  readonly packedSize: number;
  /** bytes, as the directory claims */
  readonly size: number;
  /** where the packed bytes begin in the zip */
  readonly start: number;
}

export interface EntryComplaint {
  readonly name: string;
  readonly code: string;
  readonly complaint: string;
}

export const CENTRAL_SIGNATURE: number = 0x02014b50;
export const CENTRAL_SIZE: number = 46;
export const LOCAL_SIGNATURE: number = 0x04034b50;
const LOCAL_SIZE = 30;
const ENCRYPTED_FLAG = 1;
/** Upper half of the external attributes is the Unix file mode; its type bits, and those of a symbolic link. */
const UNIX_TYPE_MASK = 0o170000;
const UNIX_SYMBOLIC_LINK = 0o120000;
/** Where a field holds this, the true value stands in a zip64 record. */
const SEE_ZIP64 = 0xffffffff;

/** Reads the entry whose central header stands at `at`. */
export function zipEntry(view: DataView, at: number): ZipEntry | EntryComplaint {
  const flags = view.getUint16(at + 8, true);
  const methodNumber = view.getUint16(at + 10, true);
  const packedSize = view.getUint32(at + 20, true);
  const size = view.getUint32(at + 24, true);
  const nameLength = view.getUint16(at + 28, true);
  const mode = view.getUint32(at + 38, true) >>> 16;
  const localAt = view.getUint32(at + 42, true);
  const name = text(view, at + CENTRAL_SIZE, nameLength);
  if (name === undefined)
    return { name: '', code: 'bad-entry-name', complaint: 'an entry name is not UTF-8 text' };
  const nameComplaint = entryNameComplaint(name);
  if (nameComplaint !== undefined) return { name, code: 'bad-entry-name', complaint: nameComplaint };
  const complain = (code: string, complaint: string): EntryComplaint => ({ name, code, complaint });
  if (flags & ENCRYPTED_FLAG)
    return complain('encrypted-entry', 'entry is encrypted; expected a zip without a password');
  if ((mode & UNIX_TYPE_MASK) === UNIX_SYMBOLIC_LINK) {
    return complain('link-entry', 'entry is a symbolic link; expected files only');
  }
  if (methodNumber !== 0 && methodNumber !== 8) {
    return complain(
      'unknown-method',
      `entry is packed by method ${methodNumber}; expected 0 (stored) or 8 (deflated)`,
    );
  }
  if ([packedSize, size, localAt].includes(SEE_ZIP64))
    return complain('too-large', 'entry uses zip64, for sizes beyond the limit');
  const start = dataStart(view, localAt, name);
  if (start === undefined || start + packedSize > view.byteLength) {
    return complain('damaged-zip', 'entry does not lie within the file; the zip is cut short or damaged');
  }
  const method = methodNumber === 0 ? 'stored' : 'deflated';
  if (method === 'stored' && packedSize !== size)
    return complain('damaged-zip', 'stored entry has two sizes');
  const crc = view.getUint32(at + 16, true);
  return { name, folder: name.endsWith('/'), method, crc, packedSize, size, start };
}

/** Where the packed bytes begin; undefined unless the local header is there and bears the same name. */
function dataStart(view: DataView, localAt: number, name: string): number | undefined {
  if (localAt + LOCAL_SIZE > view.byteLength || view.getUint32(localAt, true) !== LOCAL_SIGNATURE)
    return undefined;
  const nameLength = view.getUint16(localAt + 26, true);
  if (text(view, localAt + LOCAL_SIZE, nameLength) !== name) return undefined;
  return localAt + LOCAL_SIZE + nameLength + view.getUint16(localAt + 28, true);
}

function text(view: DataView, at: number, length: number): string | undefined {
  if (at + length > view.byteLength) return undefined;
  try {
    return new TextDecoder('utf-8', { fatal: true, ignoreBOM: true }).decode(
      new Uint8Array(view.buffer, view.byteOffset + at, length),
    );
  } catch {
    return undefined;
  }
}
