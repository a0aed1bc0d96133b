// Medians, spreads and ratios of repeated measurements, and the exponent of a growth.

export interface Spread {
  readonly median: number;
  readonly least: number;
  readonly most: number;
}

/** Median (mean of the middle two of an even number), least and most; undefined of nothing. */
export function spread(values: readonly number[]): Spread | undefined {
  if (values.length === 0) return undefined;
  const sorted = [...values].sort((a, b) => a - b);
  const above = sorted[sorted.length >> 1]!;
  const below = sorted[(sorted.length - 1) >> 1]!;
  return { median: (above + below) / 2, least: sorted[0]!, most: sorted.at(-1)! };
}

/** Spread of over/under, round by round; a round that lacks either counts for nothing. */
export function ratioSpread(
  over: readonly (number | undefined)[],
  under: readonly (number | undefined)[],
): Spread | undefined {
  return spread(
    over.flatMap((value, round) => {
      const other = under[round];
      return value === undefined || other === undefined ? [] : [value / other];
    }),
  );
}

/**
 * Exponent p of counts ≈ c·sizes^p: slope of the least-squares line through the logarithms.
 * @param sizes at least two different ones, positive
 */
export function growthExponent(sizes: readonly number[], counts: readonly number[]): number {
  const x = sizes.map(Math.log);
  const y = counts.map(Math.log);
  const mean = (values: readonly number[]): number => values.reduce((sum, v) => sum + v, 0) / values.length;
  const mx = mean(x);
  const my = mean(y);
  const along = x.reduce((sum, v, i) => sum + (v - mx) * (y[i]! - my), 0);
  return along / x.reduce((sum, v) => sum + (v - mx) ** 2, 0);
}
