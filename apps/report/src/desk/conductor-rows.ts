// Rows of a table of conductors written: cells changed, rows added and removed, columns appended where a value needs one.
import { conductorColumns, type FoundColumn, usualName } from '@ohmstead/study';
import { type Conductor, type ConductorKey, cellOf, cellTolerance, unitOfColumn } from './conductor.ts';
import { type ConductorFile, cellNumber, cellText } from './conductor-file.ts';
import { padded, type TableText, withCells, withRows } from './table-text.ts';

/** Values to be written, by column; undefined is a blank cell. */
export type Values = Partial<Conductor>;

/** Columns of a new table, in this order. */
const FIRST_COLUMNS: readonly ConductorKey[] = [
  ...(['id', 'x1', 'y1', 'depth1', 'x2', 'y2', 'depth2', 'diameter', 'material', 'electrode'] as const),
];

/** The header of a new table of conductors. */
export function newTableText(): string {
  return `${conductorColumns
    .filter(({ stem }) => FIRST_COLUMNS.some((key) => key === stem))
    .map(usualName)
    .join(',')}\n`;
}

/** Columns that values need and the table has not, in the order of the format. */
function missingColumns(file: ConductorFile, values: readonly Values[]): readonly FoundColumn[] {
  const needed = (stem: string): boolean =>
    values.some((one) => Object.entries(one).some(([key, value]) => key === stem && value !== undefined));
  return conductorColumns
    .filter(({ stem }) => !file.columns.has(stem) && needed(stem))
    .map((spec, i) => {
      const unit = unitOfColumn(spec.stem, undefined);
      const column = { spec, index: file.width + i, name: usualName(spec) };
      return unit === undefined ? column : { ...column, unit };
    });
}

function withColumns(file: ConductorFile, added: readonly FoundColumn[]): TableText {
  if (added.length === 0) return file.text;
  const rows = new Set(file.recordOnLine.values());
  const records = file.text.records.map((record, i) => {
    if (i === file.header) return withHeaderCells(record.raw, record, added);
    return rows.has(i) ? padded(record, added.length) : record;
  });
  return { ...file.text, records };
}

function withHeaderCells(
  raw: string,
  record: TableText['records'][number],
  added: readonly FoundColumn[],
): TableText['records'][number] {
  const names = added.map(({ name }) => name);
  return { ...record, raw: `${raw},${names.join(',')}`, cells: [...(record.cells ?? []), ...names] };
}

/** Whether a cell holds a value already, so that it keeps its text. */
function holds(file: ConductorFile, record: number, key: string, value: Values[ConductorKey]): boolean {
  if (typeof value !== 'number')
    return cellText(file, record, key) === (value === undefined ? '' : cellOf(key, value, undefined));
  return Math.abs(cellNumber(file, record, key) - value) <= cellTolerance(key, value);
}

/**
 * Writes rows.
 * @param file the table
 * @param changes values by the record that they go to; cells that hold them already, and all others, keep their text
 * @param added conductors for new rows after the last one
 * @returns the new text of the file; rows that no change touches keep theirs, save blank cells under new columns
 */
export function written(
  file: ConductorFile,
  changes: ReadonlyMap<number, Values>,
  added: readonly Conductor[] = [],
): TableText {
  const extra = missingColumns(file, [...changes.values(), ...added]);
  const columns = new Map([...file.columns, ...extra.map((column) => [column.spec.stem, column] as const)]);
  const cellsWith = (cells: readonly string[], values: Values, skip: (key: string) => boolean): string[] => {
    const next = [...cells];
    for (const [key, value] of Object.entries(values)) {
      const column = columns.get(key);
      if (column === undefined || skip(key)) continue;
      next[column.index] = value === undefined ? '' : cellOf(key, value, column);
    }
    return next;
  };
  const text = withColumns(file, extra);
  const records = text.records.map((record, i) => {
    const values = changes.get(i);
    if (values === undefined || record.cells === undefined) return record;
    const keys = new Map(Object.entries(values));
    const cells = cellsWith(record.cells, values, (key) => holds(file, i, key, keys.get(key)));
    return cells.every((cell, c) => cell === record.cells?.[c]) ? record : withCells(record, cells);
  });
  const blank = Array.from({ length: file.width + extra.length }, () => '');
  const rows = added.map((conductor) => cellsWith(blank, conductor, () => false));
  return rows.length === 0 ? { ...text, records } : withRows({ ...text, records }, rows);
}
