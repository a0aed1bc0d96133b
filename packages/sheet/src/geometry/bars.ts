// Lengths of the bars that set voltages against their limits on one scale.

export interface Barred {
  readonly worst: number;
  readonly uncertainty: number;
  readonly limit: number;
}

/** Places along the bar, share of its full length. */
export interface Bar {
  /** length up to the limit */
  readonly within: number;
  /** length beyond the limit */
  readonly beyond: number;
  /** where the limit stands: the same in every row */
  readonly limit: number;
  /** ends of the uncertainty */
  readonly low: number;
  readonly high: number;
}

/** The scale reaches at least this share of the limit, so that the limit never stands at the edge. */
const LEAST_SCALE = 1.25;
const HEADROOM = 1.02;

/** Share of the limit at the end of the bars. */
export function barScale(rows: readonly Barred[]): number {
  const shares = rows.map((r) => ((r.worst + r.uncertainty) / r.limit) * HEADROOM).filter(Number.isFinite);
  return Math.max(LEAST_SCALE, ...shares);
}

/** One bar on a scale that ends at `full` times the limit. */
export function barOf({ worst, uncertainty, limit }: Barred, full: number): Bar {
  const share = Number.isFinite(worst / limit) ? Math.max(0, worst / limit) : 0;
  const half = Number.isFinite(uncertainty / limit) ? uncertainty / limit : 0;
  return {
    within: Math.min(1, share) / full,
    beyond: Math.max(0, share - 1) / full,
    limit: 1 / full,
    low: Math.max(0, share - half) / full,
    high: Math.min(full, share + half) / full,
  };
}
