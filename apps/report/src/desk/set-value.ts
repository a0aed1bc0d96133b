// Edits of study.json at a path: a value set or removed, an item of a list inserted, copied or moved.
import { isList, isObject, type JsonObject, type JsonValue } from '@ohmstead/study';
import { type Draft, valueAt, withStudy } from './draft.ts';
import { sameJson, withoutValue, withValue } from './json-edit.ts';
import type { JsonPath } from './path.ts';

function edited(draft: Draft, study: JsonValue): Draft {
  return withStudy(draft, isObject(study) ? study : {});
}

/**
 * Sets a value of study.json, or removes it.
 * @param path what is missing on the way to it is made
 * @param value finite numbers only; undefined removes, with what then holds nothing
 * @returns the same draft where the value stands there already, so that study.json keeps its bytes
 * @throws RangeError for an item past the end of a list, or a number that JSON has no word for
 */
export function setValue(draft: Draft, path: JsonPath, value: JsonValue | undefined): Draft {
  if (typeof value === 'number' && !Number.isFinite(value))
    throw new RangeError(`${value} is no number of JSON`);
  if (sameJson(valueAt(draft, path), value)) return draft;
  return edited(
    draft,
    value === undefined ? withoutValue(draft.study, path) : withValue(draft.study, path, value),
  );
}

/** The list at a path; empty where there is none. */
export function listAt(draft: Draft, path: JsonPath): readonly JsonValue[] {
  const list = valueAt(draft, path);
  return isList(list) ? list : [];
}

/** A list replaced; an empty one is removed with what then holds nothing. */
export function setList(draft: Draft, path: JsonPath, list: readonly JsonValue[]): Draft {
  return setValue(draft, path, list.length === 0 ? undefined : list);
}

/** An item put before the item `at`, or at the end of the list. */
export function insertItem(draft: Draft, path: JsonPath, at: number, item: JsonValue): Draft {
  return setList(draft, path, listAt(draft, path).toSpliced(at, 0, item));
}

/** A list without its item `at`; the whole list is removed with its last item. */
export function removeItem(draft: Draft, path: JsonPath, at: number): Draft {
  return setList(draft, path, listAt(draft, path).toSpliced(at, 1));
}

/** The item `from` moved to the place `to`, both counted in the list as it is before and after. */
export function moveItem(draft: Draft, path: JsonPath, from: number, to: number): Draft {
  const list = listAt(draft, path);
  const item = list[from];
  if (item === undefined || to < 0 || to >= list.length) return draft;
  return setList(draft, path, list.toSpliced(from, 1).toSpliced(to, 0, item));
}

/** A name that no item of a list has: the name itself, or with a number after it. */
export function freeName(list: readonly JsonValue[], name: string): string {
  const taken = new Set(list.map((item) => (isObject(item) ? item.name : undefined)));
  for (let n = 1; ; n++) {
    const tried = n === 1 ? name : `${name} ${n}`;
    if (!taken.has(tried)) return tried;
  }
}

/** The item `at` copied after itself, under a free name where it has one. */
export function copyItem(draft: Draft, path: JsonPath, at: number): Draft {
  const list = listAt(draft, path);
  const item = list[at];
  if (item === undefined) return draft;
  return insertItem(draft, path, at + 1, isObject(item) ? renamed(list, item) : item);
}

function renamed(list: readonly JsonValue[], item: JsonObject): JsonObject {
  const { name } = item;
  return typeof name === 'string' ? { ...item, name: freeName(list, name) } : item;
}
