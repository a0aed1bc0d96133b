// What is wrong with pasted text, and where.

/** What is wrong with a cell or a row. */
export interface PasteComplaint {
  /** line of the pasted text, the first being 1 */
  readonly line: number;
  /** name of the column, or its place counted from 1 */
  readonly column?: string | undefined;
  /** what stands there */
  readonly value: string;
  /** what is wrong and what was expected */
  readonly message: string;
}

/** One line for people: `line 3, thickness: "deep" is not a number; …`. */
export function complaintLine({ line, column, message }: PasteComplaint): string {
  return `line ${line}${column === undefined ? '' : `, ${column}`}: ${message}`;
}
