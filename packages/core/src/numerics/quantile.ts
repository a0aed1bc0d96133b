// Quantiles and the median of a sample.

/**
 * Quantile by linear interpolation between order statistics, (n − 1)p from the least (Hyndman and Fan 1996, type 7).
 * @param sorted ascending, shape [n]
 * @param share p, 0 to 1
 */
export function quantileOfSorted(sorted: ArrayLike<number>, share: number): number {
  const place = (sorted.length - 1) * share;
  const below = Math.floor(place);
  const above = Math.min(below + 1, sorted.length - 1);
  return sorted[below]! + (place - below) * (sorted[above]! - sorted[below]!);
}

/** Middle value; NaN of none. */
export function medianOf(values: ArrayLike<number>): number {
  if (values.length === 0) return Number.NaN;
  return quantileOfSorted(Float64Array.from(values).sort(), 0.5);
}
