// Revision lines of a study: one more, under the mark that follows the last one.
import { member } from '@ohmstead/study';
import type { Draft } from './draft.ts';
import { insertItem, listAt } from './set-value.ts';

const REVISIONS = ['revisions'] as const;
const FIRST_MARK = 'A';
const ALPHABET = 'ABCDEFGHIJKLMNOPQRSTUVWXYZ';

/** The mark after another: A → B, Z → AA, 1 → 2, P09 → P10; A after one that is neither counted nor lettered. */
export function nextMark(mark: string): string {
  const [, stem = '', digits = ''] = /^(.*?)(\d{1,6})$/.exec(mark) ?? [];
  if (digits !== '') return `${stem}${String(Number(digits) + 1).padStart(digits.length, '0')}`;
  if (!/^[A-Z]+$/.test(mark)) return FIRST_MARK;
  const [head, last] = [mark.slice(0, -1), mark.slice(-1)];
  if (last !== 'Z') return `${head}${ALPHABET[ALPHABET.indexOf(last) + 1]}`;
  return `${head === '' ? 'A' : nextMark(head)}A`;
}

/**
 * Adds a revision after the others.
 * @param words its date, text and author as the page knows them; blank ones are left out
 */
export function addRevision(
  draft: Draft,
  words: { readonly date?: string; readonly text?: string; readonly by?: string },
): Draft {
  const list = listAt(draft, REVISIONS);
  const last = member(list.at(-1), 'mark');
  const mark = typeof last === 'string' ? nextMark(last) : FIRST_MARK;
  const given = Object.entries(words).filter(([, text]) => text.trim() !== '');
  return insertItem(draft, REVISIONS, list.length, { mark, ...Object.fromEntries(given) });
}
