// The published schema of study.json: the file equals the function, and every part of it is explained.
import { readFileSync } from 'node:fs';
import { describe, expect, test } from 'vitest';
import { studyJsonSchema } from '../../src/input/json-schema.ts';
import { isObject, type JsonValue, member } from '../../src/input/json-value.ts';
import { testDataPath } from './folder-source.ts';

/** Every part of the schema that speaks of a value, with the keys that lead to it. */
function nodes(node: JsonValue | undefined, path: string): readonly (readonly [string, JsonValue])[] {
  if (!isObject(node)) return [];
  const properties = member(node, 'properties');
  const below = isObject(properties) ? Object.entries(properties) : [];
  return [
    [path, node],
    ...below.flatMap(([key, child]) => nodes(child, `${path}.${key}`)),
    ...nodes(member(node, 'items'), `${path}[]`),
  ];
}

describe('published schema', () => {
  test('test-data/ohmstead-study.schema.json is what the function gives', () => {
    const file = readFileSync(testDataPath('ohmstead-study.schema.json'), 'utf8');
    expect(file).toBe(`${JSON.stringify(studyJsonSchema(), null, 2)}\n`);
  });

  test('names the keys of a study and refuses others', () => {
    const schema = studyJsonSchema();
    expect(Object.keys(Object(member(schema, 'properties')))).toEqual([
      'format',
      'version',
      'title',
      'project',
      'revisions',
      'soil',
      'seasons',
      'surfacing',
      'metal_model',
      'conductors',
      'electrodes',
      'cases',
      'limits',
      'areas',
      'notes',
      'display_units',
    ]);
    expect(member(schema, 'required')).toEqual([
      'format',
      'version',
      'title',
      'soil',
      'conductors',
      'cases',
      'limits',
    ]);
    expect(member(schema, 'additionalProperties')).toBe(false);
    expect(member(schema, '$schema')).toBe('https://json-schema.org/draft/2020-12/schema');
  });

  test('asks for layers, or for a survey with the number of layers', () => {
    const soil = member(member(studyJsonSchema(), 'properties'), 'soil');
    expect(member(soil, 'oneOf')).toEqual([
      { required: ['layers'] },
      { required: ['survey', 'layer_count'] },
    ]);
  });

  test('gives every part a trade name and an expectation', () => {
    const all = nodes(studyJsonSchema(), 'study');
    const bare = all.filter(([, node]) => !member(node, 'title') || !member(node, 'description'));
    expect(all.length).toBeGreaterThan(50);
    expect(bare.map(([path]) => path)).toEqual([]);
  });
});
