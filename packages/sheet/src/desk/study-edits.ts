// Rewrites the lists of a study: what is added changes nothing or begins without numbers, so that none is taken for granted.
import type { JsonObject, JsonValue } from '@ohmstead/study';
import { isObject, itemsOf, memberOf, textOf, without } from './json.ts';

type List = readonly JsonValue[];

/** Thickness given to what was the last layer where no layer above has one, m. Reason: a round length. */
const FIRST_THICKNESS_M = 1;

/** One more layer below, of the same resistivity: the ground is the same as before until one of them is changed. */
export function layersWithOneMore(layers: JsonValue | undefined): List {
  const list = itemsOf(layers);
  const last = list[list.length - 1];
  if (last === undefined) return [{}];
  const above = memberOf(list[list.length - 2], 'thickness_m');
  const thickness_m = typeof above === 'number' ? above : FIRST_THICKNESS_M;
  const bare = without(last, 'thickness_m');
  return [...list.slice(0, -1), { ...bare, thickness_m }, bare];
}

/** Without one layer; what is last then reaches to any depth. */
export function layersWithout(layers: JsonValue | undefined, index: number): List {
  const kept = itemsOf(layers).filter((_, k) => k !== index);
  return kept.map((layer, k) => (k === kept.length - 1 ? without(layer, 'thickness_m') : layer));
}

/** The first of `word 1`, `word 2` … that no item is named. */
function freeName(list: List, word: string): string {
  const taken = new Set(list.map((item) => memberOf(item, 'name')));
  let n = list.length + 1;
  while (taken.has(`${word} ${n}`)) n += 1;
  return `${word} ${n}`;
}

/** One more case, to be filled in. */
export function casesWithOneMore(cases: JsonValue | undefined): List {
  const list = itemsOf(cases);
  return [...list, { name: freeName(list, 'case') }];
}

/** One more season, its top dried or frozen, to be filled in. */
export function seasonsWithOneMore(seasons: JsonValue | undefined): List {
  const list = itemsOf(seasons);
  return [...list, { name: freeName(list, 'season'), top: {} }];
}

/** A list without one item; undefined, so that the key goes too, where none is left. */
export function listWithout(list: JsonValue | undefined, index: number): List | undefined {
  const kept = itemsOf(list).filter((_, k) => k !== index);
  return kept.length === 0 ? undefined : kept;
}

/** How the current of a case is stated. */
export type CurrentSource = 'fault' | 'grid';

/** A case is one of grid current as soon as it has the key, with or without a value. */
export function currentSourceOf(faultCase: JsonValue | undefined): CurrentSource {
  return memberOf(faultCase, 'grid_current_A') === undefined ? 'fault' : 'grid';
}

/**
 * A case with its current stated the other way: I_grid = I_fault·S_f, both before decrement. What cannot be carried over
 * is left to be filled in.
 */
export function caseWithSource(faultCase: JsonValue | undefined, source: CurrentSource): JsonObject {
  const bare = without(faultCase, 'fault_current_A', 'division_factor', 'grid_current_A');
  if (source === 'fault') {
    const grid = memberOf(faultCase, 'grid_current_A');
    return typeof grid === 'number' ? { ...bare, fault_current_A: grid, division_factor: 1 } : bare;
  }
  const fault = memberOf(faultCase, 'fault_current_A');
  const share = memberOf(faultCase, 'division_factor');
  const both = typeof fault === 'number' && typeof share === 'number';
  return { ...bare, grid_current_A: both ? Number((fault * share).toPrecision(12)) : null };
}

/** What a season does to the soil of the study. */
export type SeasonKind = 'top' | 'below' | 'both' | 'layers';

/** The kind of a season by the keys it has. */
export function seasonKindOf(season: JsonValue | undefined): SeasonKind {
  if (memberOf(season, 'layers') !== undefined) return 'layers';
  const below = memberOf(season, 'below') !== undefined;
  if (memberOf(season, 'top') === undefined) return below ? 'below' : 'top';
  return below ? 'both' : 'top';
}

/**
 * A season of another kind; what it states already stays.
 * @param soil layers of the study, which layers of its own begin from
 */
export function seasonOfKind(
  season: JsonValue | undefined,
  kind: SeasonKind,
  soil: JsonValue | undefined,
): JsonObject {
  const bare = without(season, 'top', 'below', 'layers');
  const change = (key: 'top' | 'below'): JsonObject => {
    const stated = memberOf(season, key);
    return { [key]: isObject(stated) ? stated : {} };
  };
  switch (kind) {
    case 'top':
    case 'below':
      return { ...bare, ...change(kind) };
    case 'both':
      return { ...bare, ...change('top'), ...change('below') };
    case 'layers': {
      const own = itemsOf(memberOf(season, 'layers'));
      const given = itemsOf(soil);
      return { ...bare, layers: own.length > 0 ? own : given.length > 0 ? given : [{}] };
    }
  }
}

/**
 * Which of the solved items an item of the draft is: the one in its place while the lists are as long, else the one of
 * its name; undefined where it has not been solved.
 */
export function solvedIndex(
  draft: List,
  index: number,
  solved: readonly { readonly name: string }[],
): number | undefined {
  if (draft.length === solved.length) return index;
  const name = textOf(memberOf(draft[index], 'name'));
  const found = solved.findIndex((item) => item.name === name);
  return found < 0 ? undefined : found;
}

/** The way back: where a solved item stands in the draft. */
export function draftIndex(
  draft: List,
  index: number,
  solved: readonly { readonly name: string }[],
): number | undefined {
  const found = draft.findIndex((_, k) => solvedIndex(draft, k, solved) === index);
  return found < 0 ? undefined : found;
}
