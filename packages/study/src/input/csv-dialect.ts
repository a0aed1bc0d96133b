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
const DECIMAL_POINT = /\d\.\d/;
const COMMA_NUMBER = /^[+-]?\d+,\d+$/;
/** Beginning of the table looked at for decimal commas, characters. */
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

/** A row whose decimal commas have made two cells of a number each: more cells than names, and no decimal point. */
function splitByCommas({ cells }: CsvRow, width: number): boolean {
  const numbers = cells.filter((cell) => LOOKS_LIKE_NUMBER.test(cell)).length;
  const points = cells.some((cell) => DECIMAL_POINT.test(cell));
  return cells.length > width && numbers >= 2 * (cells.length - width) && !points;
}

/**
 * Tells a table whose numbers have decimal commas, bare (each then makes two cells) or in quotation marks.
 * @param header names of the columns
 * @param rows rows under the header
 * @param isNumber tells the name of a column of numbers
 * @returns the first such row and a message, or `undefined` where fewer than half of the rows look like it
 */
export function decimalCommaFault(
  header: readonly string[],
  rows: readonly CsvRow[],
  isNumber: (name: string) => boolean,
): { readonly line: number; readonly message: string } | undefined {
  const numberColumns = header.map((name, i) => (isNumber(name) ? i : -1)).filter((i) => i >= 0);
  const commaCell = ({ cells }: CsvRow): string | undefined =>
    numberColumns.map((i) => cells[i]).find((cell) => cell !== undefined && COMMA_NUMBER.test(cell));

  const split = rows.filter((row) => splitByCommas(row, header.length));
  if (split.length > 0 && 2 * split.length >= rows.length) {
    const seen = `${split[0].cells.length} cells under ${header.length} column names`;
    const message = `${seen}; numbers seem to have a decimal comma (0,5); ${EXPECTED}`;
    return { line: split[0].line, message };
  }
  const commas = rows.filter((row) => commaCell(row) !== undefined);
  if (commas.length === 0 || 2 * commas.length < rows.length) return undefined;
  const message = `numbers have a decimal comma (${shown(commaCell(commas[0]) ?? '')}); ${EXPECTED}`;
  return { line: commas[0].line, message };
}
