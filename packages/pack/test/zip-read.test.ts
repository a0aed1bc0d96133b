// Zips round trip; damaged, oversized and hostile ones are refused as faults of the input.
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { MAX_ENTRIES } from '../src/zip-limits.ts';
import { readZip } from '../src/zip-read.ts';
import { writeZip } from '../src/zip-write.ts';
import { faultsOf } from './faults-of.ts';
import { rawZip } from './raw-zip.ts';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const faults = (zip: Uint8Array): Promise<readonly string[]> => faultsOf(() => readZip(zip, 'a.zip'));

describe('round trip', () => {
  test('any files come back as they were', async () => {
    const name = fc.stringMatching(/^[a-zäΩ][a-z0-9 ._-]{0,8}(\/[a-z][a-z0-9]{0,5})?$/);
    await fc.assert(
      fc.asyncProperty(fc.dictionary(name, fc.uint8Array({ maxLength: 300 })), async (files) => {
        const written = writeZip(new Map(Object.entries(files)));
        const read = await readZip(written, 'a.zip');
        expect(Object.fromEntries(read)).toEqual({ ...files });
      }),
      { numRuns: 50, seed: 1 },
    );
  });

  test('the order in which files are given does not change a byte', async () => {
    const one = writeZip(
      new Map([
        ['a', bytes('1')],
        ['b/c', bytes('2')],
      ]),
    );
    const other = writeZip(
      new Map([
        ['b/c', bytes('2')],
        ['a', bytes('1')],
      ]),
    );
    expect(other).toEqual(one);
  });

  test('the clock leaves no trace', async () => {
    const zip = writeZip(new Map([['a', bytes('1')]]));
    const stamp = new DataView(zip.buffer).getUint32(10, true);
    // MS-DOS time and date of the local header (APPNOTE.TXT 6.3.10, 4.4.6): midnight, first of January 1980
    expect(stamp).toBe(((0 << 9) | (1 << 5) | 1) * 0x10000);
  });

  test('stored entries are read as well, and folders left out', async () => {
    const zip = rawZip([
      { name: 'b/', content: '', method: 0 },
      { name: 'b/x', content: 'text', method: 0 },
    ]);
    expect([...(await readZip(zip, 'a.zip'))]).toEqual([['b/x', bytes('text')]]);
  });

  test('an empty zip has no files', async () => {
    expect((await readZip(rawZip([]), 'a.zip')).size).toBe(0);
  });
});

describe('damage', () => {
  const sound = rawZip([
    { name: 'study.json', content: '{"a": 1}' },
    { name: 'b.csv', content: 'x', method: 0 },
  ]);

  test('not a zip, nothing at all, and cut short', async () => {
    expect(await faults(bytes('id,x1_m\n1,2\n'.repeat(9)))).toEqual(['a.zip: not a zip file']);
    expect(await faults(new Uint8Array())).toEqual(['a.zip: the file is empty; expected a zip']);
    expect(await faults(sound.subarray(0, 60))).toEqual([
      'a.zip: the zip is cut short: its directory is missing',
    ]);
  });

  test('another number of entries than stated', async () => {
    expect(await faults(rawZip([{ name: 'x' }], 2))).toEqual([
      'a.zip: the zip directory does not hold the 2 entries stated',
    ]);
  });

  test('every cut is a fault', async () => {
    for (let length = 0; length < sound.length; length++) {
      expect(await faults(sound.subarray(0, length))).not.toEqual([]);
    }
  });

  test('no flipped bit ever changes what is read unseen', async () => {
    const before = [...(await readZip(sound, 'a.zip'))];
    let refused = 0;
    for (let bit = 0; bit < sound.length * 8; bit++) {
      const flipped = sound.slice();
      flipped[bit >> 3] ^= 1 << (bit & 7);
      try {
        expect([...(await readZip(flipped, 'a.zip'))]).toEqual(before);
      } catch (error) {
        expect(error).toHaveProperty('faults');
        refused++;
      }
    }
    expect(refused).toBeGreaterThan(sound.length * 3);
  });

  test('a wrong checksum is told of its entry', async () => {
    const message = 'entry is damaged: its bytes do not unpack to the size and checksum stated';
    expect(
      await faults(
        rawZip([
          { name: 'x', crc: 1 },
          { name: 'y', crc: 1, method: 0 },
        ]),
      ),
    ).toEqual([`a.zip: x: ${message}`, `a.zip: y: ${message}`]);
  });
});

describe('hostile', () => {
  test.each([
    ['../evil.csv', 'a.zip: ../evil.csv: entry name leaves the zip; expected a path without ..'],
    ['a/../../evil', 'a.zip: a/../../evil: entry name leaves the zip; expected a path without ..'],
    ['/etc/passwd', 'a.zip: /etc/passwd: entry name is absolute; expected a path relative to the zip'],
    ['C:evil', 'a.zip: C:evil: entry name is absolute; expected a path relative to the zip'],
    ['..\\evil', 'a.zip: ..\\evil: entry name has a backslash in it; expected / between folders'],
    ['a//b', 'a.zip: a//b: entry name has an empty or . part; expected a plain path'],
    ['./b', 'a.zip: ./b: entry name has an empty or . part; expected a plain path'],
    ['a\u001b[2Jb', 'a.zip: a\\u001b[2Jb: entry name has control characters in it'],
    ['', 'a.zip: : an entry has no name'],
    ['n'.repeat(1025), `a.zip: ${'n'.repeat(80)}…: entry name is longer than 1024 bytes`],
  ])('name %j', async (name, line) => {
    expect(await faults(rawZip([{ name }]))).toEqual([line]);
  });

  test('all faults are listed together', async () => {
    expect(await faults(rawZip([{ name: '../a' }, { name: 'ok' }, { name: '/b' }]))).toHaveLength(2);
  });

  test('one name twice', async () => {
    expect(await faults(rawZip([{ name: 'x' }, { name: 'x' }]))).toEqual([
      'a.zip: x: entry name stands twice in the zip',
    ]);
  });

  test('directory and local header disagree on the name', async () => {
    expect(await faults(rawZip([{ name: 'x', localName: 'y' }]))).toEqual([
      'a.zip: x: entry does not lie within the file; the zip is cut short or damaged',
    ]);
  });

  test('encrypted, linked, and packed in an unknown way', async () => {
    const zip = rawZip([
      { name: 'e', flags: 1 },
      { name: 'l', mode: 0o120777 },
      { name: 'm', method: 12 },
    ]);
    expect(await faults(zip)).toEqual([
      'a.zip: e: entry is encrypted; expected a zip without a password',
      'a.zip: l: entry is a symbolic link; expected files only',
      'a.zip: m: entry is packed by method 12; expected 0 (stored) or 8 (deflated)',
    ]);
  });

  test('too many entries', async () => {
    const zip = rawZip([{ name: 'x' }], MAX_ENTRIES + 1);
    expect(await faults(zip)).toEqual([`a.zip: ${MAX_ENTRIES + 1} entries; expected at most ${MAX_ENTRIES}`]);
  });

  test('more unpacked bytes stated than a study may have', async () => {
    const zip = rawZip([
      { name: 'x', size: 200e6 },
      { name: 'y', size: 200e6 },
    ]);
    expect(await faults(zip)).toEqual(['a.zip: 400000000 bytes unpacked; expected at most 268435456']);
  });

  test('a bomb that states a small size is stopped there', async () => {
    const zip = rawZip([{ name: 'x', content: new Uint8Array(40e6), size: 10 }]);
    expect(zip.length).toBeLessThan(100e3);
    expect(await faults(zip)).toHaveLength(1);
  });

  test('a size stated larger than what unpacks', async () => {
    expect(await faults(rawZip([{ name: 'x', size: 1000 }]))).toHaveLength(1);
  });

  test('sizes left to zip64', async () => {
    expect(await faults(rawZip([{ name: 'x', size: 0xffffffff }]))).toEqual([
      'a.zip: x: entry uses zip64, for sizes beyond the limit',
    ]);
  });
});
