// The study inside a zip: at the top, in one folder, in a review pack, or nowhere.
import { expect, test } from 'vitest';
import { studyFiles } from '../src/study-files.ts';
import { faultsOf } from './faults-of.ts';

const zipOf = (...names: readonly string[]): ReadonlyMap<string, Uint8Array> =>
  new Map(names.map((name) => [name, new TextEncoder().encode(name)]));
const found = (...names: readonly string[]): readonly string[] => [
  ...studyFiles(zipOf(...names), 'a.zip').keys(),
];

test('at the top', () => {
  expect(found('study.json', 'tables/conductors.csv')).toEqual(['study.json', 'tables/conductors.csv']);
});

test('in one folder, desktop litter aside', () => {
  expect(
    found('yard/study.json', 'yard/c.csv', '__MACOSX/yard/._c.csv', '.DS_Store', 'yard/Thumbs.db'),
  ).toEqual(['study.json', 'c.csv']);
});

test('in a review pack', () => {
  expect(found('index.html', 'manifest.json', 'study/c.csv', 'study/study.json')).toEqual([
    'c.csv',
    'study.json',
  ]);
});

test('contents go with their names', () => {
  const content = studyFiles(zipOf('yard/study.json'), 'a.zip').get('study.json');
  expect(new TextDecoder().decode(content)).toBe('yard/study.json');
});

test('nowhere, too deep, and two of them', async () => {
  const none = 'a.zip: no study.json in the zip; expected it at the top or in one folder';
  expect(await faultsOf(() => found('conductors.csv'))).toEqual([none]);
  expect(await faultsOf(() => found('a/b/study.json'))).toEqual([none]);
  expect(await faultsOf(() => found('a/study.json', 'b/study.json'))).toEqual([
    'a.zip: 2 studies in the zip (a/study.json, b/study.json); expected one',
  ]);
});
