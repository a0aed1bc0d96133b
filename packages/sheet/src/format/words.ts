// Builds the small words of a sentence: counts, lists and plurals.

const COUNTS: readonly string[] = [
  'no',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/** A count in words up to twelve, in digits beyond. */
export function countWord(count: number): string {
  return COUNTS[count] ?? String(count);
}

/** `one rod`, `12 rods`. */
export function counted(count: number, one: string, many: string = `${one}s`): string {
  return `${countWord(count)} ${count === 1 ? one : many}`;
}

/** `1 rod`, `12 rods`: digits, for facts that are read as a list. */
export function tally(count: number, one: string, many: string = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** `a`, `a and b`, `a, b and c`. */
export function listed(items: readonly string[]): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} and ${items[items.length - 1]}`;
}

/** A text in at most so many lines of at most so many characters, broken between words; what does not fit ends in …. */
export function wrapped(text: string, longest: number, most: number): readonly string[] {
  const lines: string[] = [];
  let rest = text.trim();
  while (lines.length < most && rest !== '') {
    const space = rest.length <= longest ? rest.length : rest.lastIndexOf(' ', longest);
    const end = space > 0 ? space : longest;
    lines.push(rest.slice(0, end));
    rest = rest.slice(end).trim();
  }
  if (rest !== '') lines[lines.length - 1] = `${lines[lines.length - 1].slice(0, longest - 1)}…`;
  return lines;
}

/** First letter as a capital. */
export function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
