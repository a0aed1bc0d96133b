// A folder as a source: files within it, and nothing that a link leads to outside.
import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { folderSource } from '../src/folder-source.ts';

let outside: string;
let root: string;
beforeEach(() => {
  outside = mkdtempSync(join(tmpdir(), 'study-'));
  root = join(outside, 'study');
  mkdirSync(join(root, 'tables'), { recursive: true });
  writeFileSync(join(root, 'study.json'), '{}');
  writeFileSync(join(root, 'tables', 'a.csv'), 'abc');
  writeFileSync(join(outside, 'secret.csv'), 'secret');
});
afterEach(() => rmSync(outside, { recursive: true }));

test('files by path, with sizes known before reading', () => {
  const source = folderSource(root);
  expect(source.paths).toEqual(['study.json', 'tables/a.csv']);
  expect(source.size('tables/a.csv')).toBe(3);
  expect(source.read('tables/a.csv')).toEqual(new TextEncoder().encode('abc'));
  expect(source.size('b.csv')).toBeUndefined();
  expect(source.size('study.json/b.csv')).toBeUndefined();
});

test('links within the folder are followed, links out of it are refused', () => {
  symlinkSync('tables/a.csv', join(root, 'inner.csv'));
  symlinkSync('../secret.csv', join(root, 'outer.csv'));
  symlinkSync(outside, join(root, 'up'));
  symlinkSync('nowhere', join(root, 'dangling.csv'));
  const source = folderSource(root);
  expect(source.size('inner.csv')).toBe(3);
  expect(() => source.size('outer.csv')).toThrow(
    'outer.csv: is a link out of the study folder; expected a file within it',
  );
  expect(() => source.size('up/secret.csv')).toThrow('is a link out of the study folder');
  expect(source.size('dangling.csv')).toBeUndefined();
});

test('a study folder reached by a link is a study folder', () => {
  symlinkSync(root, join(outside, 'alias'));
  expect(folderSource(join(outside, 'alias')).size('study.json')).toBe(2);
});

test('a name that only begins with two dots is within', () => {
  writeFileSync(join(root, '..a.csv'), 'x');
  expect(folderSource(root).size('..a.csv')).toBe(1);
});

test('a folder or device in the place of a table', () => {
  symlinkSync('/dev/null', join(root, 'null.csv'));
  expect(() => folderSource(root).size('tables')).toThrow(
    'tables: is not a file; expected a table or study.json',
  );
  expect(() => folderSource(root).size('null.csv')).toThrow('is a link out of the study folder');
});

test('what the system refuses is a fault of the input', () => {
  symlinkSync('loop', join(root, 'loop'));
  expect(() => folderSource(root).size('loop')).toThrow('loop: cannot be read: links that lead in a circle');
  expect(() => folderSource(root).size(`${'n'.repeat(300)}.csv`)).toThrow(
    'cannot be read: the name is too long',
  );
});

test('hidden folders are not listed', () => {
  mkdirSync(join(root, '.hidden'));
  writeFileSync(join(root, '.hidden', 'x'), '');
  expect(folderSource(root).paths).toEqual(['study.json', 'tables/a.csv']);
});

test('a large tree is not walked through', () => {
  for (let i = 0; i < 600; i++) writeFileSync(join(root, 'tables', `${i}.csv`), '');
  const { paths } = folderSource(root);
  expect(paths).toHaveLength(500);
  expect(paths[0]).toBe('study.json');
});
