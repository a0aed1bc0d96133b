// Bytes as text: UTF-8 read, everything else named.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { decodeText } from '../../src/input/text-encoding.ts';

const SEED = 20_240_604;

function utf16(text: string, bigEndian: boolean): Uint8Array {
  const view = new DataView(new ArrayBuffer(2 * text.length));
  for (let i = 0; i < text.length; i++) view.setUint16(2 * i, text.charCodeAt(i), !bigEndian);
  return new Uint8Array(view.buffer);
}

const table = 'id,x1_m\nA,1\nB,2\n';

describe('decodeText', () => {
  test('any text comes back with its line ends made one', () => {
    const word = fc.string({ unit: 'grapheme', maxLength: 5 }).map((text) => text.replaceAll('\0', ''));
    const pieces = fc.oneof(word, fc.constantFrom('\r', '\n', '\r\n'));
    fc.assert(
      fc.property(fc.array(pieces), (parts) => {
        const text = `x${parts.join('')}`;
        const expected = text.split(/\r\n|\r|\n/).join('\n');
        expect(decodeText(new TextEncoder().encode(text))).toEqual({ kind: 'text', text: expected });
      }),
      { seed: SEED, numRuns: 500 },
    );
  });

  test.each([
    ['\r\n', 'a\r\nb'],
    ['\r', 'a\rb'],
    ['\n', 'a\nb'],
    ['a byte order mark', '\ufeffa\nb'],
  ])('%s leaves lines alone', (_, text) => {
    expect(decodeText(new TextEncoder().encode(text))).toEqual({ kind: 'text', text: 'a\nb' });
  });

  test.each([
    [
      'little endian with mark',
      utf16('\ufeff굵기깊이', false),
      'the file is UTF-16 (little endian) text; save it as UTF-8',
    ],
    [
      'big endian with mark',
      utf16('\ufeff굵기깊이', true),
      'the file is UTF-16 (big endian) text; save it as UTF-8',
    ],
    ['little endian', utf16(table, false), 'the file is UTF-16 (little endian) text; save it as UTF-8'],
    ['big endian', utf16(table, true), 'the file is UTF-16 (big endian) text; save it as UTF-8'],
    [
      '32 bit',
      Uint8Array.of(0xff, 0xfe, 0, 0, 0x61, 0, 0, 0),
      'the file is UTF-32 (little endian) text; save it as UTF-8',
    ],
    [
      'workbook',
      Uint8Array.of(0x50, 0x4b, 3, 4, 0x14),
      'the file is a zip file or a spreadsheet workbook (.xlsx); export it as text (UTF-8)',
    ],
    [
      'old workbook',
      Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0xa1),
      'the file is an old spreadsheet workbook (.xls); export it as text (UTF-8)',
    ],
    [
      'document',
      new TextEncoder().encode('%PDF-1.7\n'),
      'the file is a PDF document; export it as text (UTF-8)',
    ],
  ])('%s is named', (_, bytes, message) => {
    expect(decodeText(bytes)).toMatchObject({ kind: 'fault', message });
  });

  test.each([
    ['at the start', [0xe9, 0x0a, 0x61], 1, '0xE9'],
    ['in line 3', [0x61, 0x0a, 0x0a, 0x62, 0xfc, 0x62], 3, '0xFC'],
    ['in the last byte', [0x61, 0x0a, 0xe4], 2, '0xE4'],
    ['cut off within a character', [0x61, 0x0a, 0xe2, 0x82], 2, '0xE2'],
    ['a lone continuation', [0x0a, 0x80], 2, '0x80'],
  ])('a byte that is not UTF-8 is told with its line: %s', (_, bytes, line, byte) => {
    expect(decodeText(Uint8Array.from(bytes))).toEqual({
      kind: 'fault',
      code: 'text-encoding',
      line,
      message: `the byte ${byte} is not UTF-8, perhaps Latin-1 or Windows-1252; save the file as UTF-8`,
    });
  });

  test('a zero byte is told with its line', () => {
    const bytes = new TextEncoder().encode('id,x1_m\nA,1\0\n');
    expect(decodeText(bytes)).toMatchObject({ kind: 'fault', code: 'nul-byte', line: 2 });
  });
});
