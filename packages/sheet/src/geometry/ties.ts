// Values that differ by rounding alone count as equal, so that the order in which things are told is the same on every machine.

/** Relative difference up to which values are tied: two kinds of machine agree to this, as review packs are compared. */
export const TIE_SHARE = 1e-9;

/** Significant digits of `TIE_SHARE`. */
const TIED_DIGITS = 9;

/** A value for sorting: tied values are equal, but for the few that lie at an edge of rounding. */
export function levelled(value: number): number {
  return Number(value.toPrecision(TIED_DIGITS));
}
