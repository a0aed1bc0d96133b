// `field`: CSV alone on standard output, for the case that was asked for.
import { expect, test } from 'vitest';
import { main } from '../src/main.ts';
import { doubleEngine } from './double.ts';
import { studyFolder } from './study-folder.ts';
import { testIo } from './test-io.ts';

const folder = studyFolder();

async function field(
  ...words: readonly string[]
): Promise<{ readonly status: number; readonly out: string; readonly err: string }> {
  folder.write('points.csv', 'x_m,y_m\n1,2\n3.5,-4\n');
  const io = testIo();
  const status = await main(['field', ...words], io, doubleEngine());
  return { status, ...io.written };
}

test('one row a point, numbers in full, the first case named', async () => {
  expect(await field(folder.at('study'), '--points', folder.at('points.csv'))).toEqual({
    status: 0,
    out: 'x_m,y_m,depth_m,potential_V,touch_V\n1,2,0,3.3000000000000003,-1e-7\n3.5,-4,0,3.3000000000000003,-3.5e-7\n',
    err: 'case: bus\n',
  });
});

test('another case by its name', async () => {
  const { status, out, err } = await field(
    folder.at('study'),
    '--points',
    folder.at('points.csv'),
    '--case',
    'feeder',
  );
  expect([status, err]).toEqual([0, '']);
  expect(out).toContain(String(6 + 0.1 + 0.2));
});

test('an unknown case', async () => {
  const points = ['--points', folder.at('points.csv')];
  expect(await field(folder.at('study'), ...points, '--case', 'feder')).toEqual({
    status: 2,
    out: '',
    err: 'ohmstead field: --case: feder is not a case of the study; did you mean feeder?\n',
  });
  expect((await field(folder.at('study'), ...points, '--case', '33 kV')).err).toContain(
    'expected one of bus, feeder',
  );
});

test('points that are not there or not points', async () => {
  const none = await field(folder.at('study'), '--points', folder.at('none.csv'));
  expect([none.status, none.err]).toEqual([2, `${folder.at('none.csv')}: no such file or folder\n`]);
  const asFolder = await field(folder.at('study'), '--points', folder.at('study'));
  expect([asFolder.status, asFolder.err]).toEqual([2, `${folder.at('study')}: is not a file\n`]);
  folder.write('bad.csv', 'x_m,y_m\n1,oops\n');
  const bad = await field(folder.at('study'), '--points', folder.at('bad.csv'));
  expect(bad.status).toBe(2);
  expect(bad.err).toContain('bad.csv:2: y_m: ');
});

test('points missing altogether', async () => {
  expect(await field(folder.at('study'))).toEqual({
    status: 2,
    out: '',
    err: 'ohmstead field: --points: missing; expected --points POINTS.csv\n',
  });
});
