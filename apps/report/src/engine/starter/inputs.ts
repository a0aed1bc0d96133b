// The numbers of a study.json that a reader may try otherwise, and the study with some of them changed.
import { pathText } from '@ohmstead/sheet';

type InputPath = readonly (string | number)[];

export interface NumberInput {
  /** path as faults write it: `cases[0].duration_s` */
  readonly name: string;
  /** part of the study it belongs to, by the name that part has in the study: `33 kV busbar` */
  readonly group: string;
  /** path in its group: `duration_s` */
  readonly label: string;
  readonly value: number;
}

/** Tells the file's form apart; no quantity. */
const NOT_QUANTITIES: readonly string[] = ['version'];

/** Every number of the study but corners of areas, which only a plan makes sense of. */
export function numberInputs(study: unknown): readonly NumberInput[] {
  const found: NumberInput[] = [];
  const visit = (value: unknown, path: InputPath): void => {
    if (typeof value === 'number') found.push({ name: pathText(path), ...groupOf(study, path), value });
    else if (Array.isArray(value)) {
      if (!value.some(Array.isArray)) for (const [k, inner] of value.entries()) visit(inner, [...path, k]);
    } else if (isObject(value)) {
      for (const [key, inner] of Object.entries(value))
        if (!NOT_QUANTITIES.includes(key)) visit(inner, [...path, key]);
    }
  };
  visit(study, []);
  return found;
}

/**
 * @param changes values by the names of `numberInputs`
 * @returns a study with these numbers in place of its own; the one given stays as it is
 */
export function withNumbers(study: unknown, changes: ReadonlyMap<string, number>): unknown {
  const copy = (value: unknown, path: InputPath): unknown => {
    if (typeof value === 'number') return changes.get(pathText(path)) ?? value;
    if (Array.isArray(value)) return value.map((inner, k) => copy(inner, [...path, k]));
    if (!isObject(value)) return value;
    return Object.fromEntries(
      Object.entries(value).map(([key, inner]) => [key, copy(inner, [...path, key])]),
    );
  };
  return copy(study, []);
}

/**
 * A number as somebody types it; a comma for the point is taken as one.
 * @returns undefined where it is none
 */
export function typedNumber(text: string): number | undefined {
  const plain = text.trim().replace(',', '.').replace('−', '-');
  const value = Number(plain);
  return plain === '' || !Number.isFinite(value) ? undefined : value;
}

/** A named member of a list, such as a case or a season, is a group of its own; all else goes by its first key. */
function groupOf(study: unknown, path: InputPath): Pick<NumberInput, 'group' | 'label'> {
  const [first, second] = path;
  const list = isObject(study) && typeof first === 'string' ? study[first] : undefined;
  const member: unknown = Array.isArray(list) && typeof second === 'number' ? list[second] : undefined;
  return isObject(member) && typeof member.name === 'string'
    ? { group: member.name, label: pathText(path.slice(2)) }
    : { group: String(first), label: path.length === 1 ? String(first) : pathText(path.slice(1)) };
}

function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null;
}
