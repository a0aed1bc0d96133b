// Joins a table that is opened while a study is worked at to that study, where the study asks for such a table.
import { type Draft, valueAt, withFile } from './draft.ts';
import { questionsOf } from './missing.ts';
import type { JsonPath } from './path.ts';
import { listAt, setValue } from './set-value.ts';

/** What a bare table gives a study: a survey its soil, a table of conductors its metal. */
const GIVEN: readonly { readonly id: 'soil' | 'conductors'; readonly path: JsonPath }[] = [
  { id: 'soil', path: ['soil'] },
  { id: 'conductors', path: ['conductors'] },
];

/** What no table tells, so that a study begun from tables alone asks for it. */
const BARE = ['current', 'duration', 'body-mass'] as const;

function tablesOf(draft: Draft): readonly string[] {
  return [valueAt(draft, ['soil', 'survey']), ...listAt(draft, ['conductors'])].filter(
    (path) => typeof path === 'string',
  );
}

/**
 * The study with the tables of another that was begun from bare tables.
 * @param draft worked at
 * @param begun from the files that were opened, by `bareDraft`
 * @returns undefined where `begun` tells more than tables, or the study asks for none of them, or has a file of that name
 */
export function joinTables(draft: Draft, begun: Draft): Draft | undefined {
  const untold = new Set(questionsOf(begun).map(({ id }) => id));
  if (!BARE.every((id) => untold.has(id))) return undefined;
  const asked = new Set(questionsOf(draft).map(({ id }) => id));
  const wanted = GIVEN.filter(({ path }) => valueAt(begun, path) !== undefined);
  if (wanted.length === 0 || !wanted.every(({ id }) => asked.has(id))) return undefined;
  const paths = tablesOf(begun);
  if (paths.some((path) => draft.files.has(path))) return undefined;
  const withTables = paths.reduce((joined, path) => {
    const bytes = begun.files.get(path);
    return bytes === undefined ? joined : withFile(joined, path, bytes);
  }, draft);
  return wanted.reduce((joined, { path }) => setValue(joined, path, valueAt(begun, path)), withTables);
}
