// A CSV table with one header row and rows of its width, or the faults that keep it from being one.
import type { Fault } from '../fault.ts';
import { decimalCommaFault, separatorFault } from './csv-dialect.ts';
import { type CsvRow, csvRows } from './csv-rows.ts';
import { MOST_COLUMNS } from './limits.ts';
import { figure, quoted, shown } from './shown-value.ts';

export interface CsvTable {
  readonly file: string;
  /** names of the columns, without spaces around them */
  readonly header: readonly string[];
  readonly headerLine: number;
  /** rows as wide as the header */
  readonly rows: readonly CsvRow[];
}

/** Begins as a number does: a digit, a sign or point before one, or a formula. */
const LIKE_NUMBER = /^(?:=|[+\-\u2212]?\s*[.,]?\d)/;
/** Rows under the header looked at for the true column names. Reason: title, subject, date and blank rows. */
const HEADER_SEARCH_ROWS = 5;

function likeHeader({ cells }: CsvRow): boolean {
  return cells.filter((cell) => cell !== '').length > 1 && !cells.some((cell) => LIKE_NUMBER.test(cell));
}

function shownRow({ cells }: CsvRow): string {
  return shown(cells.filter((cell) => cell !== '').join(', '));
}

/** Where the column names stand, if the first row holds none of them; told once instead of each missing column. */
function headerFault(
  rows: readonly CsvRow[],
  isColumn: (name: string) => boolean,
): Omit<Fault, 'file'> | undefined {
  const first = rows[0];
  if (first.cells.some(isColumn)) return undefined;
  const late = rows.slice(1, 1 + HEADER_SEARCH_ROWS).find(({ cells }) => cells.some(isColumn));
  if (late !== undefined) {
    const message = `the column names stand on line ${late.line}; expected them in the first row, with nothing above`;
    return { line: first.line, code: 'header-late', message };
  }
  if (first.cells.filter((cell) => LIKE_NUMBER.test(cell)).length < 2) return undefined;
  const message = `the first row holds values (${shownRow(first)}); expected the column names`;
  return { line: first.line, code: 'header-missing', message };
}

function columnNameFaults(header: CsvRow, rows: readonly CsvRow[]): readonly Omit<Fault, 'file'>[] {
  return header.cells.flatMap((name, i): readonly Omit<Fault, 'file'>[] => {
    if (name === '') {
      const used = rows.find(({ cells }) => cells[i] !== undefined && cells[i] !== '');
      if (used === undefined) return [];
      const message = `column ${i + 1} has no name, but ${quoted(used.cells[i])} on line ${used.line}`;
      return [{ line: header.line, code: 'unnamed-column', message }];
    }
    const first = header.cells.indexOf(name);
    if (first === i) return [];
    const message = `column ${i + 1} has the same name as column ${first + 1}`;
    return [{ line: header.line, place: shown(name), code: 'duplicate-column', message }];
  });
}

/** Header rows below the first: leading rows of words (units, second names) and repetitions of the first row. */
function headerRowFaults(header: CsvRow, rows: readonly CsvRow[]): ReadonlyMap<CsvRow, Omit<Fault, 'file'>> {
  const found = new Map<CsvRow, Omit<Fault, 'file'>>();
  const names = header.cells.join('\n');
  let leading = true;
  for (const row of rows) {
    leading &&= likeHeader(row);
    const expected = 'expected one header row, with the unit in each column name, as in x1_m';
    if (row.cells.join('\n') === names) {
      const message = 'the header row stands here again; expected one header row';
      found.set(row, { line: row.line, code: 'header-repeated', message });
    } else if (leading) {
      const message = `a second header row (${shownRow(row)}); ${expected}`;
      found.set(row, { line: row.line, code: 'header-second', message });
    }
  }
  return found;
}

/**
 * Reads a table.
 * @param file name for the faults
 * @param text the whole table, line ends `\n`
 * @param kind most rows under the header, and how to tell the name of a column that the table needs
 * @param faults gets what is wrong with the table as a table
 * @returns the table with the rows that have the width of the header, or `undefined` where it cannot be judged further
 */
export function readCsvTable(
  file: string,
  text: string,
  kind: { readonly mostRows: number; readonly isColumn: (name: string) => boolean },
  faults: Fault[],
): CsvTable | undefined {
  const add = (fault: Omit<Fault, 'file'>): undefined => {
    faults.push({ file, ...fault });
  };
  const { rows: all, quote, truncated } = csvRows(text, kind.mostRows + 1);
  const [header, ...below] = all;
  const dialect = header === undefined ? undefined : separatorFault(text, header.cells);
  if (dialect !== undefined) return add({ line: header.line, code: 'separator', message: dialect });
  if (quote !== undefined) return add({ line: quote.line, code: 'quotation-mark', message: quote.message });
  if (header === undefined) {
    return add({
      line: 1,
      code: 'empty-file',
      message: 'the table is empty; expected a header row and rows under it',
    });
  }
  if (truncated) {
    const message = `the table has more than ${figure(kind.mostRows)} rows under its header, the most that are read`;
    return add({ code: 'too-many-rows', message });
  }
  if (header.cells.length > MOST_COLUMNS) {
    const message = `the header has ${header.cells.length} columns; at most ${MOST_COLUMNS} are read`;
    return add({ line: header.line, code: 'too-many-columns', message });
  }
  const misplaced = headerFault(all, kind.isColumn);
  if (misplaced !== undefined) return add(misplaced);
  if (below.length === 0) {
    return add({
      line: header.line,
      code: 'no-rows',
      message: 'the table has a header row and no rows under it',
    });
  }
  const split = decimalCommaFault(header.cells, below, kind.isColumn);
  if (split !== undefined) return add({ line: split.line, code: 'decimal-comma', message: split.message });

  for (const fault of columnNameFaults(header, below)) add(fault);
  const headerRows = headerRowFaults(header, below);
  const rows = below.filter((row) => {
    const headerRow = headerRows.get(row);
    if (headerRow !== undefined) {
      add(headerRow);
      return false;
    }
    if (row.cells.length === header.cells.length) return true;
    const message = `the row has ${row.cells.length} cells, the header ${header.cells.length}; expected as many`;
    add({ line: row.line, code: 'ragged-row', message });
    return false;
  });
  return { file, header: header.cells, headerLine: header.line, rows };
}
