// The schema of study.json in the standard form that editors and other programs read.
import { z } from 'zod';
import { isObject, type JsonObject, type JsonValue } from './json-value.ts';
import { studySchema } from './study-schema.ts';

/**
 * JSON Schema of study.json, version 1. It tells keys, kinds and ranges; rules between keys (such as one current for a
 * case) are judged when a study is loaded.
 * @returns the schema in the 2020-12 draft, the same at every call
 * @throws if the schema cannot be told in that form, a fault of the program
 */
export function studyJsonSchema(): JsonObject {
  const schema: JsonValue = JSON.parse(
    JSON.stringify(z.toJSONSchema(studySchema, { target: 'draft-2020-12' })),
  );
  if (!isObject(schema)) throw new Error('the schema of study.json is no object');
  return schema;
}
