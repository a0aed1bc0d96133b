// Writes a table as CSV after RFC 4180, with text that a spreadsheet would take for a formula made harmless.

export type Cell = string | number | boolean | null | undefined;

export interface Column<Row> {
  /** with its unit, e.g. `worst_touch_V` */
  readonly name: string;
  readonly value: (row: Row) => Cell;
}

export interface TableFile {
  /** ends in `.csv`, unique within the list */
  readonly name: string;
  readonly csv: string;
}

/** Text that begins like this is evaluated by spreadsheets when the file is opened. */
const FORMULA_START = /^[=+\-@\t\r]/;
const NEEDS_QUOTES = /[",\r\n]/;

/**
 * A text cell. Where it begins with = + - @, a tab or a carriage return, an apostrophe is put before it: spreadsheets
 * then show it as text and do not evaluate it. Numbers never pass here, so negative ones stay numbers.
 */
function textCell(text: string): string {
  const harmless = FORMULA_START.test(text) ? `'${text}` : text;
  return NEEDS_QUOTES.test(harmless) ? `"${harmless.replace(/"/g, '""')}"` : harmless;
}

/** One cell: numbers in full precision, yes or no for flags, nothing where there is no value. */
export function csvCell(cell: Cell): string {
  switch (typeof cell) {
    case 'number':
      return Number.isFinite(cell) ? String(cell === 0 ? 0 : cell) : '';
    case 'boolean':
      return cell ? 'yes' : 'no';
    case 'string':
      return textCell(cell);
    default:
      return '';
  }
}

/** Header and rows, each line ended by CR LF. */
export function csvOf<Row>(columns: readonly Column<Row>[], rows: readonly Row[]): string {
  const header = columns.map((column) => csvCell(column.name)).join(',');
  const lines = rows.map((row) => columns.map((column) => csvCell(column.value(row))).join(','));
  return `${[header, ...lines].join('\r\n')}\r\n`;
}
