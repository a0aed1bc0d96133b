// Reads parts of a study that may still be incomplete or at fault.
import type { JsonObject, JsonValue } from '@ohmstead/study';

export function isObject(value: JsonValue | undefined): value is JsonObject {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function isList(value: JsonValue | undefined): value is readonly JsonValue[] {
  return Array.isArray(value);
}

/** Items of a list; none where there is no list. */
export function itemsOf(value: JsonValue | undefined): readonly JsonValue[] {
  return isList(value) ? value : [];
}

/** Own member of an object; undefined where there is none. */
export function memberOf(value: JsonValue | undefined, key: string): JsonValue | undefined {
  return isObject(value) && Object.hasOwn(value, key) ? value[key] : undefined;
}

/** A text as it stands; undefined where another kind of value stands. */
export function textOf(value: JsonValue | undefined): string | undefined {
  return typeof value === 'string' ? value : undefined;
}

/** An object without a key; what is no object becomes an empty one. */
export function without(value: JsonValue | undefined, ...keys: readonly string[]): JsonObject {
  if (!isObject(value)) return {};
  return Object.fromEntries(Object.entries(value).filter(([key]) => !keys.includes(key)));
}

/** A value that is no quantity or text as it stands, so that it is seen where it was expected. */
export function rawText(value: JsonValue | undefined): string {
  if (value === undefined || value === null) return '';
  return typeof value === 'string' ? value : JSON.stringify(value);
}
