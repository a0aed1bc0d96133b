// Paths of a study: none leaves its folder.
import { posix, win32 } from 'node:path';
import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { pathFault } from '../../src/input/study-path.ts';

const SEED = 20_240_607;

describe('pathFault', () => {
  test.each(['conductors.csv', 'tables/grid.csv', 'a b.csv', '.hidden', 'Größe.csv'])('%s passes', (path) => {
    expect(pathFault(path)).toBeUndefined();
  });

  test.each([
    ['../a.csv', /leaves the study folder/],
    ['a/../../b.csv', /leaves the study folder/],
    ['a/..', /leaves the study folder/],
    ['/a.csv', /is absolute/],
    ['//host/a.csv', /is absolute/],
    ['C:a.csv', /names a drive/],
    ['c:/a.csv', /names a drive/],
    ['a.csv:stream', /has a colon/],
    ['a'.repeat(241), /more than 240 characters/],
    ['a\\b.csv', /has a backslash/],
    ['\\\\host\\a.csv', /has a backslash/],
    ['a//b.csv', /empty or \. part/],
    ['./a.csv', /empty or \. part/],
    ['a/', /empty or \. part/],
    ['a\0.csv', /has the character U\+0000/],
    ['a\nb.csv', /has the character U\+000A/],
  ])('%j is refused', (path, reason) => {
    expect(pathFault(path)).toMatch(reason);
  });

  test('whatever passes stays below the folder on every system', () => {
    const pieces = fc.constantFrom('..', '.', '/', '\\', 'a', 'C:', '', 'b.csv');
    fc.assert(
      fc.property(fc.array(pieces, { minLength: 1, maxLength: 6 }), (parts) => {
        const path = parts.join('');
        if (path === '' || pathFault(path) !== undefined) return;
        expect(posix.join('/study', path)).toBe(`/study/${path}`);
        expect(win32.join('S:\\study', path).replaceAll('\\', '/')).toBe(`S:/study/${path}`);
        expect(win32.isAbsolute(path)).toBe(false);
      }),
      { seed: SEED, numRuns: 2000 },
    );
  });
});
