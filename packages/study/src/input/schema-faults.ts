// What the schema finds wrong with study.json, as located faults in the words of the trade.
import type { z } from 'zod';
import type { Fault } from '../fault.ts';
import {
  isList,
  isObject,
  type JsonDocument,
  type JsonObject,
  type JsonValue,
  member,
  placeOf,
} from './json-value.ts';
import { nearestName } from './nearest-name.ts';
import { listed, quoted } from './shown-value.ts';

type Part = string | number;
type Issue = z.core.$ZodIssue;

/** Values and keys of the study format that this program cannot solve yet, by their place without indices. */
const notYet: ReadonlyMap<string, readonly string[]> = new Map([
  ['metal_model', ['inductive', 'auto']],
  ['limits.basis', ['EN 50522', 'custom']],
]);

function partsOf(path: readonly PropertyKey[]): readonly Part[] {
  return path.map((part) => (typeof part === 'number' ? part : String(part)));
}

function placeAt(parts: readonly Part[]): string {
  return parts.reduce<string>(placeOf, '');
}

function valueAt(root: JsonValue, parts: readonly Part[]): JsonValue | undefined {
  return parts.reduce<JsonValue | undefined>((value, part) => {
    if (typeof part === 'number') return isList(value) ? value[part] : undefined;
    return member(value, part);
  }, root);
}

/** The part of the JSON Schema that speaks of a place. */
function schemaAt(schema: JsonObject, parts: readonly Part[]): JsonValue | undefined {
  return parts.reduce<JsonValue | undefined>((node, part) => {
    if (typeof part === 'string') return member(member(node, 'properties'), part);
    const tuple = member(node, 'prefixItems');
    return isList(tuple) ? tuple[part] : member(node, 'items');
  }, schema);
}

function textMember(node: JsonValue | undefined, key: string): string {
  const text = member(node, key);
  return typeof text === 'string' ? text : '';
}

/** A value as a fault names it: numbers bare, text quoted, the rest by kind. */
function told(value: JsonValue): string {
  if (typeof value === 'string') return quoted(value);
  if (isList(value)) return `a list of ${value.length}`;
  if (isObject(value)) return 'an object';
  return String(value);
}

function knownKeys(node: JsonValue | undefined): readonly string[] {
  const properties = member(node, 'properties');
  return isObject(properties) ? Object.keys(properties) : [];
}

/** The key that an unknown one probably means, of those that its object does not have. */
function keyMeant(key: string, known: readonly string[], owner: JsonValue | undefined): string | undefined {
  return nearestName(
    key,
    known.filter((name) => member(owner, name) === undefined),
  );
}

function valueMessage(
  issue: Issue,
  value: JsonValue | undefined,
  node: JsonValue | undefined,
  place: string,
): string {
  const name = textMember(node, 'title');
  const expected = textMember(node, 'description');
  if (value === undefined) return `${name} is missing; expected ${expected}`;
  const later = notYet.get(place);
  if (typeof value === 'string' && later?.includes(value) === true) {
    return `${name} ${quoted(value)} is not yet offered; expected ${expected}`;
  }
  if (isList(value) && issue.code !== 'invalid_type')
    return `${name} has ${value.length} items; expected ${expected}`;
  const quotedNumber = typeof value === 'string' && value.trim() !== '' && Number.isFinite(Number(value));
  const hint = quotedNumber && /^(a|the) number/.test(expected) ? ', without quotes' : '';
  return `${name} ${told(value)} is not accepted; expected ${expected}${hint}`;
}

function codeOf(issue: Issue, value: JsonValue | undefined, place: string): string {
  if (value === undefined) return 'missing';
  if (typeof value === 'string' && notYet.get(place)?.includes(value) === true) return 'not-yet-offered';
  switch (issue.code) {
    case 'invalid_type':
      return 'kind';
    case 'too_small':
    case 'too_big':
      return 'range';
    default:
      return 'value';
  }
}

/**
 * Turns the findings of the schema into faults.
 * @param file name for the faults
 * @param document the study as read
 * @param issues findings of the schema
 * @param schema JSON Schema that carries trade names and expectations
 * @returns one fault for each wrong, missing or unknown part, at its line
 */
export function schemaFaults(
  file: string,
  document: JsonDocument,
  issues: readonly Issue[],
  schema: JsonObject,
): readonly Fault[] {
  const at = (parts: readonly Part[]): { file: string; line?: number; place?: string } => {
    const place = placeAt(parts);
    // a missing part is told at the line of what it is missing from
    const line = document.lines.get(place) ?? document.lines.get(placeAt(parts.slice(0, -1)));
    return { file, ...(line === undefined ? {} : { line }), ...(place === '' ? {} : { place }) };
  };
  const misspelt = new Set<string>();
  const faults = issues.flatMap((issue): readonly Fault[] => {
    const parts = partsOf(issue.path);
    const node = schemaAt(schema, parts);
    const value = valueAt(document.value, parts);
    if (issue.code === 'unrecognized_keys') {
      const known = knownKeys(node);
      return issue.keys.map((key) => {
        const near = keyMeant(key, known, value);
        if (near !== undefined) misspelt.add(placeAt([...parts, near]));
        const hint = near === undefined ? `known are ${listed(known)}` : `${near} is probably meant`;
        const message = `there is no such key here; ${hint}`;
        return { ...at([...parts, key]), code: 'unknown-key', message };
      });
    }
    const place = placeAt(parts);
    return [
      { ...at(parts), code: codeOf(issue, value, place), message: valueMessage(issue, value, node, place) },
    ];
  });
  const said = new Set<string>();
  return faults.filter(({ code, place, message }) => {
    // a key that stands there misspelt is not told as missing too
    if (code === 'missing' && place !== undefined && misspelt.has(place)) return false;
    // nor is a text told twice that breaks two rules, being empty and without a visible character
    const sentence = `${place}: ${message}`;
    if (said.has(sentence)) return false;
    said.add(sentence);
    return true;
  });
}
