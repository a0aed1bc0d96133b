// The built program on broken and hostile input: status 2 with located lines, never a stack, nothing on standard output.
import {
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  truncateSync,
  writeFileSync,
} from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readPack } from '@ohmstead/pack';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { DEMO, ohmstead, ROOT } from './program.ts';

const BROKEN = `${ROOT}test-data/broken`;
/** Read as they should be in spite of their looks; they are there to show that they are. */
const SOUND: readonly string[] = ['byte-order-mark', 'carriage-returns', 'formula-names'];

let folder: string;
beforeAll(() => {
  folder = mkdtempSync(join(tmpdir(), 'ohmstead-'));
});
afterAll(() => rmSync(folder, { recursive: true }));

function study(name: string, files: Readonly<Record<string, string>>): string {
  mkdirSync(join(folder, name));
  for (const [path, text] of Object.entries(files)) writeFileSync(join(folder, name, path), text);
  return join(folder, name);
}

const demo = (path: string): string => readFileSync(join(DEMO, path), 'utf8');

test.each(readdirSync(BROKEN).filter((name) => !SOUND.includes(name)))('%s', (name) => {
  const { status, out, err } = ohmstead('solve', join(BROKEN, name));
  expect(err).toMatch(/^[^\s:]+(:\d+)?: ./);
  expect(err).not.toMatch(/^\s+at |fault in the program/m);
  expect([status, out]).toEqual([2, '']);
});

test.each(SOUND)('%s is read', (name) => {
  const { status, err } = ohmstead('solve', join(BROKEN, name), '--json');
  expect(err).not.toContain('fault');
  expect(status).toBe(0);
});

test('a table of 300 MB is refused without reading it', () => {
  const path = study('huge', { 'study.json': demo('study.json'), 'conductors.csv': '' });
  truncateSync(join(path, 'conductors.csv'), 300e6);
  const { status, err } = ohmstead('solve', path);
  expect(err).toMatch(/^conductors\.csv: the file has 300\.0 MB; /);
  expect(status).toBe(2);
});

test('a zip of 300 MB is refused without reading it', () => {
  writeFileSync(join(folder, 'huge.zip'), '');
  truncateSync(join(folder, 'huge.zip'), 300e6);
  const { status, err } = ohmstead('verify', join(folder, 'huge.zip'));
  expect(err).toMatch(/huge\.zip: 300000000 bytes; expected at most 268435456\n$/);
  expect(status).toBe(2);
});

test('markup and formulas in names do no harm in the pack', async () => {
  const script = '<script>alert(1)</script>';
  const path = study('hostile', {
    'study.json': demo('study.json')
      .replace('Aldermoor 33 kV intake', script)
      .replace('11 kV feeder', `=HYPERLINK(1)${script}`),
    'conductors.csv': demo('conductors.csv').replace(/^[^,\n]+(?=,\d)/m, '=1+1'),
  });
  const { status, out } = ohmstead('solve', path, '--pack', join(folder, 'hostile.zip'));
  expect(status).toBe(0);
  expect(out.startsWith(script)).toBe(true);
  const { entries } = await readPack(readFileSync(join(folder, 'hostile.zip')));
  for (const [name, content] of entries) {
    const text = new TextDecoder().decode(content);
    if (/\.(html|svg)$/.test(name)) expect(text).not.toContain(script);
    // a cell that begins with = + - @ is run by spreadsheets; numbers may begin with a minus
    if (/^tables\/.*\.csv$/.test(name)) expect(text).not.toMatch(/(^|,)"?[=@]/m);
    expect(name).toMatch(/^[\w./-]+$/);
  }
});
