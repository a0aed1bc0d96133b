// A fault of the input: where it stands, what stands there and what was expected.

export interface Fault {
  /** file as the study names it */
  readonly file: string;
  /** line of the file, the first being 1 */
  readonly line?: number;
  /** column of a table, or path into a JSON file such as `cases[0].duration_s` */
  readonly place?: string;
  /** stable word for programs */
  readonly code: string;
  /** the value and what was expected, in lower case */
  readonly message: string;
}

/** One line for people: `conductors.csv:12: diameter_mm: -5 is not a positive length`. */
export function faultLine(fault: Fault): string {
  const line = fault.line === undefined ? '' : `:${fault.line}`;
  const place = fault.place === undefined ? '' : ` ${fault.place}:`;
  return `${fault.file}${line}:${place} ${fault.message}`;
}

/** Thrown at the border of the program when an input has faults; carries all of them. */
export class InputFaults extends Error {
  readonly faults: readonly Fault[];
  constructor(faults: readonly Fault[]) {
    super(faults.map(faultLine).join('\n'));
    this.name = 'InputFaults';
    this.faults = faults;
  }
}
