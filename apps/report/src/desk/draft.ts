// The study being worked at: its files as they would be saved, and study.json as a value, faulty or not.
import { isObject, type JsonObject, type JsonValue, STUDY_FILE } from '@ohmstead/study';
import { canonical, canonicalJson } from './canonical-json.ts';
import { valueIn } from './json-edit.ts';
import type { JsonPath } from './path.ts';

/** The files are the truth: `loadStudy(sourceFromMap(draft.files))` reads them. Never changed, only replaced. */
export interface Draft {
  /** every file of the study by its path; those that no edit touched keep their bytes */
  readonly files: ReadonlyMap<string, Uint8Array>;
  /** study.json; its keys and kinds may be at fault */
  readonly study: JsonObject;
}

/** The value at a path of study.json; undefined where there is none. */
export function valueAt(draft: Draft, path: JsonPath): JsonValue | undefined {
  return valueIn(draft.study, path);
}

/** The draft with one file replaced or added; not for study.json. */
export function withFile(draft: Draft, path: string, bytes: Uint8Array): Draft {
  return { ...draft, files: new Map(draft.files).set(path, bytes) };
}

/** The draft without one file; not for study.json. */
export function withoutFile(draft: Draft, path: string): Draft {
  return { ...draft, files: new Map([...draft.files].filter(([name]) => name !== path)) };
}

/** The draft with study.json replaced, written in its canonical form. */
export function withStudy(draft: Draft, study: JsonObject): Draft {
  const whole = canonical(study);
  const bytes = new TextEncoder().encode(canonicalJson(whole));
  return { files: new Map(draft.files).set(STUDY_FILE, bytes), study: isObject(whole) ? whole : {} };
}

/** Whether two drafts would be saved as the same bytes. */
export function sameDraft(a: Draft, b: Draft): boolean {
  if (a.files === b.files) return true;
  return (
    a.files.size === b.files.size &&
    [...a.files].every(([path, bytes]) => sameBytes(bytes, b.files.get(path)))
  );
}

function sameBytes(a: Uint8Array, b: Uint8Array | undefined): boolean {
  if (a === b) return true;
  return b !== undefined && a.length === b.length && a.every((byte, i) => byte === b[i]);
}
