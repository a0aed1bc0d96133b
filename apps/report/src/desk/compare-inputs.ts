// What differs between two studies as they are written, value by value, cases and seasons met by their names.
import { isList, isObject, type JsonObject, type JsonValue, member } from '@ohmstead/study';
import { type Difference, differing } from './difference.ts';
import { sameJson } from './json-edit.ts';
import type { JsonPath } from './path.ts';
import { kindOfPath } from './path-kind.ts';
import { pathWords, valueWords } from './path-words.ts';

interface Leaf {
  readonly words: string;
  readonly path: JsonPath;
  readonly value: JsonValue;
}

/** Members by which the items of a list are known; other lists are known by place. */
const NAMES = ['name', 'mark'] as const;
const DIGITS_OF_AREA = 4;

function partKey(list: readonly JsonValue[], i: number): string {
  const item = list[i];
  for (const key of NAMES) {
    const name = member(item, key);
    if (typeof name !== 'string') continue;
    // of two items of one name the first is known by it
    if (list.findIndex((other) => member(other, key) === name) === i) return `"${name}"`;
  }
  return String(i);
}

function isOutline(path: JsonPath): boolean {
  return path.includes('areas') && typeof path.at(-1) === 'number' && typeof path.at(-2) !== 'number';
}

/** Every value of a study by a key that stays when items before it come or go. */
function leaves(
  study: JsonValue,
  value: JsonValue,
  path: JsonPath,
  key: string,
): readonly (readonly [string, Leaf])[] {
  if (isList(value) && !isOutline(path)) {
    return value.flatMap((item, i) => leaves(study, item, [...path, i], `${key}[${partKey(value, i)}]`));
  }
  if (isObject(value)) {
    return Object.keys(value).flatMap((name) =>
      leaves(study, value[name]!, [...path, name], `${key}.${name}`),
    );
  }
  return [[key, { words: pathWords(study, path), path, value }]];
}

/** An outline by its corners and its area, twice the sum of the cross products. */
function outlineWords(outline: JsonValue): string {
  const corners = isList(outline) ? outline : [];
  const at = (i: number, k: 0 | 1): number => {
    const corner = corners[i % corners.length];
    const value = isList(corner) ? corner[k] : undefined;
    return typeof value === 'number' ? value : Number.NaN;
  };
  const twice = corners.reduce<number>(
    (sum, _, i) => sum + at(i, 0) * at(i + 1, 1) - at(i + 1, 0) * at(i, 1),
    0,
  );
  const area = Number(Math.abs(twice / 2).toPrecision(DIGITS_OF_AREA));
  return `${corners.length} corners, ${area} m²`;
}

function compared({ path, value }: Leaf): number | string {
  if (isOutline(path)) return outlineWords(value);
  return typeof value === 'number' && kindOfPath(path) !== undefined ? value : valueWords(path, value);
}

function line(before: Leaf | undefined, after: Leaf | undefined): readonly Difference[] {
  const told = after ?? before;
  if (told === undefined || sameJson(before?.value, after?.value)) return [];
  const kind = kindOfPath(told.path) ?? 'text';
  const [was, is] = [before && compared(before), after && compared(after)];
  // outlines of one size at two places
  const moved = was === is && isOutline(told.path);
  return differing({ what: told.words, kind, before: was, after: moved ? `${is}, moved` : is });
}

/**
 * What differs in the inputs; the tables of conductors are compared apart.
 * @returns a line for each value, in the order of the later study, what it has no more at the end
 */
export function inputDifferences(before: JsonObject, after: JsonObject): readonly Difference[] {
  const was = new Map(leaves(before, before, [], ''));
  const is = new Map(leaves(after, after, [], ''));
  return [
    ...[...is].flatMap(([key, leaf]) => line(was.get(key), leaf)),
    ...[...was].flatMap(([key, leaf]) => (is.has(key) ? [] : line(leaf, undefined))),
  ];
}
