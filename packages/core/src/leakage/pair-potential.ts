// When two wires are far from each other, and how many points their means then need.
import type { SegmentMesh } from '../geometry/segments.ts';
import type { Wire } from './wire-pair.ts';

/**
 * Distance between centres over the longer length, below which the closed double integral is used. This and the ratios
 * below avoid round numbers, which regular grids hit exactly: a tie broken by rounding would spoil symmetries.
 */
export const CLOSED_FORM_RATIO = 1.987;

/**
 * Points on a segment of an entry by distance over length, to 1e-6: the n-point rule on 1/r errs by x²/12, x⁴/180,
 * x⁶/2 800, 2.3e-5·x⁸ of the mean at length over distance x, and twice that where both segments have a length.
 */
export const PAIR_RATIOS: Float64Array = Float64Array.of(20011, 12.37, 3.187);

/** Points on a segment of an entry, by squared distance and squared length. */
export function pairOrder(distance: number, lengthSquared: number): number {
  if (distance >= PAIR_RATIOS[0]! ** 2 * lengthSquared) return 1;
  if (distance >= PAIR_RATIOS[1]! ** 2 * lengthSquared) return 2;
  if (distance >= PAIR_RATIOS[2]! ** 2 * lengthSquared) return 3;
  return 4;
}

/**
 * Distance over the longer length in plan from which one bin of a table does for both segments (radialMean): what is
 * left out is of the sixth order.
 */
export const SINGLE_RATIO = 12.37;
/** Share of that ratio from which the second moment alone does: 0.16·x⁴ of 1/r is left out, up to four times that in layers. */
export const FARTHEST_SHARE = 2.29;
/** The same as SINGLE_RATIO with the wire in halves that points more to the other, and with both. */
export const HALVES_RATIO = 7.31;
export const QUARTERS_RATIO = 5.37;

/**
 * Distance from images over the length from which so many points suffice for their mean, a part of an entry, to 1e-6:
 * n points leave ρ⁻²ⁿ, ρ = q + √(q² + 1), q twice that ratio (Trefethen 2013, theorem 19.3).
 */
export const SMOOTH_ORDERS: readonly (readonly [ratio: number, order: number])[] = [
  [8.03, 2],
  [2.53, 3],
  [1.487, 4],
  [0.993, 5],
  [0.747, 6],
  [0.497, 8],
  [0.397, 10],
  [0.333, 12],
  [0.253, 16],
  [0.121, 32],
];

/** Points on a segment for images at a squared distance; 0 where they are too close for points. */
export function smoothOrder(distanceSquared: number, length: number): number {
  for (const [ratio, order] of SMOOTH_ORDERS)
    if (distanceSquared >= ratio * ratio * (length * length)) return order;
  return 0;
}

export function wireOf(mesh: SegmentMesh, i: number): Wire {
  return {
    x1: mesh.x1[i]!,
    y1: mesh.y1[i]!,
    z1: mesh.z1[i]!,
    x2: mesh.x2[i]!,
    y2: mesh.y2[i]!,
    z2: mesh.z2[i]!,
  };
}
