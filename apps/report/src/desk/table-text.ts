// A CSV file as its lines stand: rows found, everything else kept to the byte.
import { csvRows, decodeText } from '@ohmstead/study';

/** A row, or a line between rows. */
export interface TextRecord {
  /** as the file has it, without its line end */
  readonly raw: string;
  /** its line end; empty at the end of a file without one */
  readonly end: string;
  /** cells without spaces around them; undefined for a blank line and one of nothing but commas */
  readonly cells: readonly string[] | undefined;
}

export interface TableText {
  /** byte order mark, or nothing */
  readonly mark: string;
  readonly records: readonly TextRecord[];
}

const BYTE_ORDER_MARK = '\ufeff';
const LINE = /([^\r\n]*)(\r\n|\r|\n|$)/g;
const LINE_END = /\r\n|\r|\n/g;

interface Line {
  readonly raw: string;
  readonly end: string;
}

function linesOf(text: string): readonly Line[] {
  const lines: Line[] = [];
  for (const [all, raw = '', end = ''] of text.matchAll(LINE)) if (all !== '') lines.push({ raw, end });
  return lines;
}

function joined(lines: readonly Line[]): Line {
  const last = lines.at(-1);
  const raw = lines.slice(0, -1).map((line) => `${line.raw}${line.end}`);
  return { raw: `${raw.join('')}${last?.raw ?? ''}`, end: last?.end ?? '' };
}

/**
 * Takes a file apart.
 * @returns its rows and the lines between them; undefined where the file is no text, or quotation marks do not pair
 */
export function tableText(bytes: Uint8Array): TableText | undefined {
  const reading = decodeText(bytes);
  if (reading.kind === 'fault') return undefined;
  const { rows, quote } = csvRows(reading.text, Number.POSITIVE_INFINITY);
  if (quote !== undefined) return undefined;
  const whole = new TextDecoder('utf-8', { ignoreBOM: true }).decode(bytes);
  const mark = whole.startsWith(BYTE_ORDER_MARK) ? BYTE_ORDER_MARK : '';
  const lines = linesOf(whole.slice(mark.length));
  const records: TextRecord[] = [];
  const between = (first: number, end: number): void => {
    for (const line of lines.slice(first, end)) records.push({ ...line, cells: undefined });
  };
  let next = 0;
  for (const { line, lastLine, cells } of rows) {
    between(next, line - 1);
    records.push({ ...joined(lines.slice(line - 1, lastLine)), cells });
    next = lastLine;
  }
  between(next, lines.length);
  return { mark, records };
}

/** The bytes of a file: the same as were taken apart where no record was changed. */
export function tableBytes({ mark, records }: TableText): Uint8Array {
  return new TextEncoder().encode(`${mark}${records.map(({ raw, end }) => `${raw}${end}`).join('')}`);
}

/** The line on which each record begins, the first being 1. */
export function recordLines({ records }: TableText): readonly number[] {
  let line = 1;
  return records.map(({ raw }) => {
    const begins = line;
    line += (raw.match(LINE_END)?.length ?? 0) + 1;
    return begins;
  });
}

/** A cell as CSV writes it: in quotation marks where it could be misread without them. */
function cellText(cell: string): string {
  return /[",\r\n]|^\s|\s$/.test(cell) ? `"${cell.replaceAll('"', '""')}"` : cell;
}

/** A row of cells without its line end. */
export function csvLine(cells: readonly string[]): string {
  return cells.map(cellText).join(',');
}

/** A record with other cells, its line end kept. */
export function withCells(record: TextRecord, cells: readonly string[]): TextRecord {
  return { ...record, raw: csvLine(cells), cells };
}

/** A record with blank cells after its own. */
export function padded(record: TextRecord, count: number): TextRecord {
  const blank = Array.from({ length: count }, () => '');
  return { ...record, raw: `${record.raw}${','.repeat(count)}`, cells: [...(record.cells ?? []), ...blank] };
}

/** The line end of the file, that of its first line. */
function lineEnd(text: TableText): string {
  return text.records.find(({ end }) => end !== '')?.end ?? '\n';
}

/** The file with rows after its last row; blank lines at its end stay there. */
export function withRows(text: TableText, rows: readonly (readonly string[])[]): TableText {
  const end = lineEnd(text);
  const last = text.records.findLastIndex(({ cells }) => cells !== undefined);
  const added = rows.map((cells) => withCells({ raw: '', end, cells }, cells));
  const records = text.records.toSpliced(last + 1, 0, ...added);
  // a file without a line end at its end has none afterwards
  const open = text.records.length > 0 && text.records.at(-1)?.end === '';
  return {
    ...text,
    records: records.map((record, i) => {
      if (open && i === records.length - 1) return { ...record, end: '' };
      return record.end === '' ? { ...record, end } : record;
    }),
  };
}

/** The file without some of its records; where the last one had no line end, the new last one has none. */
export function withoutRecords(text: TableText, gone: ReadonlySet<number>): TableText {
  const records = text.records.filter((_, i) => !gone.has(i));
  const last = records.at(-1);
  const open = text.records.at(-1)?.end === '';
  return {
    ...text,
    records: open && last !== undefined ? [...records.slice(0, -1), { ...last, end: '' }] : records,
  };
}
