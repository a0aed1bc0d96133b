// `solve`: what goes where, when it ends with which status, and the review pack it leaves.
import { readFileSync, symlinkSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { rawZip } from '../../../packages/pack/test/raw-zip.ts';
import { main } from '../src/main.ts';
import { doubleEngine, exampleFit, fence, within } from './double.ts';
import { RODS_CSV, STUDY_JSON, studyFolder } from './study-folder.ts';
import { testIo } from './test-io.ts';

const folder = studyFolder();

async function solve(
  words: readonly string[],
  engine = doubleEngine(),
): Promise<{ readonly status: number; readonly out: string; readonly err: string }> {
  const io = testIo();
  const status = await main(['solve', ...words], io, engine);
  return { status, ...io.written };
}

const warned = doubleEngine((results) => ({
  ...results,
  warnings: [{ code: 'near-miss', message: 'bar ends 3 mm short of left\u0007' }],
}));

describe('output', () => {
  test('--json: results alone on standard output, warnings on standard error', async () => {
    const { status, out, err } = await solve([folder.at('study'), '--json'], warned);
    expect(status).toBe(0);
    expect(JSON.parse(out)).toMatchObject({ format: 'ohmstead-results', title: 'Two rods' });
    expect(err).toBe('warning: bar ends 3 mm short of left<U+0007> (near-miss)\n');
  });

  test('without: a table, with its warnings named', async () => {
    const { status, out, err } = await solve([folder.at('study')], warned);
    expect(status).toBe(0);
    expect(out).toMatch(/^Two rods\n/);
    expect(out).toContain('near-miss');
    expect(err).toContain('warning: bar ends 3 mm short of left');
  });
});

test('doubts about a soil fitted to readings are told too, each once', async () => {
  const engine = doubleEngine((results) => ({
    ...results,
    warnings: exampleFit.doubts,
    ground: {
      fit: { ...exampleFit, doubts: [...exampleFit.doubts, { code: 'outliers', message: 'row 3' }] },
      consequence: { resistance_ohm: { best: 1, low: 1, median: 1, high: 1 }, cases: [] },
    },
  }));
  const { out, err } = await solve([folder.at('study')], engine);
  expect(err).toBe('warning: survey.csv:2: pins are deep<U+0007> (deep-pins)\nwarning: row 3 (outliers)\n');
  expect(out).toContain('2, told on standard error: deep-pins, outliers');
});

describe('--strict', () => {
  test('3 where a limit is exceeded, and the results all the same', async () => {
    const { status, out } = await solve([folder.at('study'), '--strict', '--json']);
    expect(status).toBe(3);
    expect(JSON.parse(out).cases[0].touch.within_limit).toBe(false);
  });

  test('0 where all is within', async () => {
    expect((await solve([folder.at('study'), '--strict'], doubleEngine(within))).status).toBe(0);
  });

  test('floating metal counts, whatever its sign', async () => {
    const fenced = (touch_ratio: number) =>
      doubleEngine((results) => ({
        ...within(results),
        electrodes: [{ ...fence, touch_ratio }],
      }));
    // the example's rise is near 3340 V and its limit 800 V: the ratio at the limit is 0.24
    expect((await solve([folder.at('study'), '--strict'], fenced(-0.3))).status).toBe(3);
    expect((await solve([folder.at('study'), '--strict'], fenced(-0.2))).status).toBe(0);
  });

  test('another season counts', async () => {
    const seasonal = (worst_V: number) =>
      doubleEngine((results) => {
        const [one] = within(results).cases;
        const touch = { ...one.touch, worst_V, limit_V: 1000 };
        const season = { name: 'dry', layers: [], covering_factor: 1, segment_count: 1 };
        return {
          ...within(results),
          seasons: [
            { ...season, resistance_ohm: 1, resistance_uncertainty_ohm: 0.1, cases: [{ ...one, touch }] },
          ],
          envelope: [
            {
              name: one.name,
              gpr: { season: 'dry', gpr_V: 1 },
              touch: { ...touch, season: 'dry' },
              step: { ...one.step, season: 'as given' },
            },
          ],
        };
      });
    expect((await solve([folder.at('study'), '--strict'], seasonal(1001))).status).toBe(3);
    expect((await solve([folder.at('study'), '--strict'], seasonal(999))).status).toBe(0);
  });

  test('without it, 0 even where a limit is exceeded', async () => {
    expect((await solve([folder.at('study')])).status).toBe(0);
  });
});

describe('--pack', () => {
  const pack = async (study: string, name: string): Promise<Uint8Array> => {
    expect(await solve([study, '--json', '--pack', folder.at(name)])).toMatchObject({
      status: 0,
      err: `review pack written: ${folder.at(name)}\n`,
    });
    return new Uint8Array(readFileSync(folder.at(name)));
  };

  test('folder, study.json, zip and review pack of one study leave the same bytes', async () => {
    const first = await pack(folder.at('study'), 'a.zip');
    folder.write(
      'study.zip',
      rawZip([
        { name: 'yard/study.json', content: STUDY_JSON },
        { name: 'yard/tables/rods.csv', content: RODS_CSV },
      ]),
    );
    expect(await pack(folder.at('study/study.json'), 'b.zip')).toEqual(first);
    expect(await pack(folder.at('study.zip'), 'c.zip')).toEqual(first);
    expect(await pack(folder.at('a.zip'), 'd.zip')).toEqual(first);
  });

  test.each([
    ['pack.tar', /pack\.tar: is not the name of a zip; expected --pack FILE\.zip\n$/],
    ['no/pack.zip', /no\/pack\.zip: cannot be written: folder .*no: no such file or folder\n$/],
  ])('%s is refused before solving', async (name, line) => {
    const never = {
      ...doubleEngine(),
      solveStudy: () => {
        throw new Error('solved');
      },
    };
    const { status, out, err } = await solve([folder.at('study'), '--pack', folder.at(name)], never);
    expect([status, out]).toEqual([2, '']);
    expect(err).toMatch(line);
  });

  test('the study itself is not overwritten, by whatever name', async () => {
    await pack(folder.at('study'), 'a.zip');
    symlinkSync('a.zip', folder.at('b.zip'));
    const { status, err } = await solve([folder.at('a.zip'), '--pack', folder.at('b.zip')]);
    expect(status).toBe(2);
    expect(err).toContain('b.zip: is the study itself; expected another name');
  });
});

describe('what is not a study', () => {
  test('a bare table is told what a study is, with one to start from', async () => {
    folder.write('conductors.csv', RODS_CSV);
    const { status, out, err } = await solve([folder.at('conductors.csv')]);
    expect([status, out]).toEqual([2, '']);
    expect(err).toMatch(/conductors\.csv: a table alone is not a study\n\nA study is a folder/);
    expect(JSON.parse(err.slice(err.indexOf('\n{'), err.indexOf('\n}\n') + 3))).toMatchObject({
      format: 'ohmstead-study',
      conductors: ['conductors.csv'],
    });
  });

  test.each([
    ['nowhere', /nowhere: no such file or folder\n$/],
    ['other.json', /other\.json: expected a file named study\.json, the folder it is in, or a zip\n$/],
    ['text.zip', /text\.zip: not a zip file\n$/],
    ['empty.zip', /empty\.zip: the file is empty; expected a zip\n$/],
    ['litter.zip', /litter\.zip: no study\.json in the zip; expected it at the top or in one folder\n$/],
    ['evil', /evil: \.\.\/study\.json: entry name leaves the zip; expected a path without \.\.\n$/],
    ['.', /: no study\.json in this folder\n\nA study is a folder/],
  ])('%s', async (name, line) => {
    folder.write('other.json', '{}');
    folder.write('text.zip', 'id,x1_m');
    folder.write('empty.zip', '');
    folder.write('litter.zip', rawZip([{ name: 'readme.txt' }]));
    folder.write('evil', rawZip([{ name: '../study.json' }]));
    const { status, out, err } = await solve([folder.at(name)]);
    expect([status, out]).toEqual([2, '']);
    expect(err).toMatch(line);
  });
});
