import { describe, expect, it } from 'vitest';
import { valueAt } from '../../../src/desk/draft.ts';
import { joinTables } from '../../../src/desk/join-tables.ts';
import { setValue } from '../../../src/desk/set-value.ts';
import { demo, filesOf, opened } from './drafts.ts';

// invented data
const SURVEY = 'spacing_m,resistance_ohm\n1,60\n2,28\n4,13\n8,6\n';
const survey = opened(new Map([['survey.csv', new TextEncoder().encode(SURVEY)]]));
const yard = new Map([...filesOf('square-70m')].filter(([path]) => path === 'conductors.csv'));
const conductors = opened(yard);

describe('a table opened beside a study', () => {
  it('is the soil of a study that has conductors only, and the conductors of one that has a survey only', () => {
    for (const joined of [joinTables(conductors, survey), joinTables(survey, conductors)]) {
      expect(joined && valueAt(joined, ['soil', 'survey'])).toBe('survey.csv');
      expect(joined && valueAt(joined, ['conductors'])).toEqual(['conductors.csv']);
      expect([...(joined?.files.keys() ?? [])].sort()).toEqual([
        'conductors.csv',
        'study.json',
        'survey.csv',
      ]);
    }
  });
  it('is a study of its own where the study at work asks for no such table', () => {
    expect(joinTables(conductors, conductors)).toBeUndefined();
    expect(joinTables(demo('square-70m'), survey)).toBeUndefined();
  });
  it('is a study of its own where it comes with a study', () => {
    expect(joinTables(survey, setValue(demo('square-70m'), ['soil'], undefined))).toBeUndefined();
  });
});
