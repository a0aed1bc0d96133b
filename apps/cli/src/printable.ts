// Text from a study or file name, made fit for a terminal: no control characters, no writing-direction marks.

/** Controls, line separators, and marks that turn the writing direction; a terminal obeys them instead of showing them. */
const OBEYED = /[\p{Cc}\u2028\u2029\u200e\u200f\u202a-\u202e\u2066-\u2069]/gu;

/** The text on one line, with each such character shown by its code point, such as <U+001B>. */
export function printable(text: string): string {
  return text.replace(OBEYED, (character) => {
    const code = character.codePointAt(0) ?? 0;
    return `<U+${code.toString(16).toUpperCase().padStart(4, '0')}>`;
  });
}
