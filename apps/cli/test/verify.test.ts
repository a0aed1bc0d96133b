// `verify`: an honest pack passes, a changed one is told by lines and status 3.
import { readFileSync } from 'node:fs';
import { readPack } from '@ohmstead/pack';
import { expect, test } from 'vitest';
import { writeZip } from '../../../packages/pack/src/zip-write.ts';
import { main } from '../src/main.ts';
import { doubleEngine } from './double.ts';
import { studyFolder } from './study-folder.ts';
import { testIo } from './test-io.ts';

const folder = studyFolder();

async function run(
  words: readonly string[],
  engine = doubleEngine(),
): Promise<{ readonly status: number; readonly out: string; readonly err: string }> {
  const io = testIo();
  const status = await main(words, io, engine);
  return { status, ...io.written };
}

async function packed(): Promise<string> {
  await run(['solve', folder.at('study'), '--pack', folder.at('a.zip')]);
  return folder.at('a.zip');
}

test('an honest pack', async () => {
  const { status, out, err } = await run(['verify', await packed()]);
  expect([status, err]).toEqual([0, '']);
  expect(out).toMatch(
    /^6 digests checked; (\d+) of \1 numbers equal; 3 drawings and tables compared\nno difference\n$/,
  );
});

test('a changed entry', async () => {
  const { entries } = await readPack(readFileSync(await packed()));
  const manifest = new TextEncoder().encode(
    readFileSync(folder.at('a.zip')) &&
      JSON.stringify((await readPack(readFileSync(folder.at('a.zip')))).manifest),
  );
  const changed = new Map([
    ...entries,
    ['manifest.json', manifest],
    ['index.html', new Uint8Array()],
    ['added\u2028', new Uint8Array()],
  ]);
  folder.write('b.zip', writeZip(changed));
  const { status, out, err } = await run(['verify', folder.at('b.zip')]);
  expect([status, err]).toEqual([3, '']);
  expect(out).toContain('difference: index.html: changed after the pack was written');
  expect(out).toContain('difference: added<U+2028>: does not belong in the pack');
  expect(out).toMatch(/\n3 differences\n$/);
});

test('numbers that another program gives', async () => {
  const other = doubleEngine((results) => ({
    ...results,
    program_version: '2.0.0',
    electrode: { ...results.electrode, resistance_ohm: 34 },
  }));
  const { status, out } = await run(['verify', await packed()], other);
  expect(status).toBe(3);
  expect(out).toContain('difference: results.json: electrode.resistance_ohm: stored 33.3, recomputed 34\n');
  expect(out).toContain(
    'written by version 1.2.3, solved again by version 2.0.0; the program that its sheet may carry is not compared\n',
  );
  expect(out).toMatch(/\n1 difference\n$/);
});

test('rounding apart is told, and no difference', async () => {
  const other = doubleEngine((results) => ({
    ...results,
    electrode: { ...results.electrode, resistance_ohm: 33.300000000000004 },
  }));
  const { status, out } = await run(['verify', await packed()], other);
  expect(status).toBe(0);
  expect(out).toContain(', 1 more but for rounding (another kind of machine)');
});

test('a long list of differences is cut', async () => {
  const other = doubleEngine((results) => ({
    ...results,
    warnings: Array.from({ length: 80 }, () => ({ code: 'x', message: 'y' })),
  }));
  const { out } = await run(['verify', await packed()], other);
  expect(out.split('\n').filter((line) => line.startsWith('difference:'))).toHaveLength(50);
  expect(out).toMatch(/\nand 30 differences more\n/);
});

test.each([
  ['study', /is a folder/],
  ['study/study.json', /study\.json: not a zip file\n$/],
  ['none.zip', /none\.zip: no such file or folder\n$/],
])('%s is not a pack', async (name, line) => {
  const { status, out, err } = await run(['verify', folder.at(name)]);
  expect([status, out]).toEqual([2, '']);
  expect(err).toMatch(line);
});
