// One conductor as it is drawn and typed, in SI units, and as the cells of a row.
import { ROD_LEAN_DEGREES } from '@ohmstead/core';
import { conductorColumns, type FoundColumn, toSi, type Unit, unitsOf } from '@ohmstead/study';

/** A conductor; depths positive downward. What is undefined is left blank in the table. */
export interface Conductor {
  readonly id?: string | undefined;
  readonly x1: number;
  readonly y1: number;
  readonly depth1: number;
  readonly x2: number;
  readonly y2: number;
  readonly depth2: number;
  /** m */
  readonly diameter: number;
  readonly material?: string | undefined;
  readonly electrode?: string | undefined;
  readonly insulated?: boolean | undefined;
  /** Ω/m, in place of what material and diameter give */
  readonly resistance?: number | undefined;
}

export type ConductorKey = keyof Conductor;

/** In the order in which a row is read. */
export const conductorKeys: readonly ConductorKey[] = [
  ...(['id', 'x1', 'y1', 'depth1', 'x2', 'y2', 'depth2', 'diameter'] as const),
  ...(['material', 'electrode', 'insulated', 'resistance'] as const),
];

/** Places and depths are kept to a nanometre, m. Reason: sums such as 1.1 + 2.2 are written 3.3; nothing is set out finer. */
const PLACE_TOLERANCE_M = 1e-9;
/** Of other quantities, relative. Reason: beyond what any data sheet gives. */
const RELATIVE_TOLERANCE = 1e-9;
/** Decimals that a place may need: a nanometre in kilometres. */
const MOST_DECIMALS = 12;
/** Digits that tell every double apart. */
const MOST_DIGITS = 17;

const placeKeys: ReadonlySet<string> = new Set(['x1', 'y1', 'depth1', 'x2', 'y2', 'depth2']);

/** How far the number that a cell holds may lie from the value written to it, in SI. */
export function cellTolerance(key: string, value: number): number {
  return placeKeys.has(key) ? PLACE_TOLERANCE_M : RELATIVE_TOLERANCE * Math.abs(value);
}

/** A number rounded ever less: places by decimals, so that what is nearly nought becomes it, others by digits. */
function* roundings(key: string, value: number): Generator<number> {
  if (placeKeys.has(key)) {
    for (let decimals = 0; decimals <= MOST_DECIMALS; decimals++) yield Number(value.toFixed(decimals));
    return;
  }
  for (let digits = 1; digits < MOST_DIGITS; digits++) yield Number(value.toPrecision(digits));
}

/**
 * A value in the unit of its column.
 * @param key column without its unit
 * @param value in SI
 * @param unit of the column
 * @returns the fewest digits that are read back within `cellTolerance`, or else every digit there is
 */
export function numberCell(key: string, value: number, unit: Unit): string {
  const inUnit = (value * unit.denominator) / unit.numerator;
  for (const short of roundings(key, inUnit)) {
    if (Math.abs(toSi(short, unit) - value) <= cellTolerance(key, value)) return String(short + 0);
  }
  return String(inUnit + 0);
}

/** The unit of a column; its usual one where the table has no such column yet. */
export function unitOfColumn(key: string, column: FoundColumn | undefined): Unit | undefined {
  if (column !== undefined) return column.unit;
  const spec = conductorColumns.find(({ stem }) => stem === key);
  return spec === undefined || spec.kind === 'text'
    ? undefined
    : unitsOf(spec.kind).get(spec.usualUnit ?? '');
}

/** The text of a cell for a value of a conductor. */
export function cellOf(
  key: string,
  value: string | number | boolean,
  column: FoundColumn | undefined,
): string {
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  if (typeof value === 'string') return value;
  const unit = unitOfColumn(key, column);
  return unit === undefined ? String(value) : numberCell(key, value, unit);
}

/** Whether a conductor is a rod: vertical, or nearly so, as the results count them. */
export function isRod({ x1, y1, x2, y2, depth1, depth2 }: Conductor): boolean {
  const fall = Math.abs(depth2 - depth1);
  return fall > 0 && Math.hypot(x2 - x1, y2 - y1) <= fall * Math.tan((ROD_LEAN_DEGREES * Math.PI) / 180);
}
