// A desk over a plain study, for tests: it writes down every edit and changes nothing.
import type { JsonValue } from '@ohmstead/study';
import type { Desk, StudyPath } from '../../src/desk/desk.ts';
import { quantityText } from '../../src/format/quantity-text.ts';

function valueAt(study: unknown, path: StudyPath): JsonValue | undefined {
  const found = path.reduce<unknown>((value, part) => {
    if (typeof value !== 'object' || value === null) return undefined;
    return Object.getOwnPropertyDescriptor(value, part)?.value;
  }, study);
  return isJson(found) ? found : undefined;
}

function isJson(value: unknown): value is JsonValue {
  return value !== undefined && typeof value !== 'function';
}

export interface WrittenDesk extends Desk {
  readonly edits: readonly (readonly [StudyPath, JsonValue | undefined])[];
}

/** @param study as study.json holds it, faulty or not */
export function deskOf(study: unknown, more: Partial<Desk> = {}): WrittenDesk {
  const edits: [StudyPath, JsonValue | undefined][] = [];
  return {
    edits,
    valueAt: (path) => valueAt(study, path),
    edit: (path, value) => edits.push([path, value]),
    read: (_, text) =>
      Number.isFinite(Number(text)) ? { value: Number(text) } : { complaint: 'not a number' },
    show: (kind, value) => quantityText(kind, value, 'SI'),
    paste: () => [],
    state: () => 'fresh',
    faults: () => [],
    complaints: () => [],
    before: undefined,
    units: 'SI',
    instrument: undefined,
    goTo: () => undefined,
    note: () => undefined,
    download: undefined,
    ...more,
  };
}
