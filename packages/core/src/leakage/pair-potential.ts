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
export const PAIR_RATIOS: Float64Array = Float64Array.of(603.1, 10.37, 3.187);

/** Points on a segment of an entry, by squared distance and squared length. */
export function pairOrder(distance: number, lengthSquared: number): number {
  if (distance >= PAIR_RATIOS[0]! ** 2 * lengthSquared) return 1;
  if (distance >= PAIR_RATIOS[1]! ** 2 * lengthSquared) return 2;
  if (distance >= PAIR_RATIOS[2]! ** 2 * lengthSquared) return 3;
  return 4;
}

/**
 * Distance over the longer length from which value and curvature of a table at the mean squared distance do for both
 * segments: what is left out is 0.16·x⁴ of 1/r for two segments in line, up to four times that where layers make the
 * potential fall faster.
 */
export const SINGLE_RATIO = 28.3;

/**
 * Distance from images over the longer length from which so many points suffice for their mean, a part of an entry, to
 * 5e-7: n points leave ρ⁻²ⁿ, ρ = q + √(q² + 1), q twice that ratio (Trefethen 2013, theorem 19.3).
 */
export const SMOOTH_ORDERS: readonly (readonly [ratio: number, order: number])[] = [
  [10.37, 2],
  [3.187, 3],
  [1.987, 4],
  [0.993, 6],
  [0.497, 10],
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
