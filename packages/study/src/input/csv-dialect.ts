// Tables that are not written with commas and decimal points: what was seen, told once for the file.
import type { CsvRow } from './csv-rows.ts';
import { shown } from './shown-value.ts';

const EXPECTED = 'expected commas between columns and a decimal point, as in 1.5';

const separators: readonly (readonly [separator: string, name: string])[] = [
  [';', 'semicolons'],
  ['\t', 'tabs'],
  ['|', 'vertical bars'],
];

/** A number with a decimal comma standing between separators or at the ends of a line. */
const DECIMAL_COMMA = /(?:^|[;\t|"])\s*([+-]?\d+,\d+)\s*(?=$|[;\t|"])/m;
const LOOKS_LIKE_NUMBER = /^[+-]?\d+$/;
/** Lines looked at for decimal commas, characters. */
const SAMPLE_CHARACTERS = 10_000;

/**
 * Tells a table whose columns are separated by something else than commas.
 * @param text the whole table
 * @param header cells of its first row, split at commas
 * @returns a message for the first row, or `undefined`
 */
export function separatorFault(text: string, header: readonly string[]): string | undefined {
  const joined = header.join(',');
  for (const [separator, name] of separators) {
    const columns = joined.split(separator).length;
    if (columns < 2 || columns <= header.length) continue;
    const comma = DECIMAL_COMMA.exec(text.slice(0, SAMPLE_CHARACTERS));
    const decimals = comma === null ? '' : ` and numbers have a decimal comma (${shown(comma[1])})`;
    return `columns are separated by ${name}${decimals}; ${EXPECTED}`;
  }
  return undefined;
}

/**
 * Tells a table whose decimal commas have split its numbers into two cells each.
 * @param header names of the columns
 * @param rows rows under the header
 * @returns the first such row and a message, or `undefined` where fewer than half of the rows look like it
 */
export function decimalCommaFault(
  header: readonly string[],
  rows: readonly CsvRow[],
): { readonly line: number; readonly message: string } | undefined {
  const split = rows.filter(({ cells }) => {
    const numbers = cells.filter((cell) => LOOKS_LIKE_NUMBER.test(cell)).length;
    return cells.length > header.length && numbers >= 2 * (cells.length - header.length);
  });
  const first = split[0];
  if (first === undefined || 2 * split.length < rows.length) return undefined;
  const seen = `${first.cells.length} cells under ${header.length} column names`;
  const message = `${seen}; numbers seem to have a decimal comma (0,5); ${EXPECTED}`;
  return { line: first.line, message };
}
