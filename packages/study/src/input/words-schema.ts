// The part of study.json that holds words for people: whose work it is, its revisions, notes under the sections.
import { z } from 'zod';
import type { ProjectInput, RevisionInput, SectionNotes } from '../study.ts';
import * as most from './limits.ts';
import { label, told } from './schema-parts.ts';

/** Text of several lines: as `VISIBLE`, with line feeds and tabs. */
const VISIBLE_LINES =
  /^(?=[\s\S]*\S)(?:[\n\t]|[^\p{Cc}\p{Cs}\u2028\u2029\u200e\u200f\u202a-\u202e\u2066-\u2069])+$/u;

export const project: z.ZodType<ProjectInput> = told(
  z.strictObject({
    client: label('client', most.LONGEST_ENTRY).optional(),
    site: label('site', most.LONGEST_ENTRY).optional(),
    number: label('project number', most.LONGEST_ENTRY).optional(),
    prepared_by: label('name of who prepared the study', most.LONGEST_ENTRY).optional(),
    checked_by: label('name of who checked the study', most.LONGEST_ENTRY).optional(),
  }),
  'project data',
  'an object with any of client, site, number, prepared_by and checked_by',
);

const revision = told(
  z.strictObject({
    mark: label('revision mark', most.LONGEST_MARK),
    date: label('revision date', most.LONGEST_DATE).optional(),
    text: label('revision text', most.LONGEST_ENTRY).optional(),
    by: label('author of the revision', most.LONGEST_ENTRY).optional(),
  }),
  'revision',
  'an object with mark and any of date, text and by',
);

export const revisions: z.ZodType<readonly RevisionInput[]> = told(
  z.array(revision).max(most.MOST_REVISIONS),
  'list of revisions',
  `at most ${most.MOST_REVISIONS} revisions, each an object with mark and any of date, text and by`,
);

function note(section: string): z.ZodOptional<z.ZodString> {
  const schema = z.string().min(1).max(most.LONGEST_NOTE).regex(VISIBLE_LINES);
  const expected = `visible text of at most ${most.LONGEST_NOTE} characters, with line feeds between its lines`;
  return told(schema, `note on ${section}`, expected).optional();
}

export const notes: z.ZodType<SectionNotes> = told(
  z.strictObject({
    ground: note('the ground'),
    electrode: note('the electrode'),
    fault: note('the fault'),
    rise: note('the rise'),
    surface: note('the surface'),
    people: note('people'),
    season: note('the seasons'),
    trust: note('trust'),
    assumed: note('what is assumed'),
  }),
  'notes',
  'an object with a text for any section of the sheet',
);
