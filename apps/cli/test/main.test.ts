// Dispatch, help, usage faults and exit statuses of the program.
import { loadStudy, sourceFromMap } from '@ohmstead/study';
import { describe, expect, test } from 'vitest';
import { main } from '../src/main.ts';
import { doubleEngine } from './double.ts';
import { RODS_CSV, studyFolder } from './study-folder.ts';
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

describe('help', () => {
  test('the overview names each command, none that is not there, and an example', async () => {
    const { status, out, err } = await run(['--help']);
    expect([status, err]).toEqual([0, '']);
    for (const word of [
      'solve STUDY',
      'field STUDY',
      'soil SURVEY.csv',
      'verify FILE.zip',
      'test-data/aldermoor',
      'local codes',
    ]) {
      expect(out).toContain(word);
    }
    expect(out).not.toMatch(/probe/);
    expect((await run(['help'])).out).toBe(out);
  });

  test.each(['solve', 'field', 'soil', 'verify'])(
    'help %s has usage, options and an example',
    async (name) => {
      const { status, out } = await run(['help', name]);
      expect(status).toBe(0);
      expect(out).toContain(`Usage: ohmstead ${name} `);
      expect(out).toContain('--help');
      expect(out).toMatch(new RegExp(`Example:\n  ohmstead ${name} `));
      expect((await run([name, '--help'])).out).toBe(out);
    },
  );

  test('lines fit a terminal', async () => {
    for (const words of [
      ['help'],
      ['help', 'solve'],
      ['help', 'field'],
      ['help', 'soil'],
      ['help', 'verify'],
      ['help', 'study'],
    ]) {
      const { out } = await run(words);
      expect(Math.max(...out.split('\n').map((line) => line.length))).toBeLessThanOrEqual(100);
    }
  });

  test('the study of the help is a study', async () => {
    const { out } = await run(['help', 'study']);
    const json = out.slice(out.indexOf('\n{') + 1, out.indexOf('\n}\n') + 3);
    const files = new Map([
      ['study.json', json],
      ['conductors.csv', RODS_CSV],
    ]);
    const bytes = new Map([...files].map(([path, text]) => [path, new TextEncoder().encode(text)]));
    expect(loadStudy(sourceFromMap(bytes)).conductors.count).toBe(3);
    const lists = /"soil": (\{ "survey"[^}]*\}).*"seasons": (\[.*\])\n$/s.exec(out);
    const [, soil, seasons] = lists ?? [];
    const more = { ...JSON.parse(json), soil: JSON.parse(soil), seasons: JSON.parse(seasons) };
    const survey = new TextEncoder().encode('spacing_m,resistance_ohm\n1,20\n');
    const seasonal = new Map([...bytes, ['study.json', new TextEncoder().encode(JSON.stringify(more))]]);
    expect(loadStudy(sourceFromMap(seasonal.set('survey.csv', survey))).study.seasons).toHaveLength(2);
    const table = out.slice(out.indexOf('id,x1_m'), out.indexOf('\n\n', out.indexOf('id,x1_m')) + 1);
    bytes.set('conductors.csv', new TextEncoder().encode(table));
    expect(loadStudy(sourceFromMap(bytes)).conductors.count).toBe(2);
  });

  test('without words the overview goes to standard error', async () => {
    const { status, out, err } = await run([]);
    expect([status, out]).toEqual([2, '']);
    expect(err).toContain('Usage: ohmstead COMMAND');
  });

  test('--version', async () => {
    expect(await run(['--version'])).toEqual({ status: 0, out: 'ohmstead 1.2.3\n', err: '' });
  });
});

describe('usage faults', () => {
  test.each([
    [['sovle', 'x'], 'ohmstead: sovle: not a command; did you mean solve?\n'],
    [['frobnicate'], 'ohmstead: frobnicate: not a command; see ohmstead --help\n'],
    [['help', 'verfy'], 'ohmstead: verfy: not a command; did you mean verify?\n'],
    [['--pack', 'x'], 'ohmstead: --pack: not an option; see ohmstead --help\n'],
    [['probe', 'x'], 'ohmstead: probe: not part of this version\n'],
    [['solve', 'x', '--jsn'], 'ohmstead solve: --jsn: not an option of solve; did you mean --json?\n'],
    [['solve\u001b'], 'ohmstead: solve<U+001B>: not a command; did you mean solve?\n'],
  ])('%j', async (words, err) => {
    const found = await run(words);
    expect(found).toEqual({ status: 2, out: '', err });
  });
});

test('every fault of the input is listed, fit for a terminal', async () => {
  folder.write('study/tables/rods.csv', RODS_CSV.replace('16\n', '-16\n').replace('10\n', '\u001b[31m\n'));
  const { status, out, err } = await run(['solve', folder.at('study')]);
  expect([status, out]).toEqual([2, '']);
  expect(err.trimEnd().split('\n')).toHaveLength(2);
  expect(err).toMatch(/^tables\/rods\.csv:2: diameter_mm: -16 /m);
  expect(err).not.toContain('\u001b');
});

test('a fault of the program is told as one, with status 1', async () => {
  const broken = {
    ...doubleEngine(),
    solveStudy: () => {
      throw new RangeError('pivot 3 is not positive');
    },
  };
  const { status, out, err } = await run(['solve', folder.at('study')], broken);
  expect([status, out]).toEqual([1, '']);
  expect(err).toMatch(
    /^ohmstead: fault in the program, not in the input[^\n]*\nRangeError: pivot 3 is not positive\n/,
  );
});
