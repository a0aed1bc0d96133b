// Places of study.json and their values in the words of the trade: `soil resistivity of layer 1`.
import {
  type DisplayUnits,
  isList,
  isObject,
  type JsonValue,
  member,
  placeOf,
  shown,
  studyJsonSchema,
} from '@ohmstead/study';
import { valueIn } from './json-edit.ts';
import type { JsonPath } from './path.ts';
import { kindOfPath } from './path-kind.ts';
import { quantityText } from './quantity-text.ts';

/** Lists whose items are called by one of their values, or counted. */
const itemWords: ReadonlyMap<string, { readonly noun: string; readonly named?: string }> = new Map([
  ['layers', { noun: 'layer' }],
  ['cases', { noun: 'case', named: 'name' }],
  ['seasons', { noun: 'season', named: 'name' }],
  ['electrodes', { noun: 'electrode', named: 'name' }],
  ['revisions', { noun: 'revision', named: 'mark' }],
  ['conductors', { noun: 'table' }],
  ['touch', { noun: 'touch area' }],
  ['step', { noun: 'step area' }],
  ['areas', { noun: 'area of the covering' }],
]);

let schema: JsonValue | undefined;

function schemaAt(path: JsonPath): JsonValue | undefined {
  schema ??= studyJsonSchema();
  return path.reduce<JsonValue | undefined>((node, part) => {
    if (typeof part === 'string') return member(member(node, 'properties'), part);
    const tuple = member(node, 'prefixItems');
    return isList(tuple) ? tuple[part] : member(node, 'items');
  }, schema);
}

/** An item of a list: `layer 2`, `case 33 kV bus`, `corner 3`. */
function itemName(study: JsonValue, path: JsonPath): string {
  const place = path.at(-1);
  const owner = path.at(-2);
  const count = typeof place === 'number' ? place + 1 : 0;
  if (typeof owner === 'number') return `corner ${count}`;
  const words = itemWords.get(owner ?? '') ?? { noun: 'item' };
  const name = words.named === undefined ? undefined : member(valueIn(study, path), words.named);
  return `${words.noun} ${typeof name === 'string' && name !== '' ? shown(name) : count}`;
}

/**
 * A place in words.
 * @param study in which it is found, so that cases and seasons are called by their names
 * @param path of a value, an object or a list
 * @returns such as `fault current of case 33 kV bus`; the path itself where the schema does not know it
 */
export function pathWords(study: JsonValue, path: JsonPath): string {
  const title = member(schemaAt(path), 'title');
  if (typeof title !== 'string' || path.length === 0) return path.reduce<string>(placeOf, '');
  // the two numbers of a corner are its x and y, not items of a list
  const coordinate = path.length > 3 && path.slice(-3).every((part) => typeof part === 'number');
  const owner = coordinate ? path.slice(0, -1) : path;
  const around = owner
    .flatMap((part, i) => (typeof part === 'number' ? [itemName(study, path.slice(0, i + 1))] : []))
    .toReversed();
  if (coordinate) return [path.at(-1) === 0 ? 'x' : 'y', ...around].join(' of ');
  return typeof path.at(-1) === 'number' ? around.join(' of ') : [title, ...around].join(' of ');
}

/** A value in words, with its unit where it is a quantity. */
export function valueWords(path: JsonPath, value: JsonValue | undefined, units: DisplayUnits = 'SI'): string {
  if (value === undefined) return 'nothing';
  const kind = kindOfPath(path);
  if (typeof value === 'number' && kind !== undefined) return quantityText(kind, value, units);
  if (isList(value)) return `${value.length} ${value.length === 1 ? 'item' : 'items'}`;
  return isObject(value) ? 'given' : shown(String(value));
}
