// Which sections of the sheet an edit leaves out of date.
import type { SectionId } from '@ohmstead/sheet';
import { isObject, type JsonObject, type JsonValue } from '@ohmstead/study';
import type { Draft } from '../desk/draft.ts';
import { sameJson } from '../desk/json-edit.ts';

/** Sections whose results follow from a key of study.json; the words of the engineer change none. */
const FOLLOWING: Readonly<Record<string, readonly SectionId[]>> = {
  soil: ['ground', 'rise', 'surface', 'people', 'season', 'trust', 'assumed'],
  surfacing: ['ground', 'surface', 'people', 'season', 'assumed'],
  seasons: ['season', 'trust'],
  metal_model: ['rise', 'surface', 'people', 'season', 'trust'],
  conductors: ['electrode', 'rise', 'surface', 'people', 'season', 'trust', 'assumed'],
  electrodes: ['electrode', 'rise', 'surface', 'people', 'season', 'trust', 'assumed'],
  cases: ['fault', 'rise', 'surface', 'people', 'season', 'trust', 'assumed'],
  limits: ['surface', 'people', 'season'],
  areas: ['electrode', 'surface', 'people', 'season', 'assumed'],
};
/** Keys that hold words or how numbers are shown. */
const WORDS: ReadonlySet<string> = new Set(['title', 'project', 'revisions', 'notes', 'display_units']);
const EVERY: readonly SectionId[] = [
  ...['ground', 'electrode', 'fault', 'rise', 'surface', 'people', 'season', 'trust', 'assumed'] as const,
]; // biome-ignore format: the order of the sheet

function member(study: JsonObject, key: string): JsonValue | undefined {
  return Object.hasOwn(study, key) ? study[key] : undefined;
}

/** Sections whose results may differ between two drafts. */
export function outdatedBy(before: Draft, after: Draft): ReadonlySet<SectionId> {
  if (before === after) return new Set();
  const found = new Set<SectionId>();
  for (const key of new Set([...Object.keys(before.study), ...Object.keys(after.study)])) {
    if (WORDS.has(key) || sameJson(member(before.study, key), member(after.study, key))) continue;
    for (const section of FOLLOWING[key] ?? EVERY) found.add(section);
  }
  const tables = new Set(
    [...before.files.keys(), ...after.files.keys()].filter((path) => path !== 'study.json'),
  );
  for (const path of tables) {
    if (before.files.get(path) === after.files.get(path)) continue;
    const survey = isObject(after.study.soil) && after.study.soil.survey === path;
    for (const section of FOLLOWING[survey ? 'soil' : 'conductors'] ?? []) found.add(section);
  }
  return found;
}
