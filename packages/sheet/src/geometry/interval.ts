// Places of an interval, its median and the best fit on the scale that bars share.
import type { Spread } from '@ohmstead/study';

export interface Interval {
  /** ends, share of the scale's full length */
  readonly low: number;
  readonly high: number;
  readonly median: number;
  readonly best: number;
  /** where the limit stands: the same in every row */
  readonly limit: number;
}

/** The scale reaches at least this share of the limit, so that the limit never stands at the edge. */
const LEAST_SCALE = 1.25;
const HEADROOM = 1.02;

/** Share of the limit at the end of the scale. */
export function intervalScale(rows: readonly { readonly of: Spread; readonly limit: number }[]): number {
  const shares = rows
    .map(({ of, limit }) => (Math.max(of.best, of.high) / limit) * HEADROOM)
    .filter(Number.isFinite);
  return Math.max(LEAST_SCALE, ...shares);
}

/** One interval on a scale that ends at `full` times the limit. */
export function intervalOf(of: Spread, limit: number, full: number): Interval {
  const place = (value: number): number => {
    const share = value / limit;
    return Number.isFinite(share) ? Math.min(1, Math.max(0, share / full)) : 0;
  };
  return {
    low: place(of.low),
    high: place(of.high),
    median: place(of.median),
    best: place(of.best),
    limit: 1 / full,
  };
}
