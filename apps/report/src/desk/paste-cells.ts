// Text from a spreadsheet to rows of cells: which separator it has, and which decimal mark.
import { csvRows } from '@ohmstead/study';
import { type DecimalMark, isAmbiguous } from './typed-number.ts';

export interface PastedCells {
  /** rows that hold anything; `line` is the line of the text, the first being 1 */
  readonly rows: readonly { readonly line: number; readonly cells: readonly string[] }[];
  /** decimal mark where the numbers tell it */
  readonly decimal: DecimalMark | undefined;
  /** the text cannot be divided: why, and where */
  readonly fault?: { readonly line: number; readonly message: string };
}

/** Most rows that are taken from one paste. Reason: more than any table of a study that is edited by hand. */
export const MOST_PASTED_ROWS = 100_000;

/** A number with one mark, a unit perhaps after it: 0,5 or 1.500 m. */
const ONE_MARK = /^[+\-\u2212]?(\d*)([.,])(\d+)(?:\s*\D.*)?$/;

/** Spreadsheets put tabs between cells; else semicolons where there are any, as files with decimal commas have. */
function separatorOf(text: string): string {
  if (text.includes('\t')) return '\t';
  return text.includes(';') ? ';' : ',';
}

/** The marks that can only be decimal ones: 0,5 and 12.25, but not 1,500. */
function sureMarks(cells: readonly string[]): ReadonlySet<string> {
  const marks = new Set<string>();
  for (const cell of cells) {
    const [, whole = '', mark = '', part = ''] = ONE_MARK.exec(cell) ?? [];
    if (mark !== '' && !isAmbiguous(`${whole},${part}`)) marks.add(mark);
  }
  return marks;
}

/** The decimal mark that the numbers of a table tell together; undefined where they tell none, or disagree. */
function decimalMark(cells: readonly string[]): DecimalMark | undefined {
  const marks = sureMarks(cells);
  if (marks.size !== 1) return undefined;
  return marks.has(',') ? ',' : '.';
}

/**
 * Divides pasted text.
 * @param text tabs, semicolons or commas between cells; line ends of any kind
 * @returns rows of cells without spaces around them; blank rows are passed over
 */
export function pastedCells(text: string): PastedCells {
  const lines = text.replace(/^\ufeff/, '').replace(/\r\n?/g, '\n');
  const separator = separatorOf(lines);
  const { rows, quote, truncated } = csvRows(lines, MOST_PASTED_ROWS, separator);
  if (quote !== undefined) {
    // in cells divided by tabs a mark of inches is no quotation mark
    const plain = separator === '\t' ? divided(lines) : undefined;
    if (plain === undefined) return { rows, decimal: undefined, fault: quote };
    return { rows: plain, decimal: decimalMark(plain.flatMap(({ cells }) => cells)) };
  }
  const message = `more than ${MOST_PASTED_ROWS} rows, the most that are taken at once`;
  if (truncated) return { rows, decimal: undefined, fault: { line: rows.at(-1)?.line ?? 1, message } };
  return { rows, decimal: decimalMark(rows.flatMap(({ cells }) => cells)) };
}

function divided(text: string): PastedCells['rows'] {
  return text
    .split('\n')
    .map((line, i) => ({ line: i + 1, cells: line.split('\t').map((cell) => cell.trim()) }))
    .filter(({ cells }) => cells.some((cell) => cell !== ''));
}
