// Values of a JSON text and the places of their parts.

import { LONGEST_SHOWN } from './limits.ts';
import { quoted } from './shown-value.ts';

export type JsonValue = null | boolean | number | string | readonly JsonValue[] | JsonObject;
export interface JsonObject {
  readonly [key: string]: JsonValue;
}

/** A JSON text as read: its value and the line of each part by its place, such as `cases[0].duration_s`. */
export interface JsonDocument {
  readonly value: JsonValue;
  readonly lines: ReadonlyMap<string, number>;
}

export function isObject(value: JsonValue | undefined): value is JsonObject {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

export function isList(value: JsonValue | undefined): value is readonly JsonValue[] {
  return Array.isArray(value);
}

/** Own member of an object; `undefined` where the value is no object or has no such key. */
export function member(value: JsonValue | undefined, key: string): JsonValue | undefined {
  return isObject(value) && Object.hasOwn(value, key) ? value[key] : undefined;
}

/** Items of a list member; none where there is no such list. */
export function items(value: JsonValue | undefined, key: string): readonly JsonValue[] {
  const list = member(value, key);
  return isList(list) ? list : [];
}

/** Place of a part: `soil` and `layers` give `soil.layers`, `cases` and 0 give `cases[0]`; odd keys are quoted. */
export function placeOf(parent: string, part: string | number): string {
  if (typeof part === 'number') return `${parent}[${part}]`;
  if (part.length > LONGEST_SHOWN || !/^[A-Za-z_]\w*$/.test(part)) return `${parent}[${quoted(part)}]`;
  return parent === '' ? part : `${parent}.${part}`;
}
