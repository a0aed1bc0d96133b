// study.json as it is written after an edit: keys in the order of the schema, two spaces, one line feed at the end.
import { isList, isObject, type JsonValue, member, studyJsonSchema } from '@ohmstead/study';

let schema: JsonValue | undefined;

/** The part of the schema that speaks of an item or a key of what `node` speaks of. */
function below(node: JsonValue | undefined, part: string | number): JsonValue | undefined {
  return typeof part === 'string' ? member(member(node, 'properties'), part) : member(node, 'items');
}

/** The same value with known keys in the order of the schema, and unknown ones after them in their own order. */
function ordered(value: JsonValue, node: JsonValue | undefined): JsonValue {
  if (isList(value)) return value.map((item, i) => ordered(item, below(node, i)));
  if (!isObject(value)) return value;
  const properties = member(node, 'properties');
  const known = isObject(properties)
    ? Object.keys(properties).filter((key) => Object.hasOwn(value, key))
    : [];
  const others = Object.keys(value).filter((key) => !known.includes(key));
  return Object.fromEntries(
    [...known, ...others].map((key) => [key, ordered(value[key]!, below(node, key))]),
  );
}

/** The same value in canonical order. */
export function canonical(value: JsonValue): JsonValue {
  schema ??= studyJsonSchema();
  return ordered(value, schema);
}

/** The text of study.json for a value: the same for values that differ in the order of keys the schema knows. */
export function canonicalJson(value: JsonValue): string {
  return `${JSON.stringify(canonical(value), null, 2)}\n`;
}
