// CSV text to rows of cells, each with the lines on which it stands.
import Papa from 'papaparse';

export interface CsvRow {
  /** line of the file on which the row begins, the first being 1 */
  readonly line: number;
  /** line on which it ends: a cell in quotation marks may hold line ends */
  readonly lastLine: number;
  /** cells without spaces around them */
  readonly cells: readonly string[];
}

export interface CsvRows {
  /** rows that hold anything, in order */
  readonly rows: readonly CsvRow[];
  /** the first row whose quotation marks do not pair */
  readonly quote?: { readonly line: number; readonly message: string };
  /** more rows than asked for */
  readonly truncated: boolean;
}

const quoteMessages: ReadonlyMap<string, string> = new Map([
  ['MissingQuotes', 'a quotation mark opens in this row and is never closed'],
  [
    'InvalidQuotes',
    'text follows a closing quotation mark; write quotation marks within a quoted cell twice',
  ],
]);

/** Marks past the first: the parser passes over one of them without counting it, which would shift every line. */
const BYTE_ORDER_MARKS = /^\ufeff+/;

/**
 * Splits CSV text into rows and cells.
 * @param table text with line ends `\n`
 * @param most rows to keep
 * @param separator of the columns, one character
 * @returns rows; blank rows and rows of nothing but commas are passed over
 */
export function csvRows(table: string, most: number, separator: string = ','): CsvRows {
  const text = table.replace(BYTE_ORDER_MARKS, '');
  const rows: CsvRow[] = [];
  let quote: { line: number; message: string } | undefined;
  let truncated = false;
  let line = 1;
  let counted = 0;
  Papa.parse<string[]>(text, {
    delimiter: separator,
    newline: '\n',
    step: ({ data, errors, meta }, parser) => {
      const begins = line;
      for (; counted < meta.cursor; counted++) if (text[counted] === '\n') line++;
      const wrong = errors.map((error) => quoteMessages.get(error.code)).find((known) => known !== undefined);
      if (wrong !== undefined) {
        quote = { line: begins, message: wrong };
        parser.abort();
        return;
      }
      const cells = data.map((cell) => cell.trim());
      if (cells.every((cell) => cell === '')) return;
      if (rows.length === most) {
        truncated = true;
        parser.abort();
        return;
      }
      rows.push({ line: begins, lastLine: text[counted - 1] === '\n' ? line - 1 : line, cells });
    },
  });
  return { rows, truncated, ...(quote === undefined ? {} : { quote }) };
}
