// Rows pasted from a spreadsheet, to values of a table; every cell is taken or complained of.
import { type DisplayUnits, listed, shown } from '@ohmstead/study';
import { type PastedCells, pastedCells } from './paste-cells.ts';
import { type PasteTable, pasteColumns } from './paste-columns.ts';
import type { PasteComplaint } from './paste-complaint.ts';
import { type Found, headerColumns } from './paste-header.ts';
import { type ReadingOptions, readQuantity } from './quantity.ts';

/** A row by key of its columns, in SI; a blank cell has no key. */
export type PastedRow = ReadonlyMap<string, number | string>;

export interface Pasted {
  readonly rows: readonly PastedRow[];
  /** where there is any, the rows are not whole */
  readonly complaints: readonly PasteComplaint[];
}

type Row = PastedCells['rows'][number];

/** Begins as a number does. */
const LIKE_NUMBER = /^[+\-\u2212]?\s*[.,]?\d/;

/** Whether a row holds names: every table has numbers in each of its rows. */
function isHeader({ cells }: Row): boolean {
  return !cells.some((cell) => LIKE_NUMBER.test(cell));
}

function readRow(
  { line, cells }: Row,
  found: readonly (Found | undefined)[],
  options: Pick<ReadingOptions, 'units' | 'decimal'>,
  complaints: PasteComplaint[],
): PastedRow {
  const row = new Map<string, number | string>();
  const complain = (column: string, value: string, message: string): void => {
    complaints.push({ line, column, value, message });
  };
  found.forEach((one, i) => {
    const cell = cells[i] ?? '';
    if (one === undefined) {
      if (cell !== '') complain(`column ${i + 1}`, cell, `${shown(cell)} stands under no name of the table`);
      return;
    }
    const { column, unit } = one;
    if (cell === '') {
      if (column.required) complain(column.key, cell, `the cell is empty; expected ${column.label}`);
      return;
    }
    if (column.kind === 'yes-no' && cell !== 'yes' && cell !== 'no') {
      complain(column.key, cell, `${shown(cell)} is not accepted; expected yes or no`);
      return;
    }
    if (column.kind === 'text' || column.kind === 'yes-no') {
      row.set(column.key, cell);
      return;
    }
    const reading = readQuantity(column.kind, cell, { ...options, unit });
    if ('complaint' in reading) complain(column.key, cell, reading.complaint);
    else row.set(column.key, reading.value);
  });
  cells.slice(found.length).forEach((cell, i) => {
    const message = `${shown(cell)} stands beyond the last column; expected at most ${found.length} cells`;
    if (cell !== '') complain(`column ${found.length + i + 1}`, cell, message);
  });
  return row;
}

/**
 * Reads pasted rows.
 * @param table that they go to
 * @param text as the spreadsheet gives it; with or without a header row, cells with or without units
 * @param units of numbers without one, where no header tells it
 * @returns the rows in SI, and a complaint for each cell, column and row that cannot be taken
 */
export function readPaste(table: PasteTable, text: string, units: DisplayUnits = 'SI'): Pasted {
  const columns = pasteColumns(table);
  const { rows, decimal, fault } = pastedCells(text);
  const only = (line: number, message: string): Pasted => ({
    rows: [],
    complaints: [{ line, value: '', message }],
  });
  if (fault !== undefined) return only(fault.line, fault.message);
  const [first] = rows;
  if (first === undefined) {
    const expected = listed(columns.filter(({ required }) => required).map(({ label }) => label));
    return only(1, `nothing is pasted; expected rows with ${expected}`);
  }
  const complaints: PasteComplaint[] = [];
  const headed = isHeader(first);
  if (headed && rows.length === 1) return only(first.line, 'a header row is pasted and no rows under it');
  const found = headed
    ? headerColumns(first, columns, complaints)
    : columns.map((column): Found => ({ column, unit: undefined }));
  // with a column unknown, the cells under it would be told once more
  if (complaints.length > 0) return { rows: [], complaints };
  const read = rows.slice(headed ? 1 : 0).map((row) => readRow(row, found, { units, decimal }, complaints));
  return { rows: read, complaints };
}
