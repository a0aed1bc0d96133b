// One line of a comparison: what differs, before and after.
import type { QuantityKind } from './quantity.ts';

/** A value of a line: a number is a quantity of the line's kind, in its SI unit; undefined where a state has none. */
export type Compared = number | string | undefined;

export interface Difference {
  /** in words */
  readonly what: string;
  readonly kind: QuantityKind | 'count' | 'text';
  readonly before: Compared;
  readonly after: Compared;
  /** numerical uncertainty of both together; a smaller change is none that the computation can tell */
  readonly uncertainty?: number | undefined;
}

/** The line, unless nothing differs. */
export function differing(line: Difference): readonly Difference[] {
  return line.before === line.after ? [] : [line];
}

/** Whether a change is larger than the numerical uncertainty of the two states; texts and inputs always are. */
export function isTold({ before, after, uncertainty }: Difference): boolean {
  if (typeof before !== 'number' || typeof after !== 'number' || uncertainty === undefined) return true;
  return Math.abs(after - before) > uncertainty;
}
