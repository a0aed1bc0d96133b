// Small words of a sentence, and names of files.
import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { slug, uniqueSlugs } from '../../src/format/slug.ts';
import { counted, countWord, listed, tally, wrapped } from '../../src/format/words.ts';

describe('words', () => {
  it('counts in words up to twelve and in digits beyond', () => {
    expect([0, 1, 12, 13].map(countWord)).toEqual(['no', 'one', 'twelve', '13']);
    expect(counted(1, 'rod')).toBe('one rod');
    expect(counted(2, 'mesh', 'meshes')).toBe('two meshes');
    expect(tally(1, 'layer')).toBe('1 layer');
  });

  it('lists with one and', () => {
    expect(listed([])).toBe('');
    expect(listed(['a'])).toBe('a');
    expect(listed(['a', 'b', 'c'])).toBe('a, b and c');
  });

  it('breaks between words and says what was cut', () => {
    expect(wrapped('33 kV line terminal, back-up clearance', 22, 2)).toEqual([
      '33 kV line terminal,',
      'back-up clearance',
    ]);
    expect(wrapped('one two three four', 8, 1)).toEqual(['one two…']);
    expect(wrapped('abcdefghij', 4, 2)).toEqual(['abcd', 'efg…']);
  });
});

describe('slugs', () => {
  it('are lower-case ASCII', () => {
    expect(slug('33 kV bus')).toBe('33-kv-bus');
    expect(slug('Überstrom / Süd')).toBe('uberstrom-sud');
    expect(slug('<script>')).toBe('script');
    expect(slug('母線')).toBe('case');
    expect(slug('../../etc/passwd')).toBe('etc-passwd');
  });

  it('are unique whatever the names', () => {
    expect(uniqueSlugs(['bus', 'Bus', 'bus-2', 'bus'])).toEqual(['bus', 'bus-2', 'bus-2-2', 'bus-3']);
    fc.assert(
      fc.property(fc.array(fc.string(), { maxLength: 12 }), (names) => {
        const slugs = uniqueSlugs(names);
        expect(new Set(slugs).size).toBe(names.length);
        for (const name of slugs) expect(name).toMatch(/^[a-z0-9]+(-[a-z0-9]+)*$/);
      }),
    );
  });
});
