// Bytes of a file as text: UTF-8 only, anything else told by what it seems to be.

export type TextReading =
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'fault'; readonly line?: number; readonly code: string; readonly message: string };

const LINE_FEED = 0x0a;
/** Bytes looked at to tell UTF-16 without a byte order mark by its zero bytes. */
const SAMPLE_BYTES = 1000;

/** Beginnings of files that people send in place of text. */
const foreignBeginnings: readonly (readonly [beginning: readonly number[], seen: string])[] = [
  [[0x50, 0x4b, 0x03, 0x04], 'a zip file or a spreadsheet workbook (.xlsx)'],
  [[0xd0, 0xcf, 0x11, 0xe0], 'an old spreadsheet workbook (.xls)'],
  [[0x25, 0x50, 0x44, 0x46], 'a PDF document'],
];

const byteOrderMarks: readonly (readonly [mark: readonly number[], name: string])[] = [
  [[0xff, 0xfe, 0x00, 0x00], 'UTF-32 (little endian)'],
  [[0x00, 0x00, 0xfe, 0xff], 'UTF-32 (big endian)'],
  [[0xff, 0xfe], 'UTF-16 (little endian)'],
  [[0xfe, 0xff], 'UTF-16 (big endian)'],
];

function beginsWith(bytes: Uint8Array, beginning: readonly number[]): boolean {
  return bytes.length >= beginning.length && beginning.every((byte, i) => bytes[i] === byte);
}

function lineAt(bytes: Uint8Array, end: number): number {
  let line = 1;
  for (let i = 0; i < end; i++) if (bytes[i] === LINE_FEED) line++;
  return line;
}

/** UTF-16 by its zero bytes: in Latin text every second byte is zero. */
function markless16(bytes: Uint8Array): string | undefined {
  const sample = bytes.subarray(0, SAMPLE_BYTES);
  const zeros = [0, 0];
  for (let i = 0; i < sample.length; i++) if (sample[i] === 0) zeros[i % 2]++;
  const mostly = sample.length / 2 / 2;
  if (zeros[1] > mostly && zeros[0] === 0) return 'UTF-16 (little endian)';
  if (zeros[0] > mostly && zeros[1] === 0) return 'UTF-16 (big endian)';
  return undefined;
}

function decodes(bytes: Uint8Array, stream: boolean): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes, { stream });
    return true;
  } catch {
    return false;
  }
}

/** Whether a byte continues a UTF-8 character, 10xxxxxx. */
function continues(byte: number): boolean {
  return (byte & 0xc0) === 0x80;
}

/** Place of the byte at which the bytes stop being UTF-8, by halving; of the last character where that is cut off. */
function firstForeignByte(bytes: Uint8Array): number {
  let good = 0;
  let bad = bytes.length;
  if (decodes(bytes, true)) {
    let start = bytes.length - 1;
    while (start > 0 && continues(bytes[start])) start--;
    return start;
  }
  while (bad - good > 1) {
    const middle = (good + bad) >> 1;
    if (decodes(bytes.subarray(0, middle), true)) good = middle;
    else bad = middle;
  }
  return bad - 1;
}

/** The nearest byte at or before a place that is outside ASCII: where the foreign character begins. */
function foreignCharacterStart(bytes: Uint8Array, place: number): number {
  let start = place;
  while (start > 0 && bytes[start] < 0x80) start--;
  return start;
}

function encodingFault(seen: string): TextReading {
  return { kind: 'fault', code: 'text-encoding', message: `the file is ${seen} text; save it as UTF-8` };
}

/**
 * Decodes UTF-8 text, with or without a byte order mark.
 * @param bytes the whole file
 * @returns the text without the mark, line ends made `\n`; or the fault: another encoding or kind of file by name,
 * the first byte that is not UTF-8 with its line, or a zero byte with its line
 */
export function decodeText(bytes: Uint8Array): TextReading {
  for (const [beginning, seen] of foreignBeginnings) {
    if (!beginsWith(bytes, beginning)) continue;
    return { kind: 'fault', code: 'not-text', message: `the file is ${seen}; export it as text (UTF-8)` };
  }
  for (const [mark, name] of byteOrderMarks) if (beginsWith(bytes, mark)) return encodingFault(name);
  const zero = bytes.indexOf(0);
  if (zero >= 0) {
    const name = markless16(bytes);
    if (name !== undefined) return encodingFault(name);
    const message = 'a zero byte (NUL) stands here; expected plain text';
    return { kind: 'fault', code: 'nul-byte', line: lineAt(bytes, zero), message };
  }
  if (!decodes(bytes, false)) {
    const place = foreignCharacterStart(bytes, firstForeignByte(bytes));
    const byte = bytes[place].toString(16).toUpperCase().padStart(2, '0');
    const message = `the byte 0x${byte} is not UTF-8, perhaps Latin-1 or Windows-1252; save the file as UTF-8`;
    return { kind: 'fault', code: 'text-encoding', line: lineAt(bytes, place), message };
  }
  const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  return { kind: 'text', text: text.replace(/\r\n?/g, '\n') };
}
