// Output files appear whole or not at all, and faults are found before long work is done.
import {
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  symlinkSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { outputFault, writeWhole } from '../src/write-whole.ts';

let root: string;
beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'out-'));
});
afterEach(() => rmSync(root, { recursive: true }));

const bytes = new TextEncoder().encode('new');

test('writes a file, replaces one, and leaves nothing else behind', () => {
  const path = join(root, 'a.zip');
  writeWhole(path, bytes);
  writeFileSync(path, 'old and longer');
  writeWhole(path, bytes);
  expect(readFileSync(path, 'utf8')).toBe('new');
  expect(readdirSync(root)).toEqual(['a.zip']);
});

test('a link in its place is replaced, not followed', () => {
  writeFileSync(join(root, 'precious'), 'kept');
  symlinkSync(join(root, 'precious'), join(root, 'a.zip'));
  writeWhole(join(root, 'a.zip'), bytes);
  expect(readFileSync(join(root, 'precious'), 'utf8')).toBe('kept');
  expect(readFileSync(join(root, 'a.zip'), 'utf8')).toBe('new');
});

test('nothing is left behind where the system refuses', () => {
  mkdirSync(join(root, 'a.zip'));
  expect(() => writeWhole(join(root, 'a.zip'), bytes)).toThrow('a.zip: cannot be written: is a folder');
  expect(() => writeWhole(join(root, 'no', 'a.zip'), bytes)).toThrow(
    'cannot be written: no such file or folder',
  );
  expect(readdirSync(root)).toEqual(['a.zip']);
});

test('faults are found beforehand', () => {
  mkdirSync(join(root, 'folder.zip'));
  writeFileSync(join(root, 'file'), '');
  expect(outputFault(join(root, 'a.zip'))).toBeUndefined();
  expect(outputFault(join(root, 'folder.zip'))?.message).toBe('cannot be written: is a folder');
  expect(outputFault(join(root, 'no', 'a.zip'))?.message).toMatch(
    /^cannot be written: folder .*no: no such file or folder$/,
  );
  expect(outputFault(join(root, 'file', 'a.zip'))?.message).toMatch(/no such file or folder|is not a folder/);
});
