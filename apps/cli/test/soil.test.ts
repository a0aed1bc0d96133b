// `soil`: the fit as a table or as JSON, notes and warnings beside it, wrong input told.
import { expect, test } from 'vitest';
import { main } from '../src/main.ts';
import { soilTable } from '../src/soil-table.ts';
import { doubleEngine, exampleFit } from './double.ts';
import { studyFolder } from './study-folder.ts';
import { testIo } from './test-io.ts';

const folder = studyFolder();
const SURVEY = 'spacing_m,resistance_ohm,pin_depth_m\n1,20,0\n2,9,0\n4,3,0\n';

async function soil(
  words: readonly string[],
  text: string = SURVEY,
): Promise<{ readonly status: number; readonly out: string; readonly err: string }> {
  folder.write('survey.csv', text);
  const io = testIo();
  const status = await main(['soil', folder.at('survey.csv'), ...words], io, doubleEngine());
  return { status, ...io.written };
}

test('--json: the contract first, the spread under its own key, doubts on standard error', async () => {
  const { status, out, err } = await soil(['--json', '--layers', '2']);
  expect(status).toBe(0);
  const json = JSON.parse(out);
  expect(Object.keys(json).slice(0, 6)).toEqual([
    'format',
    'version',
    'program_version',
    'layers',
    'rms_percent',
    'outcome',
  ]);
  expect(json).toMatchObject({
    format: 'ohmstead-soil',
    version: 1,
    rms_percent: 4.56,
    outcome: 'converged',
    layer_count: 2,
  });
  expect(json.layers).toEqual([
    { resistivity_ohm_m: 123.456, thickness_m: 1.23456 },
    { resistivity_ohm_m: 45.678 },
  ]);
  expect(json.layer_spreads).toEqual(exampleFit.layers);
  for (const key of ['trials', 'readings', 'sounding', 'family', 'resolved_depth_m', 'doubts', 'notes']) {
    expect(json).toHaveProperty(key);
  }
  expect(err).toBe('warning: survey.csv:2: pins are deep<U+0007> (deep-pins)\n');
});

test('the number of layers is found where it is not given', async () => {
  const counts = await Promise.all(
    [[], ['--layers', 'auto'], ['--layers', '1'], ['--layers=5']].map(async (words) => {
      return JSON.parse((await soil(['--json', ...words])).out).layer_count;
    }),
  );
  expect(counts).toEqual([3, 3, 1, 5]);
});

test.each(['0', '6', '2.5', '02', 'two', '１'])('%s layers are refused', async (count) => {
  expect(await soil(['--layers', count])).toEqual({
    status: 2,
    out: '',
    err: `ohmstead soil: --layers: "${count}" is not accepted; expected a whole number from 1 to 5, or auto\n`,
  });
});

test('notes go to standard error, and the doubts into the table', async () => {
  const { out, err } = await soil([], SURVEY.replace('spacing_m', 'spacing_ft'));
  expect(err).toBe(
    `note: converted to SI units: ${folder.at('survey.csv')}: spacing_ft (international foot) (units-converted)\n`,
  );
  expect(out).toContain('survey.csv:2: pins are deep<U+0007> (deep-pins)');
});

test('every wrong row is named, with status 2', async () => {
  const { status, out, err } = await soil([], `${SURVEY}0,4,0\n4,-1,0\n`);
  expect([status, out]).toEqual([2, '']);
  const file = folder.at('survey.csv');
  expect(err).toBe(
    `${file}:5: spacing_m: 0 is not a positive length\n${file}:6: resistance_ohm: resistance: -1 Ω is not positive\n`,
  );
});

test('a folder is no table', async () => {
  const io = testIo();
  expect(await main(['soil', folder.at('study')], io, doubleEngine())).toBe(2);
  expect(io.written.err).toBe(`${folder.at('study')}: is not a file\n`);
});

test('the whole table', () => {
  expect(soilTable(exampleFit, '1.2.3')).toBe(`survey.csv: 2 readings on 2 traverses, spacings 0.5 m to 12 m
2 layers, misfit 4.6 % rms; converged. The readings call for 3.

           resistivity  5 to 95 %         thickness  5 to 95 %
  layer 1      123 Ω·m  98.8 to 185 Ω·m      1.23 m  0.988 to 1.85 m
  layer 2     45.7 Ω·m  36.5 to 68.5 Ω·m             to any depth

  layers  misfit  criterion
       1    42 %       12.3
       2   4.6 %      -33.2  taken
       3   1.2 %      -40.0  proposed
  least of a criterion: 3

  line  traverse       spacing      read    fitted   misfit
     2  north            0.5 m   120 Ω·m   123 Ω·m   +2.6 %
     3  south<U+001B>     12 m  80.0 Ω·m  48.3 Ω·m  -39.6 %  OUTLIER

Family      321 soils that fit within the scatter of the readings; invented, seed 7
Depth       resolved to 6.23 m: an invented rule
Doubts      survey.csv:2: pins are deep<U+0007> (deep-pins)
Field       Buried metal beside a traverse (pipes, cables, fences, the electrode itself) carries
            part of the current and makes the ground look better than it is. Readings taken along it
            and across it differ.
            The ground near the surface decides touch and step voltages: spacings as short as the
            electrode is deep are needed, and as long as it is wide. Here the shortest is 0.5 m, the
            longest 12 m.
            The readings hold for the day of the survey. Dry, frozen and wet ground differ by
            several times in the top metre or two; solve other seasons too.
            A pin in poor contact, or current and potential leads that lie side by side, falsify a
            reading without a trace in the table. Repeat what stands out.
Mind        A soil of flat layers is a model (Ohmstead 1.2.3). How many readings a site needs is for
            local codes and licensed practice to decide.
`);
});

test('one reading, met exactly', () => {
  const [reading] = exampleFit.readings;
  const exact = { ...reading, traverse: '', spacing_m: 3.04800001, misfit_percent: -0.004 };
  const trials = [{ layer_count: 1, rms_percent: 1e-9, criterion: -15.9 }];
  const table = soilTable({ ...exampleFit, readings: [exact], trials, doubts: [] }, '1');
  expect(table).toMatch(/^survey\.csv: 1 reading, spacing 3\.048 m\n/);
  expect(table).toMatch(/^ +1 {2}less than 0\.1 % +-15\.9$/m);
  expect(table).toMatch(/ 0\.0 %$/m);
  expect(table).toMatch(/^Doubts +none$/m);
});

test('a fit that did not end well says so, and no line is wider than 100', () => {
  const long = 'long name '.repeat(15);
  const table = soilTable(
    {
      ...exampleFit,
      outcome: 'stalled',
      survey_file: long,
      readings: exampleFit.readings.map((reading) => ({ ...reading, traverse: long })),
      doubts: [{ code: 'x', message: long }],
    },
    '1',
  );
  expect(table).toContain('STALLED');
  expect(Math.max(...table.split('\n').map((line) => [...line].length))).toBeLessThanOrEqual(100);
});
