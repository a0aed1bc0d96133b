// A table of conductors as a file: which line holds which conductor, in which columns and units.
import {
  conductorColumns,
  type FoundColumn,
  findColumns,
  isRequiredColumn,
  readNumber,
  toSi,
} from '@ohmstead/study';
import { recordLines, type TableText, tableText } from './table-text.ts';

export interface ConductorFile {
  readonly text: TableText;
  /** place of the header among the records, and the cells it has */
  readonly header: number;
  readonly width: number;
  /** by stem, e.g. `x1` */
  readonly columns: ReadonlyMap<string, FoundColumn>;
  /** place among the records by the line on which a row begins; rows as wide as the header only */
  readonly recordOnLine: ReadonlyMap<number, number>;
}

/** Files taken apart, for as long as their bytes live: drafts share the files that no edit touched. */
const known = new WeakMap<Uint8Array, ConductorFile | 'no table'>();

/** A table of conductors; undefined where the file cannot be judged as one, which loading the study tells. */
export function conductorFile(bytes: Uint8Array): ConductorFile | undefined {
  const before = known.get(bytes);
  const found = before ?? takeApart(bytes) ?? 'no table';
  if (before === undefined) known.set(bytes, found);
  return found === 'no table' ? undefined : found;
}

function takeApart(bytes: Uint8Array): ConductorFile | undefined {
  const text = tableText(bytes);
  const header = text?.records.findIndex(({ cells }) => cells !== undefined) ?? -1;
  const cells = text?.records[header]?.cells;
  if (text === undefined || cells === undefined) return undefined;
  if (!cells.some((name) => isRequiredColumn(conductorColumns, name))) return undefined;
  const columns = findColumns(
    { file: '', header: cells, headerLine: 1, rows: [] },
    conductorColumns,
    [],
  ).byStem;
  const lines = recordLines(text);
  const rows = text.records.flatMap((record, i): readonly (readonly [number, number])[] =>
    i > header && record.cells?.length === cells.length ? [[lines[i]!, i]] : [],
  );
  return { text, header, width: cells.length, columns, recordOnLine: new Map(rows) };
}

/** The text of a cell; empty where the table has no such column. */
export function cellText(file: ConductorFile, record: number, key: string): string {
  const column = file.columns.get(key);
  return column === undefined ? '' : (file.text.records[record]?.cells?.[column.index] ?? '');
}

/** The number that a cell holds, in SI; NaN where it holds none. */
export function cellNumber(file: ConductorFile, record: number, key: string): number {
  const unit = file.columns.get(key)?.unit;
  const reading = readNumber(cellText(file, record, key));
  return unit === undefined || reading.kind === 'fault' ? Number.NaN : toSi(reading.value, unit);
}
