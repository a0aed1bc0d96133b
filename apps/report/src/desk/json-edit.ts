// One value of a JSON document read, set, removed or moved by its path; everything else is shared.
import { isList, isObject, type JsonValue } from '@ohmstead/study';
import type { JsonPath } from './path.ts';

/** The value at a path; undefined where there is none. */
export function valueIn(root: JsonValue | undefined, path: JsonPath): JsonValue | undefined {
  return path.reduce<JsonValue | undefined>((value, part) => {
    if (typeof part === 'number') return isList(value) ? value[part] : undefined;
    return isObject(value) && Object.hasOwn(value, part) ? value[part] : undefined;
  }, root);
}

/** Whether two values are the same, whatever the order of their keys. */
export function sameJson(a: JsonValue | undefined, b: JsonValue | undefined): boolean {
  if (a === b) return true;
  if (isList(a) && isList(b)) return a.length === b.length && a.every((item, i) => sameJson(item, b[i]));
  if (!isObject(a) || !isObject(b)) return false;
  const keys = Object.keys(a);
  return (
    keys.length === Object.keys(b).length &&
    keys.every((key) => Object.hasOwn(b, key) && sameJson(a[key], b[key]))
  );
}

/**
 * A document with one value set.
 * @param root the document
 * @param path where the value goes; what is missing on the way is made, and what can hold no such part gives way
 * @param value of JSON: numbers are finite
 * @returns the new document
 * @throws RangeError for an item past the end of a list: a fault of the caller
 */
export function withValue(root: JsonValue | undefined, path: JsonPath, value: JsonValue): JsonValue {
  const [part, ...rest] = path;
  if (part === undefined) return value;
  if (typeof part === 'string') {
    const owner = isObject(root) ? root : {};
    const child = Object.hasOwn(owner, part) ? owner[part] : undefined;
    return withKey(owner, part, withValue(child, rest, value));
  }
  const list = isList(root) ? root : [];
  if (!Number.isInteger(part) || part < 0 || part > list.length)
    throw new RangeError(`item ${part} of a list of ${list.length}`);
  return list.toSpliced(part, 1, withValue(list[part], rest, value));
}

/** The owner with a key set; by entries, so that no key has a meaning of its own, not even `__proto__`. */
function withKey(owner: Readonly<Record<string, JsonValue>>, key: string, value: JsonValue): JsonValue {
  if (!Object.hasOwn(owner, key)) return Object.fromEntries([...Object.entries(owner), [key, value]]);
  return Object.fromEntries(Object.entries(owner).map(([name, old]) => [name, name === key ? value : old]));
}

/**
 * A document without one value. Objects and lists that held nothing else go with it; an item of a list stays, were
 * it empty, so that the items after it keep their places.
 * @returns the new document; the same one where there is no such value
 */
export function withoutValue(root: JsonValue, path: JsonPath): JsonValue {
  if (path.length === 0 || valueIn(root, path) === undefined) return root;
  return pruned(root, path) ?? {};
}

function pruned(value: JsonValue, [part, ...rest]: JsonPath): JsonValue | undefined {
  if (typeof part === 'number' && isList(value)) {
    if (rest.length === 0) return value.length === 1 ? undefined : value.toSpliced(part, 1);
    const item = value[part]!;
    return value.toSpliced(part, 1, pruned(item, rest) ?? (isList(item) ? [] : {}));
  }
  if (typeof part !== 'string' || !isObject(value)) return value;
  const child = rest.length === 0 ? undefined : pruned(value[part]!, rest);
  if (child !== undefined) return withKey(value, part, child);
  const left = Object.entries(value).filter(([key]) => key !== part);
  return left.length === 0 ? undefined : Object.fromEntries(left);
}
