// Project data, revisions, notes and display units: carried as written, judged in length and kind, nothing else beside them.
import { describe, expect, test } from 'vitest';
import { LONGEST_ENTRY, LONGEST_NOTE, MOST_REVISIONS } from '../../src/input/limits.ts';
import { loadStudy } from '../../src/input/load-study.ts';
import { memorySource, smallStudy, studyFaultLines } from './folder-source.ts';

const words = {
  project: { client: 'Aldermoor Power', site: 'North yard', number: 'A-17', prepared_by: 'N. N.' },
  revisions: [{ mark: 'A', date: '2 May 2024', text: 'first issue', by: 'N. N.' }, { mark: 'B' }],
  notes: { ground: 'Dry summer.\n\nReadings\tof June.', assumed: 'See drawing 12.' },
  display_units: 'US',
};

function faultsOf(change: object): readonly string[] {
  return studyFaultLines(memorySource({ ...smallStudy, ...change })).map((line) =>
    line.replace(/^study\.json:\d+: /, ''),
  );
}

describe('words of a study', () => {
  test('are carried as they are written', () => {
    const { study } = loadStudy(memorySource({ ...smallStudy, ...words }));
    expect(study).toMatchObject(words);
  });

  test('a study without them has none', () => {
    const { study } = loadStudy(memorySource());
    expect([study.project, study.revisions, study.notes, study.display_units]).toEqual(
      Array.from({ length: 4 }, () => undefined),
    );
  });

  test('are refused where they are too long, blank or invisible', () => {
    const long = 'x'.repeat(LONGEST_ENTRY + 1);
    const shownLong = `${'x'.repeat(40)}…`;
    expect(faultsOf({ project: { client: long, site: '' } })).toEqual([
      `project.client: client "${shownLong}" is not accepted; expected visible text of at most 200 characters`,
      'project.site: site "" is not accepted; expected visible text of at most 200 characters',
    ]);
    const note = 'expected visible text of at most 8000 characters, with line feeds between its lines';
    expect(
      faultsOf({ notes: { rise: 'x'.repeat(LONGEST_NOTE + 1), trust: ' \n ', people: 'a\u202eb' } }),
    ).toEqual([
      `notes.rise: note on the rise "${shownLong}" is not accepted; ${note}`,
      `notes.trust: note on trust " <U+000A> " is not accepted; ${note}`,
      `notes.people: note on people "a<U+202E>b" is not accepted; ${note}`,
    ]);
    expect(faultsOf({ notes: { ground: 'x'.repeat(LONGEST_NOTE) } })).toEqual([]);
  });

  test('a revision has a mark, and there are not too many', () => {
    expect(faultsOf({ revisions: [{ date: '2024-05-02' }] })).toEqual([
      'revisions[0].mark: revision mark is missing; expected visible text of at most 20 characters',
    ]);
    const many = Array.from({ length: MOST_REVISIONS + 1 }, (_, i) => ({ mark: String(i) }));
    expect(faultsOf({ revisions: many })).toEqual([
      'revisions: list of revisions has 101 items; expected at most 100 revisions, each an object with mark and any of date, text and by',
    ]);
  });

  test('unknown keys and units are refused', () => {
    expect(faultsOf({ project: { sight: 'x' }, notes: { roof: 'x' }, display_units: 'imperial' })).toEqual([
      'project.sight: there is no such key here; known are client, site, number, prepared_by and checked_by',
      'notes.roof: there is no such key here; known are ground, electrode, fault, rise, surface, people, season, trust and assumed',
      'display_units: units shown "imperial" is not accepted; expected "SI" or "US"',
    ]);
  });
});
