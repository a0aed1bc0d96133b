// Sets a value of a study whose holder may not be there yet.
import type { JsonValue } from '@ohmstead/study';
import type { Desk, StudyPath } from './desk.ts';

/** Sets or removes a value in one edit; objects that have to hold it are made with it. */
export function put(desk: Desk, path: StudyPath, value: JsonValue | undefined): void {
  const holder = path.slice(0, -1);
  const key = path[path.length - 1];
  const made = holder.length > 0 && typeof key === 'string' && desk.valueAt(holder) === undefined;
  if (!made) desk.edit(path, value);
  else if (value !== undefined) put(desk, holder, { [key]: value });
}
