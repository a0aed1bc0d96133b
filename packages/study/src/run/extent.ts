// The part of the surface that is mapped: the assessed areas and the metal, with a margin.
import { type Box, planReach, type SegmentMesh } from '@ohmstead/core';
import type { Prepared } from './prepare.ts';

/** Ground shown around the assessed areas, m: room for a pace past their edge, and for the eye. */
const MARGIN_M = 2;

export function assessedBox(prepared: Prepared): Box {
  const { conductors } = prepared.loaded;
  const xs = [...conductors.x1, ...conductors.x2];
  const ys = [...conductors.y1, ...conductors.y2];
  for (const [x, y] of [...prepared.touchArea, ...prepared.stepArea].flat()) {
    xs.push(x);
    ys.push(y);
  }
  const least = (values: readonly number[]): number =>
    values.reduce((a, b) => Math.min(a, b), Number.POSITIVE_INFINITY);
  const most = (values: readonly number[]): number =>
    values.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);
  return {
    west: least(xs) - MARGIN_M,
    south: least(ys) - MARGIN_M,
    east: most(xs) + MARGIN_M,
    north: most(ys) + MARGIN_M,
  };
}

/** A horizontal distance that no place in the box is from any metal. */
export function lineReach(mesh: SegmentMesh, box: Box): number {
  return planReach(mesh) + Math.hypot(box.east - box.west, box.north - box.south) + 10 * MARGIN_M;
}
