// A review pack holds what it should, names it, and is the same bytes each time.
import { sourceFromMap } from '@ohmstead/study';
import { expect, test } from 'vitest';
import { readPack } from '../src/read-pack.ts';
import { sha256 } from '../src/sha256.ts';
import { writePack } from '../src/write-pack.ts';
import { readZip } from '../src/zip-read.ts';
import { exampleFiles, exampleLoad, exampleRenderer, exampleSolve } from './example.ts';
import { faultsOf } from './faults-of.ts';
import { rawZip } from './raw-zip.ts';

const loaded = exampleLoad(sourceFromMap(exampleFiles));
const outcome = exampleSolve(loaded);
const pack = (): Promise<Uint8Array> => writePack(loaded, outcome, '1.2.3', { renderer: exampleRenderer });

test('entries, inputs exactly as read', async () => {
  const entries = await readZip(await pack(), 'a.zip');
  expect([...entries.keys()]).toEqual([
    'figures/touch.svg',
    'index.html',
    'manifest.json',
    'results.json',
    'study/study.json',
    'study/tables/rod.csv',
    'tables/cases.csv',
  ]);
  for (const [path, content] of exampleFiles) expect(entries.get(`study/${path}`)).toEqual(content);
  expect(JSON.parse(new TextDecoder().decode(entries.get('results.json')))).toEqual(outcome.results);
});

test('the manifest lists each other entry with size and digest', async () => {
  const { manifest, entries } = await readPack(await pack());
  expect(manifest).toMatchObject({ format: 'ohmstead-pack', version: 1, program_version: '1.2.3' });
  expect(manifest.entries.map(({ path }) => path)).toEqual([...entries.keys()]);
  for (const { path, bytes, sha256: digest } of manifest.entries) {
    const content = entries.get(path) ?? new Uint8Array();
    expect([bytes, digest]).toEqual([content.length, await sha256(content)]);
  }
});

test('the same study gives the same bytes', async () => {
  expect(await pack()).toEqual(await pack());
});

test('a number that JSON cannot hold, or a name that leaves the pack, is a fault of the program', async () => {
  const infinite = {
    ...outcome,
    results: {
      ...outcome.results,
      mesh: [{ segment_count: 1, resistance_ohm: Infinity, worst_touch_ratio: 0, worst_step_ratio: 0 }],
    },
  };
  await expect(writePack(loaded, infinite, '1', { renderer: exampleRenderer })).rejects.toThrow(
    'resistance_ohm is Infinity',
  );
  const stray = { ...exampleRenderer, figures: () => [{ name: '../x.svg', svg: '' }] };
  await expect(writePack(loaded, outcome, '1', { renderer: stray })).rejects.toThrow('figures/../x.svg');
  const twice = {
    ...exampleRenderer,
    tables: () => [
      { name: 'a', csv: '' },
      { name: 'a', csv: '' },
    ],
  };
  await expect(writePack(loaded, outcome, '1', { renderer: twice })).rejects.toThrow('stands twice');
});

test.each([
  [undefined, 'a.zip: no manifest.json in it; expected a review pack as written by solve --pack'],
  ['{', 'a.zip: manifest.json is not a JSON object'],
  ['{}', 'a.zip: manifest.json does not state the format "ohmstead-pack"'],
  ['{"format":"ohmstead-pack","version":2}', 'a.zip: pack version 2; this program reads version 1'],
  [
    '{"format":"ohmstead-pack","version":1,"program_version":"1","entries":[{"path":1}]}',
    'a.zip: manifest.json lacks program_version or a list of path, bytes and sha256',
  ],
])('manifest %j is refused', async (content, line) => {
  const zip = content === undefined ? rawZip([{ name: 'x' }]) : rawZip([{ name: 'manifest.json', content }]);
  expect(await faultsOf(() => readPack(zip, 'a.zip'))).toEqual([line]);
});
