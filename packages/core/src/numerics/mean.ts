// The mean of a few values that are nearly equal, exact where they are equal.

/** Mean, taken as differences from the first value so that equal values give that value to the last bit; NaN of none. */
export function meanOf(values: ArrayLike<number>): number {
  const first = values.length > 0 ? values[0]! : Number.NaN;
  let sum = 0;
  for (let i = 1; i < values.length; i++) sum += values[i]! - first;
  return first + (values.length > 1 ? sum / values.length : 0);
}
