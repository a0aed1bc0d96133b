// Verification finds every kind of tampering, and nothing in an honest pack.
import { sourceFromMap } from '@ohmstead/study';
import { beforeAll, describe, expect, test } from 'vitest';
import { differenceLine } from '../src/difference.ts';
import { jsonText } from '../src/json-text.ts';
import { makeManifest } from '../src/manifest.ts';
import { type Solve, verifyPack } from '../src/verify-pack.ts';
import { writePack } from '../src/write-pack.ts';
import { readZip } from '../src/zip-read.ts';
import { writeZip } from '../src/zip-write.ts';
import { exampleFiles, exampleLoad, exampleOptions, exampleRenderer, exampleSolve } from './example.ts';

const bytes = (text: string): Uint8Array => new TextEncoder().encode(text);
const text = (content: Uint8Array | undefined): string => new TextDecoder().decode(content);
let honest: ReadonlyMap<string, Uint8Array>;

beforeAll(async () => {
  const loaded = exampleLoad(sourceFromMap(exampleFiles));
  honest = await readZip(
    await writePack(loaded, exampleSolve(loaded), '1.2.3', { renderer: exampleRenderer }),
    'a.zip',
  );
});

/** Changes entries (undefined removes one); `forged` makes the manifest agree with the changes. */
async function tampered(
  changes: Readonly<Record<string, string | undefined>>,
  forged: boolean = false,
): Promise<Uint8Array> {
  const entries = new Map(honest);
  for (const [path, content] of Object.entries(changes)) {
    if (content === undefined) entries.delete(path);
    else entries.set(path, bytes(content));
  }
  if (forged) {
    entries.delete('manifest.json');
    entries.set('manifest.json', bytes(jsonText(await makeManifest(entries, '1.2.3'))));
  }
  return writeZip(entries);
}

async function lines(zip: Uint8Array): Promise<readonly string[]> {
  return (await verifyPack(zip, exampleSolve, exampleOptions)).differences.map(differenceLine);
}

test('an honest pack has no differences, and everything was compared', async () => {
  const numbers = text(honest.get('results.json')).match(/(?<=: )-?\d/g)?.length;
  expect(numbers).toBeGreaterThan(30);
  expect(await verifyPack(await tampered({}), exampleSolve, exampleOptions)).toEqual({
    differences: [],
    checked: {
      packVersion: '1.2.3',
      programVersion: '1.2.3',
      digests: 6,
      numbers,
      exactNumbers: numbers,
      closeNumbers: 0,
      renderings: 3,
    },
  });
});

describe('changed after writing', () => {
  test('a byte of the sheet', async () => {
    const found = await lines(await tampered({ 'index.html': '<!doctype html>' }));
    expect(found).toEqual([
      expect.stringMatching(
        /^index\.html: changed after the pack was written; manifest has \d+ bytes, sha256 [0-9a-f]{64}, found 15 bytes, sha256 [0-9a-f]{64}$/,
      ),
      'index.html: drawn from the recomputed study it has other bytes',
    ]);
  });

  test('an entry removed and one added', async () => {
    expect(await lines(await tampered({ 'figures/touch.svg': undefined, 'virus.exe': 'x' }))).toEqual([
      'figures/touch.svg: missing from the pack',
      'virus.exe: does not belong in the pack',
    ]);
  });

  test('results removed are told once, not number by number', async () => {
    expect(await lines(await tampered({ 'results.json': undefined }))).toEqual([
      'results.json: missing from the pack',
    ]);
  });

  test('results that are no JSON any more', async () => {
    expect(await lines(await tampered({ 'results.json': '{' }, true))).toEqual([
      'results.json: (all of it): stored nothing, recomputed an object',
    ]);
  });
});

describe('changed with a forged manifest', () => {
  test('a number of the results', async () => {
    const results = text(honest.get('results.json')).replace('900.1', '700.1').replace('-12.5', '12.5');
    expect(await lines(await tampered({ 'results.json': results }, true))).toEqual([
      'results.json: cases[0].touch.worst_V: stored 700.1, recomputed 900.1',
      'results.json: cases[0].touch.margin_percent: stored 12.5, recomputed -12.5',
    ]);
  });

  test('a figure', async () => {
    expect(await lines(await tampered({ 'figures/touch.svg': '<svg/>' }, true))).toEqual([
      'figures/touch.svg: drawn from the recomputed study it has other bytes',
    ]);
  });

  test('the study', async () => {
    const study = text(honest.get('study/study.json')).replace('One rod', 'Another rod');
    expect(await lines(await tampered({ 'study/study.json': study }, true))).toEqual([
      'results.json: title: stored "One rod", recomputed "Another rod"',
      'results.json: cases[0].gpr_V: stored 3337, recomputed 3341',
      'index.html: drawn from the recomputed study it has other bytes',
      'tables/cases.csv: drawn from the recomputed study it has other bytes',
    ]);
  });

  test('a study that cannot be read', async () => {
    expect(await lines(await tampered({ 'study/study.json': 'x' }, true))).toEqual([
      'study/study.json: the study cannot be read: not JSON text',
    ]);
  });
});

test('another program version is stated, its numbers compared, and by itself no difference', async () => {
  const newer: Solve = (loaded) => {
    const outcome = exampleSolve(loaded);
    return { ...outcome, results: { ...outcome.results, program_version: '9.9.9' } };
  };
  const { differences, checked } = await verifyPack(await tampered({}), newer, exampleOptions);
  expect(differences).toEqual([]);
  expect(checked).toMatchObject({ packVersion: '1.2.3', programVersion: '9.9.9' });
});

test('a fault of the program while solving is not taken for a difference', async () => {
  const broken: Solve = () => {
    throw new TypeError('no pivot');
  };
  await expect(verifyPack(await tampered({}), broken, exampleOptions)).rejects.toThrow('no pivot');
});
