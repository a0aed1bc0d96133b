// What a rule between keys of study.json finds, before it is located.
import { type JsonValue, member } from './json-value.ts';

export type Finding = readonly [place: string, code: string, message: string];

export function has(value: JsonValue | undefined, key: string): boolean {
  return member(value, key) !== undefined;
}
