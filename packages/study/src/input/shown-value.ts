// A value as a message shows it: short, on one line, with nothing invisible.
import { LONGEST_SHOWN } from './limits.ts';

/**
 * Characters that may not stand in names, nor unescaped in messages: controls, line separators, marks that turn
 * the writing direction, lone surrogates and noncharacters.
 */
const INVISIBLE =
  /[\p{Cc}\p{Cs}\p{Noncharacter_Code_Point}\u2028\u2029\u200e\u200f\u202a-\u202e\u2066-\u2069]/u;
const EVERY_INVISIBLE = new RegExp(INVISIBLE.source, 'gu');

/** Code point in the usual form, such as U+0007. */
export function codePointName(character: string): string {
  const code = character.codePointAt(0);
  return code === undefined ? '' : `U+${code.toString(16).toUpperCase().padStart(4, '0')}`;
}

/**
 * The first character of a text that may not stand in a name.
 * @returns its code point, such as U+0007, or `undefined`
 */
export function invisibleCharacter(text: string): string | undefined {
  const found = INVISIBLE.exec(text);
  return found === null ? undefined : codePointName(found[0]);
}

/**
 * Text as a message shows it: at most `LONGEST_SHOWN` characters and an ellipsis, invisible characters by code point.
 * @param text any text
 * @returns one line; `(empty)` for empty text
 */
export function shown(text: string): string {
  if (text === '') return '(empty)';
  const start = [...text.slice(0, 2 * LONGEST_SHOWN + 2)];
  const short = start.length > LONGEST_SHOWN ? `${start.slice(0, LONGEST_SHOWN).join('')}…` : start.join('');
  return short.replace(EVERY_INVISIBLE, (character) => `<${codePointName(character)}>`);
}

/** Text in quotation marks, shortened as `shown` does. */
export function quoted(text: string): string {
  return `"${text === '' ? '' : shown(text)}"`;
}

/** Size from which a limit is written with an exponent. */
const LARGEST_PLAIN_FIGURE = 1e5;

/** A limit as messages write it: 100, 1e8. */
export function figure(value: number): string {
  return Math.abs(value) < LARGEST_PLAIN_FIGURE ? String(value) : value.toExponential().replace('e+', 'e');
}

/** Words as a list in a sentence: `a`, `a and b`, `a, b and c`. */
export function listed(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} and ${words[words.length - 1]}`;
}
