// The engineer's note to a section, in study.json.
import type { SectionId } from '@ohmstead/sheet';
import { type Draft, valueAt } from '../desk/draft.ts';
import { setValue } from '../desk/set-value.ts';

export function noteOf(draft: Draft, section: SectionId): string {
  const text = valueAt(draft, ['notes', section]);
  return typeof text === 'string' ? text : '';
}

/** The draft with a note set; a blank one is removed. */
export function withNote(draft: Draft, section: SectionId, text: string): Draft {
  const held = valueAt(draft, ['notes']) === undefined ? setValue(draft, ['notes'], {}) : draft;
  const set = setValue(held, ['notes', section], text.trim() === '' ? undefined : text.trim());
  const left = valueAt(set, ['notes']);
  return left !== undefined && JSON.stringify(left) === '{}' ? setValue(set, ['notes'], undefined) : set;
}
